import type { Day } from '../days';
import { type Parentage, type PedigreeEntry, pairsOf } from './pedigree';
import { PedigreeError } from './pedigreeError';

/** What is recorded of a fish besides its parents; a brood's `bornOn` is the latest day that it may have been spawned. */
export type Recorded = { sex?: 'male' | 'female'; bornOn?: Day };

/** Something unlikely about a parent: a question for the keeper, not an error. */
export type ParentDoubt = { doubt: 'selfing' | 'sex'; child: string; parent: string };

/**
 * Throws `bornAfter`, naming child and parent, when a possible parent was born on or after the day its child was. Entries
 * without a recorded day pass.
 */
export function checkBirths(pedigree: PedigreeEntry[], recorded: Map<string, Recorded>): void {
  for (const entry of pedigree) {
    const born = recorded.get(entry.id)?.bornOn;
    if (born === undefined) continue;
    for (const { sire, dam } of pairsOf(entry)) {
      for (const parent of [...namesOf(sire), ...namesOf(dam)]) {
        if ((recorded.get(parent)?.bornOn ?? '') < born) continue;
        const message = `${parent} was not born yet when ${entry.id} was spawned. Correct one of the dates, or the parent`;
        throw new PedigreeError('bornAfter', [entry.id, parent], message);
      }
    }
  }
}

/** Certain parents that are one and the same fish, and possible parents recorded as the other sex; in the entries' order. */
export function doubtsOf(pedigree: PedigreeEntry[], recorded: Map<string, Recorded>): ParentDoubt[] {
  return pedigree.flatMap((entry) => {
    const found = new Map<string, ParentDoubt>();
    const add = (doubt: ParentDoubt['doubt'], parent: string) =>
      found.set(`${doubt} ${parent}`, { doubt, child: entry.id, parent });
    for (const { sire, dam } of pairsOf(entry)) {
      if (sire.kind === 'known' && dam.kind === 'known' && sire.id === dam.id) add('selfing', sire.id);
      for (const id of namesOf(sire)) if (recorded.get(id)?.sex === 'female') add('sex', id);
      for (const id of namesOf(dam)) if (recorded.get(id)?.sex === 'male') add('sex', id);
    }
    return [...found.values()];
  });
}

function namesOf(parentage: Parentage): string[] {
  switch (parentage.kind) {
    case 'unknown':
      return [];
    case 'known':
      return [parentage.id];
    default:
      return parentage.candidates.flatMap(({ id }) => id ?? []);
  }
}
