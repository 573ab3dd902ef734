import type { LineageNode } from '@/shared/lineage/contract';
import { generationNumbers } from '@/shared/lineage/generations';
import { isPossibleParent, parentShares } from '@/shared/lineage/parentShares';
import type { PedigreeEntry } from '@/shared/lineage/pedigree';
import { joinOr, shareWords } from '@/shared/sheets/sayings';

export type Nodes = readonly LineageNode[];

/** What the computations take of a node. */
export const entryOf = (node: LineageNode): PedigreeEntry =>
  'from' in node ? { id: node.id, from: node.from } : { id: node.id, sire: node.sire, dam: node.dam };

export const entriesOf = (nodes: Nodes): PedigreeEntry[] => nodes.map(entryOf);

export const nameOf = ({ code, thing, sex }: LineageNode): string => {
  if (code) return code;
  return thing === 'brood' ? 'a brood' : sex === 'unknown' ? 'a fish not told apart' : `a ${sex} not told apart`;
};

/** "F2", "F1 or F2"; null where the origin of an ancestor is not known. */
export function generationsOf(nodes: Nodes): Map<string, string | null> {
  const founders = new Map(
    nodes.flatMap(({ id, founderGeneration }) =>
      founderGeneration === null ? [] : [[id, founderGeneration] as const],
    ),
  );
  const words = [...generationNumbers(entriesOf(nodes), founders)].map(([id, range]) => {
    if (!range) return [id, null] as const;
    const { low, high } = range;
    return [id, low === high ? `F${low}` : high === low + 1 ? `F${low} or F${high}` : `F${low} to F${high}`] as const;
  });
  return new Map(words);
}

/** "DUMA-26C, brood, sire DUMA-A01 79 % or DUMA-A02 21 %, dam DUMA-A04": the pedigree as it is read aloud. */
export function saidOf(node: LineageNode, byId: ReadonlyMap<string, LineageNode>): string {
  const shares = parentShares(entryOf(node));
  const side = (which: 'sire' | 'dam') => {
    const own = shares.filter((one) => one.side === which && one.id !== null);
    if (own.length === 0) return null;
    const certain = own.length === 1 && !isPossibleParent(own[0]?.share ?? 0);
    const names = own.map(({ id, share }) => {
      const parent = byId.get(id ?? '');
      const name = parent ? nameOf(parent) : 'one not shown';
      return certain ? name : `${name} ${shareWords(share)}`;
    });
    return `${which} ${joinOr(names)}`;
  };
  const parents = [side('sire'), side('dam')].filter(Boolean).join(', ') || 'parents not known';
  const sheet = node.sheet
    ? `, by sheet ${node.sheet.number} of ${node.issuer}, ${node.sheet.signature === 'valid' ? 'checked' : 'not checked'}`
    : '';
  return `${nameOf(node)}, ${node.thing}, ${parents}${sheet}`;
}
