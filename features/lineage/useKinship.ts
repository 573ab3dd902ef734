import { useMemo } from 'react';
import { allEquivalentGenerations } from '@/shared/lineage/completeness';
import type { LineageNode } from '@/shared/lineage/contract';
import { meanKinship } from '@/shared/lineage/diversity';
import { kinship } from '@/shared/lineage/kinship';
import type { KinshipMatrix } from '@/shared/lineage/kinshipMatrix';
import type { PedigreeEntry } from '@/shared/lineage/pedigree';
import { entriesOf, type Nodes } from './entries';

export type GroupKinship = {
  entries: PedigreeEntry[];
  matrix: KinshipMatrix;
  /** Of each fish with the whole group, itself included. */
  mean: ReadonlyMap<string, number>;
  /** How far back each pedigree is known, in full generations. */
  depth: ReadonlyMap<string, number>;
};

/** The kinships of a group: worked out once for its fish, whatever is searched for among them. */
export function useKinship(nodes: Nodes, group: readonly LineageNode[]): GroupKinship {
  const entries = useMemo(() => entriesOf(nodes), [nodes]);
  const depth = useMemo(() => allEquivalentGenerations(entries), [entries]);
  const asked = group.map(({ id }) => id).join(' ');
  return useMemo(() => {
    const ids = asked === '' ? [] : asked.split(' ');
    const matrix = kinship(entries, ids);
    return { entries, matrix, mean: meanKinship(matrix, ids), depth };
  }, [entries, depth, asked]);
}
