import * as z from 'zod/mini';

const Days = z
  .number('Type a number of days')
  .check(z.int('Whole days'), z.minimum(1, 'At least one day'), z.maximum(365, 'At most a year'));
const ByStage = z.strictObject({ fry: Days, juvenile: Days, subadult: Days, adult: Days });

/** After how many days something is due again. A fishroom may change any of them. */
export const Intervals = z.strictObject({
  /** A look at a female that holds. */
  holdCheck: Days,
  /** Stripped eggs or wrigglers in a tumbler, until they swim free. */
  stageCheck: Days,
  headCount: ByStage,
  lengthSample: ByStage,
  waterTest: Days,
  waterChange: Days,
  /** A reservation is worth a word so many days before it ends. */
  reservationEnds: Days,
});
export type Intervals = z.output<typeof Intervals>;

/** Where the program starts. Common practice, no source. */
export const DEFAULT_INTERVALS: Intervals = {
  holdCheck: 7,
  stageCheck: 2,
  headCount: { fry: 14, juvenile: 30, subadult: 60, adult: 180 },
  lengthSample: { fry: 14, juvenile: 30, subadult: 45, adult: 120 },
  waterTest: 14,
  waterChange: 7,
  reservationEnds: 2,
};

/** A sample of so many fish is enough to see the mean to about 5 % at the usual unevenness of a brood (CV 10 %). */
export const SAMPLE_SIZE = 15;
