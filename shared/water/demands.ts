import type { SpeciesProfile } from '../species/profile';
import type { Range } from '../species/species';

/** The narrowest water that suits all of several species: each end with the species that sets it. */
export type Demand = { low: number; high: number; lowFor: string; highFor: string };

/** Null with a reason: nobody lives there, no species has the figure, or no water suits them all. */
export type Demands = Record<'temperatureC' | 'ph' | 'hardnessDgh', Demand | { none: 'noFigure' | 'noOverlap' }>;

/** What the most demanding of the species ask of the water, in °C, pH and German degrees. */
export function waterDemands(profiles: readonly SpeciesProfile[]): Demands {
  return {
    temperatureC: demandOf(profiles, ({ temperatureC }) => temperatureC.value),
    ph: demandOf(profiles, ({ ph }) => ph.value),
    hardnessDgh: demandOf(profiles, ({ hardnessDgh }) => hardnessDgh?.value ?? null),
  };
}

export const isDemand = (demand: Demands[keyof Demands]): demand is Demand => 'low' in demand;

function demandOf(profiles: readonly SpeciesProfile[], rangeOf: (profile: SpeciesProfile) => Range | null) {
  let narrowest: Demand | null = null;
  for (const profile of profiles) {
    const range = rangeOf(profile);
    if (range) narrowest = narrowedBy(narrowest, range, profile.name);
  }
  if (!narrowest) return { none: 'noFigure' } as const;
  return narrowest.low > narrowest.high ? ({ none: 'noOverlap' } as const) : narrowest;
}

function narrowedBy(so: Demand | null, [low, high]: Range, name: string): Demand {
  if (!so) return { low, high, lowFor: name, highFor: name };
  return {
    ...(low > so.low ? { low, lowFor: name } : { low: so.low, lowFor: so.lowFor }),
    ...(high < so.high ? { high, highFor: name } : { high: so.high, highFor: so.highFor }),
  };
}
