import * as z from 'zod/mini';
import { DayText } from '../days';
import { Id } from '../ids';
import { Note } from '../shapes';
import { Grams, TenthsMm } from '../units';

export const MEASURES = ['total', 'standard'] as const;
export const METHODS = ['ruler', 'box', 'photo', 'estimate'] as const;
export const METHOD_WORDS = { ruler: 'Ruler', box: 'Measuring box', photo: 'From a photo', estimate: 'By eye' };

/** Lengths of fish of a batch, a brood, or of one fish, all total or all standard; the individual lengths are kept. */
const LengthSampled = z.strictObject({
  kind: z.literal('lengthSampled'),
  sampleId: Id,
  of: z.strictObject({ thing: z.enum(['brood', 'batch', 'fish'], 'Choose what was measured'), id: Id }),
  onDay: DayText,
  measure: z.enum(MEASURES, 'Choose total or standard length'),
  method: z.enum(METHODS, 'Choose how it was measured'),
  readings: z
    .array(z.strictObject({ lengthTenthsMm: TenthsMm, weightG: z.nullable(Grams) }))
    .check(z.minLength(1, 'At least one length'), z.maxLength(2000, 'At most 2000 lengths')),
  note: Note,
});

export const growthEntries = [LengthSampled] as const;
