import { whole } from '../badValue';
import { OUTSIDE, rowFinder } from './parentOptions';
import type { PedigreeEntry } from './pedigree';
import { type SortedPedigree, sortPedigree } from './sortedPedigree';

/**
 * Complete generation equivalents of `id`: the sum over its known ancestors of (1/2)^n, n generations back (Maignel et al.
 * 1996). 3 can be three full generations or more with gaps. Possible parents count by their share. Throws `unknownId`.
 */
export function equivalentGenerations(pedigree: PedigreeEntry[], id: string): number {
  const sorted = sortPedigree(pedigree);
  return ofFamilies(sorted)[familyOf(sorted, rowFinder(sorted.rowOf)(id))] ?? 0;
}

/** `equivalentGenerations` of every entry, in one pass. */
export function allEquivalentGenerations(pedigree: PedigreeEntry[]): Map<string, number> {
  const sorted = sortPedigree(pedigree);
  const depth = ofFamilies(sorted);
  return new Map(sorted.ids.map((id, row) => [id, depth[familyOf(sorted, row)] ?? 0]));
}

const familyOf = (sorted: SortedPedigree, row: number): number => sorted.familyOf[sorted.nodeOf[row] ?? 0] ?? 0;

/** A draw is no generation of its own: it passes on how surely it is known and what is known behind it. */
function ofFamilies(sorted: SortedPedigree): Float64Array {
  const { parents, isDraw, outside } = sorted;
  const depth = new Float64Array(sorted.families);
  for (let family = 0; family < sorted.families; family += 1) {
    let sum = 0;
    for (let at = parents.start[family] ?? 0; at < (parents.start[family + 1] ?? 0); at += 1) {
      const parent = sorted.familyOf[parents.node[at] ?? 0] ?? 0;
      const known = isDraw[parent] === 1 ? 1 - (outside[parent] ?? 0) : 1;
      sum += (parents.share[at] ?? 0) * ((isDraw[family] === 1 ? 0 : known) + (depth[parent] ?? 0));
    }
    depth[family] = sum;
  }
  return depth;
}

/**
 * How complete the pedigree of `id` is over `depth` generations, 0 to 1: of the sire's side, of the dam's, and their
 * harmonic mean (MacCluer et al. 1983, with each side from 0 to 1). One side empty makes it 0, for no inbreeding could show.
 * Throws `unknownId`, and a `BadValue` for a depth that is not a whole number from 1.
 */
export function pedigreeCompleteness(
  pedigree: PedigreeEntry[],
  id: string,
  depth: number,
): { sire: number; dam: number; index: number } {
  whole('depth', depth, 1);
  const sorted = sortPedigree(pedigree);
  const family = familyOf(sorted, rowFinder(sorted.rowOf)(id));
  const sire = sideOf(sorted, parentsOf(sorted, family, 'sire'), depth);
  const dam = sideOf(sorted, parentsOf(sorted, family, 'dam'), depth);
  return { sire, dam, index: sire > 0 && dam > 0 ? (2 * sire * dam) / (sire + dam) : 0 };
}

/** Expected number of times that each node stands in one generation of one side. */
type Generation = Map<number, number>;

function sideOf(sorted: SortedPedigree, first: Generation, depth: number): number {
  let sum = 0;
  let generation = settled(sorted, first);
  for (let back = 0; back < depth && generation.size > 0; back += 1) {
    sum += [...generation.values()].reduce((heads, count) => heads + count, 0) / 2 ** back;
    const before: Generation = new Map();
    for (const [node, count] of generation) {
      for (const side of ['sire', 'dam'] as const) {
        addAll(before, parentsOf(sorted, sorted.familyOf[node] ?? 0, side), count);
      }
    }
    generation = settled(sorted, before);
  }
  return sum / depth;
}

function parentsOf({ pairs }: SortedPedigree, family: number, side: 'sire' | 'dam'): Generation {
  const found: Generation = new Map();
  for (let at = pairs.start[family] ?? 0; at < (pairs.start[family + 1] ?? 0); at += 1) {
    const parent = pairs[side][at] ?? OUTSIDE;
    if (parent !== OUTSIDE) found.set(parent, (found.get(parent) ?? 0) + (pairs.weight[at] ?? 0));
  }
  return found;
}

/** Replaces each draw by its candidates. */
function settled(sorted: SortedPedigree, generation: Generation): Generation {
  const found: Generation = new Map();
  for (const [node, count] of generation) {
    const family = sorted.familyOf[node] ?? 0;
    if (sorted.isDraw[family] === 1) addAll(found, parentsOf(sorted, family, 'sire'), count);
    else addAll(found, new Map([[node, 1]]), count);
  }
  return found;
}

function addAll(to: Generation, more: Generation, times: number): void {
  for (const [node, count] of more) to.set(node, (to.get(node) ?? 0) + count * times);
}
