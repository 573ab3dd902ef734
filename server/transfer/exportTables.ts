import type { Writable } from 'node:stream';
import { stringify } from 'csv-stringify/sync';
import { safeCell } from '../../shared/transfer/archive';
import { TABLE_WORDS } from '../../shared/transfer/tableWords';
import type { Db } from '../db/open';
import type { House } from '../house';
import { writeZip } from './exportZip';
import { type Cell, rowsOf, type TableShape, tableShapes } from './tables';

/** Every table as a CSV file (RFC 4180, UTF-8), and `columns.csv`, which says what the columns are. */
export async function writeTables(house: House, roomId: string, now: string, to: Writable): Promise<void> {
  await writeZip(house, { to, date: new Date(now) }, async (db, add) => {
    const shapes = await tableShapes(db);
    await add.text('columns.csv', columnLines(shapes));
    for (const shape of shapes) await add.text(`${shape.name}.csv`, csvLines(db, roomId, shape));
  });
}

const csv = (cells: Cell[]): string =>
  stringify([cells.map((cell) => (typeof cell === 'string' ? safeCell(cell) : cell))], { record_delimiter: '\r\n' });

async function* csvLines(db: Db, roomId: string, shape: TableShape): AsyncGenerator<string> {
  yield csv(shape.columns.map(({ name }) => name));
  for await (const row of rowsOf(db, roomId, shape)) yield csv(shape.columns.map(({ name }) => row[name] ?? null));
}

const KINDS: Record<string, string> = { TEXT: 'text', INTEGER: 'whole number', REAL: 'number' };

function* columnLines(shapes: TableShape[]): Generator<string> {
  yield csv(['table', 'what a row is', 'column', 'kind', 'may be empty', 'points to']);
  for (const { name, columns } of shapes) {
    for (const column of columns) {
      const pointsTo = column.refersTo === 'account' ? 'a person' : column.refersTo;
      const kind = `${KINDS[column.type] ?? column.type}${unitOf(column.name)}`;
      yield csv([name, TABLE_WORDS[name] ?? '', column.name, kind, column.mayBeEmpty ? 'yes' : 'no', pointsTo]);
    }
  }
}

/** The unit stands in the column's name; here it is spelled out. */
const UNITS: [RegExp, string][] = [
  [/TenthsMm$/, ', tenths of a millimetre'],
  [/C$|celsius$/, ', °C'],
  [/[lL]itres$/, ', litres'],
  [/MgL$/, ', mg/L'],
  [/Us$/, ', µS/cm'],
  [/[cC]ents$/, ', the currency’s smallest unit'],
  [/^weightG$/, ', grams'],
  [/Kg$/, ', kilograms'],
  [/(On|Day|Earliest|Latest|Until)$/, ', a date (YYYY-MM-DD)'],
  [/At$|^at$/, ', an instant (UTC, ISO 8601)'],
];
const unitOf = (column: string): string => UNITS.find(([pattern]) => pattern.test(column))?.[1] ?? '';
