/** A possible parent. `null` is an animal outside the pedigree, unrelated to all. Weights are above zero and need not sum to 1. */
export type Candidate = { id: string | null; weight: number };

/**
 * What is known of one parent.
 * - `known`: this animal.
 * - `unknown`: an unrelated, non-inbred animal outside the pedigree, another one for every entry.
 * - `oneOf`: ONE animal, not known which. All entries with the same `key` share it, whether as sire or as dam, so a key
 *   stands for one parent: use different keys for the sire and the dam of one brood.
 * - `mixed`: every entry draws a parent for itself, as in a clutch with several sires.
 */
export type Parentage =
  | { kind: 'known'; id: string }
  | { kind: 'unknown' }
  | { kind: 'oneOf'; key: string; candidates: Candidate[] }
  | { kind: 'mixed'; candidates: Candidate[] };

/** One of several pairs, with its weight: the share of the fish that come from it. */
export type WeightedPair = { sire: Parentage; dam: Parentage; weight: number };

/** A fish, or a brood standing for any one of its fry. Entries come in any order: parents need not come first. */
export type PedigreeEntry = { id: string; sire: Parentage; dam: Parentage } | { id: string; from: WeightedPair[] };

/** The pairs that an entry may come from; an entry with a sire and a dam has one. */
export function pairsOf(entry: PedigreeEntry): WeightedPair[] {
  return 'from' in entry ? entry.from : [{ sire: entry.sire, dam: entry.dam, weight: 1 }];
}
