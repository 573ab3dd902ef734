import type * as z from 'zod/mini';
import { may } from '../../shared/roles';
import type { OrderToday } from '../../shared/today/facts';
import type { Scope } from '../scope';
import { whatOf } from './letters';
import { seesOf } from './room';
import { orderRows } from './rows';

const OPEN = new Set(['reserved', 'depositAsked', 'depositPaid', 'ready']);

/** Orders whose fish are still here, for whoever may see what to catch. */
export async function ordersToday(scope: Scope): Promise<z.input<typeof OrderToday>[]> {
  if (!may(scope.role, 'catch:see')) return [];
  const rows = await orderRows(scope, seesOf(scope), { openOnly: true });
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
      reservedUntil: row.reservedUntil,
      short: row.short,
    }));
}
