import type { KinshipMatrix } from './kinshipMatrix';

/**
 * The choice behind a pairing plan, fish as numbers, males first. `cost` is what two chosen fish add to the mean kinship of
 * the young, as a square table (a fish with itself on the diagonal; a pair of two counts from both sides). `barred` pairs may
 * not both be chosen. `alike` gives each fish the first one that it could be exchanged for without any difference.
 */
export type PairingChoice = {
  count: number;
  isMale: boolean[];
  cost: Float64Array;
  barred: Uint8Array;
  alike: number[];
  required: number[];
  males: number;
  females: number;
};

export type PairingGroup = { members: number[]; cost: number };

/** Kinships and costs nearer than this are equal: they differ by rounding only. */
export const SAME = 1e-12;

/** Young get half their genes from the chosen males, each alike, and half from the females: the weights of the mean kinship. */
export function pairingChoice(
  matrix: KinshipMatrix,
  ids: string[],
  of: { maleCount: number; males: number; females: number; limit: number; required: Set<string> },
): PairingChoice {
  const count = ids.length;
  const isMale = ids.map((_, fish) => fish < of.maleCount);
  const weight = isMale.map((male) => 1 / (2 * (male ? of.males : of.females)));
  const cost = new Float64Array(count * count);
  const barred = new Uint8Array(count * count);
  ids.forEach((a, i) => {
    ids.forEach((b, j) => {
      const kinship = matrix.between(a, b);
      cost[i * count + j] = (weight[i] ?? 0) * (weight[j] ?? 0) * kinship;
      if (isMale[i] !== isMale[j] && kinship > of.limit + SAME) barred[i * count + j] = 1;
    });
  });
  const required = ids.flatMap((id, fish) => (of.required.has(id) ? [fish] : []));
  const { males, females } = of;
  return { count, isMale, cost, barred, alike: alikeOf(cost, isMale), required, males, females };
}

/** Brood mates without young are alike; so are others that no kinship tells apart. */
function alikeOf(cost: Float64Array, isMale: boolean[]): number[] {
  const count = isMale.length;
  const at = (i: number, j: number) => cost[i * count + j] ?? 0;
  const areAlike = (i: number, j: number) =>
    isMale[i] === isMale[j] &&
    Math.abs(at(i, i) - at(j, j)) <= SAME &&
    isMale.every((_, k) => k === i || k === j || Math.abs(at(i, k) - at(j, k)) <= SAME);
  const alike: number[] = [];
  for (let fish = 0; fish < count; fish += 1) {
    const earlier = alike.findIndex((first, other) => first === other && areAlike(fish, other));
    alike.push(earlier < 0 ? fish : earlier);
  }
  return alike;
}

/** What the whole group adds up to. */
export function costOf({ cost, count }: PairingChoice, members: number[]): number {
  let sum = 0;
  for (const i of members) for (const j of members) sum += cost[i * count + j] ?? 0;
  return sum;
}

export function isBarred({ barred, count }: PairingChoice, members: number[]): boolean {
  return members.some((i) => members.some((j) => barred[i * count + j] === 1));
}
