import { LIBRARY } from '../../shared/species/library';
import type { Scope } from '../scope';

/** What each species is called in this fishroom: its own name for it where it gave one, else the library's. */
export async function speciesNames({
  db,
  roomId,
}: Pick<Scope, 'db' | 'roomId'>): Promise<(speciesId: string) => string> {
  const own = await db
    .selectFrom('speciesOverride')
    .where('roomId', '=', roomId)
    .select(['id', 'scientificName'])
    .execute();
  const names = new Map<string, string>(LIBRARY.map(({ id, name }) => [id, name]));
  for (const { id, scientificName } of own) if (scientificName) names.set(id, scientificName);
  return (speciesId) => names.get(speciesId) ?? speciesId;
}
