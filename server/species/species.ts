import type * as z from 'zod/mini';
import { notFound, Refusal } from '../../shared/refusal';
import type { addSpecies, SpeciesSet, setSpecies } from '../../shared/species/contract';
import { librarySpecies } from '../../shared/species/library';
import { audit } from '../db/audit';
import type { Scope } from '../scope';

export async function speciesRows({ db, roomId }: Scope, id?: string): Promise<SpeciesSet[]> {
  let query = db
    .selectFrom('speciesOverride')
    .where('roomId', '=', roomId)
    .select(['id', 'version', 'own', 'scientificName', 'about', 'figures']);
  if (id) query = query.where('id', '=', id);
  const rows = await query.orderBy('id').execute();
  return rows.map((row) => ({
    ...row,
    own: row.own === 1,
    about: row.about ? JSON.parse(row.about) : null,
    figures: JSON.parse(row.figures),
  }));
}

async function one(scope: Scope, id: string): Promise<SpeciesSet> {
  const [species] = await speciesRows(scope, id);
  if (!species) throw notFound('That species');
  return species;
}

export async function setOne(
  scope: Scope,
  id: string,
  { version, figures }: z.output<typeof setSpecies.body>,
): Promise<SpeciesSet> {
  const { db, roomId } = scope;
  const [before] = await speciesRows(scope, id);
  if (!before && !librarySpecies(id)) throw notFound('That species');
  if ((before?.version ?? 0) !== version)
    throw new Refusal('conflict', 'Someone changed this species meanwhile', {}, { current: before });
  const stored = JSON.stringify(figures);
  if (before) {
    await db
      .updateTable('speciesOverride')
      .set({ figures: stored, version: version + 1 })
      .where('roomId', '=', roomId)
      .where('id', '=', id)
      .execute();
  } else {
    await db
      .insertInto('speciesOverride')
      .values({ roomId, id, own: 0, scientificName: null, about: null, figures: stored })
      .execute();
  }
  await audit(scope, {
    action: 'species set',
    about: 'species',
    aboutId: id,
    change: { figures: [before?.figures ?? {}, figures] },
  });
  return one(scope, id);
}

export async function addOne(
  scope: Scope,
  { id, scientificName, about, figures }: z.output<typeof addSpecies.body>,
): Promise<SpeciesSet> {
  const { db, roomId } = scope;
  await db
    .insertInto('speciesOverride')
    .values({ roomId, id, own: 1, scientificName, about: JSON.stringify(about), figures: JSON.stringify(figures) })
    .execute();
  await audit(scope, { action: 'species added', about: 'species', aboutId: id });
  return one(scope, id);
}
