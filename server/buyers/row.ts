import { availableOf } from '../broods';
import { termsOf } from '../orders';
import type { RoomAsked } from '../scope';

/** The states in which a request stands in its row. */
export const isOpen = ['waiting', 'notified'] as const;

export type Standing = { place: number; before: number; fits: boolean };
type Open = Awaited<ReturnType<typeof openRequests>>[number];

/** Every open request of a fishroom, those confirmed first in front, with what is available of its brood. */
export async function openRequests(scope: RoomAsked) {
  const { db, roomId } = scope;
  const rows = await db
    .selectFrom('request')
    .where('roomId', '=', roomId)
    .where('state', 'in', isOpen)
    .selectAll()
    .orderBy('confirmedAt')
    .orderBy('id')
    .execute();
  const available = new Map<string, number>();
  for (const id of new Set(rows.flatMap(({ broodId }) => broodId ?? [])))
    available.set(id, (await availableOf(scope, id)).available);
  const { holdDays } = await termsOf(scope);
  const keptSince = new Date(Date.parse(scope.now) - holdDays * 86_400_000).toISOString();
  return rows.map((row) => ({
    ...row,
    available: available.get(row.broodId ?? '') ?? 0,
    // Who was told and did not come for so long keeps the place, but no fish from those behind.
    claims: row.notifiedAt === null || row.notifiedAt > keptSince,
  }));
}

const rowOf = ({ broodId, strainId }: Open): string => broodId ?? strainId ?? '';

/**
 * Where each stands among those who asked for the same, how many heads those before it ask for, and whether what is available
 * is enough for all of them and it.
 */
export function placesOf(open: Open[]): Map<string, Standing> {
  const rows = new Map<string, { count: number; heads: number }>();
  return new Map(
    open.map((one) => {
      const { count, heads } = rows.get(rowOf(one)) ?? { count: 0, heads: 0 };
      const wanted = one.heads ?? 0;
      rows.set(rowOf(one), { count: count + 1, heads: heads + (one.claims ? wanted : 0) });
      return [one.id, { place: count + 1, before: heads, fits: heads + wanted <= one.available }];
    }),
  );
}
