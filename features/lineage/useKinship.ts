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

/** The kinships of a group: those of all the fish that it is chosen from are worked out once, whatever is filtered after. */
export function useKinship(
  nodes: Nodes,
  fish: readonly LineageNode[],
  group: readonly LineageNode[] = fish,
): GroupKinship {
  const entries = useMemo(() => entriesOf(nodes), [nodes]);
  const depth = useMemo(() => allEquivalentGenerations(entries), [entries]);
  const matrix = useMemo(() => kinship(entries, idsOf(fish)), [entries, fish]);
  return useMemo(
    () => ({ entries, matrix, depth, mean: meanKinship(matrix, idsOf(group)) }),
    [entries, matrix, depth, group],
  );
}

const idsOf = (fish: readonly LineageNode[]): string[] => fish.map(({ id }) => id);
