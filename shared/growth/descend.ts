import { type Curvature, type Landing, landAt, type Point, type Problem } from './profile';

const MOST_STEPS = 200;
/** Undamped steps this small end the search; a search that gets stuck on larger ones has found no optimum. */
const ARRIVED = 1e-9;
const AT_REST = 1e-6;
/** This many steps in a row beyond `MOST_LINF`, and the way leads to no optimum. */
const MOST_BEYOND = 4;
/**
 * No step changes K by more than this factor's logarithm: a leap would land where the curve is a jump between two ages.
 */
const LONGEST = 0.7;
/**
 * A final length this many times the longest fish is a straight or an exponential line, not a curve that levels off.
 */
const MOST_LINF = 100;
/** Two parameters that move the curve this nearly alike cannot be told apart. */
const ALIKE = 1e-13;

type Step = Point & { size: number };

/**
 * Levenberg-Marquardt from a point down to the nearest optimum (Marquardt 1963; damping on the scaled diagonal as More
 * 1978). Null when there is none this way: the sum of squares keeps falling towards a straight line or a jump.
 */
export function descend(problem: Problem, start: Point, arrived = ARRIVED): Landing | null {
  const landing = landAt(problem, start);
  if (!landing) return null;
  let here: Landing = landing;
  let damping = 1e-3;
  let size = sizeOf(here, problem);
  let beyond = 0;
  for (let i = 0; i < MOST_STEPS && damping < 1e16 && size >= arrived && beyond < MOST_BEYOND; i += 1) {
    const next: Landing | null = landFrom(problem, here, damping);
    const nextSize = next ? sizeOf(next, problem) : 1;
    // At rest the sum of squares differs by rounding alone, and the length of the next step is the better judge.
    const closer = next !== null && (next.cost <= here.cost || (size < AT_REST && nextSize < size));
    if (size < AT_REST && !closer) break;
    if (closer) [here, size] = [next, nextSize];
    beyond = here.linf > MOST_LINF ? beyond + 1 : 0;
    damping = closer ? Math.max(damping / 10, 1e-14) : damping * 8;
  }
  return size < Math.max(arrived, AT_REST) && here.linf <= MOST_LINF ? here : null;
}

function landFrom(problem: Problem, here: Landing, damping: number): Landing | null {
  const step = stepFrom(here, problem, damping);
  if (!step) return null;
  const share = Math.min(1, LONGEST / Math.abs(step.logK));
  return landAt(problem, { logK: here.logK + share * step.logK, beta: here.beta + share * step.beta });
}

/** How far the undamped step would go; 1, far, where there is none. */
const sizeOf = (here: Landing, problem: Problem): number => stepFrom(here, problem, 0)?.size ?? 1;

/** The damped step: Newton's where the ground curves upwards, else Gauss and Newton's; null where neither tells K from the origin. */
function stepFrom(here: Landing, { originFixed }: Problem, damping: number): Step | null {
  const solve = originFixed ? solveForK : solveForBoth;
  return solve(here, here.exact, damping) ?? solve(here, here.gauss, damping);
}

function solveForK({ down }: Landing, { kk }: Curvature, damping: number): Step | null {
  const logK = down.k / (kk * (1 + damping));
  return kk > 0 ? { logK, beta: 0, size: Math.abs(logK) } : null;
}

function solveForBoth({ down, beta }: Landing, { kk, kb, bb }: Curvature, damping: number): Step | null {
  const [ofK, ofBeta] = [kk * (1 + damping), bb * (1 + damping)];
  const determinant = ofK * ofBeta - kb * kb;
  if (!(kk > 0 && bb > 0 && determinant > ALIKE * kk * bb)) return null;
  const logK = (down.k * ofBeta - kb * down.beta) / determinant;
  const toBeta = (down.beta * ofK - kb * down.k) / determinant;
  return { logK, beta: toBeta, size: Math.abs(logK) + Math.abs(toBeta) / (1 + Math.abs(beta)) };
}
