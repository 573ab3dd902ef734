import { type Day, dayWords, formatShortDay } from '../days';
import type { UnitChoices } from '../units';
import { formatLength } from '../unitWords';
import { type Forecast, STALE_AFTER_DAYS, type Target } from './forecast';

const plural = (count: number, one: string) => `${count} ${one}${count === 1 ? '' : 's'}`;

export const MEASURE_WORDS = { total: 'total length', standard: 'standard length' };

/** "half at 5 cm by 2 Jun, four in five by 20 Jun"; what has passed is said as passed. */
export function targetWords({ lengthMm, half, fourFifths }: Target, today: Day, choices: UnitChoices): string {
  const length = formatLength(lengthMm * 10, choices);
  if (!half) return `This curve ends below ${length}`;
  const when = (on: Day) => (on <= today ? `since ${dayWords(on, today)}` : `by ${formatShortDay(on)}`);
  if (!fourFifths) return `Half at ${length} ${when(half.on)}; four in five not on this curve`;
  return `Half at ${length} ${when(half.on)}, four in five ${when(fourFifths.on)}`;
}

/** "25 May to 16 Jun, 7 samples, total length": what stands under the chart's title. */
export function targetBasis(forecast: Extract<Forecast, { kind: 'curve' }>, { half }: Target): string {
  const range = half ? [`${formatShortDay(half.from)} to ${formatShortDay(half.to)}`] : [];
  return [...range, plural(forecast.points.length, 'sample'), MEASURE_WORDS[forecast.measure]].join(' · ');
}

/** Where there is no forecast, why. */
export function whyNoForecast(forecast: Forecast, today: Day): string | null {
  switch (forecast.kind) {
    case 'none':
      return 'Not measured yet. Needs 3 samples.';
    case 'pointsOnly':
      return `Needs ${plural(forecast.needs, 'more sample')}`;
    case 'notIdentifiable':
      return 'These lengths show no growth that a curve could follow';
    case 'stale':
      return `Last measured ${dayWords(forecast.last.onDay, today)}: over ${STALE_AFTER_DAYS} days ago, so no forecast`;
    case 'curve':
      return null;
  }
}

const CURVE_NAMES = { vonBertalanffy: 'von Bertalanffy', gompertz: 'Gompertz', logistic: 'logistic' };

/** What the curve rests on, one tap away. */
export function curveBasis(forecast: Extract<Forecast, { kind: 'curve' }>): string[] {
  const { fit, points, n, cv, cvAssumed, priorDecides, leftOut } = forecast;
  const [first, last] = [points[0], points.at(-1)];
  const better = fit.candidates.filter(({ weight }) => weight >= 0.01);
  return [
    `${plural(n, 'length')} from ${plural(points.length, 'day')}, ages ${first?.ageDays ?? 0} to ${last?.ageDays ?? 0} days.`,
    `A ${CURVE_NAMES[fit.model]} curve, ${better.length > 1 ? `best of ${better.length} (${better.map(({ model, weight }) => `${CURVE_NAMES[model]} ${Math.round(weight * 100)} %`).join(', ')})` : 'clearly the best of three'}.`,
    ...(priorDecides
      ? ['The fish are small yet: where the curve ends is the species’ adult size, not these data.']
      : []),
    cvAssumed
      ? 'Unevenness of 10 % assumed: too few fish were measured at once.'
      : `Unevenness (CV) ${Math.round(cv * 100)} %.`,
    ...(leftOut > 0 ? [`${plural(leftOut, 'length')} measured the other way left out.`] : []),
  ];
}
