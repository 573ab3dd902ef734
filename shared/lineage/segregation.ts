import type { SortedPedigree } from './sortedPedigree';
import type { FamilyKinship } from './sweep';

/**
 * What A = T D T' needs (Henderson 1976, on the scale of kinship). A family's D is `self` less `within`, a member's own share
 * of chance: with uncertain parents the usual 1/2 - (F_sire + F_dam)/4 does not hold, this difference does.
 */
export type Segregation = FamilyKinship & { sorted: SortedPedigree };

/** Turns shares of genes wanted from some nodes into the share that came through every ancestor (T' q), in place. */
export function flowUp(sorted: SortedPedigree, flow: Float64Array): void {
  const { firstNode } = sorted;
  const { start, node, share } = sorted.parents;
  for (let family = sorted.families - 1; family >= 0; family -= 1) {
    let total = 0;
    for (let member = firstNode[family] ?? 0; member < (firstNode[family + 1] ?? 0); member += 1) {
      total += flow[member] ?? 0;
    }
    if (total === 0) continue;
    for (let at = start[family] ?? 0; at < (start[family + 1] ?? 0); at += 1) {
      const parent = node[at] ?? 0;
      flow[parent] = (flow[parent] ?? 0) + total * (share[at] ?? 0);
    }
  }
}

/** The kinships (T D q) of every node with the mixture of genes that `flowUp` was given. */
export function kinshipDown({ sorted, self, within }: Segregation, flow: Float64Array): Float64Array {
  const { firstNode } = sorted;
  const { start, node, share } = sorted.parents;
  const kinship = new Float64Array(sorted.nodes);
  for (let family = 0; family < sorted.families; family += 1) {
    let shared = 0;
    for (let at = start[family] ?? 0; at < (start[family + 1] ?? 0); at += 1) {
      shared += (share[at] ?? 0) * (kinship[node[at] ?? 0] ?? 0);
    }
    const own = (self[family] ?? 0) - (within[family] ?? 0);
    for (let member = firstNode[family] ?? 0; member < (firstNode[family + 1] ?? 0); member += 1) {
      kinship[member] = shared + own * (flow[member] ?? 0);
    }
  }
  return kinship;
}

/** Adds `part` of a gene mixture drawn from a member of `family` to a flow: as much of each parent as its share. */
export function pourParents(sorted: SortedPedigree, family: number, flow: Float64Array, part = 1): void {
  const { start, node, share } = sorted.parents;
  for (let at = start[family] ?? 0; at < (start[family + 1] ?? 0); at += 1) {
    const parent = node[at] ?? 0;
    flow[parent] = (flow[parent] ?? 0) + part * (share[at] ?? 0);
  }
}

/** What a member of `family` inherits of a column through its parents: its kinship, but for its own share of chance. */
export function inherited({ parents }: SortedPedigree, family: number, kinship: Float64Array): number {
  let sum = 0;
  for (let at = parents.start[family] ?? 0; at < (parents.start[family + 1] ?? 0); at += 1) {
    sum += (parents.share[at] ?? 0) * (kinship[parents.node[at] ?? 0] ?? 0);
  }
  return sum;
}
