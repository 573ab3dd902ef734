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
import type { FigureName, Range, Species, SpeciesFigures } from './species';

/** What a fishroom says of a species instead of the library, and where it has it from. */
export type SpeciesOverrides = Partial<SpeciesFigures>;
export type OverrideSources = Partial<Record<FigureName, string>>;

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

type Own = <K extends FigureName>(name: K) => Figure<SpeciesFigures[K]> | null;

/**
 * Merges a species with a fishroom's overrides; what neither has is filled in from related species, and says so. An
 * override without a source of its own names the fishroom.
 */
export function profileFrom(
  species: Species,
  overrides: SpeciesOverrides = {},
  sources: OverrideSources = {},
): SpeciesProfile {
  const { figures, ...about } = species;
  const own: Own = (name) => {
    const value = overrides[name];
    return value === undefined ? figures[name] : ofTheRoom(value, sources[name]);
  };
  return { ...about, ...keeping(species, own), ...holding(species, own), ...body(species, own), ...told(species, own) };
}

const ofTheRoom = <T>(value: T, source = 'Set by this fishroom'): Figure<T> => ({
  value,
  source,
  standing: 'room',
  confidence: 'high',
});

function keeping(species: Species, own: Own) {
  const water = fallbackWater(species);
  const group = fallbackGroup(species);
  return {
    temperatureC: own('temperatureC') ?? water.temperatureC,
    ph: own('ph') ?? water.ph,
    phTolerated: own('phTolerated'),
    hardnessDgh: own('hardnessDgh') ?? water.hardnessDgh,
    minLitres: own('minLitres'),
    minGroup: own('minGroup') ?? group.minGroup,
    femalesPerMale: own('femalesPerMale') ?? group.femalesPerMale,
    temper: own('temper'),
    diet: own('diet'),
  };
}

/** A fishroom that sets other days of holding moves the library's marks along the hold with them. */
function holding(species: Species, own: Own) {
  const pace = fallbackHold(species);
  const holdDays = own('holdDays') ?? pace.holdDays;
  const marks = fallbackMarks(species, holdDays?.value ?? null, own('hatchDay')?.value ?? null);
  const usual = species.figures.holdDays?.value;
  const stretch = holdDays?.standing === 'room' && usual ? holdDays.value / usual : 1;
  return {
    holdDays,
    holdDaysRange: stretched(own('holdDaysRange'), stretch, rangeBy) ?? marks.holdDaysRange,
    holdAtC: own('holdAtC') ?? pace.holdAtC,
    q10: own('q10') ?? pace.q10,
    hatchDay: stretched(own('hatchDay'), stretch, dayBy) ?? marks.hatchDay,
    freeSwimmingDay: stretched(own('freeSwimmingDay'), stretch, dayBy) ?? marks.freeSwimmingDay,
    stripDays: marks.stripDays && (stretched(own('stripDays'), stretch, rangeBy) ?? marks.stripDays),
  };
}

const dayBy = (day: number, stretch: number): number => Math.round(day * stretch);
const rangeBy = ([from, to]: Range, stretch: number): Range => [dayBy(from, stretch), dayBy(to, stretch)];

function stretched<T>(figure: Figure<T> | null, stretch: number, by: (value: T, stretch: number) => T) {
  if (!figure || figure.standing === 'room' || stretch === 1) return figure;
  return { ...figure, value: by(figure.value, stretch), note: 'Moved with this fishroom’s days of holding.' };
}

function body(species: Species, own: Own) {
  const [adultMale, adultFemale] = [own('adultMale'), own('adultFemale')];
  const sizes = fallbackSizes(species, { male: adultMale?.value.mm ?? null, female: adultFemale?.value.mm ?? null });
  return {
    adultMale,
    adultFemale,
    saleMm: own('saleMm') ?? sizes.saleMm,
    maturity: own('maturity') ?? sizes.maturity,
    releaseMm: own('releaseMm') ?? sizes.releaseMm,
    lengthWeight: own('lengthWeight') ?? sizes.lengthWeight,
    growth: own('growth'),
  };
}

function told(species: Species, own: Own) {
  const brood = fallbackBrood();
  const cautions = fallbackCautions(species);
  return {
    clutch: own('clutch'),
    clutchRange: own('clutchRange'),
    eggToRelease: own('eggToRelease') ?? brood.eggToRelease,
    eggMm: own('eggMm'),
    paternity: own('paternity') ?? brood.paternity,
    crossesWith: own('crossesWith') ?? cautions.crossesWith,
    checkLocally: own('checkLocally') ?? cautions.checkLocally,
  };
}
