import type { LineageNode } from '@/shared/lineage/contract';

/** How much of a pedigree stands behind a figure, short and read aloud. */
export type Known = { short: string; said: string };

/** Of two fish the shallower pedigree counts: no kinship can show beyond it. `depth` is in full generations. */
export function knownOf(fish: readonly LineageNode[], depth: ReadonlyMap<string, number>): Known {
  const least = Math.min(...fish.map(({ id }) => depth.get(id) ?? 0));
  if (least > 0)
    return { short: `${least.toFixed(1)} gen`, said: `pedigree known equal to ${least.toFixed(1)} full generations` };
  const bare = fish.filter(({ id }) => (depth.get(id) ?? 0) === 0);
  if (bare.every(({ founderGeneration }) => founderGeneration === 0))
    return { short: 'wild', said: 'wild, taken as unrelated to others' };
  return { short: 'none', said: 'no ancestors are recorded' };
}
