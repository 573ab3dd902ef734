import { type BoundedBranch, type Branch, bounded, rootBranch, withFish } from './pairingBranch';
import { type PairingChoice, type PairingGroup, SAME } from './pairingChoice';

/**
 * Branch and bound from the best group known: fish are tried one by one, cheapest first, and a branch is left when even its
 * bound is no better. Of fish that are alike one stands for all. `exact` is false when `mostSteps` ended the search; `group`
 * is then the best one seen, or undefined if none was.
 */
export function searchGroup(
  choice: PairingChoice,
  start: PairingGroup | undefined,
  mostSteps: number,
): { group: PairingGroup | undefined; exact: boolean } {
  const order = nearestFirst(choice);
  let best = start;
  let steps = 0;
  const worth = (bound: number) => !best || bound < best.cost - SAME;
  // As deep as the group is large, so recursion is safe.
  const visit = (branch: Branch): void => {
    steps += 1;
    if (branch.needed.males + branch.needed.females === 0) {
      if (worth(branch.cost)) best = { members: branch.members, cost: branch.cost };
      return;
    }
    const state = bounded(choice, order, branch);
    if (!state) return;
    for (const next of continuations(choice, state, worth)) {
      if (steps >= mostSteps) return;
      visit(next);
    }
  };
  visit(rootBranch(choice));
  return { group: best, exact: steps < mostSteps };
}

/** The branch with each next fish in turn, those before it left out; ends where the bound says that none can be better. */
function* continuations(
  choice: PairingChoice,
  state: BoundedBranch,
  worth: (bound: number) => boolean,
): Generator<Branch> {
  const sex = state.needed.males > 0 ? 'males' : 'females';
  const listed = state.pool[sex];
  const needed = state.needed[sex];
  const leastOf = (fish: number[]) => fish.reduce((sum, each) => sum + (state.least[each] ?? 0), 0);
  const others = state.bound - leastOf(listed.slice(0, needed));
  const left = new Set<number>();
  for (let next = 0; next + needed <= listed.length; next += 1) {
    const fish = listed[next] ?? 0;
    const alike = choice.alike[fish] ?? fish;
    if (left.has(alike)) continue;
    if (!worth(others + leastOf(listed.slice(next, next + needed)))) return;
    const rest = listed.slice(next + 1).filter((other) => !left.has(choice.alike[other] ?? other));
    yield withFish(choice, state, fish, { ...state.pool, [sex]: rest });
    left.add(alike);
  }
}

/** For each fish all others, least costly to have together first. */
function nearestFirst({ count, cost }: PairingChoice): Int32Array[] {
  return Array.from({ length: count }, (_, fish) => {
    const others = Int32Array.from({ length: count }, (_, other) => other).filter((other) => other !== fish);
    return others.sort((a, b) => (cost[fish * count + a] ?? 0) - (cost[fish * count + b] ?? 0));
  });
}
