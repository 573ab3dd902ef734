import type { LengthAtAge } from '../../shared/growth/ageGroups';
import { fitGrowth } from '../../shared/growth/fitGrowth';
import { GROWTH_MODELS, type GrowthModel } from '../../shared/growth/shapes';

import type { Figure } from './figure';

/** Every fish at an age of its own is the hard case; a brood is measured on a few days. */
const CASES = [
  { fish: 500, days: 500, goal: 'under 50 ms' },
  { fish: 2000, days: 2000, goal: 'under 100 ms' },
  { fish: 2000, days: 24, goal: 'under 100 ms' },
] as const;

/**
 * Three curves fitted and compared, with standard errors, beside Levenberg-Marquardt as a textbook gives it:
 * differences for the Jacobian, every fish by itself, one start. Throws when the two do not find the same curves.
 */
export async function bench(): Promise<Figure[]> {
  return CASES.map(({ fish, days, goal }) => {
    const brood = broodOf(fish, days);
    sameCurves(brood);
    return {
      figure: `Growth: three curves through ${fish} lengths at ${days} ages`,
      ours: median(() => fitGrowth(brood), 25),
      anchor: median(() => GROWTH_MODELS.map((model) => textbook(model, brood)), 7),
      anchorName: 'Levenberg-Marquardt by differences',
      unit: 'ms',
      goal,
    };
  });
}

function sameCurves(brood: LengthAtAge[]): void {
  for (const model of GROWTH_MODELS) {
    const ours = fitGrowth(brood, { models: [model] }).residualSumOfSquares;
    const theirs = textbook(model, brood).rss;
    if (Math.abs(ours / theirs - 1) > 1e-6) throw new Error(`${model}: ${ours} and ${theirs} are not the same fit`);
  }
}

function broodOf(fish: number, days: number): LengthAtAge[] {
  let state = 1;
  const chance = () => {
    state = (state * 16807) % 2147483647;
    return state / 2147483647;
  };
  return Array.from({ length: fish }, (_, i) => {
    const ageDays = 20 + ((i % days) * 700) / days;
    const scatter = 4 * (chance() + chance() + chance() - 1.5);
    return { ageDays, lengthMm: 110 * Math.exp(-Math.exp(-0.006 * (ageDays - 80))) + scatter };
  });
}

function median(work: () => unknown, times: number): number {
  work();
  const spans = Array.from({ length: times }, () => {
    const from = performance.now();
    work();
    return performance.now() - from;
  });
  return spans.sort((a, b) => a - b)[Math.floor(times / 2)] ?? 0;
}

type Three = [linf: number, k: number, origin: number];

const LENGTH: Record<GrowthModel, (p: Three, age: number) => number> = {
  vonBertalanffy: ([linf, k, t0], age) => linf * (1 - Math.exp(-k * (age - t0))),
  gompertz: ([linf, k, ti], age) => linf * Math.exp(-Math.exp(-k * (age - ti))),
  logistic: ([linf, k, ti], age) => linf / (1 + Math.exp(-k * (age - ti))),
};

function textbook(model: GrowthModel, brood: LengthAtAge[]): { p: Three; rss: number } {
  const length = LENGTH[model];
  const rssOf = (p: Three) =>
    brood.reduce((sum, { ageDays, lengthMm }) => sum + (lengthMm - length(p, ageDays)) ** 2, 0);
  let p: Three = [1.1 * Math.max(...brood.map(({ lengthMm }) => lengthMm)), 0.005, 50];
  let rss = rssOf(p);
  let damping = 1e-3;
  for (let i = 0; i < 200 && damping < 1e12; i += 1) {
    const step = solved(normalEquations(p, brood, length), damping);
    const next: Three = [p[0] + step[0], p[1] + step[1], p[2] + step[2]];
    const nextRss = rssOf(next);
    damping = nextRss < rss ? damping / 10 : damping * 10;
    if (!(nextRss < rss)) continue;
    const settled = rss - nextRss < 1e-12 * rss;
    [p, rss] = [next, nextRss];
    if (settled) break;
  }
  return { p, rss };
}

/** Rows of J'J with J'r as the fourth column, J by forward differences. */
function normalEquations(p: Three, brood: LengthAtAge[], length: (p: Three, age: number) => number): number[][] {
  const rows = [0, 1, 2].map(() => [0, 0, 0, 0]);
  for (const { ageDays, lengthMm } of brood) {
    const here = length(p, ageDays);
    const slopes = p.map((value, j) => {
      const by = 1e-7 * Math.max(Math.abs(value), 1e-3);
      const moved: Three = [p[0], p[1], p[2]];
      moved[j] = value + by;
      return (length(moved, ageDays) - here) / by;
    });
    const last = [...slopes, lengthMm - here];
    for (const [i, row] of rows.entries()) {
      for (let j = 0; j < 4; j += 1) row[j] = (row[j] ?? 0) + (slopes[i] ?? 0) * (last[j] ?? 0);
    }
  }
  return rows;
}

function solved(rows: number[][], damping: number): Three {
  const a = rows.map((row, i) => row.map((value, j) => (i === j ? value * (1 + damping) : value)));
  const at = (i: number, j: number) => a[i]?.[j] ?? 0;
  for (let i = 0; i < 3; i += 1) {
    for (let r = i + 1; r < 3; r += 1) {
      const share = at(r, i) / at(i, i);
      a[r] = (a[r] ?? []).map((value, j) => value - share * at(i, j));
    }
  }
  const z = at(2, 3) / at(2, 2);
  const y = (at(1, 3) - at(1, 2) * z) / at(1, 1);
  return [(at(0, 3) - at(0, 1) * y - at(0, 2) * z) / at(0, 0), y, z];
}
