import type { LineageNode } from '@/shared/lineage/contract';
import { inbreedingOutcomes } from '@/shared/lineage/outcomes';
import { isPossibleParent, parentShares } from '@/shared/lineage/parentShares';
import type { PedigreeEntry } from '@/shared/lineage/pedigree';
import { sharedAncestry } from '@/shared/lineage/sharedAncestors';
import { entryOf, type Nodes, nameOf, saidOf } from './entries';
import type { Kin } from './kin';
import { knownOf } from './known';

/** More cases than this would hold the page up. */
const MOST_CASES = 512;

export type PairFacts = {
  f: number;
  /** What F of their young may be; null where there are too many cases. */
  outcomes: { f: number; probability: number }[] | null;
  generationsKnown: number;
  known: { id: string; code: string; said: string }[];
  shared: { id: string; code: string; words: string; certain: boolean; sex: LineageNode['sex'] }[];
  /** Drawn: the two, what they share, and everything between. */
  between: LineageNode[];
  /** "DUMA-26C, brood, sire DUMA-A01 79 % or DUMA-A02 21 %, dam DUMA-A04". */
  doubts: string[];
};

/** What a kinship of two fish rests on. */
export function pairFacts(nodes: Nodes, kin: Kin, [a, b]: readonly [LineageNode, LineageNode]): PairFacts {
  const byId = new Map<string, LineageNode>(nodes.map((node) => [node.id, node]));
  const { ancestors, between } = sharedAncestry(kin.entries, a.id, b.id);
  const drawn = new Set(between);
  const shownNodes = nodes.filter(({ id }) => drawn.has(id));
  const depths = [a, b].map(({ id }) => kin.depth.get(id) ?? 0);
  return {
    f: kin.matrix.between(a.id, b.id),
    outcomes: a.id === b.id ? [] : outcomesOf(kin.entries, a.id, b.id),
    generationsKnown: Math.min(...depths),
    known: [...new Set([a, b])].map((node) => ({
      id: node.id,
      code: nameOf(node),
      said: knownOf([node], kin.depth).said,
    })),
    shared: ancestors.flatMap(({ id, back, certain }) => {
      const node = byId.get(id);
      return node ? [{ id, code: nameOf(node), words: backWords(back, [a, b]), certain, sex: node.sex }] : [];
    }),
    between: shownNodes,
    doubts: shownNodes.filter(isDoubtful).map((node) => saidOf(node, byId)),
  };
}

const isDoubtful = (node: LineageNode): boolean =>
  parentShares(entryOf(node)).some(({ id, share }) => id !== null && isPossibleParent(share));

/** F of a young fish of the two, in every case that the uncertain parents behind it leave open. */
function outcomesOf(entries: readonly PedigreeEntry[], sire: string, dam: string): PairFacts['outcomes'] {
  const id = 'their young';
  const young: PedigreeEntry = { id, sire: { kind: 'known', id: sire }, dam: { kind: 'known', id: dam } };
  return inbreedingOutcomes([...entries, young], id, MOST_CASES);
}

/** "parent of both", "parent of DUMA-A04", "parent of DUMA-A04, grandparent of DUMA-26C". */
function backWords(back: readonly [number, number], pair: readonly [LineageNode, LineageNode]): string {
  if (back[0] === back[1]) return `${ancestorWord(back[0])} of both`;
  const words = pair.flatMap((node, i) => (back[i] ? [`${ancestorWord(back[i])} of ${nameOf(node)}`] : []));
  return words.join(', ');
}

/** 1: parent; 3: great-grandparent; 5: ancestor 5 generations back. */
function ancestorWord(back: number): string {
  if (back > 4) return `ancestor ${back} generations back`;
  return ['', 'parent', 'grandparent', 'great-grandparent', 'great-great-grandparent'][back] ?? '';
}
