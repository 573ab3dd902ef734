import * as z from 'zod/mini';
import { NoteDraft } from '@/features/entries/note';
import type { IdOf } from '@/features/entries/useEntryForm';
import { BroodCode } from '@/shared/codes';
import { DayText } from '@/shared/days';
import type { ParentageDraft } from '@/shared/lineage/parentageDraft';
import type { ContentOf } from '@/shared/record/kinds';
import { HeadsOrNone } from '@/shared/shapes';
import { orBlank, spelledHeads } from '@/shared/spelled';

/** What a select says for "no strain is claimed". */
export const NOT_CLAIMED = 'notClaimed';

const Fields = z.strictObject({
  start: z.enum(['found', 'guarded', 'acquired'], 'Choose how they came'),
  strainId: z.string('Choose a strain, or that none is claimed'),
  tankId: z.string('Choose the tank they are in'),
  code: BroodCode,
  onDay: DayText,
  spawnEarliest: DayText,
  spawnLatest: DayText,
  stage: z.enum(['eggs', 'wrigglers', 'freeSwimming'], 'Choose what they are'),
  heads: orBlank(spelledHeads(HeadsOrNone)),
  dams: z.array(z.string()),
  sires: z.array(z.string()),
  note: NoteDraft,
});

export const FoundDraft = Fields.check(
  z.refine(({ spawnLatest, onDay }) => spawnLatest <= onDay, {
    path: ['spawnLatest'],
    error: 'Not after the day they were found',
  }),
  z.refine(({ spawnEarliest, spawnLatest }) => spawnEarliest <= spawnLatest, {
    path: ['spawnEarliest'],
    error: 'Not after the last day that it can be',
  }),
);
export type Found = z.output<typeof FoundDraft>;

/** Each that was ticked is as likely as the next; what is known better is set on the brood's page. */
export function parentageOf({ start, dams, sires }: Found): ParentageDraft {
  const equal = (ids: readonly string[]) => ids.map((fishId) => ({ fishId, weight: 1 }));
  if (start === 'acquired') return { paternity: 'single', sires: [], dams: [], basis: null };
  return { paternity: 'single', sires: equal(sires), dams: equal(dams), basis: null };
}

export function foundEntry(found: Found, idOf: IdOf): ContentOf<'broodFound'> {
  const { start, strainId, tankId, code, onDay, spawnEarliest, spawnLatest, stage, heads, note } = found;
  const of = (one: Found['stage']) => (one === stage ? heads : null);
  return {
    kind: 'broodFound',
    broodId: idOf('brood'),
    batchId: idOf('batch'),
    code,
    strainId: strainId === NOT_CLAIMED ? null : strainId,
    start,
    onDay,
    spawnEarliest,
    spawnLatest,
    parentage: parentageOf(found),
    tankId,
    numbers: {
      total: heads,
      eggs: of('eggs'),
      wrigglers: of('wrigglers'),
      freeSwimming: of('freeSwimming'),
      dead: null,
      deformed: null,
    },
    opening: stage === 'freeSwimming' ? heads : null,
    note,
  };
}
