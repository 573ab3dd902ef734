import { librarySpecies, profileOf, unlistedSpecies } from './library';
import { profileFrom, type SpeciesOverrides, type SpeciesProfile } from './profile';

type Seen = { id: string; name: string; about: Record<string, unknown> | null; overrides: Record<string, unknown> };

/** Species as a fishroom sees them, out of what travels: the library's figures are in the app, only what differs is sent. */
export function profilesIn(species: Seen[]): Map<string, SpeciesProfile> {
  return new Map(
    species.flatMap((seen) => {
      const profile = profileSeen(seen);
      return profile ? [[seen.id, profile] as const] : [];
    }),
  );
}

export function profileSeen({ id, name, about, overrides }: Seen): SpeciesProfile | null {
  // Both were checked against the species contract when they were stored.
  const figures = overrides as SpeciesOverrides;
  if (librarySpecies(id)) return profileOf(id, figures);
  if (!about) return null;
  return profileFrom(
    unlistedSpecies({ ...(about as Omit<Parameters<typeof unlistedSpecies>[0], 'id' | 'name'>), id, name }),
    figures,
  );
}
