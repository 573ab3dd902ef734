import { useMemo } from 'react';
import { useWorked } from '@/hooks/useWorked';
import type { LineageNode } from '@/shared/lineage/contract';
import { meanKinship } from '@/shared/lineage/diversity';
import { matrixOf } from '@/shared/lineage/kinshipMatrix';
import { deskWith } from './desk';
import type { Nodes } from './entries';
import type { Kin } from './kin';

/** `mean`: of each fish with the whole group, itself included. */
export type GroupKinship = Pick<Kin, 'matrix' | 'depth'> & { mean: ReadonlyMap<string, number> };

/**
 * The kinships of a group; nothing until they are worked out. Those of all the fish that it is chosen from are worked out
 * once, whatever is filtered after.
 */
export function useKinship(
  nodes: Nodes,
  fish: readonly LineageNode[],
  group: readonly LineageNode[],
): GroupKinship | null {
  const { data } = useWorked('kinship', [nodes, fish], async () => {
    const { desk, turn } = await deskWith(nodes);
    return desk.kinship(turn, idsOf(fish));
  });
  const whole = useMemo(() => {
    if (!data) return null;
    const ids = idsOf(fish);
    const depth = new Map(ids.map((id, at) => [id, data.depths[at] ?? 0]));
    return { matrix: matrixOf({ ...data.packed, ids }), depth };
  }, [data, fish]);
  return useMemo(() => (whole ? { ...whole, mean: meanKinship(whole.matrix, idsOf(group)) } : null), [whole, group]);
}

const idsOf = (fish: readonly LineageNode[]): string[] => fish.map(({ id }) => id);
