import { stageOf } from '../broods/stage';
import { addDays, type Day, daysBetween, formatShortDay } from '../days';
import { careClock, careProfileOf } from '../holds/careProfile';
import type { Clock } from '../holds/clock';
import { clockState } from '../holds/clockWords';
import type { HoldRow } from '../holds/contract';
import { learnHoldProfile } from '../holds/learnHoldProfile';
import { adultMm } from '../species/adultSize';
import type { SpeciesProfile } from '../species/profile';
import { profilesIn } from '../species/profilesIn';
import type { UnitChoices } from '../units';
import type { Finding } from '../water/finding';
import { waterFindings } from '../water/waterFindings';
import type { TankToday, TaskRow, TodayFacts } from './facts';
import { SAMPLE_SIZE } from './intervals';

export type HoldToday = { hold: HoldRow; clock: Clock | null; basedOn: number; checkDue: boolean; nextOn: Day };

/** Something that is due. `key` names it for decisions; `lateDays` is below zero while it is still ahead. */
export type Due = {
  key: string;
  kind: DueKind;
  thing: 'hold' | 'batch' | 'tank' | 'brood' | 'task' | 'order';
  id: string;
  code: string;
  dueOn: Day;
  lateDays: number;
  /** When it was last done; null: never. */
  lastOn: Day | null;
  heads: number | null;
  tankCode: string | null;
  /** Fish to measure, percentage to change, or the task's words. */
  amount: number | null;
  title: string | null;
  assignedTo: TaskRow['assignedTo'];
};

export type DueKind =
  | 'holdCheck'
  | 'stripWindow'
  | 'release'
  | 'stageCount'
  | 'headCount'
  | 'lengthSample'
  | 'waterTest'
  | 'waterChange'
  | 'treatmentEnd'
  | 'quarantineEnd'
  | 'reservationEnds'
  | 'answer'
  | 'own';

export type Trouble = { tank: TankToday; finding: Finding; at: string };

export type Today = {
  holds: HoldToday[];
  /** Outside a range, loudest first; `look` findings come after every `act`. */
  troubles: Trouble[];
  due: Due[];
  /** Due in the days to come, for the calendar. */
  ahead: Due[];
  treatments: TodayFacts['care'];
  leaving: TodayFacts['orders'];
  short: TodayFacts['orders'];
  failedLetters: number;
};

/** Shown from this many days before. */
const AHEAD_DAYS = 60;

/**
 * What needs doing today, worked out from the facts and nothing else: the screen, the daily letter and the calendar feed all
 * show this. Holds come by their next date, due things by how late they are.
 */
export function todayOf(facts: TodayFacts, choices: UnitChoices): Today {
  const profiles = profilesIn(facts.species);
  const holds = facts.holds.map((hold) => holdToday(hold, facts, profiles)).sort(byNext);
  const all = decided(
    [
      ...holdDues(holds, facts),
      ...batchDues(facts, profiles),
      ...tankDues(facts),
      ...careDues(facts),
      ...orderDues(facts),
      ...ownTasks(facts),
    ],
    facts,
  );
  return {
    holds,
    troubles: troublesOf(facts, profiles, choices),
    due: all
      .filter(({ lateDays }) => lateDays >= 0)
      .sort((a, b) => b.lateDays - a.lateDays || (a.code < b.code ? -1 : 1)),
    ahead: all
      .filter(({ lateDays }) => lateDays < 0 && lateDays >= -AHEAD_DAYS)
      .sort((a, b) => b.lateDays - a.lateDays),
    treatments: facts.care.filter((care) => isRunning(care, facts.today)),
    leaving: facts.orders.filter(({ time }) => time?.slice(0, 10) === facts.today),
    short: facts.orders.filter(({ short }) => short > 0),
    failedLetters: facts.failedLetters,
  };
}

function holdToday(hold: HoldRow, { today, intervals }: TodayFacts, profiles: Map<string, SpeciesProfile>): HoldToday {
  const profile = profiles.get(hold.clock.speciesId ?? '');
  const care = profile ? careProfileOf(profile) : null;
  const learned = care ? learnHoldProfile(care, hold.clock.finished) : null;
  const clock = learned ? careClock(hold, learned, hold.clock.temperatures, today) : null;
  const looked = hold.checkedOn.at(-1) ?? hold.firstSeenOn;
  return {
    hold,
    clock,
    basedOn: learned?.basedOn ?? 0,
    checkDue: daysBetween(looked, today) >= intervals.holdCheck,
    nextOn: nextDate(hold, clock, today),
  };
}

/** The date that decides where a hold stands in the list: the end of what is open now, or the start of what comes next. */
function nextDate(hold: HoldRow, clock: Clock | null, today: Day): Day {
  if (!clock) return addDays(hold.spawnLatest, 400);
  switch (clockState(clock, hold.plan)) {
    case 'strip':
      return clock.stripTo ?? today;
    case 'early':
      return (hold.plan === 'strip' ? clock.stripFrom : clock.handOverFrom) ?? clock.releaseEarliest;
    case 'handOver':
      return clock.handOverTo ?? today;
    case 'release':
    case 'late':
      return clock.releaseLatest;
    default:
      return clock.releaseEarliest;
  }
}

const byNext = (a: HoldToday, b: HoldToday) =>
  a.nextOn === b.nextOn ? (a.hold.id < b.hold.id ? -1 : 1) : a.nextOn < b.nextOn ? -1 : 1;

function holdDues(holds: HoldToday[], { intervals, today }: TodayFacts): Due[] {
  return holds.flatMap(({ hold, clock }) => {
    const base = {
      thing: 'hold' as const,
      id: hold.id,
      code: hold.holder?.code ?? hold.colony?.code ?? hold.tank.code,
      heads: null,
      tankCode: hold.tank.code,
      amount: null,
      title: null,
      assignedTo: null,
    };
    const looked = hold.checkedOn.at(-1) ?? hold.firstSeenOn;
    const dues = [
      due({ ...base, kind: 'holdCheck', dueOn: addDays(looked, intervals.holdCheck), lastOn: looked }, today),
    ];
    if (clock?.stripFrom && clock.stripTo && hold.plan === 'strip')
      dues.push(due({ ...base, kind: 'stripWindow', dueOn: clock.stripFrom, lastOn: null }, today));
    if (clock) dues.push(due({ ...base, kind: 'release', dueOn: clock.releaseOn, lastOn: null }, today));
    return dues;
  });
}

function batchDues({ batches, intervals, today }: TodayFacts, profiles: Map<string, SpeciesProfile>): Due[] {
  return batches.flatMap((batch) => {
    const { openedOn, countedOn, sampledOn, stageCountedOn, startedOn, balance, spawnLatest, meanTenthsMm, tank } =
      batch;
    const base = {
      thing: 'batch' as const,
      id: batch.id,
      code: batch.codes.join(' + '),
      heads: balance,
      tankCode: tank?.code ?? null,
      title: null,
      assignedTo: null,
    };
    if (openedOn === null) {
      const lastOn = stageCountedOn ?? startedOn;
      return [
        due({ ...base, kind: 'stageCount', dueOn: addDays(lastOn, intervals.stageCheck), lastOn, amount: null }, today),
      ];
    }
    if (balance === 0) return [];
    const profile = profiles.get(batch.speciesId ?? '');
    const stage = stageOf({
      spawnLatest,
      openedOn,
      meanMm: meanTenthsMm === null ? null : meanTenthsMm / 10,
      adultMm: profile ? adultMm(profile, null) : null,
      today,
    });
    const known = stage === 'egg' || stage === 'wriggler' ? 'fry' : stage;
    const counted = countedOn ?? openedOn;
    return [
      due(
        {
          ...base,
          kind: 'headCount',
          dueOn: addDays(counted, intervals.headCount[known]),
          lastOn: counted,
          amount: null,
        },
        today,
      ),
      due(
        {
          ...base,
          kind: 'lengthSample',
          dueOn: addDays(sampledOn ?? openedOn, intervals.lengthSample[known]),
          lastOn: sampledOn,
          amount: Math.min(SAMPLE_SIZE, balance),
        },
        today,
      ),
    ];
  });
}

function tankDues({ tanks, intervals, today }: TodayFacts): Due[] {
  return tanks.flatMap((tank) => {
    if (tank.stockedSince === null) return [];
    const base = {
      thing: 'tank' as const,
      id: tank.id,
      code: tank.code,
      heads: null,
      tankCode: tank.code,
      title: null,
      assignedTo: null,
    };
    return [
      due(
        {
          ...base,
          kind: 'waterTest',
          dueOn: addDays(tank.testedOn ?? tank.stockedSince, intervals.waterTest),
          lastOn: tank.testedOn,
          amount: null,
        },
        today,
      ),
      due(
        {
          ...base,
          kind: 'waterChange',
          dueOn: addDays(tank.changedOn ?? tank.stockedSince, intervals.waterChange),
          lastOn: tank.changedOn,
          amount: tank.changedPercent,
        },
        today,
      ),
    ];
  });
}

const isRunning = ({ kind, ended, untilDay }: TodayFacts['care'][number], today: Day): boolean =>
  (kind === 'treatment' || kind === 'quarantine') && !ended && (untilDay === null || untilDay >= today);

function careDues({ care, tanks, today }: TodayFacts): Due[] {
  return care.flatMap(({ id, kind, ended, untilDay, tankId, what, onDay }) => {
    if ((kind !== 'treatment' && kind !== 'quarantine') || ended || untilDay === null) return [];
    const code = tanks.find((tank) => tank.id === tankId)?.code ?? '?';
    return [
      due(
        {
          thing: 'tank',
          id: tankId,
          kind: kind === 'treatment' ? 'treatmentEnd' : 'quarantineEnd',
          code,
          dueOn: untilDay,
          lastOn: onDay,
          heads: null,
          tankCode: code,
          amount: null,
          title: what,
          assignedTo: null,
          subject: id,
        },
        today,
      ),
    ];
  });
}

/** Whoever waits for an answer; and a word to the buyer before the fish are free again. */
function orderDues({ orders, intervals, today }: TodayFacts): Due[] {
  return orders.flatMap(({ id, number, reservedUntil, waitsSince, what }) => {
    const facts = { heads: null, tankCode: null, amount: null, assignedTo: null, lastOn: null };
    const order = { ...facts, thing: 'order' as const, id, code: String(number) };
    const dues = waitsSince ? [due({ ...order, kind: 'answer', dueOn: waitsSince, title: what }, today)] : [];
    if (reservedUntil === null) return dues;
    const until = reservedUntil.slice(0, 10);
    const title = `Held until ${formatShortDay(until)}`;
    const dueOn = addDays(until, -intervals.reservationEnds);
    return [...dues, due({ ...order, kind: 'reservationEnds', dueOn, title }, today)];
  });
}

function ownTasks({ tasks, today }: TodayFacts): Due[] {
  return tasks.flatMap(({ id, taskKey, title, dueOn, doneAt, assignedTo }) =>
    taskKey === 'own' && dueOn && doneAt === null
      ? [
          due(
            {
              thing: 'task',
              id,
              kind: 'own',
              code: '',
              dueOn,
              lastOn: null,
              heads: null,
              tankCode: null,
              amount: null,
              title,
              assignedTo,
            },
            today,
          ),
        ]
      : [],
  );
}

/** A key names the occasion, not only the thing: what was done for one date does not hide the next. */
const due = ({ subject, ...facts }: Omit<Due, 'key' | 'lateDays'> & { subject?: string }, today: Day): Due => ({
  ...facts,
  key: `${facts.kind}:${subject ?? facts.id}:${facts.dueOn}`,
  lateDays: daysBetween(facts.dueOn, today),
});

/** What was decided about each: done and skipped ones go, put-off ones wait until their day. */
function decided(dues: Due[], { tasks, today }: TodayFacts): Due[] {
  const byKey = new Map(tasks.map((task) => [task.taskKey === 'own' ? `own:${task.id}` : task.taskKey, task]));
  return dues.flatMap((one) => {
    const decision = byKey.get(one.kind === 'own' ? `own:${one.id}` : one.key);
    if (!decision) return [one];
    if (decision.doneAt !== null || decision.skippedBecause !== null) return [];
    const dueOn = decision.snoozedUntil && decision.snoozedUntil > one.dueOn ? decision.snoozedUntil : one.dueOn;
    return [{ ...one, dueOn, lateDays: daysBetween(dueOn, today), assignedTo: decision.assignedTo }];
  });
}

function troublesOf({ tanks }: TodayFacts, profiles: Map<string, SpeciesProfile>, choices: UnitChoices): Trouble[] {
  const all = tanks.flatMap((tank): Trouble[] => {
    if (!tank.latest || tank.stockedSince === null) return [];
    const species = tank.speciesIds.flatMap((id) => profiles.get(id) ?? []);
    return waterFindings(tank.latest, species, choices).map((finding) => ({
      tank,
      finding,
      at: tank.latest?.at ?? '',
    }));
  });
  return all.sort(
    (a, b) =>
      Number(b.finding.level === 'act') - Number(a.finding.level === 'act') || (a.tank.code < b.tank.code ? -1 : 1),
  );
}
