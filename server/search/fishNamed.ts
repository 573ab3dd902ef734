import type { Source } from './sources';

/** Fish with codes, by code, mark and species; ancestors known only from sheets have no page here. */
export const fishNamed: Source = async ({ db, roomId }, nameOf, ids) => {
  let query = db
    .selectFrom('fish')
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'fish.roomId').onRef('strain.id', '=', 'fish.strainId'),
    )
    .leftJoin('fishExit', (join) =>
      join.onRef('fishExit.roomId', '=', 'fish.roomId').onRef('fishExit.fishId', '=', 'fish.id'),
    )
    .where('fish.roomId', '=', roomId)
    .where('fish.origin', '<>', 'imported')
    .select(['fish.id', 'fish.code', 'strain.speciesId', 'strain.scientificName', 'fishExit.id as exitId']);
  query = ids ? query.where('fish.id', 'in', ids) : query.where('fish.code', 'is not', null);
  const rows = await query.execute();
  const marks = await lastMarks({ db, roomId });
  return rows.map(({ id, code, speciesId, scientificName, exitId }) => {
    const species = scientificName ?? (speciesId ? nameOf(speciesId) : null);
    const mark = marks.get(id) ?? null;
    return {
      thing: 'fish',
      id,
      code: code ?? 'without a code',
      name: [species, mark].filter(Boolean).join(', ') || null,
      gone: exitId !== null,
    };
  });
};

async function lastMarks({ db, roomId }: Pick<Parameters<Source>[0], 'db' | 'roomId'>): Promise<Map<string, string>> {
  const rows = await db
    .selectFrom('finding')
    .where('roomId', '=', roomId)
    .where('kind', '=', 'mark')
    .select(['fishId', 'value'])
    .orderBy('onDay')
    .orderBy('id')
    .execute();
  return new Map(rows.flatMap(({ fishId, value }) => (value ? [[fishId, value] as const] : [])));
}
