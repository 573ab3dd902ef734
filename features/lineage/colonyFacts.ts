import type { LineageNode } from '@/shared/lineage/contract';
import { geneDiversity } from '@/shared/lineage/diversity';
import { predictedGeneDiversity } from '@/shared/lineage/drift';
import { type GroupSize, sizeByFamilies, sizeBySexes, sizeByShares, sizeOverTime } from '@/shared/lineage/groupSize';
import { kinship } from '@/shared/lineage/kinship';
import { parentShares } from '@/shared/lineage/parentShares';
import { entryOf, type Nodes } from './entries';
import type { Kin } from './kin';

export type SizeLine = GroupSize & { key: string; word: string; rests: string };

export type ColonyFacts = {
  id: string;
  code: string;
  heads: { males: number; females: number; unsexed: number };
  diversity: number;
  depth: number;
  /** The effective size that the forecast goes by, and the others beside it. */
  size: SizeLine;
  sizes: SizeLine[];
};

/** From so many broods on, who bred says more than who could have. Common practice, no source. */
const ENOUGH_BROODS = 4;

/** Gene diversity and effective size of a colony's breeders, each with what it rests on. */
export function colonyFacts(
  nodes: Nodes,
  { entries, depth }: Pick<Kin, 'entries' | 'depth'>,
  colony: { id: string; code: string; fish: readonly LineageNode[] },
): ColonyFacts {
  const breeders = colony.fish.filter(({ keptAs }) => keptAs === 'breeder');
  const group = breeders.length > 0 ? breeders : colony.fish;
  const ids = group.map(({ id }) => id);
  const members = new Set(ids);
  const theirs = nodes.filter((node) => parentShares(entryOf(node)).some(({ id }) => id !== null && members.has(id)));
  const broods = theirs.filter(({ thing }) => thing === 'brood').map(entryOf);
  const kept = theirs.filter(({ thing, keptAs }) => thing === 'fish' && keptAs !== 'other').map(entryOf);
  const count = (sex: LineageNode['sex']) => group.filter((fish) => fish.sex === sex).length;
  const heads = { males: count('male'), females: count('female'), unsexed: count('unknown') };
  const bySexes: SizeLine = { ...sizeBySexes(group), key: 'sexes', word: 'By heads', rests: headsWords(heads) };
  const byShares: SizeLine = {
    ...sizeByShares(group, broods),
    key: 'shares',
    word: 'By who bred',
    rests: `${plural(broods.length, 'brood')}, each counted alike; possible sires by their share`,
  };
  const byFamilies: SizeLine = {
    ...sizeByFamilies(group, kept),
    key: 'families',
    word: 'By families kept',
    rests: `${plural(kept.length, 'young', 'young')} of theirs kept as breeders or holdbacks; how unequally the parents left them`,
  };
  const size = byShares.size !== null && broods.length >= ENOUGH_BROODS ? byShares : bySexes;
  const { generations, ...overTime } = sizeOverTime(entries, ids, size);
  const behind = generations.map((one) => one.size.toFixed(1)).join(', ');
  return {
    id: colony.id,
    code: colony.code,
    heads,
    diversity: geneDiversity(kinship(entries, ids), ids),
    depth: ids.reduce((sum, id) => sum + (depth.get(id) ?? 0), 0) / ids.length,
    size,
    sizes: [
      bySexes,
      byShares,
      byFamilies,
      {
        ...overTime,
        key: 'time',
        word: 'Over time',
        rests: `Harmonic mean of today’s and of the parents before: ${behind}`,
      },
    ],
  };
}

/** Gene diversity today and after each generation on; null where the colony cannot breed as it is known. */
export function forecastOf({ diversity, size }: ColonyFacts, generations: number): number[] | null {
  const effective = size.size;
  if (effective === null) return null;
  const after = Array.from({ length: generations + 1 }, (_, n) =>
    predictedGeneDiversity({ effectiveSize: effective, generations: n, geneDiversity: diversity }),
  );
  return after.every((value) => value !== null) ? after : null;
}

const plural = (n: number, one: string, many = `${one}s`): string => `${n} ${n === 1 ? one : many}`;

export const headsWords = ({ males, females, unsexed }: ColonyFacts['heads']): string =>
  `${plural(males, 'male')}, ${plural(females, 'female')}${unsexed > 0 ? `, ${unsexed} not sexed, which are left out` : ''}`;

/** The colonies of a scope with the fish of it that live there; chosen fish are looked at as if they were one colony. */
export function coloniesOf(fish: readonly LineageNode[], chosen: boolean) {
  if (chosen) return [{ id: 'chosen', code: 'The chosen fish', fish }];
  const colonies = new Map<string, { id: string; code: string; fish: LineageNode[] }>();
  for (const node of fish) {
    if (!node.colony) continue;
    const known = colonies.get(node.colony.id);
    if (known) known.fish.push(node);
    else colonies.set(node.colony.id, { ...node.colony, fish: [node] });
  }
  return [...colonies.values()].sort((a, b) => a.code.localeCompare(b.code));
}
