import type { Day } from '../days';
import type { SpeciesProfile } from '../species/profile';
import { type Clock, type Landmarks, runClock, type SpawnInterval } from './clock';
import type { Pace } from './development';
import { type HoldProfile, landmarksOf } from './holdClock';
import type { TemperatureReading } from './waterTemperature';

/** What a species' profile says about its clock. Only `strips` has a strip window; the others never suggest one. */
export type CareProfile =
  | ({ kind: 'strips' } & HoldProfile)
  | (Pace & Omit<Landmarks, 'kind' | 'strip'> & { kind: 'holds' | 'handsOver' | 'guards' });

/**
 * The clock's figures out of a species profile: who carries the young, for how long, at what temperature. Days of the strip
 * window are day numbers with the spawn on day 1. Null when the profile does not know how long the species holds.
 */
export function careProfileOf(profile: SpeciesProfile): CareProfile | null {
  const pace = { atC: profile.holdAtC.value, q10: profile.q10.value };
  const swim = profile.freeSwimmingDay.value;
  const hatch = profile.hatchDay.value;
  if (profile.mode === 'substrateSpawner') {
    return {
      kind: 'guards',
      ...pace,
      days: swim,
      spreadDays: 2,
      hatchShare: hatch / swim,
      swimShare: 1,
      handOver: null,
    };
  }
  const days = profile.holdDays?.value;
  if (days === undefined) return null;
  const [low, high] = profile.holdDaysRange?.value ?? [days, days];
  const swimShare = Math.min(1, swim / days);
  const shares = { ...pace, days, spreadDays: Math.max(1, (high - low) / 2), swimShare };
  const hatchShare = Math.min(swimShare, hatch / days);
  if (profile.mode === 'biparentalMouthbrooder') {
    return { kind: 'handsOver', ...shares, hatchShare, handOver: [HAND_OVER[0] / 22, HAND_OVER[1] / 22] };
  }
  const strip = profile.mode === 'maternalMouthbrooder' ? profile.stripDays?.value : undefined;
  if (!strip) return { kind: 'holds', ...shares, hatchShare, handOver: null };
  const [stripFrom, stripTo] = [shareOn(strip[0], days), shareOn(strip[1], days)];
  return { kind: 'strips', ...shares, hatchShare, stripFrom, stripTo };
}

/** A day number of the hold as a share of the way; never past release, whatever a fishroom has set. */
const shareOn = (day: number, days: number) => Math.min(1, Math.max(0, day - 1) / days);

/** Days 10 to 12 of a hold of 22, measured in Eretmodus cyanostictus (Grueter & Taborsky 2004). */
const HAND_OVER = [10, 12] as const;

/** The clock of any brood, held or guarded; `holdClock` for those that may be stripped. Throws `BadValue` as it does. */
export function careClock(
  spawn: SpawnInterval,
  care: CareProfile,
  temperatures: TemperatureReading[],
  today: Day,
): Clock {
  const marks = care.kind === 'strips' ? landmarksOf(care) : { ...care, strip: null };
  return runClock(spawn, care, marks, temperatures, today);
}
