import type { CareProfile } from '@/shared/holds/careProfile';
import { careProfileOf } from '@/shared/holds/careProfile';
import type { ClockFacts } from '@/shared/holds/contract';
import { profileSeen } from '@/shared/species/profilesIn';

/** How a species carries its young and for how long, as this fishroom sees it; null where it is not known. */
export function careOf(facts: ClockFacts | null): CareProfile | null {
  if (!facts?.speciesId) return null;
  const { speciesId: id, about, overrides } = facts;
  const profile = profileSeen({ id, name: '', about, overrides });
  return profile ? careProfileOf(profile) : null;
}

/** Where nothing is known of the species: no mouthbrooder holds for longer. From memory. */
const LONGEST_HOLD = 45;

/** The most days that she can have been holding unseen: the species' hold with its spread. */
export function longestHold(facts: ClockFacts | null): number {
  const care = careOf(facts);
  return care ? Math.ceil(care.days + care.spreadDays) : LONGEST_HOLD;
}
