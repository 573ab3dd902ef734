import { ancestorWalk } from './ancestorWalk';
import { inherited, pourParents, type Segregation } from './segregation';

/** Kinships read through the ancestors of the animals asked about, and no others. */
export type SparseColumns = {
  /** Kinships of `node` with each of `others`. Nothing but its own ancestors need be settled. */
  between(node: number, others: number[]): number[];
  /** Kinship of two different members of a family. */
  within(family: number): number;
};

/** The products of `flowUp` and `kinshipDown`, kept to the few nodes where they are not zero or not wanted. */
export function sparseColumns(segregation: Segregation): SparseColumns {
  const { sorted, self, within } = segregation;
  const { familyOf, parents } = sorted;
  const walk = ancestorWalk(sorted);
  const flow = new Float64Array(sorted.nodes);
  const kinship = new Float64Array(sorted.nodes);
  const own = (node: number) => {
    const family = familyOf[node] ?? 0;
    return (self[family] ?? 0) - (within[family] ?? 0);
  };
  const flowUp = () => walk.visit((node) => pourParents(sorted, familyOf[node] ?? 0, flow, flow[node] ?? 0)).slice();
  return {
    between(node, others) {
      flow[node] = 1;
      walk.ask(node);
      const ancestors = flowUp();
      for (const other of others) walk.ask(other);
      const path = walk.visit();
      for (let at = path.length - 1; at >= 0; at -= 1) {
        const each = path[at] ?? 0;
        const share = flow[each] ?? 0;
        kinship[each] = inherited(sorted, familyOf[each] ?? 0, kinship) + (share === 0 ? 0 : own(each) * share);
      }
      for (const ancestor of ancestors) flow[ancestor] = 0;
      return others.map((other) => kinship[other] ?? 0);
    },
    within(family) {
      pourParents(sorted, family, flow);
      for (let at = parents.start[family] ?? 0; at < (parents.start[family + 1] ?? 0); at += 1) {
        walk.ask(parents.node[at] ?? 0);
      }
      let sum = 0;
      for (const ancestor of flowUp()) {
        sum += own(ancestor) * (flow[ancestor] ?? 0) ** 2;
        flow[ancestor] = 0;
      }
      return sum;
    },
  };
}
