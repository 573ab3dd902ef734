import { addMonths, type Day, formatDate, formatShortDay } from '../days';
import { TENTHS_MM_PER, type UnitChoices } from '../units';
import { formatLength } from '../unitWords';
import type { Curves } from './bands';
import type { CannotFitReason } from './cannotFit';
import { type CurveForecast, DAYS_NEEDED, type Forecast, type SizeOnDay, STALE_AFTER_DAYS } from './forecast';
import type { GradingAdvice } from './grading';
import type { Measure } from './points';
import type { GrowthModel } from './shapes';
import type { HeadsSpan } from './sizes';
import type { DateRange, Target } from './target';

/*
 * The sentences of growth, so that screen, PDF and letters say the same. Lengths come in mm and are said in the
 * reader's unit; dates carry the year when it is over six months away.
 */

export const MEASURE_WORDS: Record<Measure, string> = { total: 'total length', standard: 'standard length' };
const CURVE_NAMES: Record<GrowthModel, string> = {
  vonBertalanffy: 'von Bertalanffy',
  gompertz: 'Gompertz',
  logistic: 'logistic',
};

const plural = (count: number, one: string, many = `${one}s`) => `${count} ${count === 1 ? one : many}`;
const percent = (share: number) => `${Math.round(share * 100)} %`;

/** A length that was chosen, "5 cm" or "2 in", without the zeros of a measurement. */
function chosenLength(mm: number, { length }: UnitChoices): string {
  return `${Number((mm / (TENTHS_MM_PER[length] / 10)).toFixed(2))} ${length}`;
}

const measuredLength = (mm: number, choices: UnitChoices) => formatLength(mm * 10, choices);

function dateWords(day: Day, today: Day): string {
  const far = day < addMonths(today, -6) || day > addMonths(today, 6);
  return far ? formatDate(day) : formatShortDay(day);
}

/** "half at 5 cm by 2 Jun, four in five by 20 Jun", as the title of a chart; what has passed is said as passed. */
export function targetWords({ lengthMm, half, fourFifths, finalMm }: Target, today: Day, choices: UnitChoices): string {
  const length = chosenLength(lengthMm, choices);
  if (!half) return `Not expected to reach ${length}: levels off near ${measuredLength(finalMm, choices)}`;
  const when = ({ on }: DateRange) => `${on <= today ? 'since' : 'by'} ${dateWords(on, today)}`;
  if (!fourFifths) return `Half at ${length} ${when(half)}, four in five not on this curve`;
  return `Half at ${length} ${when(half)}, four in five ${when(fourFifths)}`;
}

/** "25 May to 16 Jun · 7 samples · total length, cm": what stands under the chart's title. */
export function targetBasis(
  grown: Forecast & CurveForecast,
  { half }: Target,
  today: Day,
  choices: UnitChoices,
): string {
  const fitted = grown.points.filter(({ beforeGrading }) => !beforeGrading).length;
  const range = half ? [rangeWords(half, today)] : [];
  return [...range, plural(fitted, 'sample'), `${MEASURE_WORDS[grown.measure]}, ${choices.length}`].join(' · ');
}

/** "25 May to 16 Jun", "25 May or later". */
function rangeWords({ from, to }: DateRange, today: Day): string {
  return to === null ? `${dateWords(from, today)} or later` : `${dateWords(from, today)} to ${dateWords(to, today)}`;
}

const CANNOT_FIT_WORDS: Record<CannotFitReason, string> = {
  tooFewFish: 'No curve yet: measure more fish at the next sample',
  tooFewAges: 'No curve yet: one more sample on another day',
  noGrowth: 'No forecast: these samples show no growth',
  noCurvature: 'No forecast: growth has not begun to slow, so nothing says where it ends',
  oneLength: 'No relation of weight to length: all fish measured are of one length',
};

export const cannotFitWords = (reason: CannotFitReason): string => CANNOT_FIT_WORDS[reason];

/** Where there is no forecast, why; null where there is one. */
export function whyNoForecast(grown: Forecast, today: Day, choices: UnitChoices): string | null {
  switch (grown.kind) {
    case 'none':
      return `Not measured yet. Needs ${plural(DAYS_NEEDED, 'sample')}`;
    case 'pointsOnly':
      return `Needs ${plural(grown.needs, 'more sample')}`;
    case 'notIdentifiable':
      return cannotFitWords(grown.reason);
    case 'stale': {
      const { meanMm, onDay } = grown.last;
      const last = `${measuredLength(meanMm, choices)} on ${dateWords(onDay, today)}`;
      return `${last}, ${grown.daysSince} days ago. No forecast past ${STALE_AFTER_DAYS} days: sample again`;
    }
    case 'curve':
      return null;
  }
}

/** What the curve rests on, one tap away: whole sentences, the doubts among them. */
export function curveBasis(grown: Forecast & CurveForecast, target: Target | null = null): string[] {
  const { fit, points, n, cv, leftOut } = grown;
  const fitted = points.filter(({ beforeGrading }) => !beforeGrading).length;
  const { fromDays, toDays } = fit.ages;
  const notes: [boolean, string][] = [
    [
      grown.priorDecides,
      'These fish are too small to show where growth ends: the adult length of the species stands in.',
    ],
    [
      grown.originFixed,
      'Few sample days: the curve takes the length to be zero at the spawn. One more sample will better it.',
    ],
    [fit.extrapolated, 'The final length lies far beyond the fish measured: take the far end of the curve as a guess.'],
    [
      target?.half?.far ?? false,
      `The date is over ${STALE_AFTER_DAYS} days past the last sample: sample again before you promise it.`,
    ],
    [
      grown.sameFish,
      'Most of the fish are measured each time, so the samples repeat each other: the true range is wider.',
    ],
    [grown.cvAssumed, 'Unevenness of 10 % is assumed: no sample has five fish.'],
    [!grown.cvAssumed, `Unevenness (CV) ${percent(cv)}, from the last sample of five fish or more.`],
    [fitted < points.length, `${plural(points.length - fitted, 'sample')} from before the batch was graded left out.`],
    [leftOut > 0, `${plural(leftOut, 'length')} measured the other way left out.`],
  ];
  return [
    `${plural(n, 'length')} from ${plural(fitted, 'day')}, ages ${fromDays} to ${toDays} days.`,
    curveSentence(fit.curves),
    ...notes.filter(([holds]) => holds).map(([, sentence]) => sentence),
  ];
}

/** "Average of the curves that fit: Gompertz 53 %, logistic 47 %." */
function curveSentence(curves: Curves): string {
  const share = ({ curve, weight }: Curves[number]) => `${CURVE_NAMES[curve.model]} ${percent(weight)}`;
  const [only, ...others] = curves;
  if (only && others.length === 0) return `${sentenceCase(CURVE_NAMES[only.curve.model])} curve, by far the best fit.`;
  return `Average of the curves that fit: ${curves.map(share).join(', ')}.`;
}

const sentenceCase = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

/** "4.9 cm today" by the curve, else "4.7 cm on 11 May": the availability page and the tank. */
export function sizeWords({ meanMm, measuredOn }: SizeOnDay, day: Day, today: Day, choices: UnitChoices): string {
  const length = measuredLength(meanMm, choices);
  if (measuredOn) return `${length} on ${dateWords(measuredOn, today)}`;
  return `about ${length} ${day === today ? 'today' : `on ${dateWords(day, today)}`}`;
}

/** "14 of 29 at 5 cm or over, 10 to 18 likely". */
export function headsWords(span: HeadsSpan, heads: number, lengthMm: number, choices: UnitChoices): string {
  const range = span.low === span.high ? '' : `, ${span.low} to ${span.high} likely`;
  return `${span.expected} of ${heads} at ${chosenLength(lengthMm, choices)} or over${range}`;
}

/** What the unevenness of a sample asks for. */
export function gradingWords(advice: GradingAdvice): string {
  switch (advice.advice) {
    case 'measureMore':
      return `Measure ${plural(advice.missing, 'more fish', 'more fish')} to see how even they are`;
    case 'leave':
      return `Even: CV ${percent(advice.cv)}`;
    case 'watch':
      return `Growing apart: CV ${percent(advice.cv)}. Look again at the next sample`;
    case 'grade': {
      const why = advice.reason === 'cv' ? `CV ${percent(advice.cv)}` : 'the longest is twice the shortest';
      return `Grade: ${why}. Move the largest to a tank of their own`;
    }
  }
}
