import { finite } from '../badValue';
import { daysAt, type Pace } from './development';
import { mean } from './waterTemperature';

/** The species' figure counts as much as this many finished holds of the fishroom's own. */
const SPECIES_COUNTS_AS = 3;

/** A hold that ended in release: days from the spawn, and the mean temperature over them in °C. */
export type FinishedHold = { days: number; meanC: number };

/**
 * The holding time that a fishroom's own released holds speak for. Each is brought to the profile's temperature by its Q10;
 * their mean and the species' value are weighed n to 3, and so is the spread, taken as two standard deviations. Strip
 * shares and Q10 stay. `basedOn` is the number of holds; none leaves the profile as it was. Stripped or lost holds say
 * nothing about release and must not be passed. A shrinkage mean (James & Stein 1961) with a fixed prior weight.
 * Throws `BadValue` for days or temperatures that cannot be.
 */
export function learnHoldProfile<P extends Pace & { spreadDays: number }>(
  profile: P,
  finished: FinishedHold[],
): P & { basedOn: number } {
  const n = finished.length;
  if (n === 0) return { ...profile, basedOn: 0 };
  const own = finished.map(({ days, meanC }) => {
    finite('Days of a finished hold', days, { above: 0, max: 400 });
    finite('Mean temperature of a finished hold', meanC, { min: 0, max: 45 });
    return daysAt({ days, atC: meanC, q10: profile.q10 }, profile.atC);
  });
  const days = (SPECIES_COUNTS_AS * profile.days + n * mean(own)) / (SPECIES_COUNTS_AS + n);
  const priorVariance = (profile.spreadDays / 2) ** 2;
  const ownSquares = own.reduce((sum, value) => sum + (value - days) ** 2, 0);
  const variance = (SPECIES_COUNTS_AS * priorVariance + ownSquares) / (SPECIES_COUNTS_AS + n);
  return { ...profile, days, spreadDays: Math.max(1, 2 * Math.sqrt(variance)), basedOn: n };
}
