import { promiseOf } from '@/shared/buyers/promise';
import type { RequestRow } from '@/shared/buyers/requests';
import { type Day, formatDay } from '@/shared/days';

type Source = RequestRow['sources'][number];

export const isOpen = ({ state }: RequestRow): boolean => state === 'waiting' || state === 'notified';

/** Fish of a brood that are as long as was asked, as far as their lengths tell; all that are available where none was. */
export function thereOf({ available, size }: Source, { lengthTenthsMm }: RequestRow): number {
  if (lengthTenthsMm === null || available <= 0) return Math.max(0, available);
  return size ? promiseOf(size, available, { heads: 1, lengthTenthsMm }).expected : 0;
}

/** Whether there are enough for this one after those before it in the row. */
export function canBeMet(request: RequestRow): boolean {
  const there = request.sources.reduce((sum, source) => sum + thereOf(source, request), 0);
  return there - request.before >= (request.heads ?? 1);
}

/** "Can be answered", "waits: 2 of 8 are there", "told on Thu 3". */
export function standsWords(request: RequestRow, today: Day): string {
  const { state, order, notifiedOn, heads, before } = request;
  if (order) return `Order ${order.number}`;
  if (state === 'closed') return 'Closed';
  const told = notifiedOn ? `Told on ${formatDay(notifiedOn, today)}. ` : '';
  if (canBeMet(request)) return `${told}Can be answered`;
  const there = request.sources.reduce((sum, source) => sum + thereOf(source, request), 0);
  const left = Math.max(0, there - before);
  return `${told}Waits: ${left} of ${heads ?? 1} there${before > 0 && there > 0 ? ' after those before' : ''}`;
}
