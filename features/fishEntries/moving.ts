import * as z from 'zod/mini';
import { NoteDraft } from '@/features/entries/note';
import type { IdOf } from '@/features/entries/useEntryForm';
import { DayText } from '@/shared/days';
import type { EntryContent } from '@/shared/record/kinds';
import { Heads } from '@/shared/shapes';
import { orBlank, spelledHeads } from '@/shared/spelled';
import type { Resident, TankRow } from '@/shared/tanks/contract';

/** The value of "one fish" among what can move; everything else is `<thing>:<id>`. */
export const ONE_FISH = 'oneFish';
export const APART = 'apart';

export const MoveDraft = z
  .strictObject({
    what: z.string('Choose what moves'),
    fishId: z.optional(z.string()),
    /** Of a batch: how many; empty: all of them. */
    heads: orBlank(spelledHeads(Heads)),
    toTankId: z.string('Choose the tank they go to'),
    /** Of a batch: stay apart in the new tank, or mix with the batch named. */
    joins: z.string(),
    /** Of a fish: what becomes of its colony. */
    colony: z.enum(['stay', 'leave', 'join'], 'Choose what becomes of its colony'),
    onDay: DayText,
    note: NoteDraft,
  })
  .check(
    z.refine(({ what, fishId }) => what !== ONE_FISH || fishId !== undefined, {
      error: 'Choose which fish',
      path: ['fishId'],
    }),
  );
export type Move = z.output<typeof MoveDraft>;

export const keyOf = ({ thing, id }: Pick<Resident, 'thing' | 'id'>): string => `${thing}:${id}`;

/** The entry: a move of all, a split of some, or a mixing of batches. */
export function moveOf(value: Move, from: TankRow | null, to: TankRow | undefined, idOf: IdOf): EntryContent {
  const { what, fishId, heads, toTankId, joins, colony, onDay, note } = value;
  if (what === ONE_FISH) {
    const joined = to?.residents.find(({ thing }) => thing === 'colony')?.id ?? null;
    const colonyId = colony === 'leave' ? null : colony === 'join' ? joined : undefined;
    return {
      kind: 'moved',
      thing: 'fish',
      id: fishId ?? '',
      toTankId,
      onDay,
      note,
      ...(colonyId === undefined ? {} : { colonyId }),
    };
  }
  const resident = from?.residents.find((one) => keyOf(one) === what);
  const { thing = 'batch', id = what.slice(what.indexOf(':') + 1), heads: all = 0 } = resident ?? {};
  if (thing === 'batch' && joins !== APART)
    return { kind: 'batchJoined', batchId: id, intoBatchId: joins, heads: heads ?? all, onDay, note };
  if (thing === 'batch' && heads !== null && heads < all)
    return { kind: 'batchSplit', batchId: id, newBatchId: idOf('batch'), toTankId, heads, onDay, note };
  return { kind: 'moved', thing, id, toTankId, onDay, note };
}
