import type { Day } from '../days';
import { profileSeen } from '../species/profilesIn';
import { careClock, careProfileOf } from './careProfile';
import type { Clock, SpawnInterval } from './clock';
import type { ClockFacts } from './contract';
import { learnHoldProfile } from './learnHoldProfile';

/**
 * The clock of a hold out of the facts that travel with it, as it stood on a day (for a hold that has ended, the day it
 * ended). `basedOn` is the number of the fishroom's own holds that were learned from. Null where nothing is known of how long
 * the species holds, or the day lies before the spawn.
 */
export function clockOf(facts: ClockFacts, spawn: SpawnInterval, on: Day): { clock: Clock; basedOn: number } | null {
  const { speciesId, about, overrides, finished, temperatures } = facts;
  if (speciesId === null || on < spawn.spawnEarliest || spawn.spawnLatest < spawn.spawnEarliest) return null;
  const profile = profileSeen({ id: speciesId, name: '', about, overrides });
  const care = profile ? careProfileOf(profile) : null;
  if (!care) return null;
  const learned = learnHoldProfile(care, finished);
  const { spawnEarliest, spawnLatest } = spawn;
  return { clock: careClock({ spawnEarliest, spawnLatest }, learned, temperatures, on), basedOn: learned.basedOn };
}
