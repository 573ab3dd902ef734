import { finite } from '../badValue';
import { UNIONISED_LIMITS, unionisedAmmonia } from './ammonia';
import { NITRATE_LIMITS, NITRITE_LIMITS, type WaterTest } from './waterFindings';

/** The largest part of the water to change at once; more is done in steps. Common practice, no source. */
const MOST_AT_ONCE = 50;

export const WATER_CHANGE_CAUTION =
  'Unplug heater and pump before the water falls and before reaching in. Match temperature and pH, and treat tap water as its label says.';

/** One change of `percent`, or several equal ones a day apart; or why no change can do it. */
export type WaterChange = { percent: number; times: number; inOne: number } | { none: 'notNeeded' | 'tapTooHigh' };

/**
 * What part of the water to change so that a concentration falls to `target`, all three in the same unit: (c - target) /
 * (c - tap), rounded up to 5 %. Over 50 % it is split into equal changes a day apart, each over the mixed water. `inOne` is
 * the exact single change. Null answers are typed: it is there already, or the tap has as much as the target.
 * Dilution, exact as long as nothing is added meanwhile. Throws `BadValue` for negative values.
 */
export function waterChangeTo(target: number, from: { tank: number; tap: number }): WaterChange {
  const tank = finite('Concentration in the tank', from.tank, { min: 0 });
  const tap = finite('Concentration in the tap water', from.tap, { min: 0 });
  if (tank <= finite('Target', target, { min: 0 })) return { none: 'notNeeded' };
  if (tap >= target) return { none: 'tapTooHigh' };
  const left = (target - tap) / (tank - tap);
  const times = Math.ceil(Math.log(left) / Math.log(1 - MOST_AT_ONCE / 100) - 1e-9);
  const each = 100 * (1 - left ** (1 / times));
  return { percent: Math.min(MOST_AT_ONCE, roundUp(each)), times, inOne: 100 * (1 - left) };
}

const roundUp = (percent: number) => 5 * Math.ceil(percent / 5 - 1e-9);

export type TapWater = Pick<WaterTest, 'totalAmmoniaNMgL' | 'nitriteNMgL' | 'nitrateNMgL'>;

/**
 * The change that would bring each of ammonia, nitrite and nitrate back to where nothing is said of it; null where it was
 * not measured. A tap value that is null counts as none. Ammonia: to 0.02 mg/L un-ionised, if pH and temperature stay.
 */
export function waterChangesFor(
  test: WaterTest,
  tap: TapWater,
): Record<'ammonia' | 'nitrite' | 'nitrate', WaterChange | null> {
  const change = (tank: number | null, tapValue: number | null, target: number | null) =>
    tank === null || target === null ? null : waterChangeTo(target, { tank, tap: tapValue ?? 0 });
  return {
    ammonia: change(test.totalAmmoniaNMgL, tap.totalAmmoniaNMgL, totalAmmoniaLimit(test)),
    nitrite: change(test.nitriteNMgL, tap.nitriteNMgL, NITRITE_LIMITS.look),
    nitrate: change(test.nitrateNMgL, tap.nitrateNMgL, NITRATE_LIMITS.look),
  };
}

function totalAmmoniaLimit({ ph, celsius }: WaterTest): number | null {
  if (ph === null || celsius === null) return null;
  const { fraction } = unionisedAmmonia({ totalAmmoniaNMgL: 0, ph, celsius });
  return fraction === 0 ? null : UNIONISED_LIMITS.look / fraction;
}

/** "Change 45 % of the water", "Change 50 % twice, a day apart", or why not. */
export function waterChangeWords(change: WaterChange): string {
  if ('none' in change) {
    return change.none === 'notNeeded'
      ? 'No change needed'
      : 'The tap water holds as much: a change cannot bring it down';
  }
  const { percent, times } = change;
  if (times === 1) return `Change ${percent} % of the water`;
  return `Change ${percent} % ${times === 2 ? 'twice' : `${times} times`}, a day apart`;
}
