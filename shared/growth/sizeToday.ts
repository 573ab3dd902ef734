import * as z from 'zod/mini';
import { DayText } from '../days';

/** How long the fish of a brood are today, and what that rests on. */
export const SizeToday = z.strictObject({
  meanTenthsMm: z.number(),
  /** Doubt about the mean, and how uneven the fish are: what counts of fish over a length are worked out from. */
  seMm: z.number(),
  cv: z.number(),
  cvSd: z.number(),
  measure: z.enum(['total', 'standard']),
  /** The day of the last sample where no curve speaks for today; null: by the growth curve. */
  measuredOn: z.nullable(DayText),
  lastOn: DayText,
  samples: z.number(),
  fish: z.number(),
});
export type SizeToday = z.output<typeof SizeToday>;
