import { BadValue, finite } from '../badValue';
import { rowFinder } from './parentOptions';
import type { PedigreeEntry } from './pedigree';
import { noAnimals } from './pedigreeError';
import { flowUp, pourParents } from './segregation';
import { type SortedPedigree, sortPedigree } from './sortedPedigree';

/** Where genes of parents that nobody knows are counted. */
export const UNKNOWN_FOUNDERS = '?';

/**
 * Share of the genes of `ids` (each counted alike) that each founder gave, by id, and those of unknown parents under "?";
 * sums to 1. A founder is an entry with no known parent; a parent unknown beside a known one adds to "?". Expected shares
 * where parents are uncertain. Gene flow as in Lacy 1989. Throws `unknownId`; no ids give an empty map.
 */
export function founderContributions(pedigree: PedigreeEntry[], ids: string[]): Map<string, number> {
  const sorted = sortPedigree(pedigree);
  const rows = [...new Set(ids)].map(rowFinder(sorted.rowOf));
  const flow = new Float64Array(sorted.nodes);
  const founders = new Map<string, number>();
  let unknown = 0;
  for (const row of rows) {
    const node = sorted.nodeOf[row] ?? 0;
    const family = sorted.familyOf[node] ?? 0;
    if (sorted.isLeaf[node] !== 1) flow[node] = (flow[node] ?? 0) + 1 / rows.length;
    else if (isFounder(sorted, family)) founders.set(sorted.ids[row] ?? '', 1 / rows.length);
    else {
      pourParents(sorted, family, flow, 1 / rows.length);
      unknown += (sorted.outside[family] ?? 0) / rows.length;
    }
  }
  flowUp(sorted, flow);
  unknown += addFlow(sorted, flow, founders);
  if (unknown > 0) founders.set(UNKNOWN_FOUNDERS, unknown);
  return founders;
}

/** Adds what reached each breeding founder; tells how much left the pedigree elsewhere. */
function addFlow(sorted: SortedPedigree, flow: Float64Array, founders: Map<string, number>): number {
  sorted.ids.forEach((id, row) => {
    const node = sorted.nodeOf[row] ?? 0;
    const share = flow[node] ?? 0;
    if (share > 0 && isFounder(sorted, sorted.familyOf[node] ?? 0)) founders.set(id, share);
  });
  let unknown = 0;
  flow.forEach((share, node) => {
    const family = sorted.familyOf[node] ?? 0;
    if (!isFounder(sorted, family)) unknown += share * (sorted.outside[family] ?? 0);
  });
  return unknown;
}

const isFounder = ({ parents, isDraw }: SortedPedigree, family: number): boolean =>
  isDraw[family] !== 1 && parents.start[family] === parents.start[family + 1];

/**
 * How many founders with equal shares would spread the genes as evenly: 1 / sum of squared shares (Lacy 1989). Give it what
 * `founderContributions` gives; "?" counts as one founder, so much unknown parentage lowers it. Throws `noAnimals` for an
 * empty map and a `BadValue` for a share below zero or not a number.
 */
export function founderEquivalents(contributions: Map<string, number>): number {
  if (contributions.size === 0) throw noAnimals('the number of founders');
  let squares = 0;
  for (const [id, share] of contributions) squares += finite(`share of ${id}`, share, { min: 0 }) ** 2;
  if (squares === 0) throw new BadValue('shares of founders', 0, 'one must be above 0');
  return 1 / squares;
}
