import { OUTSIDE } from './parentOptions';
import type { SortedPedigree } from './sortedPedigree';
import type { SparseColumns } from './sparseColumns';

/** Kinship of the two parents of a listed pair, by the pair's place in the pedigree's pair list. */
export type PairColumns = { kinshipOf(pair: number): number };

/**
 * Reads the kinships of all possible pairs from as few columns as it can. A column of a parent needs nothing but its own
 * ancestors to be settled, so the first pair that asks for it fills in all mates of that parent, the younger ones too.
 */
export function pairColumns(sorted: SortedPedigree, columns: SparseColumns): PairColumns {
  const { sire, dam } = sorted.pairs;
  const hubs = hubsOf(sorted);
  const values = new Float64Array(sire.length);
  const known = new Uint8Array(sorted.nodes);
  const read = (hub: number) => {
    const pairs = hubs.pairsOf(hub);
    const mates = Array.from(pairs, (pair) => (sire[pair] === hub ? dam[pair] : sire[pair]) ?? OUTSIDE);
    const kinships = columns.between(hub, mates);
    pairs.forEach((pair, index) => {
      values[pair] = kinships[index] ?? 0;
    });
  };
  return {
    kinshipOf(pair) {
      const hub = hubs.of[pair] ?? OUTSIDE;
      if (known[hub] !== 1) {
        known[hub] = 1;
        read(hub);
      }
      return values[pair] ?? 0;
    },
  };
}

/** For every pair of two different animals: which of the two has more mates, and the pairs of each such hub. */
function hubsOf(sorted: SortedPedigree): { of: Int32Array; pairsOf(hub: number): Int32Array } {
  const { sire, dam } = sorted.pairs;
  const count = sire.length;
  const mates = new Int32Array(sorted.nodes);
  const isPair = (pair: number) => sire[pair] !== OUTSIDE && dam[pair] !== OUTSIDE && sire[pair] !== dam[pair];
  for (let pair = 0; pair < count; pair += 1) {
    if (!isPair(pair)) continue;
    mates[sire[pair] ?? 0] = (mates[sire[pair] ?? 0] ?? 0) + 1;
    mates[dam[pair] ?? 0] = (mates[dam[pair] ?? 0] ?? 0) + 1;
  }
  const of = new Int32Array(count).fill(OUTSIDE);
  const start = new Int32Array(sorted.nodes + 1);
  for (let pair = 0; pair < count; pair += 1) {
    if (!isPair(pair)) continue;
    const [a, b] = [sire[pair] ?? 0, dam[pair] ?? 0];
    const hub = (mates[a] ?? 0) >= (mates[b] ?? 0) ? a : b;
    of[pair] = hub;
    start[hub + 1] = (start[hub + 1] ?? 0) + 1;
  }
  for (let node = 1; node < start.length; node += 1) start[node] = (start[node] ?? 0) + (start[node - 1] ?? 0);
  const next = start.slice();
  const listed = new Int32Array(start[sorted.nodes] ?? 0);
  of.forEach((hub, pair) => {
    if (hub === OUTSIDE) return;
    listed[next[hub] ?? 0] = pair;
    next[hub] = (next[hub] ?? 0) + 1;
  });
  return { of, pairsOf: (hub) => listed.subarray(start[hub], start[hub + 1]) };
}
