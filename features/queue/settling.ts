import { type Day, formatShortDay } from '@/shared/days';
import { HoldClash } from '@/shared/holds/contract';
import { type HoldFacts, OUTCOME_WORDS } from '@/shared/holds/entries';
import { EntryLine } from '@/shared/record/contract';
import type { ContentOf, EntryContent } from '@/shared/record/kinds';
import type { Settlement } from './changing';
import type { Waiting } from './waiting';

/** Both ways out of a conflict. Whichever is right, the other stays in the history; `yours` null: only a keeper may. */
export type Choices = { theirs: Choice; yours: Choice | null };
type Choice = Settlement & {
  /** The other's record, taken back on the server before. */
  undoFirst?: string;
};

type Conflicted = Pick<Waiting, 'content' | 'trouble'>;

/** Someone else's record of the same hold. */
export const holdClashIn = ({ trouble }: Conflicted): HoldClash | null =>
  trouble?.reason === 'conflict' ? (HoldClash.safeParse(trouble.current).data ?? null) : null;

/** The record as it went up before it was changed here. */
export const firstLineIn = ({ trouble }: Conflicted): EntryLine | null =>
  trouble?.reason === 'conflict' ? (EntryLine.safeParse(trouble.current).data ?? null) : null;

type Begins = ContentOf<'holdingSeen'> | ContentOf<'spawnSeen'>;
type OfHold = ContentOf<'holdEnded'> | ContentOf<'holdCorrected'> | ContentOf<'holdPlanned'> | ContentOf<'holdCheck'>;

const begins = (content: EntryContent): content is Begins =>
  content.kind === 'holdingSeen' || content.kind === 'spawnSeen';
const isOfHold = (content: EntryContent): content is OfHold =>
  ['holdEnded', 'holdCorrected', 'holdPlanned', 'holdCheck'].includes(content.kind);

export const canSettle = (entry: Conflicted): boolean =>
  firstLineIn(entry) !== null || (holdClashIn(entry) !== null && (begins(entry.content) || isOfHold(entry.content)));

type Known = {
  today: Day;
  mayCorrect: boolean;
  /** The tank's part of the brood that the other record started, for what builds on one's own. */
  theirBatchId: string | null;
  newId: string;
};

export function choicesOf(entry: Waiting, known: Known): Choices | null {
  const { content } = entry;
  const first = firstLineIn(entry);
  if (first) return sameNumber(entry, first, known);
  const clash = holdClashIn(entry);
  if (!clash) return null;
  if (begins(content)) return oneMouth(content, clash, known);
  return isOfHold(content) ? oneHold(content, clash, known) : null;
}

/** Changed here after it had gone up: either it stays as it was, or it is undone there and sent anew. */
function sameNumber({ content }: Waiting, first: EntryLine, { newId }: Known): Choices {
  const ids = new Map<string, string>();
  return { theirs: { content: null, ids }, yours: { content, ids, newId, undoFirst: first.id } };
}

/** Two people recorded one mouth: mine goes on as a check on theirs, or theirs is corrected to mine. */
function oneMouth(mine: Begins, { hold }: HoldClash, { today, mayCorrect }: Known): Choices {
  const ids = new Map([[mine.holdId, hold.id]]);
  const onDay = [firstSeenIn(mine), hold.spawnEarliest].sort().at(-1) ?? today;
  const note = [saidIn(mine), mine.note].filter(Boolean).join(' ');
  if (hold.endedOn) return { theirs: { ids, content: checkOf(hold.id, hold.endedOn, 'unsure', note) }, yours: null };
  const was = factsOf(hold);
  const now = { ...spawnIn(mine), holderId: was.holderId };
  const corrected: ContentOf<'holdCorrected'> = {
    kind: 'holdCorrected',
    holdId: hold.id,
    onDay: today,
    was,
    now,
    parentage: mine.parentage,
    note: mine.note,
  };
  return {
    theirs: { ids, content: checkOf(hold.id, onDay, 'holding', note) },
    yours: mayCorrect ? { ids, content: corrected } : null,
  };
}

/** Two people ended, corrected or planned one hold. */
function oneHold(mine: OfHold, { hold, entryId }: HoldClash, { mayCorrect, theirBatchId }: Known): Choices {
  const ids = new Map<string, string>();
  const onDay = hold.endedOn && mine.onDay > hold.endedOn ? hold.endedOn : mine.onDay;
  const more = mine.kind !== 'holdPlanned' && mine.note ? `. ${mine.note}` : '';
  const asNote = checkOf(hold.id, onDay, 'unsure', `I recorded: ${wordsOf(mine)}${more}`);
  if (mine.kind === 'holdCorrected' && !hold.endedOn) {
    const again = { ...mine, was: factsOf(hold) };
    return { theirs: { ids, content: asNote }, yours: mayCorrect ? { ids, content: again } : null };
  }
  const undone = entryId && mayCorrect ? { ids, content: mine, undoFirst: entryId } : null;
  if (mine.kind !== 'holdEnded' || !mine.brood || !hold.brood)
    return { theirs: { ids, content: asNote }, yours: undone };
  const theirs = new Map([[mine.brood.broodId, hold.brood.id]]);
  if (theirBatchId) theirs.set(mine.brood.batchId, theirBatchId);
  const { numbers } = mine.brood;
  const counted = Object.values(numbers).some((number) => number !== null);
  const count: ContentOf<'stageCount'> = {
    kind: 'stageCount',
    broodId: hold.brood.id,
    onDay: mine.onDay,
    numbers,
    note: mine.note,
  };
  return { theirs: { ids: theirs, content: counted ? count : asNote }, yours: undone };
}

type Check = ContentOf<'holdCheck'>;

const checkOf = (holdId: string, onDay: Day, seen: Check['seen'], note: string): Check => ({
  kind: 'holdCheck',
  holdId,
  onDay,
  seen,
  note: note.slice(0, 4000),
});

const firstSeenIn = (mine: Begins): Day => (mine.kind === 'spawnSeen' ? mine.onDay : mine.firstSeenOn);

/** The spawn as one's own record tells it. */
export const spawnIn = (mine: Begins) =>
  mine.kind === 'spawnSeen'
    ? { spawnSeen: true, spawnEarliest: mine.onDay, spawnLatest: mine.onDay, firstSeenOn: mine.onDay }
    : {
        spawnSeen: false,
        spawnEarliest: mine.spawnEarliest,
        spawnLatest: mine.spawnLatest,
        firstSeenOn: mine.firstSeenOn,
      };

/** Of a record that begins a hold: what stands beside the other's. */
export const beginningIn = (content: EntryContent): Begins | null => (begins(content) ? content : null);

const saidIn = (mine: Begins): string =>
  mine.kind === 'spawnSeen'
    ? `Spawn seen ${formatShortDay(mine.onDay)} by me.`
    : `I saw her not holding ${formatShortDay(mine.spawnEarliest)}, holding ${formatShortDay(mine.firstSeenOn)}.`;

const factsOf = ({ holder, spawnSeen, spawnEarliest, spawnLatest, firstSeenOn }: HoldClash['hold']): HoldFacts => ({
  holderId: holder?.id ?? null,
  spawnSeen,
  spawnEarliest,
  spawnLatest,
  firstSeenOn,
});

/** "stripped 12 May", in a note. */
export function wordsOf(mine: OfHold): string {
  const day = formatShortDay(mine.onDay);
  switch (mine.kind) {
    case 'holdEnded':
      return `${OUTCOME_WORDS[mine.outcome].toLowerCase()} ${day}`;
    case 'holdPlanned':
      return mine.plan === 'strip' ? `plan to strip, ${day}` : `plan to leave her, ${day}`;
    case 'holdCorrected':
      return `spawn ${formatShortDay(mine.now.spawnEarliest)} to ${formatShortDay(mine.now.spawnLatest)}`;
    case 'holdCheck':
      return `check ${day}`;
  }
}
