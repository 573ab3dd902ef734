import type { Figure } from './figure';

export type Range = readonly [low: number, high: number];
export type LengthType = 'TL' | 'SL';
/** Adult length in mm; `type` is null where the source does not say total or standard. */
type AdultLength = { readonly mm: number; readonly type: LengthType | null };

/** How the young are cared for until they feed. Only a maternal mouthbrooder may be stripped. */
export const BREEDING_MODES = [
  'maternalMouthbrooder',
  'biparentalMouthbrooder',
  'paternalMouthbrooder',
  'substrateSpawner',
] as const;
export type BreedingMode = (typeof BREEDING_MODES)[number];

export const MODE_WORDS: Record<BreedingMode, string> = {
  maternalMouthbrooder: 'The female holds',
  biparentalMouthbrooder: 'The female holds, then hands over to the male',
  paternalMouthbrooder: 'The male holds',
  substrateSpawner: 'Spawns on rock or in a hole and guards',
};

export type Carers = 'mother' | 'father' | 'pair' | 'group';
export type Diet = 'aufwuchs' | 'piscivore' | 'plankton' | 'invertebrate' | 'omnivore';
export type Body = 'deep' | 'standard' | 'slender';
/** Home water: what temperature, pH and hardness fall back to. */
export type Waters = 'tanganyika' | 'malawi' | 'victoriaAndRivers' | 'lagoons';
/** Relatives: what holding times and sizes at release fall back to. */
export type Kin =
  | 'tropheini'
  | 'cyphotilapia'
  | 'openWater'
  | 'mbunaAndHaps'
  | 'victoriaAndRivers'
  | 'dwarfRiver'
  | 'biparental'
  | 'tilapia'
  | 'caveSpawner';

/** Who fathers a brood. `habit` null: not known. `says` is the finding in words. */
type Paternity = { readonly habit: 'single' | 'mixed' | null; readonly says: string };
type Maturity = {
  readonly what: string;
  readonly mm?: number;
  readonly maleMm?: number;
  readonly femaleMm?: number;
  readonly type?: LengthType;
  readonly ageMonths?: number;
};
/** W = a L^b in grams and centimetres of total length. */
export type LengthWeight = { readonly a: number; readonly b: number };
type GrowthPoint = {
  readonly linfMm: number;
  readonly kPerYear: number;
  readonly type: LengthType;
  readonly stock: string;
};

/** Every figure a profile can hold, by name. Days count from the spawn; temperatures in °C; volumes in litres. */
export type SpeciesFigures = {
  adultMale: AdultLength;
  adultFemale: AdultLength;
  temperatureC: Range;
  ph: Range;
  /** Outside `ph` but borne: a reason to look, not to act. */
  phTolerated: Range;
  hardnessDgh: Range;
  minLitres: number;
  minGroup: number;
  femalesPerMale: number;
  temper: string;
  holdDays: number;
  holdDaysRange: Range;
  holdAtC: number;
  hatchDay: number;
  freeSwimmingDay: number;
  /** Day numbers of the hold, day 1 being the day of the spawn. */
  stripDays: Range;
  q10: number;
  clutch: number;
  clutchRange: Range;
  eggToRelease: number;
  eggMm: number;
  paternity: Paternity;
  saleMm: number;
  maturity: Maturity;
  releaseMm: number;
  lengthWeight: LengthWeight;
  growth: GrowthPoint;
  diet: Diet;
  crossesWith: string;
  checkLocally: string;
};

export type FigureName = keyof SpeciesFigures;

/** A species as the library or a fishroom describes it. A figure that is null is not known. */
export type Species = {
  id: string;
  name: string;
  author: Figure<string> | null;
  family: string;
  origin: Figure<string> | null;
  commonNames: Figure<readonly string[]> | null;
  mode: BreedingMode;
  carers: Carers;
  kin: Kin;
  body: Body;
  waters: Waters;
  /** Stripping is not advised though the female holds. */
  leaveToHer?: true;
  figures: { [K in FigureName]: Figure<SpeciesFigures[K]> | null };
  notes: string | null;
};
