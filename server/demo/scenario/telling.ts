import { addDays } from '../../../shared/days';
import { between, chanceOf } from '../drawings/chance';
import type { Ago, Entry, Happening, Key, Recorded } from './shape';

/** When in the day things are done: feeding rounds first, tests, then nets, then counting and measuring. Minutes after midnight. */
type Kind = Entry['kind'] | 'colony' | 'founders';
const MINUTE_OF: Partial<Record<Kind, number>> = {
  colony: 420,
  founders: 440,
  incident: 450,
  quarantineStarted: 470,
  treatmentStarted: 480,
  treatmentEnded: 485,
  waterTested: 500,
  seenWell: 530,
  spawnSeen: 545,
  holdingSeen: 550,
  holdCheck: 560,
  holdPlanned: 575,
  dominant: 590,
  sexSeen: 600,
  markSeen: 610,
  toldApart: 620,
  holdEnded: 660,
  broodFound: 665,
  stageCount: 690,
  headsOpened: 720,
  fishLeft: 740,
  headCounted: 780,
  headsLost: 810,
  headsCulled: 815,
  moved: 900,
  batchJoined: 930,
  batchSplit: 940,
  headLineReversed: 950,
  heldBack: 960,
  headsKept: 980,
  headsLeft: 1020,
  waterChanged: 1060,
  lengthSampled: 1090,
  photoTaken: 1110,
};

/** Kinds without an hour of their own. */
const ELSE_AT = 640;

/** Kinds that a helper does not record: what leaves the house and what is started. */
const NOT_BY_HELPER = new Set<string>([
  'headsLeft',
  'colony',
  'founders',
  'headLineReversed',
  'fishLeft',
  'treatmentStarted',
]);

const clock = (minute: number): string =>
  `${String(Math.floor(minute / 60)).padStart(2, '0')}:${String(minute % 60).padStart(2, '0')}`;

/** Who did it: mostly the keeper, the owner often, the helper in the afternoons. */
function handOf(kind: string, words: string): Key {
  const share = chanceOf(`${words} hand`)();
  if (share < 0.34) return 'account:nora';
  return share < 0.8 || NOT_BY_HELPER.has(kind) ? 'account:idris' : 'account:pim';
}

/** Writes a happening of the story into the fishroom's calendar. */
export function teller(today: string) {
  const day = (on: Ago): string => addDays(today, on);
  const when = (kind: Kind, on: Ago, words: string) => ({
    on: day(on),
    time: clock((MINUTE_OF[kind] ?? ELSE_AT) + Math.floor(between(chanceOf(`${words} ${on} minute`), 0, 9))),
    by: handOf(kind, `${words} ${on}`),
  });
  const entry = (on: Ago, words: string, content: Entry, more: Pick<Recorded, 'picture' | 'order'> = {}): Recorded => ({
    ...when(content.kind, on, words),
    what: 'entry',
    entry: content,
    ...more,
  });
  return { today, day, when, entry };
}
export type Teller = ReturnType<typeof teller>;

/** In order of day and time; what was told first goes first within a minute. */
export const inOrder = (happenings: Happening[]): Happening[] =>
  happenings
    .map((happening, i) => ({ happening, i }))
    .sort((a, b) => key(a.happening).localeCompare(key(b.happening)) || a.i - b.i)
    .map(({ happening }) => happening);

const key = ({ on, time }: Happening): string => `${on} ${time}`;
