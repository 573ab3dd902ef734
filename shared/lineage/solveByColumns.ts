import { type PairColumns, pairColumns } from './pairColumns';
import { OUTSIDE } from './parentOptions';
import type { Segregation } from './segregation';
import type { SortedPedigree } from './sortedPedigree';
import { type SparseColumns, sparseColumns } from './sparseColumns';

/**
 * F of every family in memory linear in the pedigree: families in order, the kinship of each possible pair read from the
 * column of the parent with most mates (Colleau 2002: an indirect product with A, no matrix).
 */
export function solveByColumns(sorted: SortedPedigree): Segregation {
  const segregation: Segregation = {
    sorted,
    self: new Float64Array(sorted.families),
    within: new Float64Array(sorted.families),
  };
  const columns = sparseColumns(segregation);
  const pairs = pairColumns(sorted, columns);
  for (let family = 0; family < sorted.families; family += 1) {
    segregation.self[family] = selfOf(segregation, pairs, family);
    segregation.within[family] = withinOf(segregation, columns, family);
  }
  return segregation;
}

function selfOf({ sorted, self }: Segregation, mates: PairColumns, family: number): number {
  const { pairs, familyOf, isDraw, outside } = sorted;
  const draw = isDraw[family] === 1;
  let sum = draw ? (outside[family] ?? 0) / 2 : 0;
  for (let at = pairs.start[family] ?? 0; at < (pairs.start[family + 1] ?? 0); at += 1) {
    const sire = pairs.sire[at] ?? OUTSIDE;
    const dam = draw ? sire : (pairs.dam[at] ?? OUTSIDE);
    if (sire === OUTSIDE || dam === OUTSIDE) continue;
    sum += (pairs.weight[at] ?? 0) * (sire === dam ? (self[familyOf[sire] ?? 0] ?? 0) : mates.kinshipOf(at));
  }
  return draw ? sum : (1 + sum) / 2;
}

function withinOf({ sorted, self }: Segregation, columns: SparseColumns, family: number): number {
  const { parents, familyOf } = sorted;
  const first = parents.start[family] ?? 0;
  const count = (parents.start[family + 1] ?? 0) - first;
  if (count === 0) return 0;
  const selfOfParent = (at: number) => self[familyOf[parents.node[at] ?? 0] ?? 0] ?? 0;
  if (count === 1) return (parents.share[first] ?? 0) ** 2 * selfOfParent(first);
  if (!isOnePair(sorted, family)) return columns.within(family);
  const inbreeding = 2 * (self[family] ?? 0) - 1;
  return (selfOfParent(first) + selfOfParent(first + 1)) / 4 + inbreeding / 2;
}

function isOnePair({ pairs, isDraw }: SortedPedigree, family: number): boolean {
  return isDraw[family] !== 1 && (pairs.start[family + 1] ?? 0) - (pairs.start[family] ?? 0) === 1;
}
