import type * as z from 'zod/mini';
import { minorDigits } from '../../shared/money';
import type { OrderPage } from '../../shared/orders/contract';
import { depositOf, refundableOf } from '../../shared/orders/money';
import { packingFor, TRANSPORT_CAUTIONS } from '../../shared/orders/packing';
import type { Stand } from '../../shared/orders/shapes';
import { broodRows, claimsOf } from '../broods';
import { tokenOf } from '../mail/tokens';
import type { Scope } from '../scope';
import { catchesOf } from './catches';
import { messagesOf, offeredTimesOf } from './change';
import { moneyOfOrder, paymentsOf } from './ledger';
import { sheetsOf } from './letters';
import { lineRows } from './lines';
import { hasReceipt } from './receipt';
import { seesOf } from './room';
import { oneOrder } from './rows';
import { type StoredOrder, storedOrder } from './stored';
import { termsOf } from './terms';

type Row = Awaited<ReturnType<typeof oneOrder>>;
type Told = z.input<typeof OrderPage>;

/** One order as its reader may see it: a keeper what to catch and when, an owner all of it. */
export async function orderPage(scope: Scope, orderId: string): Promise<Told> {
  const sees = seesOf(scope);
  const order = await storedOrder(scope, orderId);
  const row = await oneOrder(scope, sees, orderId);
  return {
    order: row,
    note: order.note,
    cancelledBecause: sees.buyer ? order.cancelledBecause : null,
    offeredTimes: offeredTimesOf(order),
    packing: packingFor(row.lines),
    cautions: TRANSPORT_CAUTIONS,
    catches: await catchesOf(scope, row),
    sheets: (await sheetsOf(scope, row)).map(({ id, number, token, subject }) => ({
      id,
      number,
      token,
      code: subject.code,
    })),
    hasReceipt: sees.money && (await hasReceipt(scope, orderId)),
    owner: sees.money && sees.buyer ? await ownersPart(scope, order, row) : null,
  };
}

async function ownersPart(scope: Scope, order: StoredOrder, row: Row): Promise<NonNullable<Told['owner']>> {
  const { db, roomId, house, currency } = scope;
  const buyer = await db
    .selectFrom('buyer')
    .where('roomId', '=', roomId)
    .where('id', '=', order.buyerId)
    .select(['id', 'name', 'email', 'phone', 'address', 'note'])
    .executeTakeFirstOrThrow();
  const lines = await lineRows(scope, [order.id]);
  const money = await moneyOfOrder(
    scope,
    order,
    lines.map(({ cents }) => cents),
  );
  const all = await paymentsOf(scope, [order.id]);
  const { depositPercent } = await termsOf(scope);
  return {
    buyer,
    link: `${house.config.origin}/order/${tokenOf(house.config, order.id)}`,
    discountCents: order.discountCents,
    linesCents: money.linesCents,
    receivedCents: money.receivedCents,
    depositCents: order.depositCents,
    proposedDepositCents: depositOf(money.totalCents, depositPercent, minorDigits(currency)),
    termsText: order.termsText,
    stands: await standsOf(scope, row),
    payments: all.map((payment) => {
      const { id, kind, method, cents, onDay, needsRefund, refunds, note } = payment;
      return {
        id,
        kind,
        method,
        cents,
        onDay,
        needsRefund,
        refunds,
        note,
        refundableCents: refundableOf(payment, all),
      };
    }),
    messages: await messagesOf(scope, order.id),
    letters: await lettersOf(scope, order.id),
    log: await logOf(scope, order.id),
  };
}

/** How the heads of each brood are spoken for: this order’s, the others’, those meant to stay, what is available. */
async function standsOf(scope: Scope, { lines }: Row): Promise<z.input<typeof Stand>[]> {
  const ids = [...new Set(lines.flatMap(({ broodId }) => broodId ?? []))];
  if (ids.length === 0) return [];
  const claims = await claimsOf(scope);
  const owners = await scope.db
    .selectFrom('purchaseLine')
    .innerJoin('purchase', (join) =>
      join.onRef('purchase.roomId', '=', 'purchaseLine.roomId').onRef('purchase.id', '=', 'purchaseLine.purchaseId'),
    )
    .where('purchaseLine.roomId', '=', scope.roomId)
    .where('purchaseLine.broodId', 'in', ids)
    .select(['purchaseLine.id', 'purchase.id as orderId', 'purchase.number'])
    .execute();
  return (await broodRows(scope, { ids })).map(({ id, code, heads, available }) => {
    const own = claims.filter(({ broodId }) => broodId === id);
    const orders = own.flatMap((claim) => {
      const owner = owners.find((one) => one.id === claim.purchaseLineId);
      return owner ? [{ orderId: owner.orderId, number: owner.number, heads: claim.heads }] : [];
    });
    const kept = own.filter(({ kind }) => kind === 'keep').reduce((sum, claim) => sum + claim.heads, 0);
    return { broodId: id, code, heads: Math.floor(heads + 1e-9), orders, kept, available };
  });
}

async function lettersOf({ db, roomId }: Scope, orderId: string) {
  const rows = await db
    .selectFrom('letter')
    .where('roomId', '=', roomId)
    .where('aboutId', '=', orderId)
    .select(['id', 'kind', 'state', 'createdAt as at', 'lastError'])
    .orderBy('id', 'desc')
    .execute();
  return rows;
}

async function logOf({ db, roomId }: Scope, orderId: string) {
  return db
    .selectFrom('audit')
    .leftJoin('account', 'account.id', 'audit.actorId')
    .where('audit.roomId', '=', roomId)
    .where('audit.about', '=', 'order')
    .where('audit.aboutId', '=', orderId)
    .select(['audit.id', 'audit.at', 'audit.action', 'account.name as by'])
    .orderBy('audit.id', 'desc')
    .execute();
}
