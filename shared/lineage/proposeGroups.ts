import type { KinshipMatrix } from './kinshipMatrix';
import { PedigreeError } from './pedigreeError';
import { type PairingPlan, type PairingRequest, planPairing } from './planPairing';

export type Proposal =
  | { fits: 'one'; groups: [PairingPlan] }
  /** All of them together do not keep the limit; in two tanks they do. */
  | { fits: 'two'; groups: [PairingPlan, PairingPlan] }
  /** `atLimit`: the lowest of the usual limits under which one group would fit; null: under none. */
  | { fits: 'none'; because: string; atLimit: number | null };

/** Usual limits: first cousins' young 1/16, half sibs' 1/8, full sibs' 1/4 (Falconer & Mackay, from memory). */
export const USUAL_LIMITS = [1 / 16, 1 / 8, 1 / 4, 1 / 2] as const;

/**
 * The group that `planPairing` finds, else two groups of about half the fish each, else why nothing fits and which limit
 * would let one. Throws what `planPairing` throws for a request that is wrong in itself.
 */
export function proposeGroups(request: PairingRequest): Proposal {
  const together = tried(request);
  if (!('because' in together)) return { fits: 'one', groups: [together] };
  const apart = inTwo(request);
  if (apart) return { fits: 'two', groups: apart };
  const atLimit = USUAL_LIMITS.find(
    (limit) =>
      limit > (request.maxFryInbreeding ?? 1) && !('because' in tried({ ...request, maxFryInbreeding: limit })),
  );
  return { fits: 'none', because: together.because, atLimit: atLimit ?? null };
}

const NO_GROUP = new Set(['noGroupFits', 'noGroupFound']);

function tried(request: PairingRequest): PairingPlan | { because: string } {
  try {
    return planPairing(request);
  } catch (error) {
    if (error instanceof PedigreeError && NO_GROUP.has(error.reason)) return { because: error.message };
    throw error;
  }
}

/** The larger half first, the rest out of who is left. Fish that must be in the plan are in one of the two. */
function inTwo(request: PairingRequest): [PairingPlan, PairingPlan] | null {
  const { males, females, chooseMales, chooseFemales, required = [] } = request;
  const each = { males: Math.max(1, Math.ceil(chooseMales / 2)), females: Math.ceil(chooseFemales / 2) };
  const rest = { males: Math.max(1, chooseMales - each.males), females: chooseFemales - each.females };
  if (rest.females < 1) return null;
  const first = tried({ ...request, chooseMales: each.males, chooseFemales: each.females, required: [] });
  if ('because' in first) return null;
  const taken = new Set([...first.males, ...first.females]);
  const left = (ids: string[]) => ids.filter((id) => !taken.has(id));
  const second = tried({
    ...request,
    males: left(males),
    females: left(females),
    chooseMales: rest.males,
    chooseFemales: rest.females,
    required: required.filter((id) => !taken.has(id)),
  });
  return 'because' in second ? null : [first, second];
}

export type GroupFigures = {
  pairs: { male: string; female: string; fryInbreeding: number }[];
  /** Over all pairs, each alike. */
  meanFryInbreeding: number;
  highest: number;
  /** Of the young the group would leave, each sex giving half: 0 to 1. */
  geneDiversity: number;
};

/** The figures of a group as it stands, whoever chose it: for fish that a keeper swaps, and for what lives there now. Null without both sexes. */
export function groupFigures(matrix: KinshipMatrix, males: string[], females: string[]): GroupFigures | null {
  if (males.length === 0 || females.length === 0) return null;
  const pairs = males
    .flatMap((male) => females.map((female) => ({ male, female, fryInbreeding: matrix.between(male, female) })))
    .sort((a, b) => a.fryInbreeding - b.fryInbreeding);
  const mean = (own: string[], other: string[]): number =>
    own.reduce((sum, a) => sum + other.reduce((row, b) => row + matrix.between(a, b), 0), 0) /
    (own.length * other.length);
  const between = mean(males, females);
  const meanKinship = (mean(males, males) + mean(females, females) + 2 * between) / 4;
  return {
    pairs,
    meanFryInbreeding: between,
    highest: pairs.at(-1)?.fryInbreeding ?? 0,
    geneDiversity: 1 - meanKinship,
  };
}
