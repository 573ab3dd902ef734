import type { Shape } from './curves';

/** Lengths of one age, as much of them as a fit needs: fish of one age share their fitted value. */
export type AgeGroup = { age: number; n: number; mean: number };

/** Linf in mm, K per day, m in days. */
export type Curve = { linf: number; k: number; m: number };

/** Draws Linf towards a mean: `weight` is the residual variance over the prior's. Zero for none. */
export type Pull = { mean: number; weight: number };

export type Problem = { shape: Shape; groups: AgeGroup[]; pull: Pull; originFixed: boolean };

/** Squares between the groups' means and the curve, with the pull; squares within groups are the same for every curve. */
export function squares({ shape, groups, pull }: Problem, { linf, k, m }: Curve): number {
  let sum = pull.weight * (linf - pull.mean) ** 2;
  for (const { age, n, mean } of groups) sum += n * (mean - linf * shape.at(k * (age - m))) ** 2;
  return sum;
}

/** The best Linf for a K and an m: the curve is linear in it. */
export function bestLinf({ shape, groups, pull }: Problem, k: number, m: number): number {
  let [up, down] = [pull.weight * pull.mean, pull.weight];
  for (const { age, n, mean } of groups) {
    const share = shape.at(k * (age - m));
    up += n * mean * share;
    down += n * share * share;
  }
  return up / down;
}

type Normal = { matrix: number[][]; gradient: number[] };

/** J'WJ and J'Wr in (Linf, K, m); m is left out where it is fixed. */
export function normalEquations({ shape, groups, pull, originFixed }: Problem, { linf, k, m }: Curve): Normal {
  const size = originFixed ? 2 : 3;
  const matrix = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  const gradient = new Array<number>(size).fill(0);
  const add = (row: number[], weight: number, residual: number) => {
    for (let i = 0; i < size; i += 1) {
      gradient[i] = (gradient[i] ?? 0) + weight * (row[i] ?? 0) * residual;
      for (let j = 0; j < size; j += 1) {
        const line = matrix[i];
        if (line) line[j] = (line[j] ?? 0) + weight * (row[i] ?? 0) * (row[j] ?? 0);
      }
    }
  };
  for (const { age, n, mean } of groups) {
    const row = jacobianRow(shape, { linf, k, m }, age);
    add(row, n, mean - linf * (row[0] ?? 0));
  }
  add([1, 0, 0], pull.weight, pull.mean - linf);
  return { matrix, gradient };
}

/** d length / d (Linf, K, m) at an age. */
export function jacobianRow(shape: Shape, { linf, k, m }: Curve, age: number): number[] {
  const u = k * (age - m);
  const share = shape.at(u);
  const slope = linf * shape.slope(u, share);
  return [share, slope * (age - m), -slope * k];
}

/** Solves a small symmetric system by Cholesky; null where it is not positive definite. */
export function solve(matrix: number[][], right: number[]): number[] | null {
  const size = right.length;
  const lower = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  const at = (rows: number[][], i: number, j: number) => rows[i]?.[j] ?? 0;
  for (let i = 0; i < size; i += 1) {
    for (let j = 0; j <= i; j += 1) {
      let sum = at(matrix, i, j);
      for (let l = 0; l < j; l += 1) sum -= at(lower, i, l) * at(lower, j, l);
      const row = lower[i] ?? [];
      if (i === j) {
        if (!(sum > 1e-13 * at(matrix, i, i))) return null;
        row[j] = Math.sqrt(sum);
      } else row[j] = sum / at(lower, j, j);
    }
  }
  const half: number[] = [];
  for (let i = 0; i < size; i += 1) {
    let sum = right[i] ?? 0;
    for (let l = 0; l < i; l += 1) sum -= at(lower, i, l) * (half[l] ?? 0);
    half.push(sum / at(lower, i, i));
  }
  const answer = new Array<number>(size).fill(0);
  for (let i = size - 1; i >= 0; i -= 1) {
    let sum = half[i] ?? 0;
    for (let l = i + 1; l < size; l += 1) sum -= at(lower, l, i) * (answer[l] ?? 0);
    answer[i] = sum / at(lower, i, i);
  }
  return answer;
}

/** Inverse of a small symmetric matrix; null where it has none. */
export function inverse(matrix: number[][]): number[][] | null {
  const columns = matrix.map((_row, i) =>
    solve(
      matrix,
      matrix.map((_line, j) => (i === j ? 1 : 0)),
    ),
  );
  return columns.every((column) => column !== null) ? columns : null;
}

const MOST_STEPS = 500;

/**
 * Levenberg-Marquardt (Marquardt 1963) with the Jacobian in closed form, K kept above zero by stepping in its logarithm.
 * Answers the curve at which a step no longer matters, or the best that was found.
 */
export function descend(problem: Problem, start: Curve): Curve {
  let curve = { ...start, linf: bestLinf(problem, start.k, start.m) };
  let sum = squares(problem, curve);
  let damping = 1e-3;
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const { matrix, gradient } = inLogK(normalEquations(problem, curve), curve.k);
    const damped = matrix.map((row, i) => row.map((value, j) => (i === j ? value * (1 + damping) + 1e-300 : value)));
    const move = solve(damped, gradient);
    if (!move) {
      damping *= 10;
      if (damping > 1e20) break;
      continue;
    }
    const [byLinf = 0, byLogK = 0, byM = 0] = move;
    const next = {
      linf: curve.linf + byLinf,
      k: curve.k * Math.exp(Math.max(-2, Math.min(2, byLogK))),
      m: curve.m + byM,
    };
    const nextSum = squares(problem, next);
    if (nextSum <= sum) {
      const still =
        Math.abs(byLinf) < 1e-10 * Math.abs(next.linf) && Math.abs(byLogK) < 1e-10 && Math.abs(byM) * next.k < 1e-10;
      curve = next;
      sum = nextSum;
      damping = Math.max(1e-12, damping / 8);
      if (still) break;
    } else {
      damping *= 6;
      if (damping > 1e20) break;
    }
  }
  return curve;
}

const inLogK = ({ matrix, gradient }: Normal, k: number): Normal => ({
  matrix: matrix.map((row, i) => row.map((value, j) => value * (i === 1 ? k : 1) * (j === 1 ? k : 1))),
  gradient: gradient.map((value, i) => value * (i === 1 ? k : 1)),
});

/** Starts over a wide grid of K and m, Linf being the best for each; the best few are descended from, the best end is kept. */
export function bestCurve(problem: Problem): Curve | null {
  const starts = gridOf(problem)
    .map(({ k, m }) => ({ k, m, linf: bestLinf(problem, k, m) }))
    .filter(({ linf }) => Number.isFinite(linf) && linf > 0)
    .map((curve) => ({ curve, sum: squares(problem, curve) }))
    .filter(({ sum }) => Number.isFinite(sum))
    .sort((a, b) => a.sum - b.sum)
    .slice(0, 4);
  let best: { curve: Curve; sum: number } | null = null;
  for (const { curve } of starts) {
    const end = descend(problem, curve);
    const sum = squares(problem, end);
    if (Number.isFinite(sum) && (best === null || sum < best.sum)) best = { curve: end, sum };
  }
  return best?.curve ?? null;
}

/** K so that 3 % to 60 spans of the data's ages bring the fish to 1 - 1/e; m from far before to past the data. */
function gridOf({ groups, originFixed }: Problem): { k: number; m: number }[] {
  const first = groups[0]?.age ?? 0;
  const last = groups.at(-1)?.age ?? 1;
  const span = Math.max(last - first, last, 1e-9);
  const ks = Array.from({ length: 16 }, (_, i) => (0.05 * 2 ** (i * 0.75)) / span);
  const ms = originFixed ? [0] : Array.from({ length: 17 }, (_, i) => first - span + (i * span) / 4);
  return ks.flatMap((k) => ms.map((m) => ({ k, m })));
}
