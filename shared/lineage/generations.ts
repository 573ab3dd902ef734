import { OUTSIDE } from './parentOptions';
import type { PedigreeEntry } from './pedigree';
import { PedigreeError } from './pedigreeError';
import { type SortedPedigree, sortPedigree } from './sortedPedigree';

/** F0 is `{ low: 0, high: 0 }`; "F1 or F2" is `{ low: 1, high: 2 }`; `null`: of unknown origin. */
export type GenerationRange = { low: number; high: number } | null;

/**
 * Filial generation of every entry. `founders` gives the number of those whose origin is known (wild = 0; a bought F2 = 2).
 * Any other fish is 1 + the smaller of its parents' numbers (offspring of a wild and a bred fish are F1: CITES Res. Conf.
 * 10.16, from memory), with low and high over its possible pairs; `null` if a possible parent is of unknown origin.
 * Throws a `PedigreeError` as `kinship` does, and `badGeneration` for a founder whose number is not whole from 0 on.
 */
export function generationNumbers(
  pedigree: PedigreeEntry[],
  founders: Map<string, number>,
): Map<string, GenerationRange> {
  const sorted = sortPedigree(pedigree);
  checkFounders(founders);
  const ofNode: GenerationRange[] = [];
  const found = new Map<string, GenerationRange>(sorted.ids.map((id) => [id, null]));
  const idsOf = idsByNode(sorted);
  for (let node = 0; node < sorted.nodes; node += 1) {
    const bred = bredRange(sorted, ofNode, sorted.familyOf[node] ?? 0);
    const ids = idsOf[node] ?? [];
    for (const id of ids) {
      const given = founders.get(id);
      const range = given === undefined ? bred : { low: given, high: given };
      found.set(id, range);
      ofNode[node] = range;
    }
    if (ids.length === 0) ofNode[node] = bred;
  }
  return found;
}

function checkFounders(founders: Map<string, number>): void {
  for (const [id, generation] of founders) {
    if (Number.isSafeInteger(generation) && generation >= 0) continue;
    throw new PedigreeError('badGeneration', [id], `The generation of ${id} must be a whole number: 0 for a wild fish`);
  }
}

function idsByNode(sorted: SortedPedigree): string[][] {
  const idsOf: string[][] = [];
  sorted.ids.forEach((id, row) => {
    const node = sorted.nodeOf[row] ?? 0;
    const ids = idsOf[node] ?? [];
    ids.push(id);
    idsOf[node] = ids;
  });
  return idsOf;
}

/** From the possible pairs; a draw takes its candidates' numbers as they are. */
function bredRange(sorted: SortedPedigree, ofNode: GenerationRange[], family: number): GenerationRange {
  const { pairs } = sorted;
  const isDraw = sorted.isDraw[family] === 1;
  const of = (node: number | undefined) => (node === undefined || node === OUTSIDE ? null : (ofNode[node] ?? null));
  let range: GenerationRange = null;
  for (let at = pairs.start[family] ?? 0; at < (pairs.start[family + 1] ?? 0); at += 1) {
    const sire = of(pairs.sire[at]);
    const dam = isDraw ? sire : of(pairs.dam[at]);
    if (!sire || !dam) return null;
    const step = isDraw ? 0 : 1;
    const low = step + Math.min(sire.low, dam.low);
    const high = step + Math.min(sire.high, dam.high);
    range = range ? { low: Math.min(range.low, low), high: Math.max(range.high, high) } : { low, high };
  }
  return range;
}
