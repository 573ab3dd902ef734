import { BadValue, finite, whole } from '../badValue';
import { adultMm } from '../species/adultSize';
import type { SpeciesProfile } from '../species/profile';

/**
 * Fish of one strain and one kind in a tank: a colony, a batch, a single fish. `speciesId` finds the profile. Lengths are
 * total lengths in mm of the smallest and largest; null: not measured, taken as adult.
 */
export type TankResident = {
  name: string;
  speciesId: string;
  locality: string | null;
  males: number;
  females: number;
  unsexed: number;
  smallestMm: number | null;
  largestMm: number | null;
};

/** A resident with its species' profile and what follows from the two. */
export type Lodger = TankResident & {
  profile: SpeciesProfile;
  heads: number;
  /** Lengths used: measured, else adult; null when the profile has none either. */
  smallest: number | null;
  largest: number | null;
  /** How many adults they weigh as much as. */
  adults: number;
};

/** Pairs each resident with its profile. Throws `BadValue` for a species without one, or heads that are not whole. */
export function lodgersOf(residents: readonly TankResident[], profiles: readonly SpeciesProfile[]): Lodger[] {
  const byId = new Map(profiles.map((profile) => [profile.id, profile]));
  return residents.map((resident) => {
    const profile = byId.get(resident.speciesId);
    if (!profile) throw new BadValue('Species', resident.speciesId, 'needs a profile');
    const { males, females, unsexed } = resident;
    const heads = whole('Males', males) + whole('Females', females) + whole('Unsexed fish', unsexed);
    const largest = measured('Largest length', resident.largestMm) ?? adultMm(profile, males > 0 ? 'male' : null);
    const smallest = measured('Smallest length', resident.smallestMm) ?? resident.largestMm ?? smallestAdult(profile);
    return { ...resident, profile, heads, smallest, largest, adults: adultsOf(heads, smallest, largest, profile) };
  });
}

const measured = (what: string, mm: number | null) => mm && finite(what, mm, { above: 0 });

function smallestAdult(profile: SpeciesProfile): number | null {
  const [male, female] = [adultMm(profile, 'male'), adultMm(profile, 'female')];
  return male === null || female === null ? (male ?? female) : Math.min(male, female);
}

/** Weight goes with the cube of length. */
function adultsOf(heads: number, smallest: number | null, largest: number | null, profile: SpeciesProfile): number {
  const adult = adultMm(profile, null);
  if (adult === null || smallest === null || largest === null) return heads;
  return heads * Math.min(1, (smallest + largest) / 2 / adult) ** 3;
}
