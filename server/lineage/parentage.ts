import type { ParentageTold } from '../../shared/holds/contract';
import type { ParentageDraft } from '../../shared/lineage/parentageDraft';
import { Refusal } from '../../shared/refusal';
import { newId } from '../db/newId';
import type { Scope } from '../scope';

/** Stores who may be the parents; `rootId` given: a later turn of a parentage that is superseded, never edited. */
export async function keepParentage(
  scope: Scope,
  draft: ParentageDraft,
  more: { entryId: string | null; rootId?: string },
): Promise<string> {
  const { db, roomId, actorId, now } = scope;
  await mustBeFishOfOurs(scope, draft);
  const id = newId(now);
  const rootId = more.rootId ?? id;
  const last = await db
    .selectFrom('parentage')
    .where('roomId', '=', roomId)
    .where('rootId', '=', rootId)
    .select(({ fn }) => fn.max('turn').as('turn'))
    .executeTakeFirst();
  await db
    .insertInto('parentage')
    .values({
      roomId,
      id,
      rootId,
      turn: Number(last?.turn ?? 0) + 1,
      paternity: draft.paternity,
      basis: draft.basis,
      entryId: more.entryId,
      madeBy: actorId,
      madeAt: now,
    })
    .execute();
  const rows = (['sire', 'dam'] as const).flatMap((side) =>
    draft[side === 'sire' ? 'sires' : 'dams'].map(({ fishId, weight }, position) => ({
      roomId,
      parentageId: id,
      side,
      position,
      fishId,
      weight,
    })),
  );
  if (rows.length > 0) await db.insertInto('parentageCandidate').values(rows).execute();
  return rootId;
}

async function mustBeFishOfOurs({ db, roomId }: Scope, draft: ParentageDraft): Promise<void> {
  for (const side of ['sires', 'dams'] as const) {
    const ids = draft[side].flatMap(({ fishId }) => fishId ?? []);
    if (ids.length === 0) continue;
    const found = await db
      .selectFrom('fish')
      .where('roomId', '=', roomId)
      .where('id', 'in', ids)
      .select('id')
      .execute();
    const missing = draft[side].findIndex(({ fishId }) => fishId !== null && !found.some(({ id }) => id === fishId));
    if (missing >= 0)
      throw new Refusal('invalid', 'A possible parent was not found', {
        [`parentage.${side}.${missing}.fishId`]: 'Choose a fish',
      });
  }
  const both = draft.sires.find(({ fishId }) => fishId !== null && draft.dams.some((dam) => dam.fishId === fishId));
  if (both)
    throw new Refusal('invalid', 'One fish cannot be both father and mother', {
      'parentage.sires': 'Also named as the mother',
    });
}

/** The parentages in force, by root. */
export async function parentagesOf(
  { db, roomId }: Pick<Scope, 'db' | 'roomId'>,
  rootIds?: string[],
): Promise<Map<string, ParentageTold>> {
  let query = db
    .selectFrom('parentage')
    .where('parentage.roomId', '=', roomId)
    .where(({ eb, selectFrom }) =>
      eb(
        'parentage.turn',
        '=',
        selectFrom('parentage as later')
          .whereRef('later.roomId', '=', 'parentage.roomId')
          .whereRef('later.rootId', '=', 'parentage.rootId')
          .select(({ fn }) => fn.max('later.turn').as('turn')),
      ),
    )
    .leftJoin('parentageCandidate as candidate', (join) =>
      join.onRef('candidate.roomId', '=', 'parentage.roomId').onRef('candidate.parentageId', '=', 'parentage.id'),
    )
    .leftJoin('fish', (join) =>
      join.onRef('fish.roomId', '=', 'candidate.roomId').onRef('fish.id', '=', 'candidate.fishId'),
    )
    .select([
      'parentage.rootId',
      'parentage.turn',
      'parentage.paternity',
      'parentage.basis',
      'candidate.side',
      'candidate.fishId',
      'candidate.weight',
      'fish.code',
    ])
    .orderBy('candidate.position');
  if (rootIds) {
    if (rootIds.length === 0) return new Map();
    query = query.where('parentage.rootId', 'in', rootIds);
  }
  const told = new Map<string, ParentageTold>();
  for (const { rootId, turn, paternity, basis, side, fishId, weight, code } of await query.execute()) {
    const one = told.get(rootId) ?? { rootId, turn, paternity, basis, sires: [], dams: [] };
    if (side && weight) one[side === 'sire' ? 'sires' : 'dams'].push({ fishId, code, share: weight });
    told.set(rootId, one);
  }
  for (const one of told.values()) {
    one.sires = asShares(one.sires);
    one.dams = asShares(one.dams);
  }
  return told;
}

function asShares(parents: ParentageTold['sires']): ParentageTold['sires'] {
  const sum = parents.reduce((total, { share }) => total + share, 0);
  return parents.map((parent) => ({ ...parent, share: parent.share / sum }));
}
