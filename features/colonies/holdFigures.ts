import type { BroodRow } from '@/shared/broods/contract';
import { type Day, daysBetween } from '@/shared/days';
import { clockOf } from '@/shared/holds/clockOf';
import type { HoldRow } from '@/shared/holds/contract';
import { OUTCOME_WORDS } from '@/shared/holds/entries';

const YEAR_DAYS = 365;

/** How a colony breeds: median of the fry of its counted broods, and broods a year over the time it has been recorded. */
export function breedingFigures(broods: readonly BroodRow[], startedOn: Day, today: Day) {
  const fry = broods.flatMap(({ opened }) => opened ?? []).sort((a, b) => a - b);
  const middle = Math.floor(fry.length / 2);
  const median = fry.length % 2 === 1 ? fry[middle] : ((fry[middle - 1] ?? 0) + (fry[middle] ?? 0)) / 2;
  // A colony of a few weeks has no yearly rate yet.
  const days = Math.min(daysBetween(startedOn, today), YEAR_DAYS);
  const recent = broods.filter((brood) => daysBetween(brood.startedOn, today) < days).length;
  return {
    fryABrood: fry.length > 0 ? Math.round(median ?? 0) : null,
    broodsAYear: days >= 90 ? Number(((recent * YEAR_DAYS) / days).toFixed(1)) : null,
  };
}

/** A female's holds as the timeline draws them; days by stage come from the hold's own clock. */
export function timelineRows(
  holds: readonly HoldRow[],
  members: readonly { id: string; code: string | null }[],
  today: Day,
) {
  const known = members.map(({ id, code }) => ({
    id,
    code: shortCode(code),
    own: holds.filter((one) => one.holder?.id === id),
  }));
  const unknown = holds.filter(({ holder }) => holder === null || !members.some(({ id }) => id === holder.id));
  const rows = unknown.length > 0 ? [...known, { id: 'unknown', code: '?', own: unknown }] : known;
  return rows.map(({ id, code, own }) => ({
    id,
    code,
    holds: own.map((hold) => {
      const to = hold.endedOn ?? today;
      const clock = clockOf(hold.clock, hold, to)?.clock;
      return {
        from: hold.spawnLatest,
        to,
        hatchOn: clock?.hatchOn ?? to,
        swimOn: clock?.freeSwimmingOn ?? to,
        failed: hold.outcome === 'swallowed' || hold.outcome === 'lost',
        end: hold.outcome ? OUTCOME_WORDS[hold.outcome] : 'Holding now',
      };
    }),
  }));
}

const shortCode = (code: string | null): string => code?.replace(/^.*?(\d+)$/, '$1') ?? '?';
