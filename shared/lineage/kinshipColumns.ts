import { rowFinder } from './parentOptions';
import type { PedigreeEntry } from './pedigree';
import { noAnimals } from './pedigreeError';
import { flowUp, kinshipDown, pourParents, type Segregation } from './segregation';
import { solveFamilies } from './solveFamilies';
import { sortPedigree } from './sortedPedigree';

/** Kinships of one animal, or of a group on average, with every entry; values in the order of `ids`. */
export type KinshipColumns = {
  ids: string[];
  /** Kinship of `id` with every entry; with itself (1 + F) / 2. */
  of(id: string): Float64Array;
  /** Mean kinship of every entry with the fish of `group`, each counted once, an entry's kinship with itself included. */
  meanWith(group: string[]): Float64Array;
};

/**
 * One animal against all, without a matrix: after one pass for F, each column costs time and memory linear in the pedigree
 * (Colleau 2002). Throws what `inbreeding` throws, `unknownId`, and `noAnimals` for an empty group.
 */
export function kinshipColumns(pedigree: PedigreeEntry[]): KinshipColumns {
  const sorted = sortPedigree(pedigree);
  const segregation = solveFamilies(sorted);
  const rowOf = rowFinder(sorted.rowOf);
  const column = (rows: number[]) => {
    const kinship = nodeColumn(
      segregation,
      rows.map((row) => sorted.nodeOf[row] ?? 0),
    );
    const all = new Float64Array(sorted.ids.length);
    for (let row = 0; row < all.length; row += 1) all[row] = kinship[sorted.nodeOf[row] ?? 0] ?? 0;
    for (const row of rows) all[row] = (all[row] ?? 0) + ownPart(segregation, sorted.nodeOf[row] ?? 0) / rows.length;
    return all;
  };
  return {
    ids: sorted.ids,
    of: (id) => column([rowOf(id)]),
    meanWith(group) {
      if (group.length === 0) throw noAnimals('mean kinship');
      return column([...new Set(group)].map(rowOf));
    },
  };
}

/** Mean kinship of the given nodes with every node; a leaf counts as an entry other than those it stands for. */
export function nodeColumn(segregation: Segregation, nodes: number[]): Float64Array {
  const { sorted } = segregation;
  const flow = new Float64Array(sorted.nodes);
  for (const node of nodes) {
    if (sorted.isLeaf[node] === 1) pourParents(sorted, sorted.familyOf[node] ?? 0, flow, 1 / nodes.length);
    else flow[node] = (flow[node] ?? 0) + 1 / nodes.length;
  }
  flowUp(sorted, flow);
  return kinshipDown(segregation, flow);
}

/** What a leaf's kinship with itself exceeds that with an entry just like it by. */
function ownPart({ sorted, self, within }: Segregation, node: number): number {
  const family = sorted.familyOf[node] ?? 0;
  return sorted.isLeaf[node] === 1 ? (self[family] ?? 0) - (within[family] ?? 0) : 0;
}
