import type * as z from 'zod/mini';
import { dayOf } from '../../shared/days';
import { may } from '../../shared/roles';
import type { OrderToday } from '../../shared/today/facts';
import type { Scope } from '../scope';
import { whatOf } from './letters';
import { seesOf } from './room';
import { orderRows } from './rows';

const OPEN = new Set(['requested', 'reserved', 'depositAsked', 'depositPaid', 'ready']);

/** Orders whose fish are still here, for whoever may see what to catch; owners also see who waits for an answer. */
export async function ordersToday(scope: Scope): Promise<z.input<typeof OrderToday>[]> {
  if (!may(scope.role, 'catch:see')) return [];
  const sees = seesOf(scope);
  const rows = await orderRows(scope, sees, { openOnly: true });
  const unread = sees.buyer ? await unreadSince(scope) : new Map<string, string>();
  return rows
    .filter(({ state }) => OPEN.has(state))
    .map((row) => ({
      id: row.id,
      number: row.number,
      state: row.state,
      buyerName: row.buyer?.code ?? null,
      what: whatOf(row),
      time: row.agreedTime,
      toPayCents: row.toPayCents,
      reservedUntil: row.reservedUntil && dayOf(Date.parse(row.reservedUntil), scope.timeZone),
      short: row.short,
      waitsSince: sees.buyer ? (unread.get(row.id) ?? (row.state === 'requested' ? row.madeOn : null)) : null,
    }));
}

async function unreadSince({ db, roomId, timeZone }: Scope): Promise<Map<string, string>> {
  const rows = await db
    .selectFrom('message')
    .where('roomId', '=', roomId)
    .where('fromBuyer', '=', 1)
    .where('readAt', 'is', null)
    .select(['purchaseId', ({ fn }) => fn.min('at').as('at')])
    .groupBy('purchaseId')
    .execute();
  return new Map(rows.map(({ purchaseId, at }) => [purchaseId, dayOf(Date.parse(at), timeZone)]));
}
