import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as z from 'zod/mini';
import { BadValue } from '@/shared/badValue';
import type { HeadKind, LedgerEntry } from '@/shared/broods/headEntry';
import {
  ageOn,
  kaplanMeier,
  mortalityRate,
  stageSurvival,
  survivalByAge,
  survivalOf,
  survivalWords,
  wilson,
} from '@/shared/broods/survival';
import { Numbers, near, rowsOf, seeded } from './growthRows';

describe('a share and its interval', () => {
  const Wilson = z.object({ k: z.number(), n: z.number(), conf: z.number() });
  const Limits = z.object({ p: z.number(), lo: z.number(), hi: z.number() });
  test.each(rowsOf('surv.wilson', Wilson, Limits))(
    '$id: $source',
    ({ inputs: { k, n, conf }, expected: { p, lo, hi } }) => {
      const interval = wilson(k, n, conf);
      expect(interval?.share).toBeCloseTo(p, 12);
      expect(interval?.low).toBeCloseTo(lo, 10);
      expect(interval?.high).toBeCloseTo(hi, 10);
    },
  );

  test('none of none says nothing; more than there were, or half a fish, is refused', () => {
    expect(wilson(0, 0)).toBeNull();
    for (const [k, n] of [
      [5, 4],
      [-1, 4],
      [1.5, 4],
      [1, Number.NaN],
    ] as const)
      expect(() => wilson(k, n)).toThrow(BadValue);
  });

  test('the interval holds the share, stays within 0 and 1, and narrows with more fish', () => {
    const counts = fc
      .integer({ min: 1, max: 500 })
      .chain((n) => fc.tuple(fc.integer({ min: 0, max: n }), fc.constant(n)));
    fc.assert(
      fc.property(counts, ([k, n]) => {
        const [one, ten] = [wilson(k, n), wilson(10 * k, 10 * n)];
        if (!one || !ten) throw new Error('no interval');
        expect(0 <= one.low && one.low <= one.share && one.share <= one.high && one.high <= 1).toBe(true);
        expect(ten.high - ten.low).toBeLessThan(one.high - one.low);
      }),
      { numRuns: 200, seed: 9 },
    );
  });

  test('is said in whole percent', () => {
    const interval = wilson(29, 34);
    expect(interval && survivalWords(interval)).toBe('85 %, between 70 and 94 %');
  });
});

describe('mortality a day', () => {
  const Counts = z.object({ N0: z.number(), Nt: z.number(), t: z.number() });
  test.each(rowsOf('surv.Z', Counts, z.nullable(z.object({ Z: z.number() }))))(
    '$id: $source',
    ({ inputs: { N0, Nt, t }, expected }) => {
      const rate = mortalityRate({ count: N0, day: 0 }, { count: Nt, day: t });
      if (expected === null) expect(rate).toBeNull();
      else near(rate, expected.Z, 1e-12);
    },
  );

  test('more fish later is a count to look at; no time or no fish is no rate', () => {
    expect(() => mortalityRate({ count: 4, day: 0 }, { count: 5, day: 9 })).toThrow(BadValue);
    expect(mortalityRate({ count: 4, day: 9 }, { count: 3, day: 9 })).toBeNull();
    expect(mortalityRate({ count: 0, day: 0 }, { count: 0, day: 9 })).toBeNull();
  });
});

describe('survival of fish followed one by one', () => {
  const Step = z.object({
    t: z.number(),
    n: z.number(),
    d: z.number(),
    S: z.number(),
    se: z.number(),
    lo_loglog: z.number(),
    hi_loglog: z.number(),
  });
  const rows = rowsOf('surv.kaplan_meier', z.object({ time: Numbers, event: Numbers }), z.array(Step));
  const fatesOf = ({ time, event }: { time: number[]; event: number[] }) =>
    time.map((at, i) => ({ time: at, died: event[i] === 1 }));

  test.each(rows)('$id: $source', ({ inputs, expected }) => {
    const steps = kaplanMeier(fatesOf(inputs));
    expect(steps.map(({ time, atRisk, deaths }) => [time, atRisk, deaths])).toEqual(
      expected.map(({ t, n, d }) => [t, n, d]),
    );
    expected.forEach(({ S, se, lo_loglog, hi_loglog }, i) => {
      expect(steps[i]?.survival).toBeCloseTo(S, 12);
      expect(steps[i]?.standardError).toBeCloseTo(se, 12);
      expect(steps[i]?.low).toBeCloseTo(lo_loglog, 9);
      expect(steps[i]?.high).toBeCloseTo(hi_loglog, 9);
    });
  });

  test('the order of the lines does not matter, nor whether fish of one fate share a line', () => {
    for (const { inputs } of rows) {
      const fates = fatesOf(inputs);
      fc.assert(
        fc.property(fc.shuffledSubarray(fates, { minLength: fates.length }), (shuffled) => {
          expect(kaplanMeier(shuffled)).toEqual(kaplanMeier(fates));
        }),
        { numRuns: 20, seed: 3 },
      );
    }
    expect(
      kaplanMeier([
        { time: 3, died: true, heads: 2 },
        { time: 9, died: false, heads: 8 },
      ]),
    ).toEqual(kaplanMeier([3, 3, 9, 9, 9, 9, 9, 9, 9, 9].map((time) => ({ time, died: time === 3 }))));
  });

  test('without departures it is the plain share alive', () => {
    const steps = kaplanMeier([
      { time: 3, died: true, heads: 2 },
      { time: 8, died: true, heads: 3 },
      { time: 30, died: false, heads: 15 },
    ]);
    expect(steps.map(({ survival }) => survival)).toEqual([0.9, 0.75]);
  });

  test('when the last fish dies there are no limits to give', () => {
    const last = kaplanMeier([
      { time: 2, died: true },
      { time: 4, died: true },
    ]).at(-1);
    expect(last).toEqual({ time: 4, atRisk: 1, deaths: 1, survival: 0, standardError: null, low: null, high: null });
    expect(kaplanMeier([{ time: 4, died: false }])).toEqual([]);
    expect(() => kaplanMeier([{ time: Number.NaN, died: true }])).toThrow(BadValue);
    expect(() => survivalOf([{ time: 1, atRisk: 2, deaths: 3 }])).toThrow(BadValue);
  });

  test('the limits hold the truth in 92 to 98 % of 1,000 seeded broods, half of them sold on the way', () => {
    const { chance } = seeded(12);
    let held = 0;
    for (let brood = 0; brood < 1000; brood += 1) {
      const fates = Array.from({ length: 60 }, () => {
        const [dies, leaves] = [-Math.log(1 - chance()) / 0.005, 120 * chance()];
        return { time: Math.min(dies, leaves), died: dies < leaves };
      });
      const at = kaplanMeier(fates).findLast(({ time }) => time <= 60);
      if ((at?.low ?? 1) <= Math.exp(-0.3) && Math.exp(-0.3) <= (at?.high ?? 1)) held += 1;
    }
    console.log(`95 % limits of survival to 60 days, 1000 broods: held in ${held / 10} %`);
    expect(held).toBeGreaterThanOrEqual(920);
    expect(held).toBeLessThanOrEqual(980);
  });
});

describe('survival out of a ledger', () => {
  const entry = (onDay: string, kind: HeadKind, heads: number): LedgerEntry => ({
    id: `${onDay}-${kind}`,
    on: onDay,
    at: `${onDay}T12:00:00.000Z`,
    kind,
    heads,
  });

  // Worked by hand: 40 swim, 4 die (36/40), 6 are sold, 1 is not found, 3 of 29 die: 0.9 * 26 / 29.
  test('only losses are deaths; sold fish and those not found leave without having died', () => {
    const steps = survivalByAge(
      [
        entry('2026-05-01', 'opening', 40),
        entry('2026-05-11', 'loss', 4),
        entry('2026-05-20', 'sold', 6),
        entry('2026-05-21', 'recount', 29),
        entry('2026-06-01', 'loss', 3),
      ],
      '2026-04-10',
    );
    expect(steps.map(({ time, atRisk, deaths }) => [time, atRisk, deaths])).toEqual([
      [31, 40, 4],
      [52, 29, 3],
    ]);
    expect(steps[1]?.survival).toBeCloseTo((0.9 * 26) / 29, 12);
  });

  test('fish moved in count from then on, and culled fish did not die', () => {
    const steps = survivalByAge(
      [
        entry('2026-05-01', 'opening', 10),
        entry('2026-05-02', 'movedIn', 10),
        entry('2026-05-03', 'cull', 5),
        entry('2026-05-04', 'loss', 3),
      ],
      '2026-04-10',
    );
    expect(steps).toMatchObject([{ atRisk: 15, deaths: 3, survival: 0.8 }]);
  });

  test('more found dead than were on the books were all alive before', () => {
    const steps = survivalByAge([entry('2026-05-01', 'opening', 4), entry('2026-05-03', 'loss', 6)], '2026-04-10');
    expect(steps).toMatchObject([{ atRisk: 6, deaths: 6, survival: 0 }]);
  });
});

describe('stages', () => {
  const Stage = z.object({
    stage: z.string(),
    n: z.number(),
    S_step: z.number(),
    S_cum: z.number(),
    wilson_cum: Numbers,
  });
  const Stages = z.object({ stages: z.array(z.tuple([z.string(), z.number()])) });
  test.each(rowsOf('surv.stage', Stages, z.array(Stage)))('$id: $source', ({ inputs: { stages }, expected }) => {
    const steps = stageSurvival(stages.map(([stage, n]) => ({ stage, n })));
    expect(steps.map(({ stage, n }) => [stage, n])).toEqual(expected.map(({ stage, n }) => [stage, n]));
    expected.forEach(({ S_step, S_cum, wilson_cum }, i) => {
      expect(steps[i]?.step).toBeCloseTo(S_step, 12);
      expect(steps[i]?.survival.share).toBeCloseTo(S_cum, 12);
      expect(steps[i]?.survival.low).toBeCloseTo(wilson_cum[0] ?? Number.NaN, 10);
      expect(steps[i]?.survival.high).toBeCloseTo(wilson_cum[1] ?? Number.NaN, 10);
    });
  });

  test('a stage with more fish than the one before is named; a brood of none has no survival', () => {
    expect(() =>
      stageSurvival([
        { stage: 'eggs', n: 20 },
        { stage: 'wrigglers', n: 22 },
      ]),
    ).toThrow('wrigglers');
    expect(
      stageSurvival([
        { stage: 'eggs', n: 0 },
        { stage: 'wrigglers', n: 0 },
      ]),
    ).toEqual([]);
    expect(stageSurvival([])).toEqual([]);
    expect(
      stageSurvival([
        { stage: 'eggs', n: 9 },
        { stage: 'wrigglers', n: 0 },
        { stage: 'fry', n: 0 },
      ])[1]?.step,
    ).toBeNull();
  });
});

test('age counts from the middle of the days between which the spawn lies', () => {
  expect(ageOn('2026-04-10', '2026-04-14', '2026-05-12')).toBe(30);
});
