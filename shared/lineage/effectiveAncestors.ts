import { rowFinder } from './parentOptions';
import type { PedigreeEntry } from './pedigree';
import { noAnimals } from './pedigreeError';
import { inherited, pourParents } from './segregation';
import { type SortedPedigree, sortPedigree } from './sortedPedigree';

/** Contributions closer than this are a tie, and one this small is none. */
const SAME = 1e-12;

export type AncestorShare = { id: string; share: number };

/**
 * Effective number of ancestors behind `ids` (Boichard, Maignel & Verrier 1997): unlike founder equivalents it sees
 * bottlenecks. The ancestor that explains most genes not yet explained is taken, again and again; of several that tie, the
 * one whose id sorts first, for the figure depends on it. It lies between the founder genomes and the founder equivalents.
 * Possible parents count by their share. Throws `noAnimals`, and what `kinship` throws.
 */
export function effectiveAncestors(
  pedigree: PedigreeEntry[],
  ids: string[],
): { number: number; contributions: AncestorShare[] } {
  if (ids.length === 0) throw noAnimals('the number of ancestors');
  const sorted = sortPedigree(pedigree);
  const group = [...new Set(ids)].map(rowFinder(sorted.rowOf));
  const chosen = new Set<number>();
  const contributions: AncestorShare[] = [];
  for (let next = largest(sorted, group, chosen); next; next = largest(sorted, group, chosen)) {
    chosen.add(next.row);
    contributions.push({ id: sorted.ids[next.row] ?? '', share: next.share });
  }
  return { number: 1 / contributions.reduce((sum, { share }) => sum + share ** 2, 0), contributions };
}

function largest(
  sorted: SortedPedigree,
  group: number[],
  chosen: Set<number>,
): { row: number; share: number } | undefined {
  const passed = new Uint8Array(sorted.nodes);
  for (const row of chosen) if (!isLeaf(sorted, row)) passed[sorted.nodeOf[row] ?? 0] = 1;
  const flow = flowCut(
    sorted,
    passed,
    group.filter((row) => !chosen.has(row)),
    1 / group.length,
  );
  const explained = explainedShares(sorted, passed);
  const inGroup = new Set(group);
  let best: { row: number; share: number } | undefined;
  sorted.ids.forEach((id, row) => {
    if (chosen.has(row) || (isLeaf(sorted, row) && !inGroup.has(row))) return;
    const node = sorted.nodeOf[row] ?? 0;
    const genes = isLeaf(sorted, row) ? 1 / group.length : (flow[node] ?? 0);
    const share = genes * (1 - (explained[node] ?? 0));
    const tie = best && Math.abs(share - best.share) <= SAME;
    if (share > SAME && (!best || (tie ? id < (sorted.ids[best.row] ?? '') : share > best.share)))
      best = { row, share };
  });
  return best;
}

const isLeaf = (sorted: SortedPedigree, row: number): boolean => sorted.isLeaf[sorted.nodeOf[row] ?? 0] === 1;

/** Genes of the group that came through each node, those of ancestors already taken traced no further. */
function flowCut(sorted: SortedPedigree, passed: Uint8Array, rows: number[], part: number): Float64Array {
  const flow = new Float64Array(sorted.nodes);
  for (const row of rows) {
    const node = sorted.nodeOf[row] ?? 0;
    if (isLeaf(sorted, row)) pourParents(sorted, sorted.familyOf[node] ?? 0, flow, part);
    else flow[node] = (flow[node] ?? 0) + part;
  }
  for (let node = sorted.nodes - 1; node >= 0; node -= 1) {
    const share = flow[node] ?? 0;
    if (share > 0 && passed[node] !== 1) pourParents(sorted, sorted.familyOf[node] ?? 0, flow, share);
  }
  return flow;
}

/** Share of each node's genes that came through ancestors already taken. */
function explainedShares(sorted: SortedPedigree, passed: Uint8Array): Float64Array {
  const explained = new Float64Array(sorted.nodes);
  for (let node = 0; node < sorted.nodes; node += 1) {
    explained[node] = passed[node] === 1 ? 1 : inherited(sorted, sorted.familyOf[node] ?? 0, explained);
  }
  return explained;
}
