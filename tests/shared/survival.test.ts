import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { kaplanMeier, mortalityRate, stageSurvival, survivalWords, wilson } from '@/shared/broods/survival';
// Each row carries its own source and how it was obtained.
import checks from './growthChecks.json';

type Row = { id: string; kind: string; inputs: unknown; expected: unknown };
const rows = (kind: string) =>
  (checks as unknown as Row[]).filter((row) => row.kind === kind).map((row) => [row.id, row] as const);

describe('survival', () => {
  test.each(rows('surv.wilson'))('%s', (_id, { inputs, expected }) => {
    const { k, n, conf } = inputs as { k: number; n: number; conf: number };
    const { p, lo, hi } = expected as { p: number; lo: number; hi: number };
    const interval = wilson(k, n, conf);
    expect(interval.share).toBeCloseTo(p, 9);
    expect(interval.low).toBeCloseTo(lo, 9);
    expect(interval.high).toBeCloseTo(hi, 9);
  });

  test.each(rows('surv.Z'))('%s', (_id, { inputs, expected }) => {
    const { N0, Nt, t } = inputs as { N0: number; Nt: number; t: number };
    const rate = mortalityRate({ count: N0, day: 0 }, { count: Nt, day: t });
    if (expected === null) expect(rate).toBeNull();
    else expect(rate).toBeCloseTo((expected as { Z: number }).Z, 12);
  });

  test.each(rows('surv.kaplan_meier'))('%s', (_id, { inputs, expected }) => {
    const { time, event } = inputs as { time: number[]; event: number[] };
    const steps = kaplanMeier(time.map((at, i) => ({ time: at, died: event[i] === 1 })));
    const wanted = expected as {
      t: number;
      n: number;
      d: number;
      S: number;
      se: number;
      lo_loglog: number;
      hi_loglog: number;
    }[];
    expect(steps.map((step) => [step.time, step.atRisk, step.deaths])).toEqual(wanted.map(({ t, n, d }) => [t, n, d]));
    wanted.forEach(({ S, se, lo_loglog, hi_loglog }, i) => {
      expect(steps[i]?.survival).toBeCloseTo(S, 8);
      expect(steps[i]?.standardError).toBeCloseTo(se, 8);
      expect(steps[i]?.low).toBeCloseTo(lo_loglog, 8);
      expect(steps[i]?.high).toBeCloseTo(hi_loglog, 8);
    });
  });

  test.each(rows('surv.stage'))('%s', (_id, { inputs, expected }) => {
    const { stages } = inputs as { stages: [string, number][] };
    const steps = stageSurvival(stages.map(([stage, n]) => ({ stage, n })));
    for (const [i, row] of (expected as { S_step: number; S_cum: number; wilson_cum: [number, number] }[]).entries()) {
      expect(steps[i]?.step).toBeCloseTo(row.S_step, 9);
      expect(steps[i]?.survival.share).toBeCloseTo(row.S_cum, 9);
      expect(steps[i]?.survival.low).toBeCloseTo(row.wilson_cum[0], 9);
      expect(steps[i]?.survival.high).toBeCloseTo(row.wilson_cum[1], 9);
    }
  });

  test('refuses more survivors than fish, and more counted later than before', () => {
    expect(() => wilson(5, 4)).toThrow(BadValue);
    expect(() => mortalityRate({ count: 4, day: 0 }, { count: 5, day: 9 })).toThrow(BadValue);
  });

  test('says its interval in words', () => {
    expect(survivalWords(wilson(29, 34))).toBe('85 %, between 70 and 94 %');
  });
});
