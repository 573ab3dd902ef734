import { GROWTH_MODELS, SHAPES } from '../../shared/growth/curves';
import { fitGrowth } from '../../shared/growth/fitGrowth';

type Figure = { figure: string; ours: number; anchor: number; anchorName: string; unit: string; goal?: string };

/** The three-model fit beside a plain Gauss-Newton with finite differences, as a textbook gives it, over the same lengths. */
export async function bench(): Promise<Figure[]> {
  return [500, 2000].map((count) => {
    const points = broodOf(count);
    const ours = fastest(() => fitGrowth(points), 9);
    const anchor = fastest(() => GROWTH_MODELS.map((model) => textbook(model, points)), 3);
    return {
      figure: `Three growth curves through ${count} lengths`,
      ours,
      anchor,
      anchorName: 'Gauss-Newton, finite differences',
      unit: 'ms',
      goal: 'under 100 ms',
    };
  });
}

function broodOf(count: number) {
  let state = 1;
  const chance = () => {
    state = (state * 16807) % 2147483647;
    return state / 2147483647;
  };
  return Array.from({ length: count }, (_, i) => {
    const ageDays = 20 + Math.round((i / count) * 50) * 14;
    return { ageDays, lengthMm: 110 * SHAPES.gompertz.at(0.006 * (ageDays - 80)) + 4 * (chance() + chance() - 1) };
  });
}

function fastest(work: () => unknown, times: number): number {
  const spans = Array.from({ length: times }, () => {
    const from = performance.now();
    work();
    return performance.now() - from;
  });
  return Math.min(...spans);
}

/** Gauss-Newton with step halving, the Jacobian by differences, every length by itself. */
function textbook(model: keyof typeof SHAPES, points: { ageDays: number; lengthMm: number }[]): number[] {
  const { at } = SHAPES[model];
  const value = ([linf = 0, k = 0, m = 0]: number[], age: number) => linf * at(k * (age - m));
  const rss = (p: number[]) =>
    points.reduce((sum, { ageDays, lengthMm }) => sum + (lengthMm - value(p, ageDays)) ** 2, 0);
  let p = [1.3 * Math.max(...points.map(({ lengthMm }) => lengthMm)), 0.004, 60];
  for (let step = 0; step < 60; step += 1) {
    const a = [0, 1, 2].map(() => [0, 0, 0, 0]);
    for (const { ageDays, lengthMm } of points) {
      const here = value(p, ageDays);
      const row = p.map(
        (v, i) =>
          (value(
            p.map((w, j) => (i === j ? v + 1e-6 * Math.max(1e-3, Math.abs(v)) : w)),
            ageDays,
          ) -
            here) /
          (1e-6 * Math.max(1e-3, Math.abs(v))),
      );
      for (let i = 0; i < 3; i += 1) {
        const line = a[i] ?? [];
        for (let j = 0; j < 3; j += 1) line[j] = (line[j] ?? 0) + (row[i] ?? 0) * (row[j] ?? 0);
        line[3] = (line[3] ?? 0) + (row[i] ?? 0) * (lengthMm - here);
      }
    }
    const move = gauss(a);
    let share = 1;
    while (share > 1e-6 && !(rss(p.map((v, i) => v + share * (move[i] ?? 0))) < rss(p))) share /= 2;
    p = p.map((v, i) => v + share * (move[i] ?? 0));
    if (share <= 1e-6) break;
  }
  return p;
}

function gauss(a: number[][]): number[] {
  for (let i = 0; i < 3; i += 1) {
    const pivot = a[i] ?? [];
    for (let r = i + 1; r < 3; r += 1) {
      const line = a[r] ?? [];
      const f = (line[i] ?? 0) / (pivot[i] || 1e-12);
      for (let c = i; c < 4; c += 1) line[c] = (line[c] ?? 0) - f * (pivot[c] ?? 0);
    }
  }
  const x = [0, 0, 0];
  for (let i = 2; i >= 0; i -= 1) {
    const line = a[i] ?? [];
    let sum = line[3] ?? 0;
    for (let c = i + 1; c < 3; c += 1) sum -= (line[c] ?? 0) * (x[c] ?? 0);
    x[i] = sum / (line[i] || 1e-12);
  }
  return x;
}
