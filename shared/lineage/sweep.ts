import { OUTSIDE } from './parentOptions';
import type { SortedPedigree } from './sortedPedigree';

/** Which nodes are held in a table of kinships, and where: `placeOf[node]` below `size`, or `OUTSIDE`. */
export type Places = { size: number; placeOf: Int32Array };

/** Per family: kinship of a member with itself, and of two different members. */
export type FamilyKinship = { self: Float64Array; within: Float64Array };

/**
 * Kinships by place, `values[j (j + 1) / 2 + i]` for i <= j. The diagonal holds the kinship with itself, but for a leaf
 * (entries that are alike) that of two different entries.
 */
export type Sweep = FamilyKinship & { values: Float64Array };

/**
 * Goes through `families` (parents first) by the tabular method (Emik & Terrill 1949; with shares of possible parents
 * Henderson 1988): the kinship of a member with any older animal i is the sum over its parents k of share x f(k, i). Brood
 * mates differ in nothing but their own block, so a family's line is worked out once and copied. A place may be taken over
 * by a later node once no family still to come names the node that held it.
 */
export function sweep(sorted: SortedPedigree, places: Places, families: Iterable<number>): Sweep {
  const { size, placeOf } = places;
  const values = new Float64Array((size * (size + 1)) / 2);
  const found: Sweep = { values, self: new Float64Array(sorted.families), within: new Float64Array(sorted.families) };
  const line = new Float64Array(size);
  let used = 0;
  for (const family of families) {
    inheritLine(sorted, values, { family, placeOf, line: line.subarray(0, used) });
    const self = selfKinship(sorted, values, { family, placeOf });
    const within = kinshipWithin(sorted, line, { family, placeOf });
    found.self[family] = self;
    found.within[family] = within;
    for (let node = sorted.firstNode[family] ?? 0; node < (sorted.firstNode[family + 1] ?? 0); node += 1) {
      const place = placeOf[node] ?? OUTSIDE;
      if (place === OUTSIDE) continue;
      writeLine(values, line.subarray(0, used), place);
      values[(place * (place + 3)) / 2] = sorted.isLeaf[node] === 1 ? within : self;
      line[place] = within;
      used = Math.max(used, place + 1);
    }
  }
  return found;
}

type Of = { family: number; placeOf: Int32Array };

function inheritLine(sorted: SortedPedigree, values: Float64Array, of: Of & { line: Float64Array }): void {
  const { start, node, share } = sorted.parents;
  of.line.fill(0);
  for (let at = start[of.family] ?? 0; at < (start[of.family + 1] ?? 0); at += 1) {
    addKinships(values, of.line, of.placeOf[node[at] ?? 0] ?? 0, share[at] ?? 0);
  }
}

/** Adds `share` times the kinships of one place with all to a line: along the place's row, then down its column. */
function addKinships(values: Float64Array, line: Float64Array, place: number, share: number): void {
  const row = (place * (place + 1)) / 2;
  for (let i = 0; i <= place; i += 1) line[i] = (line[i] ?? 0) + share * (values[row + i] ?? 0);
  let below = row + 2 * place + 1;
  for (let i = place + 1; i < line.length; i += 1) {
    line[i] = (line[i] ?? 0) + share * (values[below] ?? 0);
    below += i + 1;
  }
}

function writeLine(values: Float64Array, line: Float64Array, place: number): void {
  values.set(line.subarray(0, place), (place * (place + 1)) / 2);
  let below = (place * (place + 1)) / 2 + 2 * place + 1;
  for (let i = place + 1; i < line.length; i += 1) {
    values[below] = line[i] ?? 0;
    below += i + 1;
  }
}

/** (1 + F) / 2 for a fish, F being the weighted kinship of its possible pairs; for a draw that of its candidates. */
function selfKinship(sorted: SortedPedigree, values: Float64Array, { family, placeOf }: Of): number {
  const { pairs, isDraw, outside } = sorted;
  const draw = isDraw[family] === 1;
  let sum = draw ? (outside[family] ?? 0) / 2 : 0;
  for (let at = pairs.start[family] ?? 0; at < (pairs.start[family + 1] ?? 0); at += 1) {
    const sire = pairs.sire[at] ?? OUTSIDE;
    const dam = draw ? sire : (pairs.dam[at] ?? OUTSIDE);
    if (sire === OUTSIDE || dam === OUTSIDE) continue;
    sum += (pairs.weight[at] ?? 0) * kinshipAt(values, placeOf[sire] ?? 0, placeOf[dam] ?? 0);
  }
  return draw ? sum : (1 + sum) / 2;
}

/** Two different members draw independently of each other: the parents' shares against the family's line. */
function kinshipWithin(sorted: SortedPedigree, line: Float64Array, { family, placeOf }: Of): number {
  const { start, node, share } = sorted.parents;
  let sum = 0;
  for (let at = start[family] ?? 0; at < (start[family + 1] ?? 0); at += 1) {
    sum += (share[at] ?? 0) * (line[placeOf[node[at] ?? 0] ?? 0] ?? 0);
  }
  return sum;
}

/** The value of places `a` and `b`, in either order. */
export function kinshipAt(values: Float64Array, a: number, b: number): number {
  return (a > b ? values[(a * (a + 1)) / 2 + b] : values[(b * (b + 1)) / 2 + a]) ?? 0;
}
