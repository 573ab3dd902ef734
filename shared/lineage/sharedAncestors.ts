import { isPossibleParent, parentShares } from './parentShares';
import type { PedigreeEntry } from './pedigree';
import { unknownId } from './pedigreeError';

/** How many generations back an animal stands from each of two others (0: it is that one), and whether that is beyond doubt. */
export type SharedAncestor = { id: string; back: [number, number]; certain: boolean };

/** What a kinship of two animals rests on. */
export type SharedAncestry = {
  /** The nearest animals that both may descend from, nearest first. */
  ancestors: SharedAncestor[];
  /** Those, the two themselves and everything on the ways between, in the pedigree's order. */
  between: string[];
};

/**
 * The nearest shared ancestors of two animals: those that one of them may reach without passing another shared one. Each stands
 * at the joint of one of Wright's paths (Wright 1922). Throws `unknownId`.
 */
export function sharedAncestry(pedigree: PedigreeEntry[], a: string, b: string): SharedAncestry {
  const parents = new Map(pedigree.map((entry) => [entry.id, namedParents(entry)]));
  for (const id of [a, b]) if (!parents.has(id)) throw unknownId(id);
  const [ofA, ofB] = [back(parents, a), back(parents, b)];
  const shared = new Set([...ofA.keys()].filter((id) => ofB.has(id)));
  const near = new Set([
    ...back(parents, a, { stopAt: shared }).keys(),
    ...back(parents, b, { stopAt: shared }).keys(),
  ]);
  const [surelyA, surelyB] = [back(parents, a, { sure: true }), back(parents, b, { sure: true })];
  const ancestors = [...shared]
    .filter((id) => near.has(id))
    .map(
      (id): SharedAncestor => ({
        id,
        back: [ofA.get(id) ?? 0, ofB.get(id) ?? 0],
        certain: surelyA.has(id) && surelyB.has(id),
      }),
    )
    .sort((one, other) => one.back[0] + one.back[1] - other.back[0] - other.back[1]);
  const leads = (id: string) => {
    const above = back(parents, id, { stopAt: shared });
    return ancestors.some((one) => above.has(one.id));
  };
  const onTheWay = new Set([a, b, ...[...near].filter(leads)]);
  return { ancestors, between: pedigree.flatMap(({ id }) => (onTheWay.has(id) ? [id] : [])) };
}

type Parents = ReadonlyMap<string, { id: string; certain: boolean }[]>;

const namedParents = (entry: PedigreeEntry) =>
  parentShares(entry).flatMap(({ id, share }) => (id === null ? [] : [{ id, certain: !isPossibleParent(share) }]));

/** Everything that an animal may descend from, itself at 0, with the fewest generations between. */
function back(parents: Parents, from: string, how: { sure?: boolean; stopAt?: Set<string> } = {}): Map<string, number> {
  const found = new Map([[from, 0]]);
  let level = [from];
  for (let generations = 1; level.length > 0; generations += 1) {
    const next = level
      .filter((id) => !how.stopAt?.has(id))
      .flatMap((id) => parents.get(id) ?? [])
      .filter(({ certain }) => certain || !how.sure);
    level = [...new Set(next.map(({ id }) => id))].filter((id) => !found.has(id));
    for (const id of level) found.set(id, generations);
  }
  return found;
}
