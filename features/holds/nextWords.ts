import type { Clock } from '@/shared/holds/clock';
import { clockState, nextInClock, spawnDoubt } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';

/** What comes next for her, as a row says it; a check that is due, or a spawn that is in doubt, where nothing presses. */
export function nextWords(hold: HoldRow, clock: Clock, checkDue: boolean): string {
  const state = clockState(clock, hold.plan);
  if (checkDue && (state === 'early' || state === 'waiting')) return 'Check due';
  const doubt = spawnDoubt(clock);
  return doubt && clock.day <= 7 ? doubt : nextInClock(clock, hold.plan);
}

export const isPressing = (hold: HoldRow, clock: Clock | null): boolean =>
  clock !== null && ['strip', 'handOver', 'release', 'late'].includes(clockState(clock, hold.plan));
