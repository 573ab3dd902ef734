import { kinship } from './kinship';
import type { PedigreeEntry } from './pedigree';
import { unknownId } from './pedigreeError';

/** Kinship among broods, a brood meaning its fry. */
export type BroodKinship = {
  /** Expected F of each fry. */
  inbreeding(brood: string): number;
  /** Kinship of a fry of one with a fry of the other; of a brood with itself, that of two DIFFERENT fry of it. */
  between(a: string, b: string): number;
  /** Kinship of a fish of the pedigree with a fry of the brood; a fry that has a code of its own is a sib like any other. */
  withFish(brood: string, fish: string): number;
};

/**
 * Kinship of the entries named `broods`, each standing for any one of its fry (default of `fish`: no fish besides). A second
 * entry with the same parents is put beside each, so that the kinship of two sibs is never taken for that of a fish with
 * itself: f of two fry is 1/4 for unrelated parents, of one fry with itself 1/2. Throws what `kinship` throws.
 */
export function broodKinship(pedigree: PedigreeEntry[], broods: string[], fish: string[] = []): BroodKinship {
  const taken = new Set(pedigree.map(({ id }) => id));
  const wanted = new Set(broods);
  const sibOf = new Map([...wanted].map((brood) => [brood, sibId(brood, taken)]));
  const sibs = pedigree.flatMap((entry) => {
    const id = sibOf.get(entry.id);
    return id === undefined ? [] : [{ ...entry, id }];
  });
  const matrix = kinship([...pedigree, ...sibs], [...wanted, ...fish, ...sibOf.values()]);
  const sib = (brood: string) => {
    const id = sibOf.get(brood);
    if (id === undefined) throw unknownId(brood, 'the broods asked for');
    return id;
  };
  return {
    inbreeding: (brood) => matrix.inbreeding(sib(brood)),
    between: (a, b) => matrix.between(sib(a), a === b ? b : sib(b)),
    withFish: (brood, of) => matrix.between(sib(brood), of),
  };
}

function sibId(brood: string, taken: Set<string>): string {
  let id = `${brood} sib`;
  while (taken.has(id)) id += ' sib';
  taken.add(id);
  return id;
}
