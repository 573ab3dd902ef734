import { equivalentGenerations } from '@/shared/lineage/completeness';
import type { LineageNode } from '@/shared/lineage/contract';
import { founderContributions, UNKNOWN_FOUNDERS } from '@/shared/lineage/founders';
import { inbreeding } from '@/shared/lineage/inbreeding';
import { inbreedingOutcomes } from '@/shared/lineage/outcomes';
import { entriesOf, generationsOf, type Nodes, nameOf } from './entries';

export type LineageFigures = {
  /** Expected F, its possible values, and how far back the pedigree reaches. */
  inbreeding: { f: number; outcomes: { f: number; probability: number }[] | null; generationsKnown: number };
  generation: string | null;
  founders: { key: string; word: string; share: number }[];
  unknownShare: number;
};

/** What is said of one animal, out of the part of the pedigree around it. */
export function figuresOf(nodes: Nodes, id: string): LineageFigures {
  const entries = entriesOf(nodes);
  const byId = new Map<string, LineageNode>(nodes.map((node) => [node.id, node]));
  const contributions = founderContributions(entries, [id]);
  const unknownShare = contributions.get(UNKNOWN_FOUNDERS) ?? 0;
  const founders = [...contributions]
    .filter(([founder, share]) => founder !== UNKNOWN_FOUNDERS && founder !== id && share > 0)
    .sort((a, b) => b[1] - a[1])
    .map(([founder, share]) => {
      const node = byId.get(founder);
      return { key: founder, word: node ? nameOf(node) : 'a founder', share };
    });
  return {
    inbreeding: {
      f: inbreeding(entries).get(id) ?? 0,
      outcomes: inbreedingOutcomes(entries, id),
      generationsKnown: equivalentGenerations(entries, id),
    },
    generation: generationsOf(nodes).get(id) ?? null,
    founders,
    unknownShare,
  };
}
