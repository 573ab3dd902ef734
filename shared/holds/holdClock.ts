import { BadValue, finite } from '../badValue';
import type { Day } from '../days';
import { type Clock, type Landmarks, runClock, type SpawnInterval } from './clock';
import type { TemperatureReading } from './waterTemperature';

/**
 * How a species holds: `days` from the spawn to release at `atC` °C, with the Q10 of the rate; the strip window as shares
 * of the way to release; release is spread by `spreadDays` either side. Shares for hatching and free-swimming may be given.
 */
export type HoldProfile = {
  days: number;
  atC: number;
  q10: number;
  stripFrom: number;
  stripTo: number;
  spreadDays: number;
  hatchShare?: number;
  swimShare?: number;
};

/** A clock of a hold that may be stripped. */
export type HoldClock = Clock & { stripFrom: Day; stripTo: Day };

/** Usual shares of the hold, assumed from haplochromines. */
const HATCH_SHARE = 0.28;
const SWIM_SHARE = 0.85;

/**
 * Where a hold is today. Development advances each day by 1 / D(T), with D(T) = days Q10^((atC - T) / 10), added up over
 * the tank's recorded temperatures (°C; the profile's where none are recorded; 22 to 30 °C at most, beyond which the rate
 * is not known and `temperature.beyondTrust` says so). Days are civil dates and the day of the spawn is day 1. When the spawn
 * was not seen, dates count from the middle of the interval, and the release range covers all of it.
 * Rate summation: degree-day form after Rana 1990 (onset of feeding in Oreochromis niloticus at 24, 28 and 30 °C; Q10 3.2).
 * Throws `BadValue` for dates the wrong way round, shares outside 0 to 1, or figures that are not numbers.
 */
export function holdClock(
  hold: SpawnInterval,
  profile: HoldProfile,
  temperatures: TemperatureReading[],
  today: Day,
): HoldClock {
  const clock = runClock(hold, profile, landmarksOf(profile), temperatures, today);
  const { stripFrom, stripTo } = clock;
  if (stripFrom === null || stripTo === null) throw new BadValue('Strip window', null, 'is needed');
  return { ...clock, stripFrom, stripTo };
}

export function landmarksOf(profile: HoldProfile): Landmarks {
  const { stripFrom, stripTo, spreadDays, hatchShare = HATCH_SHARE, swimShare = SWIM_SHARE } = profile;
  finite('Start of the strip window', stripFrom, { min: 0, max: 1 });
  finite('End of the strip window', stripTo, { min: stripFrom, max: 1.5 });
  finite('Share of the hold to hatching', hatchShare, { min: 0, max: 1 });
  finite('Share of the hold to swimming free', swimShare, { min: hatchShare, max: 1 });
  return { kind: 'strips', spreadDays, hatchShare, swimShare, strip: [stripFrom, stripTo], handOver: null };
}
