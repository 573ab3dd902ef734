import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { addDays, type Day } from '@/shared/days';
import {
  type CurveForecast,
  type Forecast,
  forecast,
  type GrowthFacts,
  meanOn,
  sizeOn,
} from '@/shared/growth/forecast';
import { measureOf, type SampleTaken } from '@/shared/growth/points';
import { headsAtLeast } from '@/shared/growth/sizes';
import { targetOf } from '@/shared/growth/target';
import {
  cannotFitWords,
  curveBasis,
  gradingWords,
  headsWords,
  sizeWords,
  targetBasis,
  targetWords,
  whyNoForecast,
} from '@/shared/growth/words';
import { METRIC, US } from '@/shared/units';
import { seeded } from './growthRows';

const SPAWNED: Day = '2026-01-01';
const dayAt = (age: number) => addDays(SPAWNED, age);
/** A Gompertz brood: 15 mm at 60 days, 50 mm at 166, 120 mm in the end. */
const trueMean = (age: number) => 120 * Math.exp(-Math.exp(-0.0081 * (age - 150)));
const AGES = [40, 65, 90, 115, 140];

/** Twelve fish a day, 10 % about the mean. */
function brood(ages: number[], fish = 12, seed = 3): SampleTaken[] {
  const { normal } = seeded(seed);
  return ages.map((age) => ({
    onDay: dayAt(age),
    measure: 'total',
    lengthsMm: Array.from({ length: fish }, () => trueMean(age) * (1 + 0.1 * normal())),
  }));
}

const facts = (samples: SampleTaken[], more: Partial<GrowthFacts> = {}): GrowthFacts => ({
  samples,
  spawnEarliest: SPAWNED,
  spawnLatest: SPAWNED,
  today: dayAt(150),
  prior: { meanMm: 120, sdMm: 14 },
  ...more,
});

function curveFrom(given: GrowthFacts): Forecast & CurveForecast {
  const grown = forecast(given);
  if (grown.kind !== 'curve') throw new Error(grown.kind);
  return grown;
}

describe('a forecast says no more than the samples do', () => {
  test.each([
    [0, 'none', 'Not measured yet. Needs 3 samples'],
    [1, 'pointsOnly', 'Needs 2 more samples'],
    [2, 'pointsOnly', 'Needs 1 more sample'],
  ])('after %s sample days: points alone', (days, kind, words) => {
    const grown = forecast(facts(brood(AGES.slice(0, days))));
    expect(grown.kind).toBe(kind);
    expect(grown.points).toHaveLength(days);
    expect(whyNoForecast(grown, dayAt(150), METRIC)).toBe(words);
  });

  test('two samples on one day are one', () => {
    const [first, second] = [brood([40]), brood([40, 65])];
    expect(forecast(facts([...first, ...second]))).toMatchObject({ kind: 'pointsOnly', needs: 1 });
    expect(forecast(facts([...first, ...second])).points[0]?.n).toBe(24);
  });

  test('60 days after the last sample there still is a curve, on day 61 the last size alone', () => {
    const samples = brood(AGES);
    expect(forecast(facts(samples, { today: dayAt(200) })).kind).toBe('curve');
    const stale = forecast(facts(samples, { today: dayAt(201) }));
    expect(stale).toMatchObject({ kind: 'stale', daysSince: 61 });
    const mm = stale.points.at(-1)?.meanMm ?? 0;
    const words = `${(mm / 10).toFixed(1)} cm on 21 May, 61 days ago. No forecast past 60 days: sample again`;
    expect(whyNoForecast(stale, dayAt(201), METRIC)).toBe(words);
  });

  test('small fish are drawn to the adult length of their species, and the basis says so', () => {
    const grown = curveFrom(facts(brood(AGES)));
    expect(grown.priorDecides).toBe(true);
    expect(curveBasis(grown).join(' ')).toContain('the adult length of the species stands in');
    const grownUp = curveFrom(facts(brood([60, 150, 250, 350, 450, 550, 700, 800]), { today: dayAt(820) }));
    expect(grownUp.priorDecides).toBe(false);
    expect(curveBasis(grownUp).join(' ')).not.toContain('species');
  });

  test('three sample days without a species take the length to be zero at the spawn, and say so', () => {
    const days = [60, 90, 120].map((age, i) => ({
      onDay: dayAt(age),
      measure: 'total' as const,
      lengthsMm: [-2, 0, 2].map((off) => ([29, 40, 49][i] ?? 0) + off),
    }));
    const grown = curveFrom(facts(days, { prior: null }));
    expect(grown.originFixed).toBe(true);
    expect(curveBasis(grown).join(' ')).toContain('zero at the spawn');
    expect(meanOn(grown, SPAWNED)).toBe(0);
  });

  test('fish of unknown birth, counted from their first sample, are not taken to begin at zero', () => {
    const grown = forecast(facts(brood([0, 30, 60]), { prior: null, today: dayAt(70) }));
    expect(grown).toMatchObject({ kind: 'notIdentifiable', reason: 'tooFewAges' });
    expect(whyNoForecast(grown, dayAt(70), METRIC)).toBe('No curve yet: one more sample on another day');
  });

  test('fish that do not grow get no curve', () => {
    const still = AGES.map((age) => ({ onDay: dayAt(age), measure: 'total' as const, lengthsMm: [29, 30, 31] }));
    const grown = forecast(facts(still));
    expect(grown).toMatchObject({ kind: 'notIdentifiable', reason: 'noGrowth' });
    expect(whyNoForecast(grown, dayAt(150), METRIC)).toBe('No forecast: these samples show no growth');
  });

  test('total and standard lengths are never mixed: the last way counts, the rest is left out and counted', () => {
    const standard = { onDay: dayAt(50), measure: 'standard' as const, lengthsMm: [11, 12, 13] };
    const samples = [standard, ...brood(AGES)];
    const grown = curveFrom(facts(samples));
    expect([grown.measure, grown.leftOut, measureOf(samples)]).toEqual(['total', 3, 'total']);
    expect(grown.fit).toMatchObject({ n: 60 });
    expect(curveBasis(grown)).toContain('3 lengths measured the other way left out.');
    expect(measureOf([...samples, { ...standard, onDay: dayAt(149) }])).toBe('standard');
  });

  test('lengths from before the batch was graded are drawn and not fitted', () => {
    const samples = brood(AGES);
    const graded = forecast(facts(samples, { gradedOn: dayAt(100) }));
    expect(graded).toMatchObject({ kind: 'pointsOnly', needs: 1 });
    expect(graded.points.map(({ beforeGrading }) => beforeGrading)).toEqual([true, true, true, false, false]);
    const later = curveFrom(facts(samples, { gradedOn: dayAt(65) }));
    expect(later.n).toBe(48);
    expect(curveBasis(later)).toContain('1 sample from before the batch was graded left out.');
  });

  test('measuring nearly all the fish each time is said to be the same fish again', () => {
    expect(curveFrom(facts(brood(AGES), { heads: 14 })).sameFish).toBe(true);
    expect(curveFrom(facts(brood(AGES), { heads: 40 })).sameFish).toBe(false);
  });

  test('without five fish in a sample an unevenness of 10 % is assumed, and said', () => {
    const grown = curveFrom(facts(brood(AGES, 4)));
    expect([grown.cv, grown.cvAssumed]).toEqual([0.1, true]);
    expect(curveBasis(grown)).toContain('Unevenness of 10 % is assumed: no sample has five fish.');
  });

  test('the order in which samples arrive does not matter', () => {
    const samples = brood(AGES);
    const [one, other] = [curveFrom(facts(samples)), curveFrom(facts(samples.toReversed()))];
    expect(other.fit.parameters).toEqual(one.fit.parameters);
    expect(other.points).toEqual(one.points);
  });

  test('a length that is none is named', () => {
    const bad = { onDay: dayAt(40), measure: 'total' as const, lengthsMm: [30, Number.NaN] };
    expect(() => forecast(facts([bad]))).toThrow(BadValue);
  });
});

describe('the days by which a batch reaches a length', () => {
  const grown = curveFrom(facts(brood(AGES)));
  const target = targetOf(grown, 50);

  test('half are there when the mean is, four fifths later, each within its range', () => {
    const { half, fourFifths } = target;
    if (!half || !fourFifths) throw new Error('never there');
    expect(meanOn(grown, half.on)).toBeGreaterThanOrEqual(50);
    expect(meanOn(grown, addDays(half.on, -1))).toBeLessThan(50);
    const size = sizeOn(grown, fourFifths.on);
    // Four in five of a thousand heads, by the same curve and unevenness, both taken as known.
    expect(size && headsAtLeast({ ...size, seMm: 0, cvSd: 0 }, 50, 1000).expected).toBeGreaterThanOrEqual(800);
    expect(half.from < half.on && half.on < (half.to ?? '')).toBe(true);
    expect(half.on < fourFifths.on && fourFifths.from < fourFifths.on && fourFifths.on < (fourFifths.to ?? '')).toBe(
      true,
    );
  });

  test('the true day lies in the range', () => {
    const trueAge = 150 - Math.log(-Math.log(50 / 120)) / 0.0081;
    const day = dayAt(Math.round(trueAge));
    expect((target.half?.from ?? '') <= day && day <= (target.half?.to ?? '')).toBe(true);
  });

  test('four fifths is the less certain the less certain the unevenness', () => {
    const spanOf = (cvSd: number) => {
      const dates = targetOf({ ...grown, cvSd }, 50).fourFifths;
      return Date.parse(dates?.to ?? '') - Date.parse(dates?.from ?? '');
    };
    expect(spanOf(0.05)).toBeGreaterThan(spanOf(0.001));
  });

  test('a date over 60 days past the last sample is said to be far', () => {
    expect(target.half?.far).toBe(false);
    const far = targetOf(grown, 80);
    expect(far.half?.far).toBe(true);
    expect(curveBasis(grown, far).join(' ')).toContain('sample again before you promise it');
  });

  test('a length above the final one is never reached, one within its doubt perhaps never', () => {
    expect(targetOf(grown, 300)).toMatchObject({ half: null, fourFifths: null });
    const perhaps = targetOf(grown, 110);
    expect(perhaps.half?.to).toBeNull();
    expect(targetBasis(grown, perhaps, dayAt(150), METRIC)).toMatch(/ or later · 5 samples · total length, cm$/);
    expect(() => targetOf(grown, 0)).toThrow(BadValue);
  });
});

describe('the size on a day, for the availability page', () => {
  const grown = curveFrom(facts(brood(AGES)));

  test('is the curve’s up to 60 days after the last sample, then the last measured', () => {
    const [today, later, tooLate] = [150, 200, 201].map((age) => sizeOn(grown, dayAt(age)));
    expect(today).toMatchObject({ measuredOn: null, meanMm: meanOn(grown, dayAt(150)) });
    expect(later?.measuredOn).toBeNull();
    expect(tooLate).toMatchObject({ measuredOn: dayAt(140), meanMm: grown.points.at(-1)?.meanMm });
  });

  test('is the last measured while there are points alone, and none without them', () => {
    const two = forecast(facts(brood(AGES.slice(0, 2))));
    expect(sizeOn(two, dayAt(80))).toMatchObject({ measuredOn: dayAt(65), meanMm: two.points[1]?.meanMm });
    expect(sizeOn(forecast(facts([])), dayAt(80))).toBeNull();
    // One fish has no spread: the usual 10 % stands in.
    const one = forecast(facts([{ onDay: dayAt(40), measure: 'total', lengthsMm: [20] }]));
    expect(sizeOn(one, dayAt(41))).toMatchObject({ meanMm: 20, seMm: 2, cv: 0.1 });
  });

  test('tells how many of the heads are at a length, fewer the longer it is', () => {
    const size = sizeOn(grown, dayAt(150));
    if (!size) throw new Error('no size');
    const counts = [10, 30, 35, 40, 70].map((mm) => headsAtLeast(size, mm, 29).expected);
    expect(counts).toEqual(counts.toSorted((a, b) => b - a));
    expect([counts[0], counts[4]]).toEqual([29, 0]);
  });
});

describe('the sentences', () => {
  const dates = (on: Day, from: Day, to: Day | null) => ({ on, from, to, far: false });
  const target = {
    lengthMm: 50,
    half: dates('2026-06-02', '2026-05-25', '2026-06-16'),
    fourFifths: dates('2026-06-20', '2026-06-09', '2026-07-08'),
    finalMm: 118,
  };

  test.each([
    ['ahead', target, '2026-05-14', METRIC, 'Half at 5 cm by 2 Jun, four in five by 20 Jun'],
    ['half of it past', target, '2026-06-10', METRIC, 'Half at 5 cm since 2 Jun, four in five by 20 Jun'],
    ['in inches', { ...target, lengthMm: 50.8 }, '2026-05-14', US, 'Half at 2 in by 2 Jun, four in five by 20 Jun'],
    ['over six months away', target, '2025-11-01', METRIC, 'Half at 5 cm by 2 Jun 2026, four in five by 20 Jun 2026'],
    [
      'four fifths never',
      { ...target, fourFifths: null },
      '2026-05-14',
      METRIC,
      'Half at 5 cm by 2 Jun, four in five not on this curve',
    ],
    [
      'never',
      { ...target, lengthMm: 125, half: null },
      '2026-05-14',
      METRIC,
      'Not expected to reach 12.5 cm: levels off near 11.8 cm',
    ],
  ] as const)('a target %s', (_, given, today, units, words) => expect(targetWords(given, today, units)).toBe(words));

  test('the range, the samples, the measure and the unit stand under the title', () => {
    expect(targetBasis(curveFrom(facts(brood(AGES))), target, '2026-05-14', METRIC)).toBe(
      '25 May to 16 Jun · 5 samples · total length, cm',
    );
  });

  test('the basis names lengths, days, ages and the curves that count', () => {
    const [lengths, curve] = curveBasis(curveFrom(facts(brood(AGES))));
    expect(lengths).toBe('60 lengths from 5 days, ages 40 to 140 days.');
    expect(curve).toMatch(/^Average of the curves that fit: (von Bertalanffy|Gompertz|logistic) \d+ %, .* \d+ %\.$/);
    const sure = curveFrom(
      facts(brood([40, 65, 90, 115, 140, 180, 230, 290, 360, 450, 600], 40), { today: dayAt(610) }),
    );
    expect(curveBasis(sure)[1]).toBe('Gompertz curve, by far the best fit.');
  });

  test('size and heads', () => {
    const size = { meanMm: 47.2, seMm: 0.5, cv: 0.1, cvSd: 0.02, measuredOn: null };
    expect(sizeWords(size, '2026-05-14', '2026-05-14', METRIC)).toBe('about 4.7 cm today');
    expect(sizeWords(size, '2026-06-01', '2026-05-14', METRIC)).toBe('about 4.7 cm on 1 Jun');
    expect(sizeWords({ ...size, measuredOn: '2026-05-11' }, '2026-08-01', '2026-08-01', US)).toBe('1.86 in on 11 May');
    expect(headsWords({ expected: 14, low: 9, high: 20 }, 29, 50, METRIC)).toBe(
      '14 of 29 at 5 cm or over, 9 to 20 likely',
    );
    expect(headsWords({ expected: 29, low: 29, high: 29 }, 29, 30, METRIC)).toBe('29 of 29 at 3 cm or over');
  });

  test('grading', () => {
    expect(gradingWords({ advice: 'measureMore', missing: 1 })).toBe('Measure 1 more fish to see how even they are');
    expect(gradingWords({ advice: 'leave', cv: 0.092 })).toBe('Even: CV 9 %');
    expect(gradingWords({ advice: 'watch', cv: 0.17 })).toBe('Growing apart: CV 17 %. Look again at the next sample');
    expect(gradingWords({ advice: 'grade', cv: 0.21, reason: 'cv' })).toBe(
      'Grade: CV 21 %. Move the largest to a tank of their own',
    );
    expect(gradingWords({ advice: 'grade', cv: 0.18, reason: 'twiceAsLong' })).toContain('twice the shortest');
  });

  test('no sentence praises or exclaims', () => {
    const reasons = ['tooFewFish', 'tooFewAges', 'noGrowth', 'noCurvature', 'oneLength'] as const;
    expect(reasons.map(cannotFitWords).join(' ')).not.toMatch(/!|great|well done|sorry/i);
  });
});
