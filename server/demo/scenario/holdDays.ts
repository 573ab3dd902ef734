import { addDays, daysBetween } from '../../../shared/days';
import { careClock, careProfileOf } from '../../../shared/holds/careProfile';
import type { Clock } from '../../../shared/holds/clock';
import { profileOf } from '../../../shared/species/library';
import { firstDayOf, type HoldStory, lastDayOf } from './broods';
import { COLONIES } from './colonies';
import { tankOfColony } from './lives';
import type { Ago } from './shape';
import { strainOfColony } from './stories';
import { STRAINS } from './strains';
import { celsiusRead, testDays } from './temperatures';

/** Colony tanks are tested every other week for as long as a colony lives in them. */
export const COLONY_ROUND = 14;

export function colonyDays(tank: string): [Ago, Ago][] {
  return COLONIES.flatMap(({ homes }) =>
    homes.flatMap(({ on, tank: home }, i): [Ago, Ago][] => (home === tank ? [[on, homes[i + 1]?.on ?? -1]] : [])),
  );
}

/** The clock of a hold over the temperatures read in its tank. */
function clockOf(today: string, { colony, spawn }: Pick<HoldStory, 'colony' | 'spawn'>): Clock {
  const tank = tankOfColony(colony, lastDayOf(spawn)) ?? '';
  const [from, to] = [firstDayOf(spawn) - 14, firstDayOf(spawn) + 70];
  const temperatures = testDays(tank, colonyDays(tank), COLONY_ROUND)
    .filter((on) => on >= from && on <= to)
    .map((on) => ({ on: addDays(today, on), celsius: celsiusRead(tank, on) }));
  const care = careProfileOf(profileOf(STRAINS[strainOfColony(colony)].speciesId));
  if (!care) throw new Error(`No clock for ${colony}`);
  const days = { spawnEarliest: addDays(today, firstDayOf(spawn)), spawnLatest: addDays(today, lastDayOf(spawn)) };
  return careClock(days, care, temperatures, days.spawnLatest);
}

/** The day a hold ended; null while it is open. */
export function endOf(today: string, hold: HoldStory): Ago | null {
  const { end, spawn } = hold;
  if (!end) return null;
  if ('age' in end) return lastDayOf(spawn) + end.age;
  const clock = clockOf(today, hold);
  const base = end.how === 'stripped' ? (clock.stripFrom ?? clock.releaseOn) : clock.releaseOn;
  return daysBetween(today, base) + end.after;
}
