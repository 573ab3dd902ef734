import { withAncestors } from './ancestors';
import { OUTSIDE, type PairOption, rowFinder } from './parentOptions';
import type { PedigreeEntry } from './pedigree';
import { type SortedPedigree, sortPedigree } from './sortedPedigree';
import { kinshipAt } from './sweep';

/**
 * One animal's possible ancestors in order, itself last, each with its possible pairs as places in that order (for the one
 * animal behind a `oneOf` key: its candidates, as sires).
 */
export type PossibleAncestry = { options: PairOption[][]; isDraw: boolean[] };

export function possibleAncestry(pedigree: PedigreeEntry[], id: string): PossibleAncestry {
  const sorted = sortPedigree(pedigree);
  const nodes = withAncestors(sorted, [sorted.nodeOf[rowFinder(sorted.rowOf)(id)] ?? 0]);
  const placeOf = new Map(Array.from(nodes, (node, place) => [node, place]));
  const families = Array.from(nodes, (node) => sorted.familyOf[node] ?? 0);
  return {
    options: families.map((family) => optionsOf(sorted, family, (node) => placeOf.get(node) ?? OUTSIDE)),
    isDraw: families.map((family) => sorted.isDraw[family] === 1),
  };
}

function optionsOf({ pairs }: SortedPedigree, family: number, place: (node: number) => number): PairOption[] {
  const first = pairs.start[family] ?? 0;
  return Array.from({ length: (pairs.start[family + 1] ?? 0) - first }, (_, index) => ({
    sire: place(pairs.sire[first + index] ?? OUTSIDE),
    dam: place(pairs.dam[first + index] ?? OUTSIDE),
    weight: pairs.weight[first + index] ?? 0,
  }));
}

/** `fOf`: F of the last animal when `choice` settles every draw; only places from `changed` on differ from the last call. */
export function assignedKinships({ options, isDraw }: PossibleAncestry): {
  fOf(choice: number[], changed: number): number;
} {
  const last = options.length - 1;
  const values = new Float64Array((last * (last + 1)) / 2);
  return {
    fOf(choice, changed) {
      for (let place = changed; place < last; place += 1) {
        const pair = options[place]?.[choice[place] ?? 0];
        if (!pair) continue;
        if (isDraw[place]) fillAlias(values, place, pair.sire);
        else fillChild(values, place, pair);
      }
      const parents = options[last]?.[choice[last] ?? 0];
      return parents ? between(values, parents.sire, parents.dam) : 0;
    },
  };
}

/** The draw is the chosen candidate itself, or an animal from outside. */
function fillAlias(values: Float64Array, place: number, chosen: number): void {
  const row = (place * (place + 1)) / 2;
  for (let i = 0; i < place; i += 1) values[row + i] = between(values, chosen, i);
  values[row + place] = chosen === OUTSIDE ? 0.5 : between(values, chosen, chosen);
}

function fillChild(values: Float64Array, place: number, { sire, dam }: PairOption): void {
  const row = (place * (place + 1)) / 2;
  for (let i = 0; i < place; i += 1) values[row + i] = (between(values, sire, i) + between(values, dam, i)) / 2;
  values[row + place] = (1 + between(values, sire, dam)) / 2;
}

const between = (values: Float64Array, a: number, b: number): number =>
  a === OUTSIDE || b === OUTSIDE ? 0 : kinshipAt(values, a, b);
