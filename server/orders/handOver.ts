import type { HandOver } from '../../shared/orders/contract';
import { hasLeft, LEDGER_KIND } from '../../shared/orders/state';
import { Refusal } from '../../shared/refusal';
import { addLine, batchesOf, freeHeads } from '../broods';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { letLeave } from '../fish';
import { inTransaction } from '../http/serve';
import { mustBeAllowed, type Scope } from '../scope';
import { currentKeyId, issueInside, openKey } from '../sheets';
import { catchesOf } from './catches';
import { bookPayment } from './ledger';
import { writeOrderLetter } from './letters';
import { becomes, mayMove } from './moves';
import { freezeReceipt } from './receipt';
import { EVERYTHING, seesOf } from './room';
import { oneOrder } from './rows';
import { changeStored, mustBeSeen, type StoredOrder, storedOrder } from './stored';

type Key = Awaited<ReturnType<typeof openKey>>;
type Row = Awaited<ReturnType<typeof oneOrder>>;

/** The fish leave: heads, sheets, receipt, money and letters in one transaction. The key is opened before it. */
export async function giveOver(scope: Scope, orderId: string, body: HandOver) {
  if (body.paid) mustBeAllowed(scope, 'money:see', 'Only an owner books money');
  await storedOrder(scope, orderId);
  const key = body.issueSheets ? await openKey(scope, await currentKeyId(scope)) : null;
  return inTransaction(scope, async (inside) => {
    const order = await storedOrder(inside, orderId);
    const row = await oneOrder(inside, EVERYTHING, orderId);
    const next = await mayMove(inside, orderId, body.how);
    mustBeSeen(order, body.version, await oneOrder(inside, seesOf(inside), orderId));
    await takeOut(inside, order, row, body.catches);
    await changeStored(inside, orderId, { handedOverAt: inside.now, handedOverBy: inside.actorId });
    await becomes(inside, order, next);
    if (body.paid) await payAtDoor(inside, order, row, body.paid);
    if (key) await sheetsFor(inside, row, key);
    await freezeReceipt(inside, orderId);
    if (key) await writeOrderLetter(inside, orderId, 'sheet');
    return oneOrder(inside, seesOf(inside), orderId);
  });
}

/** Every line out of the ledger, by the way the order says, from the tanks that were named. */
async function takeOut(scope: Scope, order: StoredOrder, row: Row, named: HandOver['catches']): Promise<void> {
  const proposed = await catchesOf(scope, row);
  await freeHeads(
    scope,
    row.lines.map(({ id }) => id),
  );
  for (const [i, line] of row.lines.entries()) {
    const kind = LEDGER_KIND[order.way];
    if (line.fishId) {
      await letLeave(scope, { fishId: line.fishId, onDay: scope.today, kind, cause: null, note: null, entryId: null });
      continue;
    }
    const own = named.filter(({ lineId }) => lineId === line.id);
    const takes = own.length > 0 ? own : (proposed.find(({ lineId }) => lineId === line.id)?.tanks ?? []);
    const sum = takes.reduce((total, { heads }) => total + heads, 0);
    if (sum !== line.heads)
      throw new Refusal(
        'conflict',
        `${line.heads} of ${line.code} are ordered, ${sum} are caught. Change the line first.`,
        {
          [`catches.${i}.heads`]: `${line.heads} together`,
        },
      );
    const batches = await batchesOf(scope, [line.broodId ?? '']);
    for (const { batchId, heads } of takes) {
      if (heads === 0 || !batchId) continue;
      if (!batches.some(({ id }) => id === batchId))
        throw new Refusal('invalid', 'These fish are not of that brood', {
          [`catches.${i}.batchId`]: 'Choose a tank with this brood',
        });
      await addLine(scope, {
        batchId,
        kind,
        onDay: scope.today,
        heads,
        purchaseLineId: line.id,
        note: `Order ${order.number}`,
        entryId: null,
      });
    }
  }
}

async function payAtDoor(
  scope: Scope,
  order: StoredOrder,
  row: Row,
  paid: NonNullable<HandOver['paid']>,
): Promise<void> {
  if (paid.cents > (row.toPayCents ?? 0))
    throw new Refusal('conflict', 'That is more than is to pay', { 'paid.cents': 'Too much' });
  await bookPayment(scope, order, { ...paid, kind: 'balance', onDay: scope.today });
  await audit(scope, { action: 'payment booked', about: 'order', aboutId: order.id });
}

async function sheetsFor(scope: Scope, row: Row, key: Key): Promise<void> {
  for (const { id, broodId, fishId, heads } of row.lines) {
    await issueInside(
      scope,
      {
        id: newId(scope.now),
        thing: fishId ? 'fish' : 'brood',
        subjectId: fishId ?? broodId ?? '',
        heads,
        replaces: null,
        because: null,
        order: String(row.number),
        purchaseLineId: id,
      },
      key,
    );
  }
}

export const mustHaveLeft = ({ state }: StoredOrder): void => {
  if (!hasLeft(state)) throw new Refusal('conflict', 'The fish of this order have not left yet');
};
