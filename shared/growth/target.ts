import { addDays, type Day } from '../days';
import { type AgeSpan, ageSpanAt, finalOf } from './bands';
import type { CurveForecast } from './forecast';
import { normalQuantile } from './normal';
import { meanNeeded } from './sizes';

/** A date with its 95 % interval: `to` is null when the data cannot rule out that it never comes. */
export type DateRange = {
  on: Day;
  from: Day;
  to: Day | null;
  /** Over 60 days after the last sample: to be sampled again before anyone relies on it. */
  far: boolean;
};

/** When half, and four fifths, of a batch are at or over a length; null where the curve levels off before that. */
export type Target = {
  lengthMm: number;
  half: DateRange | null;
  fourFifths: DateRange | null;
  /** Where the mean levels off. */
  finalMm: number;
};

const FOUR_FIFTHS = 0.8;

/**
 * The days by which half and four fifths of a batch are at or over a length, their lengths being normal about the curve
 * with the batch's CV. Half are there when the mean is; four fifths when the mean is at length / (1 - 0.84 CV), and its
 * interval holds the doubt about the CV too. Throws `BadValue` for a length that is not above zero.
 */
export function targetOf(curve: CurveForecast, lengthMm: number, level = 0.95): Target {
  const { fit, cv, cvSd } = curve;
  const half = ageSpanAt(fit.curves, lengthMm, level);
  const needed = meanNeeded(lengthMm, FOUR_FIFTHS, cv);
  const perCv = ((needed ?? 0) ** 2 * normalQuantile(FOUR_FIFTHS)) / lengthMm;
  const fourFifths = needed === null ? null : ageSpanAt(fit.curves, needed, level, perCv * cvSd);
  return {
    lengthMm,
    half: half && datesOf(curve, half),
    fourFifths: fourFifths && datesOf(curve, fourFifths),
    finalMm: finalOf(fit.curves),
  };
}

/** Whole days outwards: the fish are there by `on`. An age that is a day to the last digit must not become the next. */
function datesOf({ bornOn, untilDay }: CurveForecast, { mean, low, high }: AgeSpan): DateRange {
  const on = addDays(bornOn, Math.ceil(mean - 1e-6));
  const from = addDays(bornOn, Math.floor(low + 1e-6));
  return { on, from, to: high === null ? null : addDays(bornOn, Math.ceil(high - 1e-6)), far: on > untilDay };
}
