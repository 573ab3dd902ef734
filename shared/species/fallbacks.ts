import type { Confidence, Figure } from './figure';
import type { Body, Kin, LengthWeight, Range, Species, Waters } from './species';

/*
 * What a profile is filled in with where neither the fishroom nor the library has a figure. All of it is marked as such
 * and of low confidence unless said otherwise; where an honest guess is not possible there is none.
 */

const basis =
  (source: string, confidence: Confidence = 'low') =>
  <T>(value: T): Figure<T> => ({
    value,
    source,
    standing: 'fallback',
    confidence,
  });

const HOLD_DAYS: Record<Kin, number | null> = {
  tropheini: 29,
  cyphotilapia: 28,
  openWater: 22,
  mbunaAndHaps: 21,
  victoriaAndRivers: 18,
  dwarfRiver: 12,
  biparental: 22,
  tilapia: 18,
  caveSpawner: null,
};

const RELEASE_MM: Record<Kin, number> = {
  tropheini: 13,
  cyphotilapia: 17,
  openWater: 10,
  mbunaAndHaps: 10,
  victoriaAndRivers: 10,
  dwarfRiver: 10,
  biparental: 10,
  tilapia: 10,
  caveSpawner: 8,
};

const WATER: Record<Waters, { temperatureC: Range; ph: Range; hardnessDgh: Range | null }> = {
  tanganyika: { temperatureC: [24, 27], ph: [8, 9], hardnessDgh: [10, 20] },
  malawi: { temperatureC: [24, 28], ph: [7.6, 8.6], hardnessDgh: [10, 20] },
  victoriaAndRivers: { temperatureC: [22, 27], ph: [7, 8.2], hardnessDgh: [5, 15] },
  lagoons: { temperatureC: [24, 30], ph: [7, 8.5], hardnessDgh: null },
};

/** W = a L^b, grams and centimetres of total length, by body shape. */
const LENGTH_WEIGHT: Record<Body, LengthWeight> = {
  deep: { a: 0.018, b: 3 },
  standard: { a: 0.014, b: 3 },
  slender: { a: 0.0075, b: 3.05 },
};

/** Share of eggs that reach release, measured in Cyprichromis leptosoma in the wild (Hydrobiologia 850:2385-2392). */
const EGG_TO_RELEASE = 0.74;
const MATURE_AT = 0.55;

const isPair = ({ mode, carers }: Species) => mode !== 'maternalMouthbrooder' && carers !== 'father';
const whole = (value: number) => Math.round(value);

export const fallbackWater = ({ waters }: Species) => {
  const fill = basis('Usual for fish of these waters', 'medium');
  const { temperatureC, ph, hardnessDgh } = WATER[waters];
  return { temperatureC: fill(temperatureC), ph: fill(ph), hardnessDgh: hardnessDgh && fill(hardnessDgh) };
};

export const fallbackGroup = (species: Species) => {
  const fill = basis('Common practice, no source');
  return { minGroup: fill(isPair(species) ? 2 : 6), femalesPerMale: fill(isPair(species) ? 1 : 3) };
};

export const fallbackSizes = (
  { kin, body, name }: Species,
  adultMm: { male: number | null; female: number | null },
) => {
  const { male, female } = adultMm;
  const largest = Math.max(male ?? 0, female ?? 0);
  const what = '55 % of adult length: time to start sexing, not a claim';
  return {
    releaseMm: basis('Related species')(name.startsWith('Petrochromis ') ? 20 : RELEASE_MM[kin]),
    saleMm: basis('Common practice, no source')(largest > 180 ? 40 : 30),
    lengthWeight: basis('By body shape: expect an error of about 35 %, until your own fish are weighed')(
      LENGTH_WEIGHT[body],
    ),
    maturity:
      largest === 0
        ? null
        : basis('Assumed; known cases run from 43 to 75 %')({
            what,
            ...(male && { maleMm: whole(male * MATURE_AT) }),
            ...(female && { femaleMm: whole(female * MATURE_AT) }),
          }),
  };
};

export const fallbackHold = ({ kin }: Species) => {
  const days = HOLD_DAYS[kin];
  return {
    holdDays: days === null ? null : basis('Median of related species')(days),
    holdAtC: basis('Middle of the usual ranges')(26),
    q10: basis('Generic rate of fish embryos, not measured')(2.2),
  };
};

/** Marks along the hold, from the days it lasts; `null` days: a guarding species. */
export const fallbackMarks = (species: Species, holdDays: number | null, hatchDay: number | null) => {
  if (holdDays === null) {
    const hatch = hatchDay ?? 3;
    const fill = basis('Usual for cave spawners');
    return { holdDaysRange: null, hatchDay: fill(hatch), freeSwimmingDay: fill(hatch + 7), stripDays: null };
  }
  const strips = species.mode === 'maternalMouthbrooder' && !species.leaveToHer;
  const range: Range = [Math.floor(0.85 * holdDays), Math.ceil(1.25 * holdDays)];
  const strip: Range = [whole(0.7 * holdDays) + 1, whole(0.9 * holdDays) + 1];
  return {
    holdDaysRange: basis('0.85 to 1.25 times the usual days, the spread among species')(range),
    hatchDay: basis('About 28 % of the hold, assumed')(Math.max(3, whole(0.28 * holdDays))),
    freeSwimmingDay: basis('About 85 % of the hold, assumed')(whole(0.85 * holdDays)),
    stripDays: strips ? basis('70 to 90 % of the hold, common practice')(strip) : null,
  };
};

export const fallbackBrood = () => ({
  eggToRelease: basis('Measured in Cyprichromis leptosoma only')(EGG_TO_RELEASE),
  paternity: basis('Not known: record every male that had access')({ habit: null, says: 'unknown' } as const),
});

export const fallbackCautions = ({ name }: Species) => ({
  crossesWith: basis(
    'House rule',
    'high',
  )(`any other ${name.split(' ')[0]}, and any other locality of the same species`),
  checkLocally: basis('House rule', 'high')('Check national rules and the current Red List.'),
});
