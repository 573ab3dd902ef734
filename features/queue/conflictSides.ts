import type { Room } from '@/hooks/useRoom';
import { dayOf, dayWords } from '@/shared/days';
import type { HoldClash, HoldRow } from '@/shared/holds/contract';
import { OUTCOME_WORDS } from '@/shared/holds/entries';
import { detailOf, titleOf } from './saying';
import { beginningIn, firstLineIn, holdClashIn, spawnIn } from './settling';
import type { Waiting } from './waiting';

/** One of the two records, in words; of a hold's beginning also its days. */
export type Side = {
  title: string;
  aside: string | null;
  lines: string[];
  spawn: {
    spawn: { spawnSeen: boolean; spawnEarliest: string; spawnLatest: string };
    sires: string[];
    hold: HoldRow;
  } | null;
  /** The button that chooses it. */
  keep: string;
};

type Around = { room: Pick<Room, 'today' | 'timeZone'>; codeOf: (id: string) => string | null };

export function sidesOf(entry: Waiting, around: Around): { theirs: Side; yours: Side; words: string } {
  const clash = holdClashIn(entry);
  const first = firstLineIn(entry);
  if (clash) return holdSides(entry, clash, around);
  const yours = sideOfMine(entry, around);
  const theirs: Side = {
    title: 'As it went up first',
    aside: first ? dayWords(first.onDay, around.room.today) : null,
    lines: [first?.said ?? entry.trouble?.message ?? ''],
    spawn: null,
    keep: 'Keep it as it went up',
  };
  const words = 'It had gone up before you changed it. Which is right? The other stays in the history.';
  return { theirs, yours: { ...yours, keep: 'Undo that, keep the change' }, words };
}

function sideOfMine({ content, madeAt }: Waiting, { room }: Around): Side {
  return {
    title: 'Yours',
    aside: dayWords(dayOf(Date.parse(madeAt), room.timeZone), room.today),
    lines: [[titleOf(content), detailOf(content, null, room.today)].filter(Boolean).join(', ')],
    spawn: null,
    keep: '',
  };
}

function holdSides(entry: Waiting, { hold, by, madeAt, sires }: HoldClash, around: Around) {
  const { room, codeOf } = around;
  const who = by ?? 'The import';
  const nameOf = (fishId: string | null) => (fishId ? (codeOf(fishId) ?? '?') : 'not known');
  const mine = beginningIn(entry.content);
  const yours = sideOfMine(entry, around);
  const ended = hold.outcome ? endWords(hold, room.today) : null;
  const theirs: Side = {
    title: who,
    aside: madeAt ? dayWords(dayOf(Date.parse(madeAt), room.timeZone), room.today) : null,
    lines: ended ? [ended] : [],
    spawn: mine ? { spawn: hold, sires: sires.map(({ fishId }) => nameOf(fishId)), hold } : null,
    keep: mine ? `Keep ${who}’s, yours as a check` : `Keep ${who}’s, yours as a note`,
  };
  const own: Side = {
    ...yours,
    lines: mine ? [] : yours.lines,
    spawn: mine
      ? { spawn: spawnIn(mine), sires: mine.parentage.sires.map(({ fishId }) => nameOf(fishId)), hold }
      : null,
    keep: mine || !ended ? `Correct ${who}’s hold to yours` : `Undo ${who}’s record, keep yours`,
  };
  const name = hold.holder?.code ?? `The hold in ${hold.tank.code}`;
  return { theirs, yours: own, words: `${name}: which record is right? Both stay in the history.` };
}

function endWords({ outcome, endedOn, brood }: HoldRow, today: string): string {
  const how = outcome ? OUTCOME_WORDS[outcome] : '';
  return [`${how}${endedOn ? ` ${dayWords(endedOn, today)}` : ''}`, brood ? `brood ${brood.code}` : '']
    .filter(Boolean)
    .join(', ');
}
