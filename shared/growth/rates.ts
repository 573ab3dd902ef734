import { finite } from '../badValue';

type Reading = { value: number; day: number };

/**
 * Specific growth rate in percent a day: 100 (ln to - ln from) / days. Negative for fish that lost. Of length it is a
 * third of that of weight for fish that keep their shape, so say which. Null when a value or the time between is not
 * above zero. Throws `BadValue` for what is not a number. (Ricker 1975, Bull Fish Res Board Can 191.)
 */
export function specificGrowthRate(from: Reading, to: Reading): number | null {
  const [before, after] = [finite('First value', from.value), finite('Last value', to.value)];
  const days = finite('Last day', to.day) - finite('First day', from.day);
  return before > 0 && after > 0 && days > 0 ? (100 * Math.log(after / before)) / days : null;
}

/** Days in which a specific growth rate (% a day) doubles what grows: ln 2 / rate. Null unless it grows. */
export function doublingDays(percentPerDay: number): number | null {
  return finite('Growth rate', percentPerDay) > 0 ? Math.LN2 / (percentPerDay / 100) : null;
}

/** Gain in mm a day between two lengths: (to - from) / days. Null when no time passed. Throws `BadValue`. */
export function dailyGain(from: Reading, to: Reading): number | null {
  const gain = finite('Last length', to.value) - finite('First length', from.value);
  const days = finite('Last day', to.day) - finite('First day', from.day);
  return days > 0 ? gain / days : null;
}

/**
 * Growth performance phi' = log10 K (a year) + 2 log10 final length (cm), by which broods of one species compare (Pauly
 * & Munro 1984, Fishbyte 2(1)). Takes mm. Throws `BadValue` unless both are above zero.
 */
export function growthPerformance(linfMm: number, kPerYear: number): number {
  const lengthCm = finite('Final length', linfMm, { above: 0 }) / 10;
  return Math.log10(finite('K', kPerYear, { above: 0 })) + 2 * Math.log10(lengthCm);
}
