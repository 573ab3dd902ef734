import { descend } from './descend';
import { type Landing, landAt, type Point, type Problem } from './profile';
import { SHAPES } from './shapes';

const MOST_BINS = 32;
const MOST_STARTS = 2;
/** A start is good enough from here: all the data do the rest. */
const NEAR = 1e-3;
/** K over the span of ages, from nearly straight to done within a tenth of it. */
const K_GRID = Array.from({ length: 11 }, (_, i) => 0.04 * 1.9 ** i);

/**
 * The best point to start from, without a guess from anyone. Each model is linear in e^(-K age) after a transformation,
 * so for a grid of K the origin is a straight-line regression; the best of these are followed down on ages drawn
 * together into bins, and the lowest optimum is the start for all the data. Null when there is none.
 */
export function bestStart(problem: Problem): Point | null {
  const coarse = binned(problem);
  const scanned = K_GRID.map((k) => landingFor(coarse, k));
  const dips = scanned.filter((here, i) => here && !lower(scanned[i - 1], here) && !lower(scanned[i + 1], here));
  const starts = dips
    .filter((here) => here !== null)
    .sort(byCost)
    .slice(0, MOST_STARTS);
  const found = starts.map((start) => descend(coarse, start, NEAR)).filter((landing) => landing !== null);
  return found.sort(byCost)[0] ?? (coarse === problem ? null : (starts[0] ?? null));
}

const byCost = (p: Landing, q: Landing) => p.cost - q.cost;
const lower = (other: Landing | null | undefined, than: Landing) => other != null && other.cost < than.cost;

function landingFor(problem: Problem, k: number): Landing | null {
  const beta = problem.originFixed ? 0 : betaFor(problem, k);
  return beta === null ? null : landAt(problem, { logK: Math.log(k), beta });
}

/** Beta from the regression at a given K; with a prior, of the line through the species' final length. */
function betaFor({ model, tau, y, weights, prior }: Problem, k: number): number | null {
  const { straight } = SHAPES[model];
  const points = Array.from(tau, (t, i) => {
    const length = y[i] ?? 0;
    return { x: Math.exp(-k * t), y: straight.of(length), w: (weights[i] ?? 0) * straight.weight(length) };
  });
  const line = prior ? lineThrough(straight.of(prior.length), points) : regression(points);
  const origin = straight.origin(line.intercept, line.slope);
  return origin > 0 && Number.isFinite(origin) ? Math.log(origin) : null;
}

type Weighted = { x: number; y: number; w: number }[];
type Line = { intercept: number; slope: number };

const sumOf = (points: Weighted, of: (x: number, y: number) => number) =>
  points.reduce((sum, { x, y, w }) => sum + w * of(x, y), 0);

function regression(points: Weighted): Line {
  const total = sumOf(points, () => 1);
  const [meanX, meanY] = [sumOf(points, (x) => x) / total, sumOf(points, (_, y) => y) / total];
  const slope = sumOf(points, (x, y) => (x - meanX) * (y - meanY)) / sumOf(points, (x) => (x - meanX) ** 2);
  return { intercept: meanY - slope * meanX, slope };
}

function lineThrough(intercept: number, points: Weighted): Line {
  return { intercept, slope: sumOf(points, (x, y) => x * (y - intercept)) / sumOf(points, (x) => x * x) };
}

/** The problem with at most `MOST_BINS` ages, neighbours drawn together at their mean. */
function binned(problem: Problem): Problem {
  const size = problem.tau.length;
  if (size <= MOST_BINS) return problem;
  const weights = new Float64Array(MOST_BINS);
  const tau = new Float64Array(MOST_BINS);
  const y = new Float64Array(MOST_BINS);
  const add = (to: Float64Array, bin: number, amount: number) => {
    to[bin] = (to[bin] ?? 0) + amount;
  };
  for (let i = 0; i < size; i += 1) {
    const bin = Math.floor((i * MOST_BINS) / size);
    const weight = problem.weights[i] ?? 0;
    add(weights, bin, weight);
    add(tau, bin, weight * (problem.tau[i] ?? 0));
    add(y, bin, weight * (problem.y[i] ?? 0));
  }
  const mean = (sum: number, bin: number) => sum / (weights[bin] ?? 1);
  const room = () => new Float64Array(MOST_BINS);
  return { ...problem, weights, tau: tau.map(mean), y: y.map(mean), g: room(), slope: room(), bend: room() };
}
