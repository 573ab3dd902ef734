import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as z from 'zod/mini';
import { BadValue } from '@/shared/badValue';
import { groupByAge, type LengthAtAge } from '@/shared/growth/ageGroups';
import { compareAt } from '@/shared/growth/bands';
import { akaikeWeights } from '@/shared/growth/candidates';
import { CannotFit } from '@/shared/growth/cannotFit';
import { ageWhen, type GrowthCurve, meanLength } from '@/shared/growth/curve';
import { fitGrowth, type GrowthFit } from '@/shared/growth/fitGrowth';
import { fitModel } from '@/shared/growth/fitModel';
import { GROWTH_MODELS, type GrowthModel } from '@/shared/growth/shapes';
import { lengthsAt, modelNamed, Named, Numbers, near, rowsOf, seeded } from './growthRows';

const rateOf = ({ parameters }: GrowthFit) => (parameters['kPerYear'] ?? Number.NaN) / 365.25;
const originOf = ({ parameters }: GrowthFit) => parameters['t0Days'] ?? parameters['tiDays'];

/** A curve without doubt, for its mean alone. */
function curveOf(model: GrowthModel, linfMm: number, kPerDay: number, originDays: number): GrowthCurve {
  const none: [number, number, number] = [0, 0, 0];
  return {
    model,
    linfMm,
    kPerDay,
    originDays,
    covariance: [none, none, none],
    residualSdMm: 0,
    typicalMm: null,
    freedom: 1,
  };
}

const Series = z.object({ model: z.string(), t: Numbers, y: Numbers });
const fits = rowsOf(
  'growth.fit',
  Series,
  z.object({
    par: Named,
    se: Named,
    rss: z.number(),
    sigma: z.number(),
    AICc: z.number(),
    pred: z.array(
      z.object({
        t: z.number(),
        fit: z.number(),
        lo: z.number(),
        hi: z.number(),
        pi_lo: z.number(),
        pi_hi: z.number(),
      }),
    ),
  }),
);

function seriesOf(id: string): LengthAtAge[] {
  const row = fits.find((one) => one.id === id);
  if (!row) throw new Error(`No row ${id}`);
  return lengthsAt(row.inputs.t, row.inputs.y);
}

describe('curves agree with published fits', () => {
  // R's nls, which scipy matches to 4e-7; tolerances a tenth of the rows' or less.
  test.each(fits)('$id: $source', ({ inputs: { model, t, y }, expected }) => {
    const fit = fitGrowth(lengthsAt(t, y), { models: [modelNamed(model)] });
    const { par, se } = expected;
    near(fit.parameters['linfMm'], par['Linf'], 1e-6);
    near(rateOf(fit), par['K'] ?? par['g'], 1e-6);
    near(originOf(fit), par['t0'] ?? par['ti'], 1e-6);
    near(fit.standardErrors['linfMm'], se['Linf'], 1e-5);
    near((fit.standardErrors['kPerYear'] ?? 0) / 365.25, se['K'] ?? se['g'], 1e-5);
    near(fit.standardErrors['t0Days'] ?? fit.standardErrors['tiDays'], se['t0'] ?? se['ti'], 1e-5);
    near(fit.residualSumOfSquares, expected.rss, 1e-10);
    near(fit.residualSdMm, expected.sigma, 1e-10);
    near(fit.aicc, expected.AICc, 1e-9);
  });

  test.each(fits)('$id: the bands of the mean and of one fish', ({ inputs: { model, t, y }, expected }) => {
    const fit = fitGrowth(lengthsAt(t, y), { models: [modelNamed(model)] });
    for (const row of expected.pred) {
      const band = fit.lengthAt(row.t);
      near(band.mean, row.fit, 1e-6);
      near(band.low, row.lo, 1e-5);
      near(band.high, row.hi, 1e-5);
      near(band.predictionLow, row.pi_lo, 1e-5);
      near(band.predictionHigh, row.pi_hi, 1e-5);
    }
  });

  // Certified values of NIST's Rat42 and BoxBOD in our terms.
  test.each(rowsOf('growth.fit_lite', Series, z.object({ par: Named, rss: z.number() })))(
    '$id: $source',
    ({ inputs: { model, t, y }, expected: { par, rss } }) => {
      const fixed = model.includes('fixed');
      const fit = fitGrowth(lengthsAt(t, y), { models: [modelNamed(model)], vonBertalanffyOriginFixed: fixed });
      near(fit.parameters['linfMm'], par['Linf'], 1e-9);
      near(rateOf(fit), par['K'] ?? par['g'], 1e-9);
      if (!fixed) near(originOf(fit), par['ti'], 1e-9);
      near(fit.residualSumOfSquares, rss, 1e-9);
    },
  );

  const nist = rowsOf(
    'growth.nist',
    z.object({ x: Numbers, y: Numbers }),
    z.object({ par: Numbers, se: Numbers, rss: z.number(), rsd: z.number() }),
  );
  test.each(nist.filter(({ id }) => /Misra1a|BoxBOD/.test(id)))('$id: $source', ({ inputs: { x, y }, expected }) => {
    const fit = fitGrowth(lengthsAt(x, y), { models: ['vonBertalanffy'], vonBertalanffyOriginFixed: true });
    near(fit.parameters['linfMm'], expected.par[0], 1e-8);
    near(rateOf(fit), expected.par[1], 1e-8);
    near(fit.standardErrors['linfMm'], expected.se[0], 1e-7);
    near((fit.standardErrors['kPerYear'] ?? 0) / 365.25, expected.se[1], 1e-7);
    near(fit.residualSumOfSquares, expected.rss, 1e-9);
    near(fit.residualSdMm, expected.rsd, 1e-9);
    expect(fit.parameters['t0Days']).toBe(0);
    expect(fit.standardErrors['t0Days']).toBe(0);
  });
  test.each(nist.filter(({ id }) => /Rat42/.test(id)))(
    '$id: $source',
    ({ inputs: { x, y }, expected: { par, se } }) => {
      const fit = fitGrowth(lengthsAt(x, y), { models: ['logistic'] });
      near(fit.parameters['linfMm'], par[0], 1e-8);
      near(rateOf(fit) * (originOf(fit) ?? 0), par[1], 1e-8);
      near(rateOf(fit), par[2], 1e-8);
      near(fit.standardErrors['linfMm'], se[0], 1e-7);
      near((fit.standardErrors['kPerYear'] ?? 0) / 365.25, se[2], 1e-7);
    },
  );

  const Inverse = z.object({
    model: z.string(),
    Linf: z.number(),
    L: z.number(),
    K: z.optional(z.number()),
    g: z.optional(z.number()),
    t0: z.optional(z.number()),
    ti: z.optional(z.number()),
  });
  test.each(rowsOf('growth.age_at_length', Inverse, z.number()))('$id: $source', ({ inputs, expected }) => {
    const { model, Linf, L, K, g, t0, ti } = inputs;
    near(ageWhen(curveOf(modelNamed(model), Linf, K ?? g ?? 0, t0 ?? ti ?? 0), L), expected, 1e-9);
    expect(ageWhen(curveOf(modelNamed(model), Linf, K ?? g ?? 0, t0 ?? ti ?? 0), Linf)).toBeNull();
  });

  const Predict = z.object({ Linf: z.number(), K: z.number(), t0: z.number(), t: Numbers });
  test.each(rowsOf('growth.predict', Predict, Numbers))('$id: $source', ({ inputs: { Linf, K, t0, t }, expected }) => {
    t.forEach((age, i) => {
      near(meanLength(curveOf('vonBertalanffy', Linf, K, t0), age), expected[i], 1e-9);
    });
  });
});

describe('the choice among the three curves', () => {
  const Choice = z.object({ best: z.string(), weight: Named });
  test.each(rowsOf('growth.model_selection', z.object({ AICc: Named }), Choice))(
    '$id: $source',
    ({ id, inputs, expected }) => {
      const fit = fitGrowth(seriesOf(`${id.replace('aicc', 'fit')}-vbgf`));
      expect(fit.model).toBe(modelNamed(expected.best));
      for (const [name, aicc] of Object.entries(inputs.AICc)) {
        const candidate = fit.candidates.find(({ model }) => model === modelNamed(name));
        near(candidate?.aicc, aicc, 1e-9);
        expect(candidate?.weight).toBeCloseTo(expected.weight[name] ?? Number.NaN, 6);
      }
      expect(akaikeWeights(Object.values(inputs.AICc)).reduce((sum, weight) => sum + weight, 0)).toBeCloseTo(1, 14);
    },
  );

  // Worked by hand: n = 7, p = 3, so k = 4 with the residual's variance; the correction is 2 * 4 * 5 / (7 - 4 - 1) = 20.
  test('AICc counts the residual variance, and is null when there are too few fish for it', () => {
    const orange = seriesOf('B-fit-orange1-logistic');
    const fit = fitGrowth(orange, { models: ['logistic'] });
    const aic = 7 * (Math.log((2 * Math.PI * fit.residualSumOfSquares) / 7) + 1) + 2 * 4;
    near(fit.aicc, aic + 20, 1e-12);
    const five = fitGrowth(orange.slice(0, 5), { models: ['logistic', 'vonBertalanffy'] });
    expect(five.candidates.every(({ aicc }) => aicc === null)).toBe(true);
    expect(five.candidates.reduce((sum, { weight }) => sum + weight, 0)).toBeCloseTo(1, 12);
  });

  test('a final length far beyond the data is said to be an extrapolation', () => {
    expect(fitGrowth(seriesOf('B-fit-chick1-logistic'), { models: ['logistic'] }).extrapolated).toBe(true);
    expect(fitGrowth(seriesOf('B-fit-synthA-vbgf')).extrapolated).toBe(false);
  });
});

const truths = fc.record({
  model: fc.constantFrom(...GROWTH_MODELS),
  linf: fc.double({ min: 50, max: 300, noNaN: true }),
  share: fc.double({ min: 0.6, max: 5, noNaN: true }),
  origin: fc.double({ min: -0.1, max: 0.4, noNaN: true }),
});
const AGES = [14, 30, 52, 75, 110, 150, 200, 270, 350] as const;

test('two broods compare at one age by the doubt about both', () => {
  const [a, c] = [
    fitGrowth(seriesOf('B-fit-synthA-vbgf')),
    fitGrowth(seriesOf('B-fit-synthC-gompertz'), { models: ['gompertz'] }),
  ];
  const { differenceMm, low, high } = compareAt(c.curves, a.curves, 200);
  // 74.0923 with a standard error of 0.551847, less 70.4075 with 0.464089; t for 23 degrees of freedom, the fewer, is 2.06866.
  near(differenceMm, 3.684826, 1e-5);
  near(high - low, 2 * 2.0686576 * Math.hypot(0.551847, 0.464089), 1e-5);
  expect(compareAt(a.curves, c.curves, 200).differenceMm).toBe(-differenceMm);
});

describe('whatever the brood', () => {
  test('lengths without scatter give their own curve back', () => {
    fc.assert(
      fc.property(truths, ({ model, linf, share, origin }) => {
        const [k, days] = [share / 350, model === 'vonBertalanffy' ? -350 * Math.abs(origin) : 350 * origin];
        const truth = curveOf(model, linf, k, days);
        const samples = AGES.map((ageDays) => ({ ageDays, lengthMm: meanLength(truth, ageDays) })).filter(
          ({ lengthMm }) => lengthMm > 0,
        );
        const fit = fitGrowth(samples, { models: [model] });
        near(fit.parameters['linfMm'], linf, 1e-6);
        near(rateOf(fit), k, 1e-6);
        expect(Math.abs((originOf(fit) ?? Number.NaN) - days)).toBeLessThan(1e-3);
        expect(fitGrowth(samples).model).toBe(model);
      }),
      { numRuns: 300, seed: 11 },
    );
  });

  test('the order in which fish were measured changes no digit', () => {
    const samples = seriesOf('B-fit-synthC-gompertz');
    const { lengthAt: _, ageAt: __, ...fit } = fitGrowth(samples);
    fc.assert(
      fc.property(fc.shuffledSubarray(samples, { minLength: samples.length }), (shuffled) => {
        const { lengthAt: _, ageAt: __, ...again } = fitGrowth(shuffled);
        expect(again).toEqual(fit);
      }),
      { numRuns: 50, seed: 5 },
    );
  });

  test('lengths in other units give the same curve in those units', () => {
    const samples = seriesOf('B-fit-synthA-vbgf');
    fc.assert(
      fc.property(fc.constantFrom(0.1, 1 / 25.4, 10, 3), fc.constantFrom(...GROWTH_MODELS), (unit, model) => {
        const fit = fitGrowth(samples, { models: [model] });
        const scaled = fitGrowth(
          samples.map(({ ageDays, lengthMm }) => ({ ageDays, lengthMm: lengthMm * unit })),
          { models: [model] },
        );
        near(scaled.parameters['linfMm'], (fit.parameters['linfMm'] ?? 0) * unit, 1e-7);
        near(rateOf(scaled), rateOf(fit), 1e-7);
        near(scaled.standardErrors['linfMm'], (fit.standardErrors['linfMm'] ?? 0) * unit, 1e-6);
      }),
      { numRuns: 12, seed: 2 },
    );
  });

  test.each([
    ['B-fit-synthC-gompertz', 'vonBertalanffy'],
    ['B-fit-synthC-gompertz', 'gompertz'],
    ['B-fit-synthC-gompertz', 'logistic'],
    ['B-fit-synthA-vbgf', 'vonBertalanffy'],
    ['B-fit-synthA-vbgf', 'gompertz'],
    ['B-fit-synthA-vbgf', 'logistic'],
    ['B-fit-orange1-logistic', 'logistic'],
    ['B-fit-chick6-logistic', 'gompertz'],
  ] as const)('%s as %s: 100 seeded starts end at the same optimum, to 1e-5', (id, model) => {
    const samples = seriesOf(id);
    const groups = groupByAge(samples);
    const fit = fitGrowth(samples, { models: [model] });
    const [first, spanDays] = [groups.ages[0] ?? 0, (groups.ages.at(-1) ?? 0) - (groups.ages[0] ?? 0)];
    const { chance } = seeded(7);
    for (let i = 0; i < 100; i += 1) {
      // K of half to eight over the ages measured; bent at one of them, or begun as long before the first.
      const kPerDay = (0.5 * 16 ** chance()) / spanDays;
      const originDays = first + spanDays * chance() * (model === 'vonBertalanffy' ? -1 : 1);
      const found = fitModel({ model, groups, from: { kPerDay, originDays } });
      near(found?.curve.linfMm, fit.curve.linfMm, 1e-5);
      near(found?.curve.kPerDay, fit.curve.kPerDay, 1e-5);
      near(found?.curve.originDays, fit.curve.originDays, 1e-5);
    }
  });

  test('an age is found from its length, and its interval from the band', () => {
    const fit = fitGrowth(seriesOf('B-fit-synthC-gompertz'), { models: ['gompertz'] });
    fc.assert(
      fc.property(fc.double({ min: 20, max: 92, noNaN: true }), (lengthMm) => {
        const age = fit.ageAt(lengthMm);
        expect(fit.lengthAt(age?.mean ?? Number.NaN).mean).toBeCloseTo(lengthMm, 9);
        expect(fit.lengthAt(age?.high ?? Number.NaN).low).toBeCloseTo(lengthMm, 6);
        // Nothing is said of the days before the spawn.
        if ((age?.low ?? 0) > 0) expect(fit.lengthAt(age?.low ?? Number.NaN).high).toBeCloseTo(lengthMm, 6);
        expect((age?.low ?? 0) < (age?.mean ?? 0) && (age?.mean ?? 0) < (age?.high ?? 0)).toBe(true);
      }),
      { numRuns: 100, seed: 4 },
    );
  });

  test('a length at or beyond the final one is never reached, one within its doubt perhaps never', () => {
    const fit = fitGrowth(seriesOf('B-fit-synthC-gompertz'), { models: ['gompertz'] });
    expect(fit.ageAt(100.004)).toBeNull();
    expect(fit.ageAt(0)).toBeNull();
    // Final length 100.0 with a standard error of 2.0: 97 mm may be above it.
    expect(fit.ageAt(97)).toBeNull();
    expect(fit.ageAt(97, 0.5)).not.toBeNull();
  });

  test('no figure is ever other than a number', () => {
    const fit = fitGrowth(seriesOf('B-fit-synthA-vbgf'), { models: ['gompertz'] });
    for (const age of [-1e6, -1e4, 0, 1e4, 1e6]) {
      expect(Object.values(fit.lengthAt(age)).every(Number.isFinite)).toBe(true);
    }
  });
});

describe('the species’ adult size', () => {
  const juvenile = [30, 60, 90, 120].flatMap((ageDays) =>
    [-1.5, 0, 1.5].map((off) => ({ ageDays, lengthMm: 8 + 0.3 * ageDays + off })),
  );
  const prior = { meanMm: 120, sdMm: 14 };

  test('decides where growth ends while the fish are small, and the fit says so', () => {
    const fit = fitGrowth(juvenile, { asymptotePrior: prior });
    expect(fit.usedPrior).toBe(true);
    near(fit.parameters['linfMm'], 120, 0.1);
    near(fit.standardErrors['linfMm'], 14, 0.1);
  });

  test('gives the optimum of the penalised squares: no curve near it is better', () => {
    const fit = fitGrowth(juvenile, { models: ['gompertz'], asymptotePrior: prior });
    const penalised = (curve: GrowthCurve) =>
      juvenile.reduce((sum, { ageDays, lengthMm }) => sum + (lengthMm - meanLength(curve, ageDays)) ** 2, 0) /
        fit.residualSdMm ** 2 +
      ((curve.linfMm - prior.meanMm) / prior.sdMm) ** 2;
    const least = penalised(fit.curve);
    for (const by of [0.999, 1.001]) {
      expect(penalised({ ...fit.curve, linfMm: fit.curve.linfMm * by })).toBeGreaterThan(least);
      expect(penalised({ ...fit.curve, kPerDay: fit.curve.kPerDay * by })).toBeGreaterThan(least);
      expect(penalised({ ...fit.curve, originDays: fit.curve.originDays * by })).toBeGreaterThan(least);
    }
  });

  test('pulls more the surer it is', () => {
    const linf = (sdMm: number) =>
      fitGrowth(juvenile, { models: ['gompertz'], asymptotePrior: { meanMm: 150, sdMm } }).parameters['linfMm'] ?? 0;
    const free = fitGrowth(juvenile, { models: ['gompertz'] }).parameters['linfMm'] ?? 0;
    expect(linf(5)).toBeGreaterThan(linf(15));
    expect(linf(15)).toBeGreaterThan(linf(60));
    expect(linf(60)).toBeGreaterThan(free);
    near(linf(0.5), 150, 0.01);
  });

  test('decides alone when the fish grow in a perfectly straight line', () => {
    const straight = [30, 60, 90, 120, 150].map((ageDays) => ({ ageDays, lengthMm: 8 + 0.3 * ageDays }));
    const fit = fitGrowth(straight, { models: ['vonBertalanffy'], asymptotePrior: prior });
    near(fit.parameters['linfMm'], 120, 0.35);
    expect(fit.standardErrors['linfMm']).toBeGreaterThan(3);
  });

  test('says nothing once the fish have shown theirs', () => {
    const grown = seriesOf('B-fit-synthA-vbgf');
    const fit = fitGrowth(grown, { asymptotePrior: { meanMm: 130, sdMm: 13 } });
    expect(fit.usedPrior).toBe(false);
    expect(fit.parameters).toEqual(fitGrowth(grown).parameters);
  });

  test('stands in for the fourth age that three unknowns need', () => {
    const three = juvenile.filter(({ ageDays }) => ageDays < 120);
    expect(() => fitGrowth(three)).toThrow(CannotFit);
    expect(fitGrowth(three, { asymptotePrior: prior }).usedPrior).toBe(true);
    expect(fitGrowth(three, { models: ['vonBertalanffy'], vonBertalanffyOriginFixed: true }).parameters['t0Days']).toBe(
      0,
    );
  });
});

describe('what cannot be fitted is refused by name', () => {
  const rising = [20, 40, 60, 80, 100];
  const at = (length: (age: number) => number) =>
    rising.flatMap((ageDays) => [-1, 0, 1].map((off) => ({ ageDays, lengthMm: length(ageDays) + off })));
  const reasonOf = (samples: LengthAtAge[], options = {}) => {
    try {
      return fitGrowth(samples, options).model;
    } catch (error) {
      if (error instanceof CannotFit) return error.reason;
      throw error;
    }
  };

  test.each([
    ['no fish', [], 'tooFewFish'],
    ['three fish', lengthsAt([20, 40, 60], [10, 15, 18]), 'tooFewFish'],
    ['all fish of one age', lengthsAt([20, 20, 20, 20, 20, 20], [10, 11, 12, 13, 14, 15]), 'tooFewAges'],
    ['three ages and no species', lengthsAt([20, 20, 40, 40, 60, 60], [10, 11, 15, 16, 18, 19]), 'tooFewAges'],
    ['fish that do not grow', at(() => 30), 'noGrowth'],
    ['fish that shrink', at((age) => 60 - 0.1 * age), 'noGrowth'],
    ['growth that speeds up', at((age) => 10 * Math.exp(0.02 * age)), 'noCurvature'],
  ])('%s', (_, samples, reason) => expect(reasonOf(samples)).toBe(reason));

  test('a straight line is no von Bertalanffy curve', () => {
    expect(
      reasonOf(
        at((age) => 10 + 0.3 * age),
        { models: ['vonBertalanffy'] },
      ),
    ).toBe('noCurvature');
  });

  test('shrinking fish are not made to grow by their species', () => {
    expect(
      reasonOf(
        at((age) => 60 - 0.1 * age),
        { asymptotePrior: { meanMm: 120, sdMm: 14 } },
      ),
    ).toBe('noGrowth');
  });

  test.each([
    [
      'Length of sample 2',
      [
        { ageDays: 20, lengthMm: 10 },
        { ageDays: 30, lengthMm: Number.NaN },
      ],
    ],
    ['Length of sample 1', [{ ageDays: 20, lengthMm: 0 }]],
    ['Age of sample 1', [{ ageDays: Number.POSITIVE_INFINITY, lengthMm: 12 }]],
    ['Age of sample 1', [{ ageDays: -3, lengthMm: 12 }]],
  ])('%s', (what, samples) => {
    expect(() => fitGrowth(samples)).toThrow(BadValue);
    expect(() => fitGrowth(samples)).toThrow(what);
  });

  test.each([
    ['Models', { models: [] }],
    ['Mean of the asymptote prior', { asymptotePrior: { meanMm: 0, sdMm: 10 } }],
    ['SD of the asymptote prior', { asymptotePrior: { meanMm: 120, sdMm: 0 } }],
  ])('%s', (what, options) => {
    expect(() => fitGrowth(seriesOf('B-fit-synthA-vbgf'), options)).toThrow(what);
  });

  test('an age, length or level that is none', () => {
    const fit = fitGrowth(seriesOf('B-fit-synthA-vbgf'));
    expect(() => fit.lengthAt(Number.NaN)).toThrow(BadValue);
    expect(() => fit.ageAt(Number.NaN)).toThrow(BadValue);
    expect(() => fit.lengthAt(30, 1)).toThrow(BadValue);
  });
});
