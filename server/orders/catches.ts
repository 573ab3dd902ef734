import type * as z from 'zod/mini';
import type { Catch, OrderRow } from '../../shared/orders/shapes';
import { batchesOf } from '../broods';
import type { RoomAsked } from '../scope';

type Told = z.input<typeof Catch>;

/** From which tanks to take the fish of each line: the fullest first, until there are enough. Returned fish stay in quarantine. */
export async function catchesOf(scope: RoomAsked, { lines }: Pick<z.input<typeof OrderRow>, 'lines'>): Promise<Told[]> {
  const kept = await keptBatches(scope);
  const told: Told[] = [];
  for (const { id, broodId, fishId, heads } of lines) {
    if (fishId)
      told.push({
        lineId: id,
        tanks: [{ batchId: null, tank: await tankOfFish(scope, fishId), balance: 1, heads: 1 }],
      });
    if (!broodId) continue;
    const batches = (await batchesOf(scope, [broodId]))
      .filter(({ id: batchId, balance }) => balance > 0 && !kept.has(batchId))
      .sort((a, b) => b.balance - a.balance);
    let left = heads;
    const tanks = batches.map(({ id: batchId, tank, balance }) => {
      const take = Math.min(left, balance);
      left -= take;
      return { batchId, tank: tank && { id: tank.id, code: tank.code }, balance, heads: take };
    });
    told.push({ lineId: id, tanks });
  }
  return told;
}

async function keptBatches({ db, roomId }: RoomAsked): Promise<Set<string>> {
  const rows = await db
    .selectFrom('reservation')
    .where('roomId', '=', roomId)
    .where('kind', '=', 'keep')
    .where('freedAt', 'is', null)
    .where('batchId', 'is not', null)
    .where('note', '=', 'Returned, in quarantine')
    .select('batchId')
    .execute();
  return new Set(rows.flatMap(({ batchId }) => batchId ?? []));
}

async function tankOfFish({ db, roomId }: RoomAsked, fishId: string) {
  const row = await db
    .selectFrom('stay')
    .innerJoin('tank', (join) => join.onRef('tank.roomId', '=', 'stay.roomId').onRef('tank.id', '=', 'stay.tankId'))
    .where('stay.roomId', '=', roomId)
    .where('stay.fishId', '=', fishId)
    .where('stay.untilDay', 'is', null)
    .select(['tank.id', 'tank.code'])
    .executeTakeFirst();
  return row ?? null;
}
