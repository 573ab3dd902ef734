import type * as z from 'zod/mini';
import { addDays, dayOf } from '../../shared/days';
import type { bookLoss, returnFish } from '../../shared/orders/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { returnHeads } from '../broods';
import { audit } from '../db/audit';
import { mustBeOurs } from '../fish';
import type { Scope } from '../scope';
import { mustHaveLeft } from './handOver';
import { lineRows } from './lines';
import { EVERYTHING, seesOf } from './room';
import { oneOrder } from './rows';
import { changeStored, storedOrder } from './stored';
import { termsOf } from './terms';

/** Fish that came back go to a quarantine tank; what they cost is given back apart. */
export async function takeBack(scope: Scope, orderId: string, body: z.output<typeof returnFish.body>) {
  const { order, line } = await lineOf(scope, orderId, body);
  mustHaveLeft(order);
  if (!line.broodId) throw new Refusal('conflict', 'A fish with a code comes back through Record');
  await mustBeOurs(scope, 'tank', body.tankId, 'tankId', 'Choose a tank');
  await mustBeQuarantine(scope, body.tankId);
  if (
    body.onDay > scope.today ||
    (order.handedOverAt && body.onDay < dayOf(Date.parse(order.handedOverAt), scope.timeZone))
  )
    throw new Refusal('invalid', 'They came back between leaving and today', { onDay: 'Choose a day since they left' });
  const { id, heads, tankId, onDay, note } = body;
  await returnHeads(scope, { id, broodId: line.broodId, heads, tankId, onDay, note });
  await setLine(scope, line.id, { returnedHeads: line.returnedHeads + heads });
  await changeStored(scope, orderId, {});
  await audit(scope, { action: 'fish returned', about: 'order', aboutId: orderId });
  return oneOrder(scope, seesOf(scope), orderId);
}

async function mustBeQuarantine({ db, roomId }: Scope, tankId: string): Promise<void> {
  const tank = await db
    .selectFrom('tank')
    .where('roomId', '=', roomId)
    .where('id', '=', tankId)
    .select('purpose')
    .executeTakeFirst();
  if (tank?.purpose !== 'quarantine')
    throw new Refusal('invalid', 'Fish that come back stay apart first', { tankId: 'Choose a quarantine tank' });
}

/** Deaths on the way, told within the days that the terms give; later only by the owner's choice. */
export async function bookDeaths(scope: Scope, orderId: string, body: z.output<typeof bookLoss.body>) {
  const { order, line } = await lineOf(scope, orderId, body);
  mustHaveLeft(order);
  const { lossDays } = await termsOf(scope);
  const leftOn = dayOf(Date.parse(order.handedOverAt ?? scope.now), scope.timeZone);
  if (!body.beyondTerms && (lossDays === 0 || addDays(leftOn, lossDays) < scope.today))
    throw new Refusal(
      'conflict',
      lossDays === 0 ? 'Your terms make no losses good' : `Your terms make losses good for ${lossDays} days`,
      {
        beyondTerms: 'Choose this to make it good all the same',
      },
    );
  await setLine(scope, line.id, { lostHeads: line.lostHeads + body.heads });
  await changeStored(scope, orderId, {});
  await audit(scope, { action: 'loss on arrival', about: 'order', aboutId: orderId });
  return oneOrder(scope, EVERYTHING, orderId);
}

async function lineOf(scope: Scope, orderId: string, { lineId, heads }: { lineId: string; heads: number }) {
  const order = await storedOrder(scope, orderId);
  const line = (await lineRows(scope, [orderId])).find(({ id }) => id === lineId);
  if (!line) throw new Refusal('invalid', 'That line was not found', { lineId: 'Choose a line of this order' });
  const left = line.heads - line.lostHeads - line.returnedHeads;
  if (heads > left)
    throw new Refusal('conflict', `Only ${left} of them are with the buyer`, { heads: `At most ${left}` });
  return { order, line };
}

async function setLine({ db, roomId }: Scope, lineId: string, change: { lostHeads?: number; returnedHeads?: number }) {
  const done = await db
    .updateTable('purchaseLine')
    .set(change)
    .where('roomId', '=', roomId)
    .where('id', '=', lineId)
    .executeTakeFirst();
  if (done.numUpdatedRows === 0n) throw notFound('That line');
}
