import { parse } from 'csv-parse/sync';
import { FishCode } from '../../shared/codes';
import { DayText } from '../../shared/days';
import type { BadCell } from '../../shared/lineage/contract';
import { Refusal } from '../../shared/refusal';

export const COLUMNS = ['id', 'sire', 'dam', 'sex', 'born', 'strain', 'clutch', 'fathers'] as const;
/** A parent that is not known, in a list: `MOKA-A01:0.7 ?:0.3`. */
export const UNKNOWN = '?';

type Column = (typeof COLUMNS)[number];
export type Parent = { code: string | null; weight: number };
/** One fish of the table. Fish with the same `clutch` share one parentage. */
export type TableRow = {
  line: number;
  id: string;
  sires: Parent[];
  dams: Parent[];
  sex: 'male' | 'female' | null;
  born: string | null;
  strain: string | null;
  clutch: string | null;
  several: boolean;
};

const MOST_ROWS = 20_000;

/**
 * Reads a pedigree table. Commas between cells; `id` is a code; `sire` and `dam` are codes of this table or of the fishroom, or
 * a list `code:weight` with spaces or semicolons between; `sex` male, female or empty; `born` such as 2026-03-14; `strain` a code.
 */
export function readTable(text: string): { rows: TableRow[]; bad: BadCell[] } {
  const bad: BadCell[] = [];
  const rows = cellsOf(text).map(({ line, cells }): TableRow => {
    const at = (column: Column) => unquoted(cells[column] ?? '');
    const wrong = (column: Column, says: string) => void bad.push({ line, column, value: at(column), says });
    const sex = at('sex').toLowerCase();
    if (!['', 'male', 'female'].includes(sex)) wrong('sex', 'Type male or female, or leave it empty');
    if (!FishCode.safeParse(at('id')).success) wrong('id', 'Letters, digits and dashes, such as MOKA-A04');
    if (at('born') && !DayText.safeParse(at('born')).success) wrong('born', 'Type a day such as 2026-03-14');
    if (!['', 'one', 'several'].includes(at('fathers'))) wrong('fathers', 'Type one or several, or leave it empty');
    return {
      line,
      id: at('id'),
      sires: parentsIn(at('sire'), (says) => wrong('sire', says)),
      dams: parentsIn(at('dam'), (says) => wrong('dam', says)),
      sex: sex === 'male' || sex === 'female' ? sex : null,
      born: at('born') || null,
      strain: at('strain') || null,
      clutch: at('clutch') || null,
      several: at('fathers') === 'several',
    };
  });
  return { rows, bad };
}

type Cells = Record<string, string>;

function cellsOf(text: string): { line: number; cells: Cells }[] {
  const refuse = (says: string) => new Refusal('invalid', says, { text: says });
  let lines: string[][];
  try {
    lines = parse(text, { bom: true, trim: true, relax_column_count: true });
  } catch {
    throw refuse('This is not a table with commas between its cells');
  }
  const heads = (lines[0] ?? []).map((head) => head.toLowerCase());
  for (const needed of ['id', 'sire', 'dam'])
    if (!heads.includes(needed)) throw refuse(`The first line must name the columns; ${needed} is missing`);
  if (lines.length - 1 > MOST_ROWS) throw refuse(`At most ${MOST_ROWS} rows at once`);
  return lines.slice(1).flatMap((cells, i) => {
    if (cells.every((cell) => cell === '')) return [];
    return [{ line: i + 2, cells: Object.fromEntries(heads.map((head, at) => [head, cells[at] ?? ''])) }];
  });
}

/** Takes the ' off that an export puts before what looks like a formula. */
const unquoted = (cell: string): string => (/^'[=+\-@]/.test(cell) ? cell.slice(1) : cell);

function parentsIn(cell: string, wrong: (says: string) => void): Parent[] {
  const parts = cell.split(/[\s;]+/).filter(Boolean);
  const parents = parts.map((part): Parent => {
    const [code = '', weight = '1'] = part.split(':');
    if (!/^\d*\.?\d+(e-?\d+)?$/.test(weight) || !(Number(weight) > 0 && Number(weight) <= 1_000_000))
      wrong(`${part}: a weight is a number above zero, such as ${code}:0.5`);
    return { code: code === UNKNOWN ? null : code, weight: Number(weight) };
  });
  if (new Set(parents.map(({ code }) => code)).size < parents.length) wrong('Name each possible parent once');
  if (parents.length > 40) wrong('At most 40 possible parents');
  return parents;
}
