import type { SpeciesProfile } from '../species/profile';
import { profilesIn } from '../species/profilesIn';
import type { UnitChoices } from '../units';
import type { Finding } from '../water/finding';
import { waterFindings } from '../water/waterFindings';
import { decided, type Settled } from './decided';
import { orderDues, ownDues, requestDues } from './deskDues';
import type { Due } from './due';
import type { TankToday, TodayFacts } from './facts';
import { type HoldToday, holdsToday } from './holdsToday';
import { batchDues, careDues, holdDues, isRunning, tankDues } from './stockDues';

export type Trouble = { tank: TankToday; finding: Finding; at: string };

export type Today = {
  holds: HoldToday[];
  /** Outside a range, loudest first; `look` findings come after every `act`. */
  troubles: Trouble[];
  due: Due[];
  /** Due in the days to come, for the calendar. */
  ahead: Due[];
  /** Done or skipped, the last first. */
  settled: Settled[];
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
  const holds = holdsToday(facts, profiles);
  const { open, settled } = decided(
    [
      ...holdDues(holds, facts),
      ...batchDues(facts, profiles),
      ...tankDues(facts),
      ...careDues(facts),
      ...orderDues(facts),
      ...requestDues(facts),
      ...ownDues(facts),
    ],
    facts,
  );
  return {
    holds,
    settled: settled.sort((a, b) => (a.decision.doneAt < b.decision.doneAt ? 1 : -1)),
    troubles: troublesOf(facts, profiles, choices),
    due: open.filter(({ lateDays }) => lateDays >= 0).sort(byLateness),
    ahead: open.filter(({ lateDays }) => lateDays < 0 && lateDays >= -AHEAD_DAYS).sort(byLateness),
    treatments: facts.care.filter((care) => isRunning(care, facts.today)),
    leaving: facts.orders.filter(({ time }) => time?.slice(0, 10) === facts.today),
    short: facts.orders.filter(({ short }) => short > 0),
    failedLetters: facts.failedLetters,
  };
}

const byLateness = (a: Due, b: Due) => b.lateDays - a.lateDays || (a.code < b.code ? -1 : 1);

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
