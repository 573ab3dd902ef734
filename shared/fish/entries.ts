import * as z from 'zod/mini';
import { FishCode } from '../codes';
import { DayText } from '../days';
import { Id } from '../ids';
import { line, Note } from '../shapes';
import { EXITS, SEXES } from './contract';

/** "Dominant from today": one tap. Another male of the tank that was dominant is not so from that day on. */
const Dominant = z.strictObject({ kind: z.literal('dominant'), fishId: Id, onDay: DayText, note: Note });

const SexSeen = z.strictObject({
  kind: z.literal('sexSeen'),
  fishId: Id,
  onDay: DayText,
  sex: z.enum(SEXES, 'Choose a sex'),
  how: z.enum(['seen', 'vented', 'dna', 'told'], 'Choose how it was found'),
  certain: z.boolean('Say how sure'),
  note: Note,
});

/** A mark gets lost or swapped, so it is a dated fact; null says that the fish has none now. */
const MarkSeen = z.strictObject({
  kind: z.literal('markSeen'),
  fishId: Id,
  onDay: DayText,
  mark: z.nullable(line(120, 'Describe the mark')),
  note: Note,
});

/** Telling an anonymous fish apart gives it a code. */
const ToldApart = z.strictObject({
  kind: z.literal('toldApart'),
  fishId: Id,
  onDay: DayText,
  code: FishCode,
  mark: z.nullable(line(120, 'Describe the mark')),
  note: Note,
});

/** A single fish has left: it died, or went to someone. */
const FishLeft = z.strictObject({
  kind: z.literal('fishLeft'),
  fishId: Id,
  onDay: DayText,
  how: z
    .enum(EXITS, 'Choose how it left')
    .check(z.refine((how) => how !== 'merged', 'Merge two records on the Lineage page')),
  cause: z.nullable(line(120, 'Say the cause, or leave it empty')),
  note: Note,
});

/** A colony, a batch or a fish goes to another tank. A fish that goes on its own may leave its colony or join the one there. */
const Moved = z.strictObject({
  kind: z.literal('moved'),
  thing: z.enum(['colony', 'batch', 'fish'], 'Choose what was moved'),
  id: Id,
  toTankId: Id,
  onDay: DayText,
  /** For a fish: the colony it joins, null to leave the one it is in, absent to stay in it. */
  colonyId: z.optional(z.nullable(Id)),
  note: Note,
});

export const fishEntries = [Dominant, SexSeen, MarkSeen, ToldApart, FishLeft, Moved] as const;
