import type { PairingChoice } from './pairingChoice';

/** Part of a group: what it costs, what each fish would add to it, who may still join, how many are still needed. */
export type Branch = {
  members: number[];
  cost: number;
  added: Float64Array;
  pool: { males: number[]; females: number[] };
  needed: { males: number; females: number };
};

/** A branch with its lower bound: the fish that may join, cheapest first, and the least that each adds in the end. */
export type BoundedBranch = Branch & { least: Float64Array; bound: number };

const SEXES = ['males', 'females'] as const;

/** The required fish, and everyone who may be put with them. */
export function rootBranch(choice: PairingChoice): Branch {
  const { count, isMale, cost } = choice;
  const all = Array.from(isMale.keys());
  let branch: Branch = {
    members: [],
    cost: 0,
    added: Float64Array.from(isMale, (_, fish) => cost[fish * count + fish] ?? 0),
    pool: { males: all.filter((fish) => isMale[fish]), females: all.filter((fish) => !isMale[fish]) },
    needed: { males: choice.males, females: choice.females },
  };
  for (const fish of choice.required) branch = withFish(choice, branch, fish, branch.pool);
  return branch;
}

/** The branch with one fish more; `pool` is what may join besides. */
export function withFish(choice: PairingChoice, branch: Branch, fish: number, pool: Branch['pool']): Branch {
  const { count, cost, barred, isMale } = choice;
  const sex = isMale[fish] ? 'males' : 'females';
  const stays = (other: number) => other !== fish && barred[fish * count + other] !== 1;
  return {
    members: [...branch.members, fish],
    cost: branch.cost + (branch.added[fish] ?? 0),
    added: branch.added.map((sum, other) => sum + 2 * (cost[fish * count + other] ?? 0)),
    pool: { males: pool.males.filter(stays), females: pool.females.filter(stays) },
    needed: { ...branch.needed, [sex]: branch.needed[sex] - 1 },
  };
}

/**
 * The branch with a bound no completion can beat: each fish still to come adds at least its share with the group and, once
 * from its own side, with the least related of those to come with it. `undefined` when too few fish are left.
 */
export function bounded(choice: PairingChoice, order: Int32Array[], branch: Branch): BoundedBranch | undefined {
  const pool = compatible(choice, branch);
  const { needed } = branch;
  if (pool.males.length < needed.males || pool.females.length < needed.females) return undefined;
  const open = new Uint8Array(choice.count);
  for (const sex of SEXES) if (needed[sex] > 0) for (const fish of pool[sex]) open[fish] = 1;
  const least = new Float64Array(choice.count);
  let bound = branch.cost;
  for (const sex of SEXES) {
    if (needed[sex] === 0) continue;
    for (const fish of pool[sex]) least[fish] = leastAdded(choice, { branch, open, fish, others: order[fish] });
    pool[sex].sort((a, b) => (least[a] ?? 0) - (least[b] ?? 0));
    for (const fish of pool[sex].slice(0, needed[sex])) bound += least[fish] ?? 0;
  }
  return { ...branch, pool, least, bound };
}

function leastAdded(
  { count, cost, isMale }: PairingChoice,
  of: { branch: Branch; open: Uint8Array; fish: number; others: Int32Array | undefined },
): number {
  const { fish, open, branch } = of;
  let males = branch.needed.males - (isMale[fish] ? 1 : 0);
  let females = branch.needed.females - (isMale[fish] ? 0 : 1);
  let sum = branch.added[fish] ?? 0;
  for (const other of of.others ?? []) {
    if (males + females === 0) break;
    if (open[other] !== 1 || (isMale[other] ? males : females) === 0) continue;
    if (isMale[other]) males -= 1;
    else females -= 1;
    sum += cost[fish * count + other] ?? 0;
  }
  return sum;
}

/** Drops fish that are barred from so many of the other sex that the group could not be completed with them, until none is. */
function compatible({ count, barred }: PairingChoice, { pool, needed }: Branch): Branch['pool'] {
  const enough = (fish: number, mates: number[], wanted: number) =>
    mates.filter((mate) => barred[fish * count + mate] !== 1).length >= wanted;
  let { males, females } = pool;
  for (let before = -1; before !== males.length + females.length; ) {
    before = males.length + females.length;
    males = males.filter((fish) => enough(fish, females, needed.females));
    females = females.filter((fish) => enough(fish, males, needed.males));
  }
  return { males: [...males], females: [...females] };
}
