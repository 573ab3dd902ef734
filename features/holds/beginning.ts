import * as z from 'zod/mini';
import { NoteDraft } from '@/features/entries/note';
import type { IdOf } from '@/features/entries/useEntryForm';
import { type Day, DayText, isDay } from '@/shared/days';
import type { proposeSires } from '@/shared/holds/contract';
import { HOLD_PLANS } from '@/shared/holds/entries';
import type { ParentageDraft } from '@/shared/lineage/parentageDraft';
import type { ContentOf } from '@/shared/record/kinds';
import type { TankRow } from '@/shared/tanks/contract';
import { basisOf, candidatesOf, NO_CHANGE, SireDraft, sireLines } from './sireDraft';

export type Proposal = z.output<typeof proposeSires.output>;
export type Seen = 'holding' | 'spawn';

/** "Can't tell which", of the holder; "several, or can't tell", of the father. */
export const CANNOT_TELL = 'cannotTell';

const Begun = z.strictObject({
  holderId: z.string('Choose which, or that you can’t tell'),
  /** Last seen not holding; of a spawn that was seen it is not asked. */
  notYetOn: z.optional(z.string()),
  firstSeenOn: DayText,
  /** The father, of a spawn that was seen. */
  sireId: z.optional(z.string()),
  sires: SireDraft,
  paternity: z.enum(['single', 'mixed'], 'Choose one father for all, or several'),
  plan: z.enum(HOLD_PLANS, 'Choose to strip or to leave her'),
  note: NoteDraft,
});
export type Begun = z.output<typeof Begun>;
export type BeginDraft = z.input<typeof Begun>;

const HoldingBegun = Begun.check(
  z.refine(({ notYetOn }) => notYetOn !== undefined && isDay(notYetOn), {
    error: 'Choose when she was last seen not holding',
    path: ['notYetOn'],
  }),
  z.refine(({ notYetOn, firstSeenOn }) => notYetOn === undefined || !isDay(notYetOn) || notYetOn <= firstSeenOn, {
    error: 'Not after the day she was first seen holding',
    path: ['notYetOn'],
  }),
);

const SpawnBegun = Begun.check(
  z.refine(({ sireId }) => sireId !== undefined, {
    error: 'Choose which male, or that you can’t tell',
    path: ['sireId'],
  }),
);

/** The value of a draft that was good enough to be sent. */
export const begunOf = (draft: BeginDraft): Begun | null => Begun.safeParse(emptied(draft)).data ?? null;

const emptied = (draft: BeginDraft) => ({
  ...draft,
  notYetOn: draft.notYetOn || undefined,
  sireId: draft.sireId || undefined,
  note: draft.note || undefined,
});

export const begunSchema = (seen: Seen) => (seen === 'spawn' ? SpawnBegun : HoldingBegun);

export const startOf = (today: Day, notYetOn: Day | null, paternity: 'single' | 'mixed' | null): BeginDraft => ({
  holderId: '',
  notYetOn: notYetOn ?? '',
  firstSeenOn: today,
  sireId: '',
  sires: NO_CHANGE,
  paternity: paternity ?? 'single',
  plan: 'strip',
  note: '',
});

export type Around = {
  seen: Seen;
  tank: TankRow;
  colonyId: string | null;
  proposal: Proposal;
  /** The species' males hold. */
  heHolds: boolean;
  /** The species may be stripped. */
  strips: boolean;
};

/** The entry out of what was typed: a spawn that was seen, or a mouth that was found full. */
export function beginningOf(
  value: Begun,
  around: Around,
  idOf: IdOf,
): ContentOf<'spawnSeen'> | ContentOf<'holdingSeen'> {
  const { seen, tank, colonyId, proposal, strips } = around;
  const { firstSeenOn, notYetOn, note } = value;
  const holderId = holderOf(value);
  const begins = {
    holdId: idOf('hold'),
    tankId: tank.id,
    colonyId: proposal.females.find(({ fishId }) => fishId === holderId)?.colonyId ?? colonyId,
    holderId,
    parentage: parentageOf(value, around),
    plan: strips ? value.plan : ('leave' as const),
    note,
  };
  if (seen === 'spawn') return { kind: 'spawnSeen', onDay: firstSeenOn, ...begins };
  const spawnEarliest = notYetOn ?? firstSeenOn;
  return { kind: 'holdingSeen', firstSeenOn, spawnEarliest, spawnLatest: firstSeenOn, ...begins };
}

const holderOf = ({ holderId }: Begun): string | null => (holderId === CANNOT_TELL ? null : holderId);

export function parentageOf(value: Begun, { seen, proposal, heHolds }: Around): ParentageDraft {
  const holderId = holderOf(value);
  const lines = sireLines(proposal.sires, value.sires);
  const mothers = equal(proposal.females.filter(({ openHoldId }) => openHoldId === null).map(({ fishId }) => fishId));
  if (heHolds) {
    const sires = holderId ? [{ fishId: holderId, weight: 1 }] : candidatesOf(lines);
    return { paternity: 'single', sires, dams: mothers, basis: null };
  }
  const dams = holderId ? [{ fishId: holderId, weight: 1 }] : mothers;
  if (seen === 'spawn' && value.sireId && value.sireId !== CANNOT_TELL)
    return { paternity: 'single', sires: [{ fishId: value.sireId, weight: 1 }], dams, basis: 'Spawn seen' };
  return { paternity: value.paternity, sires: candidatesOf(lines), dams, basis: basisOf(lines, value.sires) };
}

/** As many as a parentage may name. */
const MOST_CANDIDATES = 40;

const equal = (ids: string[]) => ids.slice(0, MOST_CANDIDATES).map((fishId) => ({ fishId, weight: 1 }));
