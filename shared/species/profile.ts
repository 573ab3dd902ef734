import {
  fallbackBrood,
  fallbackCautions,
  fallbackGroup,
  fallbackHold,
  fallbackMarks,
  fallbackSizes,
  fallbackWater,
} from './fallbacks';
import type { Figure } from './figure';
import type { FigureName, Species, SpeciesFigures } from './species';

/** What a fishroom says of a species instead of the library. */
export type SpeciesOverrides = Partial<SpeciesFigures>;

/** Figures that a profile always has: the fishroom's, the library's, or a fallback that says so. */
type AlwaysThere =
  | 'temperatureC'
  | 'ph'
  | 'minGroup'
  | 'femalesPerMale'
  | 'holdAtC'
  | 'q10'
  | 'hatchDay'
  | 'freeSwimmingDay'
  | 'eggToRelease'
  | 'paternity'
  | 'saleMm'
  | 'releaseMm'
  | 'lengthWeight'
  | 'crossesWith'
  | 'checkLocally';

/** A species as one fishroom sees it: each figure with its value and source, null where it is not known. */
export type SpeciesProfile = Omit<Species, 'figures'> & {
  [K in FigureName]: K extends AlwaysThere ? Figure<SpeciesFigures[K]> : Figure<SpeciesFigures[K]> | null;
};

/** Merges a species with a fishroom's overrides; what neither has is filled in from related species, and says so. */
export function profileFrom(species: Species, overrides: SpeciesOverrides = {}): SpeciesProfile {
  const { figures, ...about } = species;
  const own = <K extends FigureName>(name: K): Figure<SpeciesFigures[K]> | null => {
    const value = overrides[name];
    return value === undefined ? figures[name] : ofTheRoom(value);
  };
  const adult = { male: own('adultMale')?.value.mm ?? null, female: own('adultFemale')?.value.mm ?? null };
  const hold = fallbackHold(species);
  const holdDays = own('holdDays') ?? hold.holdDays;
  const filled = {
    ...fallbackWater(species),
    ...fallbackGroup(species),
    ...fallbackSizes(species, adult),
    ...fallbackMarks(species, holdDays?.value ?? null, own('hatchDay')?.value ?? null),
    ...fallbackBrood(),
    ...fallbackCautions(species),
  };
  return {
    ...about,
    adultMale: own('adultMale'),
    adultFemale: own('adultFemale'),
    temperatureC: own('temperatureC') ?? filled.temperatureC,
    ph: own('ph') ?? filled.ph,
    phTolerated: own('phTolerated'),
    hardnessDgh: own('hardnessDgh') ?? filled.hardnessDgh,
    minLitres: own('minLitres'),
    minGroup: own('minGroup') ?? filled.minGroup,
    femalesPerMale: own('femalesPerMale') ?? filled.femalesPerMale,
    temper: own('temper'),
    holdDays,
    holdDaysRange: own('holdDaysRange') ?? filled.holdDaysRange,
    holdAtC: own('holdAtC') ?? hold.holdAtC,
    q10: own('q10') ?? hold.q10,
    hatchDay: own('hatchDay') ?? filled.hatchDay,
    freeSwimmingDay: own('freeSwimmingDay') ?? filled.freeSwimmingDay,
    stripDays: filled.stripDays && (own('stripDays') ?? filled.stripDays),
    clutch: own('clutch'),
    clutchRange: own('clutchRange'),
    eggToRelease: own('eggToRelease') ?? filled.eggToRelease,
    eggMm: own('eggMm'),
    paternity: own('paternity') ?? filled.paternity,
    saleMm: own('saleMm') ?? filled.saleMm,
    maturity: own('maturity') ?? filled.maturity,
    releaseMm: own('releaseMm') ?? filled.releaseMm,
    lengthWeight: own('lengthWeight') ?? filled.lengthWeight,
    growth: own('growth'),
    diet: own('diet'),
    crossesWith: own('crossesWith') ?? filled.crossesWith,
    checkLocally: own('checkLocally') ?? filled.checkLocally,
  };
}

const ofTheRoom = <T>(value: T): Figure<T> => ({
  value,
  source: 'Set by this fishroom',
  standing: 'room',
  confidence: 'high',
});
