import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { SHAPES } from '@/shared/growth/curves';
import { fitGrowth, type GrowthFit, type GrowthModel, type LengthAtAge } from '@/shared/growth/fitGrowth';
import { GrowthError } from '@/shared/growth/growthError';
import { descend } from '@/shared/growth/leastSquares';
import {
  absoluteGrowthRate,
  doublingDays,
  fultonK,
  growthPerformance,
  lengthWeight,
  meanCondition,
  relativeCondition,
  specificGrowthRate,
} from '@/shared/growth/rates';
import { isOdd, sampleStats, samplesNeeded, shareAtLeast } from '@/shared/growth/sampleStats';
import { normalCdf, normalQuantile, studentT } from '@/shared/growth/studentT';
// Each row carries its own source and how it was obtained.
import checks from './growthChecks.json';

type Row = { id: string; kind: string; source: string; inputs: Record<string, never>; expected: never; tol: unknown };
const rows = (kind: string) =>
  (checks as unknown as Row[]).filter((row) => row.kind === kind).map((row) => [row.id, row] as const);

function rowOf(id: string): Row {
  const row = (checks as unknown as Row[]).find((one) => one.id === id);
  if (!row) throw new Error(`No row ${id}`);
  return row;
}
const seriesOf = (id: string) => rowOf(id).inputs as unknown as { t: number[]; y: number[] };

const MODELS: Record<string, GrowthModel> = { vbgf: 'vonBertalanffy', gompertz: 'gompertz', logistic: 'logistic' };
const near = (actual: number, wanted: number, relative: number) =>
  expect(Math.abs(actual - wanted), `${actual} for ${wanted}`).toBeLessThanOrEqual(relative * Math.abs(wanted) + 1e-12);
const pointsOf = (t: number[], y: number[]): LengthAtAge[] => t.map((ageDays, i) => ({ ageDays, lengthMm: y[i] ?? 0 }));
const rate = ({ parameters }: GrowthFit) => (parameters['kPerYear'] ?? 0) / 365.25;
const origin = ({ parameters }: GrowthFit) => parameters['t0Days'] ?? parameters['tiDays'] ?? 0;

describe('curves fitted to published data', () => {
  test.each(rows('growth.fit'))('%s', (_id, row) => {
    const { model, t, y } = row.inputs as unknown as { model: string; t: number[]; y: number[] };
    const wanted = row.expected as unknown as {
      par: Record<string, number>;
      se: Record<string, number>;
      rss: number;
      sigma: number;
      AICc: number;
      pred: { t: number; fit: number; lo: number; hi: number; pi_lo: number; pi_hi: number }[];
    };
    const fit = fitGrowth(pointsOf(t, y), { models: [MODELS[model] ?? 'vonBertalanffy'] });
    const k = model === 'vbgf' ? 'K' : 'g';
    const m = model === 'vbgf' ? 't0' : 'ti';
    near(fit.parameters['linfMm'] ?? 0, wanted.par['Linf'] ?? 0, 1e-5);
    near(rate(fit), wanted.par[k] ?? 0, 1e-5);
    near(origin(fit), wanted.par[m] ?? 0, 1e-4);
    near(fit.standardErrors['linfMm'] ?? 0, wanted.se['Linf'] ?? 0, 1e-3);
    near((fit.standardErrors['kPerYear'] ?? 0) / 365.25, wanted.se[k] ?? 0, 1e-3);
    near(fit.residualSumOfSquares, wanted.rss, 1e-6);
    near(fit.residualSdMm, wanted.sigma, 1e-6);
    expect(fit.aicc).toBeCloseTo(wanted.AICc, 4);
    for (const { t: age, fit: mean, lo, hi, pi_lo, pi_hi } of wanted.pred) {
      const band = fit.lengthAt(age);
      near(band.mean, mean, 1e-4);
      near(band.low, lo, 1e-3);
      near(band.high, hi, 1e-3);
      near(band.predictionLow, pi_lo, 1e-3);
      near(band.predictionHigh, pi_hi, 1e-3);
    }
  });

  // NIST StRD nonlinear regression, certified values: the sets whose model is one of ours.
  test.each(rows('growth.fit_lite'))('%s', (_id, row) => {
    const { model, t, y } = row.inputs as unknown as { model: string; t: number[]; y: number[] };
    const wanted = row.expected as unknown as { par: Record<string, number>; rss: number };
    const fixed = model.includes('fixed');
    const fit = fitGrowth(pointsOf(t, y), {
      models: [fixed ? 'vonBertalanffy' : (MODELS[model] ?? 'logistic')],
      vonBertalanffyOriginFixed: fixed,
    });
    near(fit.parameters['linfMm'] ?? 0, wanted.par['Linf'] ?? 0, 1e-6);
    near(rate(fit), wanted.par['K'] ?? wanted.par['g'] ?? 0, 1e-6);
    if (wanted.par['ti']) near(origin(fit), wanted.par['ti'], 1e-6);
    near(fit.residualSumOfSquares, wanted.rss, 1e-8);
  });

  test.each(rows('growth.nist').filter(([id]) => /Misra1a|BoxBOD/.test(id)))('%s with standard errors', (_id, row) => {
    const { x, y } = row.inputs as unknown as { x: number[]; y: number[] };
    const wanted = row.expected as unknown as { par: number[]; se: number[]; rss: number; rsd: number };
    const fit = fitGrowth(pointsOf(x, y), { models: ['vonBertalanffy'], vonBertalanffyOriginFixed: true });
    near(fit.parameters['linfMm'] ?? 0, wanted.par[0] ?? 0, 1e-6);
    near(rate(fit), wanted.par[1] ?? 0, 1e-6);
    near(fit.standardErrors['linfMm'] ?? 0, wanted.se[0] ?? 0, 1e-5);
    near((fit.standardErrors['kPerYear'] ?? 0) / 365.25, wanted.se[1] ?? 0, 1e-5);
    near(fit.residualSdMm, wanted.rsd, 1e-7);
  });

  test.each(rows('growth.age_at_length'))('%s turns the curve round', (_id, row) => {
    const inputs = row.inputs as unknown as Record<string, number> & { model: string };
    const shape = SHAPES[MODELS[inputs.model as unknown as string] ?? 'vonBertalanffy'];
    const age =
      (inputs['t0'] ?? inputs['ti'] ?? 0) +
      shape.inverse((inputs['L'] ?? 0) / (inputs['Linf'] ?? 1)) / (inputs['K'] ?? inputs['g'] ?? 1);
    near(age, row.expected as unknown as number, 1e-9);
  });

  test.each(rows('growth.predict'))('%s', (_id, row) => {
    const { Linf, K, t0, t } = row.inputs as unknown as { Linf: number; K: number; t0: number; t: number[] };
    const lengths = t.map((age) => Linf * SHAPES.vonBertalanffy.at(K * (age - t0)));
    (row.expected as unknown as number[]).forEach((wanted, i) => {
      near(lengths[i] ?? 0, wanted, 1e-9);
    });
  });
});

describe('the choice among curves', () => {
  const synth = (letter: string) => {
    const { t, y } = seriesOf(`B-fit-synth${letter}-vbgf`);
    return fitGrowth(pointsOf(t, y));
  };
  test.each([
    ['A', 'vonBertalanffy'],
    ['C', 'gompertz'],
  ])('synth%s is a %s curve, with the published weights', (letter, best) => {
    const fit = synth(letter);
    expect(fit.model).toBe(best);
    const { weight } = rowOf(`B-aicc-synth${letter}`).expected as unknown as { weight: Record<string, number> };
    for (const [name, wanted] of Object.entries(weight)) {
      expect(fit.candidates.find(({ model }) => model === MODELS[name])?.weight).toBeCloseTo(wanted, 6);
    }
  });
});

describe('the fit', () => {
  const truth = { vonBertalanffy: [120, 0.006, -20], gompertz: [100, 0.012, 70], logistic: [95, 0.02, 90] } as const;
  const ages = [20, 45, 70, 100, 140, 180, 240, 320, 420];

  test.each(Object.entries(truth))('gives the parameters back of noiseless %s lengths', (model, [linf, k, m]) => {
    const shape = SHAPES[model as GrowthModel];
    const fit = fitGrowth(
      pointsOf(
        ages,
        ages.map((age) => linf * shape.at(k * (age - m))),
      ),
      { models: [model as GrowthModel] },
    );
    near(fit.parameters['linfMm'] ?? 0, linf, 1e-7);
    near(rate(fit), k, 1e-7);
    near(origin(fit), m, 1e-6);
  });

  test('ends at the same optimum from 100 seeded starts, to 1e-5', () => {
    const { t, y } = seriesOf('B-fit-synthC-gompertz');
    const fit = fitGrowth(pointsOf(t, y), { models: ['gompertz'] });
    const groups = [...new Set(t)].map((age) => {
      const own = y.filter((_y, i) => t[i] === age);
      return { age, n: own.length, mean: own.reduce((a, b) => a + b, 0) / own.length };
    });
    const problem = { shape: SHAPES.gompertz, groups, pull: { mean: 0, weight: 0 }, originFixed: false };
    const chance = seeded(7);
    for (let i = 0; i < 100; i += 1) {
      const end = descend(problem, { linf: 40 + 260 * chance(), k: 0.003 * 8 ** chance(), m: -20 + 250 * chance() });
      near(end.linf, fit.parameters['linfMm'] ?? 0, 1e-5);
      near(end.k, rate(fit), 1e-5);
      near(end.m, origin(fit), 1e-5);
    }
  });

  test('does not depend on the order of the lengths', () => {
    const { t, y } = seriesOf('B-fit-synthA-vbgf');
    const points = pointsOf(t, y);
    const fit = fitGrowth(points);
    fc.assert(
      fc.property(fc.shuffledSubarray(points, { minLength: points.length }), (shuffled) => {
        expect(fitGrowth(shuffled).parameters).toEqual(fit.parameters);
      }),
      { numRuns: 20, seed: 3 },
    );
  });

  test('covers the true length in 92 to 98 % of 1,000 seeded broods', () => {
    const chance = seeded(2026);
    const normal = () => Math.sqrt(-2 * Math.log(1 - chance())) * Math.cos(2 * Math.PI * chance());
    const { at } = SHAPES.vonBertalanffy;
    const mean = (age: number) => 110 * at(0.0045 * (age + 25));
    let [covered, within] = [0, 0];
    for (let brood = 0; brood < 1000; brood += 1) {
      const points = [40, 80, 130, 190, 260, 340, 430, 540].flatMap((age) =>
        Array.from({ length: 6 }, () => ({ ageDays: age, lengthMm: mean(age) + 2 * normal() })),
      );
      const fit = fitGrowth(points, { models: ['vonBertalanffy'] });
      const band = fit.lengthAt(300);
      if (band.low <= mean(300) && mean(300) <= band.high) covered += 1;
      const fish = mean(300) + 2 * normal();
      if (band.predictionLow <= fish && fish <= band.predictionHigh) within += 1;
    }
    console.log(
      `95 % intervals: the mean was covered in ${covered / 10} %, a new fish in ${within / 10} % of 1,000 simulated broods`,
    );
    for (const count of [covered, within]) expect(count).toSatisfy((n: number) => n >= 920 && n <= 980);
  });

  test('draws juvenile-only data to the species’ adult size, and lets grown data speak', () => {
    const juvenile = [30, 60, 90].flatMap((age) =>
      [-1, 0, 1].map((d) => ({ ageDays: age, lengthMm: 110 * SHAPES.vonBertalanffy.at(0.003 * (age + 25)) + d })),
    );
    const prior = { meanMm: 120, sdMm: 12 };
    const fit = fitGrowth(juvenile, { models: ['vonBertalanffy'], asymptotePrior: prior });
    expect(fit.usedPrior).toBe(true);
    expect(fit.parameters['linfMm']).toBeGreaterThan(95);
    expect(fit.parameters['linfMm']).toBeLessThan(145);
    const { t, y } = seriesOf('B-fit-synthA-vbgf');
    const grown = fitGrowth(pointsOf(t, y), { models: ['vonBertalanffy'], asymptotePrior: { meanMm: 130, sdMm: 13 } });
    near(grown.parameters['linfMm'] ?? 0, 110.4585, 0.005);
  });

  test('says when a length is reached, with its interval, and that one beyond the curve never is', () => {
    const { t, y } = seriesOf('B-fit-synthC-gompertz');
    const fit = fitGrowth(pointsOf(t, y), { models: ['gompertz'] });
    const age = fit.ageAt(60);
    expect(fit.lengthAt(age?.mean ?? 0).mean).toBeCloseTo(60, 8);
    expect(fit.lengthAt(age?.low ?? 0).high).toBeCloseTo(60, 4);
    expect(fit.lengthAt(age?.high ?? 0).low).toBeCloseTo(60, 4);
    expect(fit.ageAt(101)).toBeNull();
  });

  test.each([
    ['no number', [{ ageDays: Number.NaN, lengthMm: 20 }], BadValue],
    ['a length below zero', [{ ageDays: 3, lengthMm: -2 }], BadValue],
    ['too few ages', [1, 1, 2, 2, 2].map((ageDays) => ({ ageDays, lengthMm: 20 + ageDays })), GrowthError],
  ])('refuses %s', (_what, points, kind) => {
    expect(() => fitGrowth(points)).toThrow(kind);
  });
});

describe('samples and rates', () => {
  test.each(rows('growth.cv'))('%s', (_id, row) => {
    const { L } = row.inputs as unknown as { L: number[] };
    const wanted = row.expected as unknown as {
      mean: number;
      sd: number;
      cv: number;
      se: number;
      ci95: [number, number];
    };
    const stats = sampleStats(L);
    near(stats.mean, wanted.mean, 1e-9);
    near(stats.sd ?? 0, wanted.sd, 1e-9);
    near(stats.cv ?? 0, wanted.cv, 1e-9);
    near(stats.standardError ?? 0, wanted.se, 1e-9);
    near(stats.low95 ?? 0, wanted.ci95[0], 1e-9);
    near(stats.high95 ?? 0, wanted.ci95[1], 1e-9);
  });
  test.each(rows('growth.sample_size'))('%s', (_id, row) => {
    const { cv, E, conf, N } = row.inputs as unknown as { cv: number; E: number; conf: number; N?: number };
    expect(samplesNeeded(cv, E, conf, N ?? null)).toBe((row.expected as unknown as { n: number }).n);
  });
  test.each(rows('growth.sgr'))('%s', (_id, row) => {
    const { W1, W2, days } = row.inputs as unknown as { W1: number; W2: number; days: number };
    const found = specificGrowthRate({ value: W1, day: 0 }, { value: W2, day: days });
    if (row.expected === null) expect(found).toBeNull();
    else near(found ?? 0, row.expected as unknown as number, 1e-9);
  });
  test.each(rows('growth.length_weight'))('%s', (_id, row) => {
    const { L_cm, W_g } = row.inputs as unknown as { L_cm: number[]; W_g: number[] };
    const wanted = row.expected as unknown as {
      a_corrected: number;
      b: number;
      se_b: number;
      s2: number;
      W_at_5cm: number;
      b_ci95: [number, number];
    };
    const fit = lengthWeight(L_cm.map((cm, i) => ({ lengthMm: cm * 10, weightG: W_g[i] ?? 0 })));
    near(fit.a, wanted.a_corrected, 1e-8);
    near(fit.b, wanted.b, 1e-8);
    near(fit.seB, wanted.se_b, 1e-8);
    near(fit.residualVariance, wanted.s2, 1e-8);
    near(fit.b95.low, wanted.b_ci95[0], 1e-8);
    near(fit.weightAt(50), wanted.W_at_5cm, 1e-8);
  });
  test('single rates match their rows', () => {
    const expected = (kind: string) => rows(kind)[0]?.[1].expected as unknown as number;
    near(doublingDays(5) ?? 0, expected('growth.doubling_time'), 1e-9);
    near(absoluteGrowthRate({ value: 12, day: 0 }, { value: 31.5, day: 65 }) ?? 0, expected('growth.agr'), 1e-9);
    near(fultonK(14.2, 95), expected('growth.fulton'), 1e-9);
    near(meanCondition(100, { a: 0.0185, b: 3.08 }), expected('growth.kmean'), 1e-9);
    near(relativeCondition(5.1, 60, { a: 0.0219, b: 3.02 }), expected('growth.relative_condition'), 1e-9);
    near(growthPerformance(211.21, 0.24), expected('growth.phi_prime'), 1e-9);
  });
  test('a length far from the others is asked about, one among them is not', () => {
    const before = [31, 32.5, 30, 33, 31.5, 32];
    expect(isOdd(82, before)).toBe(true);
    expect(isOdd(34, before)).toBe(false);
    expect(isOdd(82, [31])).toBe(false);
  });
  test('half the fish are at the mean or over it', () => {
    expect(shareAtLeast(50, { meanMm: 50, cv: 0.1 })).toBeCloseTo(0.5, 12);
    // Standard normal table: 0.8413 below one standard deviation.
    expect(shareAtLeast(45, { meanMm: 50, cv: 0.1 })).toBeCloseTo(0.841344746, 9);
  });
});

// Tables of t and of the normal distribution in any handbook of statistics (R: qt, qnorm), from memory.
test.each([
  [0.95, 1, 12.7062047364],
  [0.95, 2, 4.3026527297],
  [0.95, 10, 2.228138852],
  [0.99, 30, 2.7499956536],
  [0.95, 120, 1.9799304051],
  [0.9, 5, 2.0150483733],
])('two-sided t for %s at %s degrees of freedom is %s', (level, df, wanted) =>
  expect(studentT(level, df)).toBeCloseTo(wanted, 8),
);
test('normal quantiles and shares', () => {
  expect(normalQuantile(0.95)).toBeCloseTo(1.959963984540054, 12);
  expect(normalCdf(1.959963984540054)).toBeCloseTo(0.975, 14);
  expect(normalCdf(-4)).toBeCloseTo(3.167124183311992e-5, 15);
});

/** Mulberry32: the same numbers at every run. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
