import {
  type Numbering,
  numberRows,
  OUTSIDE,
  type PairOption,
  type ParentOption,
  pairOptions,
  rowFinder,
} from './parentOptions';
import type { Parentage, PedigreeEntry } from './pedigree';
import { PedigreeError } from './pedigreeError';

/**
 * All entries with the same possible parents form one family, so that brood mates share the work. The one animal behind a
 * `oneOf` key is a family of its own (a draw), its candidates listed as sires. Parents are numbers: rows first, then draws.
 * The pairs of family `f` stand at `start[f]` up to `start[f + 1]`.
 */
export type FamilyTable = {
  rowOf: Map<string, number>;
  numbers: number;
  familyOf: number[];
  isDraw: boolean[];
  start: number[];
  sire: number[];
  dam: number[];
  weight: number[];
};

export function familyTable(pedigree: PedigreeEntry[]): FamilyTable {
  const rowOf = numberRows(pedigree);
  const table: FamilyTable = { rowOf, numbers: 0, familyOf: [], isDraw: [], start: [0], sire: [], dam: [], weight: [] };
  const row = rowFinder(rowOf);
  const draws = new Map<string, { number: number; options: ParentOption[] }>();
  const draw = (key: string, options: ParentOption[]) => {
    const before = draws.get(key);
    if (before && !sameOptions(before.options, options)) {
      throw new PedigreeError(
        'keyConflict',
        [key],
        `The shared parent ${key} is listed with two different sets of fish`,
      );
    }
    const number = before?.number ?? pedigree.length + draws.size;
    if (!before) draws.set(key, { number, options });
    return number;
  };
  addEntries(table, pedigree, { row, draw });
  for (const { options } of draws.values()) {
    const pairs = options.map(({ parent, weight }) => ({ sire: parent, dam: OUTSIDE, weight }));
    table.familyOf.push(addFamily(table, pairs, true));
  }
  table.numbers = table.familyOf.length;
  return table;
}

function addEntries(table: FamilyTable, pedigree: PedigreeEntry[], numbering: Numbering) {
  const simple = new Map<number, number>();
  const uncertain = new Map<string, number>();
  for (const entry of pedigree) {
    const key = certainKey(entry, numbering);
    table.familyOf.push(
      key === undefined
        ? uncertainFamily(table, uncertain, pairOptions(entry, numbering))
        : certainFamily(table, simple, key),
    );
  }
}

/** Both certain parents as one exact integer, 26 bits each: most entries are such, and nothing else is made for them. */
function certainKey(entry: PedigreeEntry, { row }: Numbering): number | undefined {
  if ('from' in entry || isDoubtful(entry.sire) || isDoubtful(entry.dam)) return undefined;
  const { sire, dam } = entry;
  const sireRow = sire.kind === 'known' ? row(sire.id) : OUTSIDE;
  const damRow = dam.kind === 'known' ? row(dam.id) : OUTSIDE;
  return (sireRow + 1) * KEY_STEP + (damRow + 1);
}

const KEY_STEP = 2 ** 26;

const isDoubtful = ({ kind }: Parentage): boolean => kind === 'oneOf' || kind === 'mixed';

function certainFamily(table: FamilyTable, families: Map<number, number>, key: number): number {
  const known = families.get(key);
  if (known !== undefined) return known;
  const sire = Math.floor(key / KEY_STEP) - 1;
  const family = addFamily(table, [{ sire, dam: (key % KEY_STEP) - 1, weight: 1 }], false);
  families.set(key, family);
  return family;
}

function uncertainFamily(table: FamilyTable, families: Map<string, number>, pairs: PairOption[]): number {
  const key = listKey(pairs);
  const known = families.get(key);
  if (known !== undefined) return known;
  const family = addFamily(table, pairs, false);
  families.set(key, family);
  return family;
}

function addFamily(table: FamilyTable, pairs: PairOption[], isDraw: boolean): number {
  for (const { sire, dam, weight } of pairs) {
    table.sire.push(sire);
    table.dam.push(dam);
    table.weight.push(weight);
  }
  table.start.push(table.sire.length);
  return table.isDraw.push(isDraw) - 1;
}

const listKey = (pairs: PairOption[]): string =>
  pairs
    .map(({ sire, dam, weight }) => `${sire} ${dam} ${weight}`)
    .sort()
    .join(',');

/** The same candidates with the same shares, in any order; shares differ by less than a rounding error. */
function sameOptions(a: ParentOption[], b: ParentOption[]): boolean {
  const shares = new Map(a.map(({ parent, weight }) => [parent, weight]));
  return a.length === b.length && b.every(({ parent, weight }) => Math.abs((shares.get(parent) ?? 2) - weight) < 1e-9);
}
