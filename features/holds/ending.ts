import * as z from 'zod/mini';
import { NoteDraft } from '@/features/entries/note';
import type { IdOf } from '@/features/entries/useEntryForm';
import { BroodCode } from '@/shared/codes';
import { type Day, DayText } from '@/shared/days';
import type { StageNumbers } from '@/shared/holds/entries';
import type { ContentOf } from '@/shared/record/kinds';
import { HeadsOrNone } from '@/shared/shapes';
import { orBlank, spelledHeads } from '@/shared/spelled';

export const FOUND = ['eggs', 'wrigglers', 'freeSwimming', 'mixed'] as const;
export type Found = (typeof FOUND)[number];
export const FOUND_WORDS: Record<Found, string> = {
  eggs: 'Eggs',
  wrigglers: 'Wrigglers',
  freeSwimming: 'Free-swimming',
  mixed: 'Mixed',
};

const Count = orBlank(spelledHeads(HeadsOrNone));

export const EndDraft = z.strictObject({
  onDay: DayText,
  /** One total, counted with the female in hand; empty: not counted. */
  total: Count,
  found: z.enum(FOUND, 'Choose what they are'),
  eggs: Count,
  wrigglers: Count,
  freeSwimming: Count,
  dead: Count,
  deformed: Count,
  code: BroodCode,
  tankId: z.string('Choose the tank they go into'),
  note: NoteDraft,
});
export type Ending = z.output<typeof EndDraft>;

export const startOf = (today: Day, found: Found, tankId: string | null, code: string): z.input<typeof EndDraft> => ({
  onDay: today,
  total: '',
  found,
  eggs: '',
  wrigglers: '',
  freeSwimming: '',
  dead: '',
  deformed: '',
  code,
  tankId: tankId ?? '',
  note: '',
});

/** What was counted, by stage: a total of one kind is a count of that kind; a mixed one has the split, as far as it was made. */
export function numbersOf({ total, found, eggs, wrigglers, freeSwimming, dead, deformed }: Ending): StageNumbers {
  if (found !== 'mixed') {
    const of = (stage: Found) => (stage === found ? total : null);
    return { total, eggs: of('eggs'), wrigglers: of('wrigglers'), freeSwimming: of('freeSwimming'), dead, deformed };
  }
  const parts = [eggs, wrigglers, freeSwimming].flatMap((part) => part ?? []);
  const sum = parts.length > 0 ? parts.reduce((so, part) => so + part, 0) : null;
  return { total: total ?? sum, eggs, wrigglers, freeSwimming, dead, deformed };
}

/** The head count opens when all of them swim free, and not before. */
export function openingOf(ending: Ending): number | null {
  const { eggs, wrigglers, freeSwimming } = numbersOf(ending);
  return (eggs ?? 0) + (wrigglers ?? 0) === 0 && ending.found !== 'mixed' ? (freeSwimming ?? null) : null;
}

export function endingOf(
  value: Ending,
  holdId: string,
  outcome: 'stripped' | 'released',
  idOf: IdOf,
): ContentOf<'holdEnded'> {
  const { onDay, code, tankId, note } = value;
  return {
    kind: 'holdEnded',
    holdId,
    onDay,
    outcome,
    note,
    brood: {
      broodId: idOf('brood'),
      batchId: idOf('batch'),
      code,
      tankId,
      numbers: numbersOf(value),
      opening: openingOf(value),
    },
  };
}
