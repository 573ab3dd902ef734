import { librarySpecies, profileOf, unlistedSpecies } from '../../shared/species/library';
import { profileFrom, type SpeciesOverrides, type SpeciesProfile } from '../../shared/species/profile';
import type { Scope } from '../scope';
import { speciesNames } from './names';

type Room = Pick<Scope, 'db' | 'roomId'>;

/** What this fishroom set for a species, by figure; the computations take these beside the library's. */
export async function figuresOf({ db, roomId }: Room, speciesId: string): Promise<Record<string, unknown>> {
  const row = await db
    .selectFrom('speciesOverride')
    .where('roomId', '=', roomId)
    .where('id', '=', speciesId)
    .select('figures')
    .executeTakeFirst();
  return row ? valuesOf(row.figures) : {};
}

/** Stored as { figure: { value, source } }. */
export function valuesOf(figures: string): Record<string, unknown> {
  const stored: Record<string, { value: unknown }> = JSON.parse(figures);
  return Object.fromEntries(Object.entries(stored).map(([name, { value }]) => [name, value]));
}

/** A species as this fishroom sees it; null for one that was never described here. */
export async function profileIn({ db, roomId }: Room, speciesId: string): Promise<SpeciesProfile | null> {
  const row = await db
    .selectFrom('speciesOverride')
    .where('roomId', '=', roomId)
    .where('id', '=', speciesId)
    .select(['figures', 'about', 'scientificName'])
    .executeTakeFirst();
  // What was stored had the shape of the contract when it came in.
  const overrides = (row ? valuesOf(row.figures) : {}) as SpeciesOverrides;
  if (librarySpecies(speciesId)) return profileOf(speciesId, overrides);
  if (!row?.about) return null;
  return profileFrom(
    unlistedSpecies({ ...JSON.parse(row.about), id: speciesId, name: row.scientificName ?? 'Not named' }),
    overrides,
  );
}

type Seen = { id: string; name: string; about: Record<string, unknown> | null; overrides: Record<string, unknown> };

/** Species as `shared/species/profilesIn` takes them: the library is in the app, only what differs is sent. */
export async function speciesSeen(room: Room, ids: string[]): Promise<Seen[]> {
  const nameOf = await speciesNames(room);
  if (ids.length === 0) return [];
  const rows = await room.db
    .selectFrom('speciesOverride')
    .where('roomId', '=', room.roomId)
    .where('id', 'in', ids)
    .select(['id', 'about', 'figures'])
    .execute();
  return ids.map((id) => {
    const row = rows.find((one) => one.id === id);
    return {
      id,
      name: nameOf(id),
      about: row?.about ? JSON.parse(row.about) : null,
      overrides: row ? valuesOf(row.figures) : {},
    };
  });
}
