import type { LineageNode } from '@/shared/lineage/contract';
import type { PedigreeEntry } from '@/shared/lineage/pedigree';

/** What the computations take of a node. */
export const entryOf = (node: LineageNode): PedigreeEntry =>
  'from' in node ? { id: node.id, from: node.from } : { id: node.id, sire: node.sire, dam: node.dam };
