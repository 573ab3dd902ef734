import * as z from 'zod/mini';
import { NoteDraft } from '@/features/entries/note';
import type { IdOf } from '@/features/entries/useEntryForm';
import { DayText, isDay } from '@/shared/days';
import type { EntryContent } from '@/shared/record/kinds';

const MaybeWords = z.optional(z.string().check(z.maxLength(200, 'Keep it under 200 letters')));

export const TreatingDraft = z
  .strictObject({
    as: z.enum(['treatment', 'quarantine'], 'Choose what it is'),
    what: z.optional(z.string().check(z.maxLength(120, 'Keep it under 120 letters'))),
    why: MaybeWords,
    dose: z.optional(z.string().check(z.maxLength(120, 'Keep it under 120 letters'))),
    onDay: DayText,
    /** Empty: until it is ended. */
    untilDay: z.optional(z.string().check(z.refine(isDay, 'Type a date such as 12 May, or leave it empty'))),
    note: NoteDraft,
  })
  .check(
    z.refine(({ as, what }) => as === 'quarantine' || Boolean(what?.trim()), {
      error: 'Say what was given',
      path: ['what'],
    }),
    z.refine(({ as, why }) => as === 'quarantine' || Boolean(why?.trim()), {
      error: 'Say what it is for',
      path: ['why'],
    }),
    z.refine(({ onDay, untilDay }) => untilDay === undefined || untilDay >= onDay, {
      error: 'Not before the first day',
      path: ['untilDay'],
    }),
  );
export type Treating = z.output<typeof TreatingDraft>;

/** Shown wherever medicines and salts are recorded. */
export const TREATMENT_CAUTION =
  'Follow the label, and a veterinarian where you can. Local law says what may be sold without one. Keep what you pour away out of streams and drains that lead to them.';

export function treatingOf(tankId: string, value: Treating, idOf: IdOf): EntryContent {
  const { as, what = '', why, dose, onDay, untilDay = null, note } = value;
  const begins = { careId: idOf('care'), tankId, onDay, untilDay, note };
  return as === 'treatment'
    ? { kind: 'treatmentStarted', ...begins, what: what.trim(), why: why?.trim() ?? '', dose: dose?.trim() || null }
    : { kind: 'quarantineStarted', ...begins, why: why?.trim() || null };
}
