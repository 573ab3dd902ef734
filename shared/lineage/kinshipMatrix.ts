import { unknownId } from './pedigreeError';

/**
 * Kinships (coancestries) of a set of animals: the chance that two alleles drawn at random, one from each, are copies of one
 * ancestral allele. An animal's kinship with itself is (1 + F) / 2. Where parents are uncertain, exact expectations.
 */
export type KinshipMatrix = {
  ids: string[];
  between(a: string, b: string): number;
  inbreeding(id: string): number;
};

/**
 * The same as plain data, which a worker can hand over: `classOf[i]` is the class of `ids[i]` (fish with the same parents and
 * no young share one), `values[j (j + 1) / 2 + i]` the kinship of classes i <= j, for i = j that of two different members,
 * and `self[i]` the kinship of `ids[i]` with itself.
 */
export type PackedKinship = { ids: string[]; classOf: Int32Array; values: Float64Array; self: Float64Array };

/** A matrix that also lets its plain data be read, for sums over many pairs. */
export type PackedMatrix = KinshipMatrix & { packed: PackedKinship; indexOf(id: string): number };

export function matrixOf(packed: PackedKinship): PackedMatrix {
  const { ids, classOf, values, self } = packed;
  const indices = new Map(ids.map((id, index) => [id, index]));
  const indexOf = (id: string) => {
    const index = indices.get(id);
    if (index === undefined) throw unknownId(id, 'the kinship table');
    return index;
  };
  const between = (a: string, b: string) => {
    const i = indexOf(a);
    const j = indexOf(b);
    if (i === j) return self[i] ?? 0;
    const low = Math.min(classOf[i] ?? 0, classOf[j] ?? 0);
    const high = Math.max(classOf[i] ?? 0, classOf[j] ?? 0);
    return values[(high * (high + 1)) / 2 + low] ?? 0;
  };
  return { ids, packed, indexOf, between, inbreeding: (id) => 2 * (self[indexOf(id)] ?? 0) - 1 };
}

export function isPacked(matrix: KinshipMatrix): matrix is PackedMatrix {
  return 'packed' in matrix;
}
