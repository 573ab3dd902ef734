import type { LineageNode } from '@/shared/lineage/contract';
import { carriersOf } from '@/shared/lineage/descendants';
import { founderGenomeEquivalents, geneDiversity } from '@/shared/lineage/diversity';
import { founderContributions, founderEquivalents, UNKNOWN_FOUNDERS } from '@/shared/lineage/founders';
import { parentShares } from '@/shared/lineage/parentShares';
import { entryOf, type Nodes, nameOf } from './entries';
import type { Kin } from './kin';

/** `risk`: one or two fish carry it; `alone`: it lives, and none of its young is kept; `lost`: no fish carries it. */
export type Standing = 'carried' | 'risk' | 'alone' | 'lost';

export type FounderFacts = {
  id: string;
  code: string;
  sex: LineageNode['sex'];
  share: number;
  standing: Standing;
  words: string;
};

export type GroupFacts = {
  founders: FounderFacts[];
  unknownShare: number;
  equivalents: number;
  genomes: number;
  diversity: number;
  /** Full generations on record behind the fish, on average. */
  depth: number;
};

/** So few carriers that one bad day loses the founder. Common practice, no source. */
const FEW = 2;

/** Where the genes of a group come from, and which founders hang on a few fish. */
export function groupFacts(nodes: Nodes, kin: Kin, group: readonly LineageNode[]): GroupFacts {
  const ids = group.map(({ id }) => id);
  const contributions = founderContributions(kin.entries, ids);
  const strains = new Set(group.map(({ strainId }) => strainId));
  const founders = nodes.filter(
    (node) => contributions.has(node.id) || (strains.has(node.strainId) && node.thing === 'fish' && isFounder(node)),
  );
  const carriers = carriersOf(
    kin.entries,
    founders.map(({ id }) => id),
    ids,
  );
  const codes = new Map(group.map((node) => [node.id, nameOf(node)]));
  return {
    founders: founders
      .map((node) => standingOf(node, contributions.get(node.id) ?? 0, carriers.get(node.id) ?? [], codes))
      .filter(({ standing, id }) => standing !== 'lost' || !nodes.some((node) => node.id === id && node.living))
      .sort((a, b) => b.share - a.share),
    unknownShare: contributions.get(UNKNOWN_FOUNDERS) ?? 0,
    equivalents: founderEquivalents(contributions),
    genomes: founderGenomeEquivalents(kin.matrix, ids),
    diversity: geneDiversity(kin.matrix, ids),
    depth: ids.reduce((sum, id) => sum + (kin.depth.get(id) ?? 0), 0) / ids.length,
  };
}

const isFounder = (node: LineageNode): boolean => parentShares(entryOf(node)).every(({ id }) => id === null);

function standingOf(
  node: LineageNode,
  share: number,
  carriers: readonly string[],
  codes: ReadonlyMap<string, string>,
): FounderFacts {
  const facts = { id: node.id, code: nameOf(node), sex: node.sex, share };
  const names = carriers.flatMap((id) => codes.get(id) ?? []);
  if (carriers.length === 0) return { ...facts, standing: 'lost', words: 'Gone: none of these fish carries its genes' };
  if (carriers.length === 1 && carriers[0] === node.id)
    return { ...facts, standing: 'alone', words: 'Only in itself: none of its young is kept' };
  if (carriers.length <= FEW) return { ...facts, standing: 'risk', words: `Only in ${names.join(' and ')}` };
  return { ...facts, standing: 'carried', words: `In ${carriers.length} of ${codes.size} fish` };
}
