import * as z from 'zod/mini';
import { line } from '../shapes';
import type { FigureName, LengthType } from './species';

const between = (empty: string, low: number, high: number) =>
  z.number(empty).check(z.minimum(low, `At least ${low}`), z.maximum(high, `At most ${high}`));
const days = between('Type the days', 1, 200);
const wholeDay = days.check(z.int('Whole days only'));
const mm = between('Type a length', 1, 2000);

function range(empty: string, low: number, high: number) {
  const end = between(empty, low, high);
  return z
    .readonly(z.tuple([end, end], 'Type both ends'))
    .check(z.refine(([from, to]) => from < to, 'The first must be the smaller'));
}

const types = ['TL', 'SL'] as const satisfies readonly LengthType[];
const adultLength = z.strictObject({ mm, type: z.nullable(z.enum(types, 'Choose total or standard length')) });
const words = line(300, 'Type a few words');

/** What a fishroom may set for each figure of a species, with its limits. Keys and values are those of `SpeciesFigures`. */
export const FIGURE_SHAPES = {
  adultMale: adultLength,
  adultFemale: adultLength,
  temperatureC: range('Type a temperature', 5, 40),
  ph: range('Type a pH', 3, 11),
  phTolerated: range('Type a pH', 3, 11),
  hardnessDgh: range('Type a hardness', 0, 60),
  minLitres: between('Type a volume', 1, 100_000),
  minGroup: between('Type how many', 1, 500).check(z.int('Whole fish only')),
  femalesPerMale: between('Type how many', 0, 50),
  temper: words,
  holdDays: days,
  holdDaysRange: range('Type the days', 1, 200),
  holdAtC: between('Type a temperature', 15, 35),
  hatchDay: wholeDay,
  freeSwimmingDay: wholeDay,
  stripDays: range('Type the days', 1, 200),
  q10: between('Type a Q10', 1, 5),
  clutch: between('Type how many', 1, 10_000),
  clutchRange: range('Type how many', 0, 20_000),
  eggToRelease: between('Type a share', 0, 1),
  eggMm: between('Type a size', 0.1, 20),
  paternity: z.strictObject({
    habit: z.nullable(z.enum(['single', 'mixed'], 'Choose single, mixed or not known')),
    says: words,
  }),
  saleMm: mm,
  maturity: z.strictObject({
    what: words,
    mm: z.optional(mm),
    maleMm: z.optional(mm),
    femaleMm: z.optional(mm),
    type: z.optional(z.enum(types)),
    ageMonths: z.optional(between('Type the months', 1, 240)),
  }),
  releaseMm: mm,
  lengthWeight: z.strictObject({ a: between('Type a', 0.0001, 1), b: between('Type b', 2, 4) }),
  growth: z.strictObject({
    linfMm: mm,
    kPerYear: between('Type K', 0.01, 10),
    type: z.enum(types, 'Choose total or standard length'),
    stock: words,
  }),
  diet: z.enum(['aufwuchs', 'piscivore', 'plankton', 'invertebrate', 'omnivore'], 'Choose what it eats'),
  crossesWith: words,
  checkLocally: words,
} as const satisfies Record<FigureName, z.ZodMiniType>;
