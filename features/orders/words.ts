import { type Day, formatDay } from '@/shared/days';
import type { OrderRow } from '@/shared/orders/shapes';
import { hasLeft } from '@/shared/orders/state';
import { timeWords } from '@/shared/orders/times';

/** "today, 16:30", "held until Sun 6 Dec", "no date". */
export function whenWords(order: OrderRow, today: Day): string {
  if (order.handedOverAt) return formatDay(order.handedOverAt.slice(0, 10), today);
  if (order.agreedTime) return timeWords(order.agreedTime, today);
  if (order.lapsed) return 'no longer held';
  if (order.reservedUntil) return `held until ${formatDay(order.reservedUntil.slice(0, 10), today)}`;
  return 'no date';
}

/** What an order still needs of somebody; null when nothing. */
export function needWords(order: OrderRow): string | null {
  if (order.short > 0) return `${order.short} fish short`;
  if ((order.flaggedCents ?? 0) > 0 || ((order.toReturnCents ?? 0) > 0 && !hasLeft(order.state)))
    return 'Money to give back';
  if (order.lapsed) return 'Not held any more';
  if ((order.unread ?? 0) > 0) return order.unread === 1 ? '1 new message' : `${order.unread} new messages`;
  return null;
}
