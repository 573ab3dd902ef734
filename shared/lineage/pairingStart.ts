import { costOf, isBarred, type PairingChoice, type PairingGroup, SAME } from './pairingChoice';

/** No group costs as much as one barred pair: a group without any is found if exchanges lead to one. */
const BAR = 10;

/**
 * A good group to start the exact search from: beginning with each fish in turn the cheapest are added one by one, then
 * single fish are exchanged as long as that helps. `undefined` when every such group holds a barred pair.
 */
export function startGroup(choice: PairingChoice): PairingGroup | undefined {
  const price = choice.cost.map((cost, pair) => cost + (choice.barred[pair] === 1 ? BAR : 0));
  let best: PairingGroup | undefined;
  for (let first = 0; first < choice.count; first += 1) {
    const members = [...choice.required];
    if (missing(choice, members, first) && !members.includes(first)) members.push(first);
    fillUp(choice, price, members);
    exchange(choice, price, members);
    const cost = costOf(choice, members);
    if (!isBarred(choice, members) && (!best || cost < best.cost - SAME)) best = { members, cost };
  }
  return best;
}

/** Whether the group still lacks a fish of this one's sex. */
function missing({ isMale, males, females }: PairingChoice, members: number[], fish: number): boolean {
  const same = members.filter((member) => isMale[member] === isMale[fish]).length;
  return same < (isMale[fish] ? males : females);
}

function fillUp(choice: PairingChoice, price: Float64Array, members: number[]): void {
  const { count } = choice;
  const added = (fish: number) =>
    members.reduce((sum, member) => sum + 2 * (price[fish * count + member] ?? 0), price[fish * count + fish] ?? 0);
  while (members.length < choice.males + choice.females) {
    let cheapest = { fish: -1, cost: Number.POSITIVE_INFINITY };
    for (let fish = 0; fish < count; fish += 1) {
      if (members.includes(fish) || !missing(choice, members, fish)) continue;
      const cost = added(fish);
      if (cost < cheapest.cost) cheapest = { fish, cost };
    }
    members.push(cheapest.fish);
  }
}

function exchange(choice: PairingChoice, price: Float64Array, members: number[]): void {
  for (let swap = bestSwap(choice, price, members); swap; swap = bestSwap(choice, price, members)) {
    members[swap.out] = swap.fish;
  }
}

function bestSwap(choice: PairingChoice, price: Float64Array, members: number[]) {
  const { count, isMale, required } = choice;
  const at = (i: number, j: number) => price[i * count + j] ?? 0;
  const withGroup = Float64Array.from(isMale, (_, fish) => members.reduce((sum, member) => sum + at(fish, member), 0));
  const change = (out: number, fish: number) =>
    at(out, out) - 2 * (withGroup[out] ?? 0) + 2 * (withGroup[fish] ?? 0) - 2 * at(fish, out) + at(fish, fish);
  let best: { out: number; fish: number; change: number } | undefined;
  for (const [out, member] of members.entries()) {
    if (required.includes(member)) continue;
    for (let fish = 0; fish < count; fish += 1) {
      if (isMale[fish] !== isMale[member] || members.includes(fish)) continue;
      const by = change(member, fish);
      if (by < (best?.change ?? -SAME)) best = { out, fish, change: by };
    }
  }
  return best;
}
