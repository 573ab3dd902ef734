import type { KinshipMatrix } from '@/shared/lineage/kinshipMatrix';
import type { PedigreeEntry } from '@/shared/lineage/pedigree';

/** A pedigree, and the kinships of some of its animals. */
export type Kin = {
  entries: PedigreeEntry[];
  matrix: KinshipMatrix;
  /** How far back each pedigree is known, in full generations. */
  depth: ReadonlyMap<string, number>;
};
