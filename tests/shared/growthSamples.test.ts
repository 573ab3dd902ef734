import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as z from 'zod/mini';
import { BadValue } from '@/shared/badValue';
import { CannotFit } from '@/shared/growth/cannotFit';
import { fultonK, meanCondition, relativeCondition } from '@/shared/growth/condition';
import { gradingAdvice } from '@/shared/growth/grading';
import { lengthWeight } from '@/shared/growth/lengthWeight';
import { normalQuantile, normalReach, normalShareBelow } from '@/shared/growth/normal';
import { dailyGain, doublingDays, growthPerformance, specificGrowthRate } from '@/shared/growth/rates';
import { correctedCv, isOdd, sampleStats, samplesNeeded } from '@/shared/growth/sampleStats';
import { headsAtLeast, meanNeeded, shareAtLeast } from '@/shared/growth/sizes';
import { studentReach, studentTwoSided } from '@/shared/growth/studentT';
import { Numbers, near, rowsOf, seeded } from './growthRows';

describe('distributions', () => {
  // Student's t tables, worked out again in 30-digit arithmetic.
  test.each([
    [0.95, 1, 12.706204736174694],
    [0.95, 2, 4.302652729749462],
    [0.95, 3, 3.18244630528371],
    [0.95, 4, 2.776445105197794],
    [0.95, 9, 2.262157162798205],
    [0.95, 33, 2.034515297449339],
    [0.99, 30, 2.7499956535672254],
    [0.999, 5, 6.868826625881276],
    [0.5, 7, 0.711141778081786],
    [0.8, 497, 1.283257268738677],
    [0.95, 1997, 1.961152610098764],
  ])('a %s interval with %s degrees of freedom reaches %s standard errors', (level, df, wanted) => {
    near(studentReach(level, df), wanted, 1e-9);
  });

  test('the two-sided share of t and its reach undo each other', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 0.9999, noNaN: true }),
        fc.integer({ min: 1, max: 3000 }),
        (level, df) => {
          near(1 - studentTwoSided(studentReach(level, df), df), level, 1e-9);
        },
      ),
      { numRuns: 500, seed: 1 },
    );
  });

  // R: pnorm, qnorm.
  test.each([
    [-6, 9.865876450376946e-10],
    [-3, 0.0013498980316300946],
    [-1, 0.15865525393145707],
    [0, 0.5],
    [1.959963984540054, 0.975],
    [4, 0.9999683287581669],
  ])('below %s lies %s of the normal distribution', (deviate, share) => {
    near(normalShareBelow(deviate), share, 1e-12);
    expect(normalQuantile(share)).toBeCloseTo(deviate, 9);
  });

  test.each([0, 1, Number.NaN])('a confidence of %s is refused', (level) => {
    expect(() => normalReach(level)).toThrow(BadValue);
    expect(() => studentReach(level, 5)).toThrow(BadValue);
  });
});

describe('one sample', () => {
  const Cv = z.object({
    mean: z.number(),
    sd: z.number(),
    cv: z.number(),
    cv_unbiased: z.number(),
    se: z.number(),
    ci95: Numbers,
  });
  test.each(rowsOf('growth.cv', z.object({ L: Numbers }), Cv))('$id: $source', ({ inputs: { L }, expected }) => {
    const stats = sampleStats(L);
    near(stats.mean, expected.mean, 1e-12);
    near(stats.sd, expected.sd, 1e-12);
    near(stats.cv, expected.cv, 1e-12);
    near(correctedCv(stats.cv ?? 0, stats.n), expected.cv_unbiased, 1e-12);
    near(stats.standardError, expected.se, 1e-12);
    near(stats.low95, expected.ci95[0], 1e-11);
    near(stats.high95, expected.ci95[1], 1e-11);
    expect([stats.n, stats.min, stats.max]).toEqual([10, 18.9, 25.1]);
  });

  test('one fish has a length and no spread', () => {
    expect(sampleStats([31.5])).toEqual({
      n: 1,
      mean: 31.5,
      sd: null,
      cv: null,
      standardError: null,
      low95: null,
      high95: null,
      min: 31.5,
      max: 31.5,
    });
  });

  test('fish measured in another order, or another unit, are the same fish', () => {
    const lengths = fc.array(
      fc.integer({ min: 50, max: 2000 }).map((tenths) => tenths / 10),
      { minLength: 2, maxLength: 40 },
    );
    fc.assert(
      fc.property(lengths, (values) => {
        const stats = sampleStats(values);
        expect(sampleStats(values.toReversed())).toEqual(stats);
        const inches = sampleStats(values.map((mm) => mm / 25.4));
        expect(inches.mean * 25.4).toBeCloseTo(stats.mean, 9);
        expect(inches.cv).toBeCloseTo(stats.cv ?? 0, 9);
      }),
      { numRuns: 100, seed: 6 },
    );
  });

  test('an empty sample or a length that is none is refused', () => {
    expect(() => sampleStats([])).toThrow(BadValue);
    expect(() => sampleStats([31, Number.NaN])).toThrow('Value 2');
  });

  const Size = z.object({ cv: z.number(), E: z.number(), conf: z.number(), N: z.optional(z.number()) });
  test.each(rowsOf('growth.sample_size', Size, z.object({ n: z.number() })))(
    '$id: $source',
    ({ inputs: { cv, E, conf, N }, expected }) => {
      expect(samplesNeeded(cv, E, conf, N)).toBe(expected.n);
    },
  );

  test('a brood is never to be measured more often than it has fish', () => {
    expect(samplesNeeded(0.3, 0.02, 0.95, 25)).toBeLessThanOrEqual(25);
    expect(samplesNeeded(0, 0.05)).toBe(1);
    expect(() => samplesNeeded(0.1, 0)).toThrow(BadValue);
  });

  test('a length far from the others is asked about, one among them is not', () => {
    const before = [31, 32.5, 30, 33, 31.5, 32];
    expect([isOdd(82, before), isOdd(34, before), isOdd(82, [31])]).toEqual([true, false, false]);
  });

  // The limits are common practice, no source.
  test.each([
    ['seven fish', [30, 31, 32, 33, 34, 35, 36], { advice: 'measureMore', missing: 1 }],
    ['an even batch', [30, 31, 32, 33, 34, 35, 36, 33], { advice: 'leave' }],
    ['a batch growing apart', [26, 28, 30, 32, 34, 36, 38, 42], { advice: 'watch' }],
    ['an uneven batch', [25, 26, 27, 34, 36, 44, 45, 46], { advice: 'grade', reason: 'cv' }],
    [
      'one giant',
      [...Array.from({ length: 30 }, (_, i) => 30 + (i % 3)), 61],
      { advice: 'grade', reason: 'twiceAsLong' },
    ],
  ])('%s', (_, lengths, wanted) => expect(gradingAdvice(sampleStats(lengths))).toMatchObject(wanted));
});

describe('rates and condition', () => {
  const Sgr = z.object({ W1: z.number(), W2: z.number(), days: z.number() });
  test.each(rowsOf('growth.sgr', Sgr, z.nullable(z.number())))(
    '$id: $source',
    ({ inputs: { W1, W2, days }, expected }) => {
      const rate = specificGrowthRate({ value: W1, day: 0 }, { value: W2, day: days });
      if (expected === null) expect(rate).toBeNull();
      else near(rate, expected, 1e-12);
    },
  );
  test('a rate over no time, or of what is no number, is none', () => {
    expect(specificGrowthRate({ value: 2, day: 5 }, { value: 3, day: 5 })).toBeNull();
    expect(dailyGain({ value: 2, day: 5 }, { value: 3, day: 5 })).toBeNull();
    expect(doublingDays(-1)).toBeNull();
    expect(() => specificGrowthRate({ value: Number.NaN, day: 0 }, { value: 3, day: 5 })).toThrow(BadValue);
  });
  test.each(rowsOf('growth.doubling_time', z.object({ SGR: z.number() }), z.number()))(
    '$id: $source',
    ({ inputs, expected }) => {
      near(doublingDays(inputs.SGR), expected, 1e-12);
    },
  );
  const Agr = z.object({ L1: z.number(), L2: z.number(), days: z.number() });
  test.each(rowsOf('growth.agr', Agr, z.number()))('$id: $source', ({ inputs: { L1, L2, days }, expected }) => {
    near(dailyGain({ value: L1, day: 0 }, { value: L2, day: days }), expected, 1e-12);
  });
  test.each(rowsOf('growth.fulton', z.object({ W_g: z.number(), L_mm: z.number() }), z.number()))(
    '$id: $source',
    ({ inputs, expected }) => {
      near(fultonK(inputs.W_g, inputs.L_mm), expected, 1e-12);
      expect(() => fultonK(0, inputs.L_mm)).toThrow(BadValue);
    },
  );
  const Kmean = z.object({ a: z.number(), b: z.number(), L_cm: z.number() });
  test.each(rowsOf('growth.kmean', Kmean, z.number()))('$id: $source', ({ inputs: { a, b, L_cm }, expected }) => {
    near(meanCondition(L_cm * 10, { a, b }), expected, 1e-12);
  });
  const Kn = z.object({ W: z.number(), L_cm: z.number(), a: z.number(), b: z.number() });
  test.each(rowsOf('growth.relative_condition', Kn, z.number()))(
    '$id: $source',
    ({ inputs: { W, L_cm, a, b }, expected }) => {
      near(relativeCondition(W, L_cm * 10, { a, b }), expected, 1e-12);
    },
  );
  const Phi = z.object({ Linf_cm: z.number(), K_per_yr: z.number() });
  test.each(rowsOf('growth.phi_prime', Phi, z.number()))('$id: $source', ({ inputs, expected }) => {
    near(growthPerformance(inputs.Linf_cm * 10, inputs.K_per_yr), expected, 1e-12);
  });
});

describe('weight from length', () => {
  const Lw = z.object({
    n: z.number(),
    b: z.number(),
    se_b: z.number(),
    lna: z.number(),
    se_lna: z.number(),
    s2: z.number(),
    a_corrected: z.number(),
    r2: z.number(),
    b_ci95: Numbers,
    isometry_t: z.number(),
    isometry_p: z.number(),
    W_at_5cm: z.number(),
  });
  test.each(rowsOf('growth.length_weight', z.object({ L_cm: Numbers, W_g: Numbers }), Lw))(
    '$id: $source',
    ({ inputs: { L_cm, W_g }, expected }) => {
      const fit = lengthWeight(L_cm.map((cm, i) => ({ lengthMm: cm * 10, weightG: W_g[i] ?? Number.NaN })));
      near(fit.a, expected.a_corrected, 1e-8);
      near(fit.b, expected.b, 1e-8);
      near(fit.seB, expected.se_b, 1e-8);
      near(fit.lnA, expected.lna, 1e-8);
      near(fit.seLnA, expected.se_lna, 1e-8);
      near(fit.residualVariance, expected.s2, 1e-8);
      near(fit.rSquared, expected.r2, 1e-8);
      near(fit.b95.low, expected.b_ci95[0], 1e-8);
      near(fit.b95.high, expected.b_ci95[1], 1e-8);
      near(fit.isometry?.t, expected.isometry_t, 1e-8);
      near(fit.isometry?.p, expected.isometry_p, 1e-8);
      near(fit.weightAt(50), expected.W_at_5cm, 1e-8);
      expect(fit.n).toBe(expected.n);
    },
  );

  test('fish that follow a power of their length give that power back', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 2.5, max: 3.5, noNaN: true }),
        fc.double({ min: 0.005, max: 0.05, noNaN: true }),
        (b, a) => {
          const fit = lengthWeight(
            [21, 34, 55, 89].map((lengthMm) => ({ lengthMm, weightG: a * (lengthMm / 10) ** b })),
          );
          near(fit.b, b, 1e-9);
          near(fit.a, a, 1e-9);
          near(fit.weightAt(40), a * 4 ** b, 1e-9);
        },
      ),
      { numRuns: 50, seed: 8 },
    );
  });

  test('two fish, fish of one length, and a weight that is none are refused', () => {
    const pair = { lengthMm: 30, weightG: 0.6 };
    expect(() => lengthWeight([pair, pair])).toThrow(CannotFit);
    expect(() => lengthWeight([pair, pair, pair])).toThrow('oneLength');
    expect(() => lengthWeight([pair, { lengthMm: 31, weightG: 0 }])).toThrow('Weight of fish 2');
  });
});

describe('how many are at a length', () => {
  // Table of the normal distribution: 0.8413 lie above one standard deviation below the mean, 0.8 above 0.8416 below.
  test('half the fish are at the mean or over, and the rest follows the normal table', () => {
    expect(shareAtLeast(50, { meanMm: 50, cv: 0.1 })).toBeCloseTo(0.5, 14);
    expect(shareAtLeast(45, { meanMm: 50, cv: 0.1 })).toBeCloseTo(0.8413447460685429, 12);
    expect(shareAtLeast(50, { meanMm: 49, cv: 0 })).toBe(0);
    expect(shareAtLeast(45, { meanMm: meanNeeded(45, 0.8, 0.12) ?? 0, cv: 0.12 })).toBeCloseTo(0.8, 12);
    expect(meanNeeded(45, 0.8, 1.5)).toBeNull();
    expect(() => shareAtLeast(50, { meanMm: 0, cv: 0.1 })).toThrow(BadValue);
  });

  // Binomial(29, 1/2): 2.5 % quantile 9, 97.5 % quantile 20 (R: qbinom).
  test('with mean and spread known, the range is the binomial’s', () => {
    expect(headsAtLeast({ meanMm: 50, seMm: 0, cv: 0.1, cvSd: 0 }, 50, 29)).toEqual({ expected: 14, low: 9, high: 20 });
  });

  test('doubt about the mean widens it; no fish are none; fish all alike are all or none', () => {
    const sure = headsAtLeast({ meanMm: 52, seMm: 0.2, cv: 0.1, cvSd: 0.01 }, 50, 29);
    const unsure = headsAtLeast({ meanMm: 52, seMm: 4, cv: 0.1, cvSd: 0.03 }, 50, 29);
    expect(unsure.low).toBeLessThan(sure.low);
    expect(unsure.high).toBeGreaterThan(sure.high);
    expect(headsAtLeast({ meanMm: 52, seMm: 4, cv: 0.1, cvSd: 0.03 }, 50, 0)).toEqual({ expected: 0, low: 0, high: 0 });
    expect(headsAtLeast({ meanMm: 52, seMm: 1, cv: 0, cvSd: 0 }, 50, 29)).toEqual({ expected: 29, low: 29, high: 29 });
    expect(headsAtLeast({ meanMm: 20, seMm: 0.1, cv: 0.1, cvSd: 0.01 }, 90, 29)).toEqual({
      expected: 0,
      low: 0,
      high: 0,
    });
  });

  test('the range holds the true number in 92 to 99 % of 1,000 seeded batches', () => {
    const { normal } = seeded(31);
    let held = 0;
    for (let batch = 0; batch < 1000; batch += 1) {
      const sample = Array.from({ length: 15 }, () => 50 + 5 * normal());
      const { mean, cv, standardError } = sampleStats(sample);
      const size = { meanMm: mean, seMm: standardError ?? 0, cv: cv ?? 0, cvSd: (cv ?? 0) / Math.sqrt(30) };
      const there = Array.from({ length: 40 }, () => 50 + 5 * normal()).filter((length) => length >= 48).length;
      const { low, high } = headsAtLeast(size, 48, 40);
      if (low <= there && there <= high) held += 1;
    }
    console.log(`95 % range of the fish at a length, 1000 batches: held in ${held / 10} %`);
    expect(held).toBeGreaterThanOrEqual(920);
    expect(held).toBeLessThanOrEqual(990);
  });
});
