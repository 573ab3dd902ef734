import { type Parentage, type PedigreeEntry, pairsOf } from './pedigree';

export type Side = 'sire' | 'dam';

/** One possible parent of an entry and its chance; `id` null is all that is not known of that side. */
export type ParentShare = { side: Side; id: string | null; share: number };

/** A share that misses 1 by rounding only is certain. */
export const isPossibleParent = (share: number): boolean => share < 1 - 1e-9;

/** Every possible parent of an entry, each named once a side; the shares of a side sum to 1. */
export function parentShares(entry: PedigreeEntry): ParentShare[] {
  const pairs = pairsOf(entry);
  const total = sumOf(pairs);
  return (['sire', 'dam'] as const).flatMap((side) => {
    const shares = new Map<string | null, number>();
    for (const pair of pairs) {
      for (const { id, weight } of candidatesOf(pair[side])) {
        shares.set(id, (shares.get(id) ?? 0) + (weight * pair.weight) / total);
      }
    }
    return [...shares].map(([id, share]) => ({ side, id, share }));
  });
}

function candidatesOf(parentage: Parentage): { id: string | null; weight: number }[] {
  switch (parentage.kind) {
    case 'unknown':
      return [{ id: null, weight: 1 }];
    case 'known':
      return [{ id: parentage.id, weight: 1 }];
    default: {
      const total = sumOf(parentage.candidates);
      return parentage.candidates.map(({ id, weight }) => ({ id, weight: weight / total }));
    }
  }
}

const sumOf = (listed: { weight: number }[]): number => listed.reduce((sum, { weight }) => sum + weight, 0);
