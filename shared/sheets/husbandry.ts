import * as z from 'zod/mini';
import { DayText } from '../days';
import { words } from './wording';

const Mm = z.number().check(z.gt(0, 'Above zero'), z.maximum(3000));

const LengthSample = z.strictObject({
  on: DayText,
  n: z.number().check(z.int(), z.minimum(1), z.maximum(100_000)),
  meanMm: Mm,
  /** Standard deviation between fish; null for one fish. */
  sdMm: z.nullable(z.number().check(z.minimum(0), z.maximum(1000))),
});
export type LengthSample = z.output<typeof LengthSample>;

const inOrder = (list: { on: string }[]): boolean =>
  list.every((item, i) => i === 0 || (list[i - 1]?.on ?? '') <= item.on);

/** Lengths as measured. A fitted curve may run between the first and the last sample: a sheet makes no forecast. */
export const Growth = z
  .strictObject({
    measure: z.enum(['total', 'standard']),
    samples: z.array(LengthSample).check(z.minLength(1), z.maxLength(400), z.refine(inOrder, 'Samples run by date')),
    fitted: z.nullable(
      z.strictObject({
        model: z.enum(['vonBertalanffy', 'gompertz', 'logistic']),
        points: z
          .array(z.strictObject({ on: DayText, meanMm: Mm }))
          .check(z.minLength(2), z.maxLength(400), z.refine(inOrder, 'The curve runs by date')),
      }),
    ),
  })
  .check(
    z.refine(({ samples, fitted }) => {
      const from = samples[0]?.on ?? '';
      const to = samples.at(-1)?.on ?? '';
      return !fitted || fitted.points.every((point) => point.on >= from && point.on <= to);
    }, 'The curve stays within what was measured'),
  );
export type Growth = z.output<typeof Growth>;

/** Stored units: °C, mg/L of calcium carbonate, mg/L as N, µS/cm. */
const WaterReading = z
  .strictObject({
    what: z.enum(['celsius', 'ph', 'kh', 'gh', 'nitrate', 'conductivity']),
    mean: z.number().check(z.minimum(0), z.maximum(100_000)),
    low: z.number().check(z.minimum(0), z.maximum(100_000)),
    high: z.number().check(z.minimum(0), z.maximum(100_000)),
  })
  .check(z.refine((reading) => reading.low <= reading.high, 'The range runs from low to high'));
export type WaterReading = z.output<typeof WaterReading>;

/** What the fish lived in, over the days the readings span. */
export const Water = z.strictObject({
  from: DayText,
  to: DayText,
  readings: z.array(WaterReading).check(
    z.minLength(1),
    z.refine((list) => new Set(list.map((reading) => reading.what)).size === list.length, 'One line for each measure'),
  ),
});
export type Water = z.output<typeof Water>;

/** A treatment that had not ended on the day of issue. */
export const Treatment = z.strictObject({
  what: words(120),
  why: z.nullable(words(160)),
  from: DayText,
  to: z.nullable(DayText),
});
export type Treatment = z.output<typeof Treatment>;
