import type { ParentageTold } from '../../shared/holds/contract';
import type { Candidate, Parentage, PedigreeEntry, WeightedPair } from '../../shared/lineage/pedigree';
import type { RoomAsked } from '../scope';
import { parentagesOf } from './parentage';
import { foreignNames, ownDraw, toldAnimals, toldParents } from './told';

/** The fishroom's fish and broods as the computations take them. A brood stands for any one of its fry. */
export type RoomPedigree = { entries: PedigreeEntry[]; broodIds: string[]; fishIds: string[] };

/**
 * Builds the pedigree from what is recorded, every time it is read, so that a later correction flows into everything:
 * a fish's own parentage goes first; else that of the brood it was taken out of; out of a mixed batch it comes from one of
 * several pairs, weighted by heads. Founders have parents outside the pedigree.
 */
export async function pedigreeOf(scope: RoomAsked): Promise<RoomPedigree> {
  const { db, roomId } = scope;
  const parentages = await parentagesOf(scope);
  const broods = await db.selectFrom('brood').where('roomId', '=', roomId).select(['id', 'parentageId']).execute();
  const fish = await db
    .selectFrom('fish')
    .leftJoin('fishExit', (join) =>
      join.onRef('fishExit.roomId', '=', 'fish.roomId').onRef('fishExit.fishId', '=', 'fish.id'),
    )
    .leftJoin('entry', (join) => join.onRef('entry.roomId', '=', 'fish.roomId').onRef('entry.id', '=', 'fish.entryId'))
    .where('fish.roomId', '=', roomId)
    // A record that was merged into another is the same fish: it does not stand in the pedigree twice.
    .where(({ eb, or }) => or([eb('fishExit.kind', 'is', null), eb('fishExit.kind', '<>', 'merged')]))
    .select(['fish.id', 'fish.batchId', 'fish.broodId', 'fish.parentageId', 'entry.onDay as takenOn'])
    .execute();
  const merged = await mergedInto(scope);
  const pairOf = (rootId: string | null | undefined): Pair =>
    asPair(rootId ? parentages.get(rootId) : undefined, merged);
  const parentageOfBrood = new Map(broods.map(({ id, parentageId }) => [id, parentageId]));
  const batchIds = [
    ...new Set(
      fish.flatMap(({ batchId, broodId, parentageId }) => (batchId && !broodId && !parentageId ? [batchId] : [])),
    ),
  ];
  const lists = await sourceLists(scope, batchIds);
  const told = await toldPedigree(scope, { ours: fish.map(({ id }) => id), parentages, merged });
  const entryOfFish = ({ id, batchId, broodId, parentageId, takenOn }: (typeof fish)[number]): PedigreeEntry => {
    if (parentageId) return { id, ...pairOf(parentageId) };
    const byItsSheet = told.get(id);
    if (byItsSheet) return byItsSheet;
    if (broodId) return { id, ...pairOf(parentageOfBrood.get(broodId)) };
    if (!batchId) return { id, sire: { kind: 'unknown' }, dam: { kind: 'unknown' } };
    const from = sourcesOn(lists.get(batchId) ?? [], takenOn ?? '9999-12-31').map(
      ({ broodId: source, heads }): WeightedPair => ({
        ...pairOf(parentageOfBrood.get(source)),
        weight: Math.max(heads, 1e-6),
      }),
    );
    return from.length > 0 ? { id, from } : { id, sire: { kind: 'unknown' }, dam: { kind: 'unknown' } };
  };
  return {
    entries: [...fish.map(entryOfFish), ...broods.map(({ id, parentageId }) => ({ id, ...pairOf(parentageId) }))],
    fishIds: fish.map(({ id }) => id),
    broodIds: broods.map(({ id }) => id),
  };
}

type Known = { ours: string[]; parentages: Map<string, ParentageTold>; merged: Map<string, string> };

/** The parents that came with sheets from elsewhere; a parentage that was set here goes before them. */
async function toldPedigree(
  scope: RoomAsked,
  { ours, parentages, merged }: Known,
): Promise<Map<string, PedigreeEntry>> {
  const told = await toldAnimals(scope);
  if (told.size === 0) return new Map();
  const names = await foreignNames(scope);
  const own = new Set(ours);
  return toldParents(told.values(), {
    fishOf: (name) => {
      const [roomId, localId = ''] = name.split('/');
      const fishId = roomId === scope.roomId && !names.has(name) ? (merged.get(localId) ?? localId) : names.get(name);
      if (!fishId) return null;
      const standing = merged.get(fishId) ?? fishId;
      return own.has(standing) ? standing : null;
    },
    ownParent: (key) => {
      const draw = ownDraw(scope.roomId, key, (rootId) => parentages.has(rootId));
      return draw && asPair(parentages.get(draw.rootId), merged)[draw.side];
    },
  });
}

type Pair = { sire: Parentage; dam: Parentage };

/** One mouthful has one dam; its father is one male for all or a draw for each egg, as recorded. */
function asPair(told: ParentageTold | undefined, merged: Map<string, string>): Pair {
  if (!told) return { sire: { kind: 'unknown' }, dam: { kind: 'unknown' } };
  const { rootId, paternity, sires, dams } = told;
  return {
    sire: asParent(sires, paternity, `${rootId}:sire`, merged),
    dam: asParent(dams, 'single', `${rootId}:dam`, merged),
  };
}

/** Nothing known of a side is still one animal for the whole brood (`single`), or another for each of its fry (`mixed`). */
function asParent(
  parents: ParentageTold['sires'],
  paternity: 'single' | 'mixed',
  key: string,
  merged: Map<string, string>,
): Parentage {
  const candidates: Candidate[] = combined(
    parents.map(({ fishId, share }) => ({ id: fishId && (merged.get(fishId) ?? fishId), weight: share })),
  );
  const [only] = candidates;
  if (candidates.length === 1 && only?.id) return { kind: 'known', id: only.id };
  const list = candidates.length > 0 ? candidates : [{ id: null, weight: 1 }];
  return paternity === 'single' ? { kind: 'oneOf', key, candidates: list } : { kind: 'mixed', candidates: list };
}

/** Two candidates that turned out to be one fish are one candidate. */
function combined(candidates: Candidate[]): Candidate[] {
  const weights = new Map<string | null, number>();
  for (const { id, weight } of candidates) weights.set(id, (weights.get(id) ?? 0) + weight);
  return [...weights].map(([id, weight]) => ({ id, weight }));
}

async function mergedInto({ db, roomId }: RoomAsked): Promise<Map<string, string>> {
  const rows = await db
    .selectFrom('fishExit')
    .where('roomId', '=', roomId)
    .where('mergedInto', 'is not', null)
    .select(['fishId', 'mergedInto'])
    .execute();
  return new Map(rows.flatMap(({ fishId, mergedInto: into }) => (into ? [[fishId, into] as const] : [])));
}

type SourceRow = { batchId: string; broodId: string; heads: number; fromDay: string; entryId: string | null };

async function sourceLists({ db, roomId }: RoomAsked, batchIds: string[]): Promise<Map<string, SourceRow[]>> {
  const lists = new Map<string, SourceRow[]>();
  if (batchIds.length === 0) return lists;
  const rows = await db
    .selectFrom('batchSource')
    .where('roomId', '=', roomId)
    .where('batchId', 'in', batchIds)
    .select(['batchId', 'broodId', 'heads', 'fromDay', 'entryId'])
    .orderBy('fromDay')
    .orderBy('id')
    .execute();
  for (const row of rows) lists.set(row.batchId, [...(lists.get(row.batchId) ?? []), row]);
  return lists;
}

function sourcesOn(rows: SourceRow[], onDay: string): SourceRow[] {
  const last = rows.findLast(({ fromDay }) => fromDay <= onDay) ?? rows[0];
  return rows.filter(({ entryId, fromDay }) => last && entryId === last.entryId && fromDay === last.fromDay);
}
