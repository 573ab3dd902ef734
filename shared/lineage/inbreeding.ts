import type { PedigreeEntry } from './pedigree';
import { solveFamilies } from './solveFamilies';
import { sortPedigree } from './sortedPedigree';

/**
 * Inbreeding coefficient F (0 to 1) of every entry, by id: the chance that its two alleles at a locus are copies of one
 * ancestral allele; an exact expectation where parents are uncertain. Made for 100 000 animals: memory linear in the
 * pedigree, brood mates share the work. Wright 1922; indirect method of Colleau 2002; uncertain parents after Henderson 1988.
 * Throws a `PedigreeError`: cycle, duplicateId, unknownId, badWeight, noCandidates, keyConflict.
 */
export function inbreeding(pedigree: PedigreeEntry[]): Map<string, number> {
  const sorted = sortPedigree(pedigree);
  const { self } = solveFamilies(sorted);
  const found = new Map<string, number>();
  sorted.ids.forEach((id, row) => {
    const family = sorted.familyOf[sorted.nodeOf[row] ?? 0] ?? 0;
    found.set(id, 2 * (self[family] ?? 0) - 1);
  });
  return found;
}
