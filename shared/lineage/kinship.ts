import { withAncestors } from './ancestors';
import { nodeColumn } from './kinshipColumns';
import { type KinshipMatrix, matrixOf, type PackedKinship } from './kinshipMatrix';
import { OUTSIDE, rowFinder } from './parentOptions';
import type { PedigreeEntry } from './pedigree';
import { PedigreeError } from './pedigreeError';
import { solveFamilies } from './solveFamilies';
import { type SortedPedigree, sortPedigree } from './sortedPedigree';
import { kinshipAt, sweep } from './sweep';

/** A triangle over more classes than this (1 GB) is refused rather than attempted. */
const MOST_CLASSES = 16_000;

/** Up to this many nodes the whole triangle is quicker than columns, however few animals are asked for. */
const SMALL_PEDIGREE = 2_000;

/**
 * Kinships of `ids` (default: every entry), exact expectations over uncertain parents; 0 to 1, and F likewise.
 * Tabular method of Emik & Terrill 1949 after Malécot 1948; uncertain parents as in Henderson 1988, with one shared animal
 * for each `oneOf` key. Throws a `PedigreeError` that names the fish: cycle, duplicateId, unknownId, badWeight,
 * noCandidates, keyConflict, tooLarge.
 */
export function kinship(pedigree: PedigreeEntry[], ids?: string[]): KinshipMatrix {
  return matrixOf(packedKinship(pedigree, ids));
}

/** `kinship` as plain data, to be sent between threads and read through `matrixOf`. */
export function packedKinship(pedigree: PedigreeEntry[], ids?: string[]): PackedKinship {
  const sorted = sortPedigree(pedigree);
  const wanted = ids ? [...new Set(ids)] : sorted.ids;
  const find = rowFinder(sorted.rowOf);
  const nodeOfWanted = wanted.map((id) => sorted.nodeOf[find(id)] ?? 0);
  const classes = Int32Array.from(new Set(nodeOfWanted)).sort();
  if (classes.length > MOST_CLASSES) throw tooLarge(wanted.length);
  const table = tableOf(sorted, classes);
  const classAt = new Map(Array.from(classes, (node, index) => [node, index]));
  return {
    ids: [...wanted],
    classOf: Int32Array.from(nodeOfWanted, (node) => classAt.get(node) ?? 0),
    values: table.values,
    self: Float64Array.from(nodeOfWanted, (node) => table.self[classAt.get(node) ?? 0] ?? 0),
  };
}

const tooLarge = (count: number) =>
  new PedigreeError('tooLarge', [], `A kinship table of ${count} fish is too large. Choose a colony or a strain`);

/** Kinships of classes, as in `Sweep`. */
type ClassTable = { values: Float64Array; self: Float64Array };

function tableOf(sorted: SortedPedigree, classes: Int32Array): ClassTable {
  const nodes = withAncestors(sorted, classes);
  const few = nodes.length > SMALL_PEDIGREE && classes.length < nodes.length / 50;
  return few || nodes.length > MOST_CLASSES ? tableByColumn(sorted, classes) : tableByTriangle(sorted, nodes, classes);
}

function tableByTriangle(sorted: SortedPedigree, nodes: Int32Array, classes: Int32Array): ClassTable {
  const placeOf = new Int32Array(sorted.nodes).fill(OUTSIDE);
  nodes.forEach((node, place) => {
    placeOf[node] = place;
  });
  const families = new Set(Array.from(nodes, (node) => sorted.familyOf[node] ?? 0));
  const whole = sweep(sorted, { size: nodes.length, placeOf }, families);
  const self = Float64Array.from(classes, (node) => whole.self[sorted.familyOf[node] ?? 0] ?? 0);
  if (classes.length === nodes.length) return { values: whole.values, self };
  const values = new Float64Array((classes.length * (classes.length + 1)) / 2);
  let next = 0;
  classes.forEach((a, row) => {
    for (const b of classes.subarray(0, row + 1)) {
      values[next] = kinshipAt(whole.values, placeOf[a] ?? 0, placeOf[b] ?? 0);
      next += 1;
    }
  });
  return { values, self };
}

/** For a few fish of a large pedigree: their columns only, in memory linear in the pedigree. */
function tableByColumn(sorted: SortedPedigree, classes: Int32Array): ClassTable {
  const segregation = solveFamilies(sorted);
  const values = new Float64Array((classes.length * (classes.length + 1)) / 2);
  let next = 0;
  classes.forEach((node, row) => {
    const column = nodeColumn(segregation, [node]);
    for (const other of classes.subarray(0, row + 1)) {
      values[next] = column[other] ?? 0;
      next += 1;
    }
  });
  return { values, self: Float64Array.from(classes, (node) => segregation.self[sorted.familyOf[node] ?? 0] ?? 0) };
}
