import { familyOrder } from './familyOrder';
import { type FamilyTable, familyTable } from './familyTable';
import { OUTSIDE } from './parentOptions';
import type { PedigreeEntry } from './pedigree';

/** Possible pairs of every family, as nodes (`OUTSIDE` for an animal outside); those of family `f` from `start[f]` on. */
type PairList = { start: Int32Array; sire: Int32Array; dam: Int32Array; weight: Float64Array };

/** Where every family's genes come from: the share (0 to 1) of each parent node; those of family `f` from `start[f]` on. */
type ParentList = { start: Int32Array; node: Int32Array; share: Float64Array };

/**
 * A pedigree put in order for counting. A node is an animal that is a possible parent, the one animal behind a `oneOf` key,
 * or a `leaf`: all the entries of one family that have no young, which are alike in every kinship except with themselves.
 * Families and nodes come parents first; the nodes of family `f` are `firstNode[f]` up to `firstNode[f + 1]`, its leaf last.
 */
export type SortedPedigree = {
  ids: string[];
  rowOf: Map<string, number>;
  nodeOf: Int32Array;
  families: number;
  nodes: number;
  familyOf: Int32Array;
  firstNode: Int32Array;
  isDraw: Uint8Array;
  isLeaf: Uint8Array;
  pairs: PairList;
  parents: ParentList;
  /** Share of a family's genes that comes from outside the pedigree. */
  outside: Float64Array;
};

/** Sorts a pedigree, parents first, without recursion; throws a `PedigreeError` for anything that cannot be a pedigree. */
export function sortPedigree(pedigree: PedigreeEntry[]): SortedPedigree {
  const table = familyTable(pedigree);
  const ids = [...table.rowOf.keys()];
  const order = familyOrder(table, ids);
  const placed = placeNodes(table, order, ids.length);
  const pairs = placePairs(table, order, placed.nodeOf);
  const isDraw = Uint8Array.from(order, (family) => (table.isDraw[family] ? 1 : 0));
  const { parents, outside } = parentShares(pairs, isDraw);
  return {
    ids,
    rowOf: table.rowOf,
    families: order.length,
    ...placed,
    nodeOf: placed.nodeOf.subarray(0, ids.length),
    isDraw,
    pairs,
    parents,
    outside,
  };
}

function placeNodes(table: FamilyTable, order: number[], rows: number) {
  const isParent = new Uint8Array(table.numbers);
  for (const parent of [table.sire, table.dam]) {
    for (const number of parent) if (number !== OUTSIDE) isParent[number] = 1;
  }
  const members = membersOf(table);
  const nodeOf = new Int32Array(table.numbers);
  const firstNode = new Int32Array(order.length + 1);
  const familyOf: number[] = [];
  const isLeaf: number[] = [];
  order.forEach((family, place) => {
    const own = members.list.subarray(members.start[family], members.start[family + 1]);
    for (const number of own) {
      if (number < rows && !isParent[number]) continue;
      nodeOf[number] = familyOf.push(place) - 1;
      isLeaf.push(0);
    }
    const leaves = own.filter((number) => number < rows && !isParent[number]);
    for (const number of leaves) nodeOf[number] = familyOf.length;
    if (leaves.length > 0) {
      familyOf.push(place);
      isLeaf.push(1);
    }
    firstNode[place + 1] = familyOf.length;
  });
  const nodes = familyOf.length;
  return { nodeOf, firstNode, nodes, familyOf: Int32Array.from(familyOf), isLeaf: Uint8Array.from(isLeaf) };
}

function membersOf(table: FamilyTable): { start: Int32Array; list: Int32Array } {
  const start = new Int32Array(table.isDraw.length + 1);
  for (const family of table.familyOf) start[family + 1] = (start[family + 1] ?? 0) + 1;
  for (let family = 1; family < start.length; family += 1)
    start[family] = (start[family] ?? 0) + (start[family - 1] ?? 0);
  const next = start.slice();
  const list = new Int32Array(table.numbers);
  table.familyOf.forEach((family, number) => {
    const at = next[family] ?? 0;
    list[at] = number;
    next[family] = at + 1;
  });
  return { start, list };
}

function placePairs(table: FamilyTable, order: number[], nodeOf: Int32Array): PairList {
  const pairs: PairList = {
    start: new Int32Array(order.length + 1),
    sire: new Int32Array(table.sire.length),
    dam: new Int32Array(table.sire.length),
    weight: new Float64Array(table.sire.length),
  };
  const node = (number: number | undefined) =>
    number === undefined || number === OUTSIDE ? OUTSIDE : (nodeOf[number] ?? OUTSIDE);
  let next = 0;
  order.forEach((family, place) => {
    for (let at = table.start[family] ?? 0; at < (table.start[family + 1] ?? 0); at += 1) {
      pairs.sire[next] = node(table.sire[at]);
      pairs.dam[next] = node(table.dam[at]);
      pairs.weight[next] = table.weight[at] ?? 0;
      next += 1;
    }
    pairs.start[place + 1] = next;
  });
  return pairs;
}

/** A fish has half its genes from each parent of a pair; a draw has all of them from its candidate. */
function parentShares(pairs: PairList, isDraw: Uint8Array): { parents: ParentList; outside: Float64Array } {
  const outside = new Float64Array(isDraw.length);
  const start = new Int32Array(isDraw.length + 1);
  const node: number[] = [];
  const share: number[] = [];
  const give = (family: number, parent: number, part: number) => {
    if (parent === OUTSIDE) {
      outside[family] = (outside[family] ?? 0) + part;
      return;
    }
    const known = node.indexOf(parent, start[family]);
    if (known < 0) {
      node.push(parent);
      share.push(part);
    } else share[known] = (share[known] ?? 0) + part;
  };
  for (let family = 0; family < isDraw.length; family += 1) {
    for (let at = pairs.start[family] ?? 0; at < (pairs.start[family + 1] ?? 0); at += 1) {
      const weight = pairs.weight[at] ?? 0;
      give(family, pairs.sire[at] ?? OUTSIDE, isDraw[family] ? weight : weight / 2);
      if (!isDraw[family]) give(family, pairs.dam[at] ?? OUTSIDE, weight / 2);
    }
    start[family + 1] = node.length;
  }
  return { parents: { start, node: Int32Array.from(node), share: Float64Array.from(share) }, outside };
}
