import { isPacked, type KinshipMatrix, type PackedMatrix } from './kinshipMatrix';
import { noAnimals } from './pedigreeError';

/**
 * Mean kinship of each of `ids` with all of `ids`, itself included (Ballou & Lacy 1995): 0 to 1, low where a fish carries
 * rare founders. Throws `unknownId`. Every id counts once.
 */
export function meanKinship(matrix: KinshipMatrix, ids: string[]): Map<string, number> {
  const group = [...new Set(ids)];
  if (isPacked(matrix)) return meanOfPacked(matrix, group);
  const mean = (id: string) => group.reduce((sum, other) => sum + matrix.between(id, other), 0) / group.length;
  return new Map(group.map((id) => [id, mean(id)]));
}

/**
 * Gene diversity kept in the group, 0 to 1: 1 less the mean of all kinships, those of each fish with itself included
 * (Lacy 1995). Throws `noAnimals` for an empty group, `unknownId`.
 */
export function geneDiversity(matrix: KinshipMatrix, ids: string[]): number {
  return 1 - groupKinship(matrix, ids, 'gene diversity');
}

/**
 * How many unrelated, non-inbred founders would hold as much gene diversity as the group: 1 / (2 x mean kinship)
 * (Lacy 1989). Throws `noAnimals` for an empty group, `unknownId`.
 */
export function founderGenomeEquivalents(matrix: KinshipMatrix, ids: string[]): number {
  return 1 / (2 * groupKinship(matrix, ids, 'the number of founder genomes'));
}

function groupKinship(matrix: KinshipMatrix, ids: string[], what: string): number {
  const means = [...meanKinship(matrix, ids).values()];
  if (means.length === 0) throw noAnimals(what);
  return means.reduce((sum, mean) => sum + mean, 0) / means.length;
}

/** By classes of fish that are alike: a brood of fifty without young costs no more than one fish. */
function meanOfPacked({ packed, indexOf }: PackedMatrix, group: string[]): Map<string, number> {
  const { classOf, values, self } = packed;
  const heads = new Map<number, number>();
  for (const id of group) {
    const each = classOf[indexOf(id)] ?? 0;
    heads.set(each, (heads.get(each) ?? 0) + 1);
  }
  const sums = classSums(values, heads);
  return new Map(
    group.map((id) => {
      const index = indexOf(id);
      const own = classOf[index] ?? 0;
      const withItself = (self[index] ?? 0) - (values[(own * (own + 3)) / 2] ?? 0);
      return [id, ((sums.get(own) ?? 0) + withItself) / group.length];
    }),
  );
}

/** For each class the sum of its kinships over all heads, its own heads counted as fish other than itself. */
function classSums(values: Float64Array, heads: Map<number, number>): Map<number, number> {
  const classes = Int32Array.from(heads.keys()).sort();
  const counts = Float64Array.from(classes, (each) => heads.get(each) ?? 0);
  const sums = new Float64Array(classes.length);
  for (let j = 0; j < classes.length; j += 1) {
    const row = ((classes[j] ?? 0) * ((classes[j] ?? 0) + 1)) / 2;
    for (let i = 0; i <= j; i += 1) {
      const value = values[row + (classes[i] ?? 0)] ?? 0;
      sums[j] = (sums[j] ?? 0) + (counts[i] ?? 0) * value;
      if (i < j) sums[i] = (sums[i] ?? 0) + (counts[j] ?? 0) * value;
    }
  }
  return new Map(Array.from(classes, (each, index) => [each, sums[index] ?? 0]));
}
