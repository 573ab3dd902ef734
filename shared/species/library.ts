import { BadValue } from '../badValue';
import { cyphotilapia } from './cyphotilapia';
import { guards } from './guards';
import { haps } from './haps';
import { mbuna } from './mbuna';
import { openWater } from './openWater';
import { type OverrideSources, profileFrom, type SpeciesOverrides, type SpeciesProfile } from './profile';
import { shore } from './shore';
import type { Body, BreedingMode, Carers, Kin, Species, Waters } from './species';
import { tropheini } from './tropheini';
import { victoriaAndRivers } from './victoriaAndRivers';

/** The built-in species, by name. */
export const LIBRARY: readonly Species[] = [
  ...tropheini,
  ...cyphotilapia,
  ...openWater,
  ...shore,
  ...mbuna,
  ...haps,
  ...victoriaAndRivers,
  ...guards,
].sort((a, b) => (a.name < b.name ? -1 : 1));

const byId = new Map(LIBRARY.map((species) => [species.id, species]));

/** The species of the library with that id, or null. */
export const librarySpecies = (id: string): Species | null => byId.get(id) ?? null;

/**
 * A library species as a fishroom sees it: every figure with its value and source, the fishroom's own first, then the
 * library's, then a marked fallback. Throws `BadValue` for an id that is not in the library.
 */
export function profileOf(
  speciesId: string,
  overrides: SpeciesOverrides = {},
  sources: OverrideSources = {},
): SpeciesProfile {
  const species = byId.get(speciesId);
  if (!species) throw new BadValue('Species', speciesId, 'must be in the library');
  return profileFrom(species, overrides, sources);
}

/** A species that the library does not have: undescribed, or new to the trade. It starts with no figures of its own. */
export function unlistedSpecies(about: {
  id: string;
  name: string;
  mode: BreedingMode;
  carers: Carers;
  kin: Kin;
  body: Body;
  waters: Waters;
}): Species {
  return { ...about, author: null, family: 'Cichlidae', origin: null, commonNames: null, figures: NONE, notes: null };
}

const NONE: Species['figures'] = {
  adultMale: null,
  adultFemale: null,
  temperatureC: null,
  ph: null,
  phTolerated: null,
  hardnessDgh: null,
  minLitres: null,
  minGroup: null,
  femalesPerMale: null,
  temper: null,
  holdDays: null,
  holdDaysRange: null,
  holdAtC: null,
  hatchDay: null,
  freeSwimmingDay: null,
  stripDays: null,
  q10: null,
  clutch: null,
  clutchRange: null,
  eggToRelease: null,
  eggMm: null,
  paternity: null,
  saleMm: null,
  maturity: null,
  releaseMm: null,
  lengthWeight: null,
  growth: null,
  diet: null,
  crossesWith: null,
  checkLocally: null,
};
