import { parse } from 'csv-parse/sync';
import type * as z from 'zod/mini';
import { Refusal } from '../../shared/refusal';
import type { BadLine, ImportAsk, ImportLine, previewImport } from '../../shared/transfer/contract';
import { type Columns, guessColumns, IMPORT_FIELDS, monthOf } from '../../shared/transfer/importFields';
import { headsIn, Unreadable } from '../../shared/transfer/importValues';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { inTransaction } from '../http/serve';
import type { Scope } from '../scope';
import { LINES, type Line, type Made } from './importLines';

const LINES_MAX = 5000;
/** More than these help nobody: the first ones are named, the rest counted. */
const BAD_SHOWN = 200;

type Sheet = { headers: string[]; rows: string[][]; columns: Columns };
type Tried = { made: Made[]; bad: BadLine[]; badRows: number };

/** Rolls a trial back. Never leaves this file. */
class Trial extends Error {
  readonly tried: Tried;
  constructor(tried: Tried) {
    super('trial');
    this.tried = tried;
  }
}

/** Everything is done as it would be, by all the rules, and taken back again: so that every bad value is known beforehand. */
export async function preview(scope: Scope, ask: ImportAsk): Promise<z.input<typeof previewImport.output>> {
  const sheet = await sheetOf(scope, ask);
  const { headers, rows, columns } = sheet;
  const told = { headers, columns, counts: countHeaders(ask, sheet), rows: rows.length, sample: rows.slice(0, 3) };
  const missing = IMPORT_FIELDS[ask.kind]
    .filter(({ name, needed }) => needed && !columns[name])
    .map(({ name }) => name);
  if (missing.length > 0) return { ...told, missing, bad: [], badRows: 0 };
  const { bad, badRows } = await trial(scope, ask, sheet);
  return { ...told, missing, bad, badRows };
}

async function trial(scope: Scope, ask: ImportAsk, sheet: Sheet): Promise<Tried> {
  try {
    await inTransaction(scope, async (inside) => {
      throw new Trial(await bringIn(inside, ask, sheet));
    });
  } catch (error) {
    if (error instanceof Trial) return error.tried;
    throw error;
  }
  return { made: [], bad: [], badRows: 0 };
}

/** All lines or none. */
export async function run(scope: Scope, ask: ImportAsk): Promise<ImportLine> {
  const sheet = await sheetOf(scope, ask);
  return inTransaction(scope, async (inside) => {
    const { made, bad, badRows } = await bringIn(inside, ask, sheet);
    const [first] = bad;
    if (first) {
      const words = `${badRows} ${badRows === 1 ? 'line needs' : 'lines need'} another look. Nothing was brought in.`;
      throw new Refusal('invalid', words, { [`rows.${first.row}.${first.column}`]: first.why });
    }
    const id = newId(scope.now);
    const line = { id, kind: ask.kind, fileName: ask.fileName, rows: sheet.rows.length, createdAt: scope.now };
    await inside.db
      .insertInto('dataImport')
      .values({
        roomId: scope.roomId,
        ...line,
        columns: JSON.stringify(sheet.columns),
        units: JSON.stringify(ask.units),
        made: JSON.stringify(made),
        actorId: scope.actorId,
        undoneAt: null,
      })
      .execute();
    await audit(inside, { action: 'brought in', about: ask.kind, aboutId: id, change: { lines: [0, line.rows] } });
    return { ...line, undoneAt: null };
  });
}

async function sheetOf({ db, roomId }: Scope, ask: ImportAsk): Promise<Sheet> {
  const [headers = [], ...rows] = linesIn(ask.text);
  if (rows.length === 0)
    throw new Refusal('invalid', 'The file holds no lines', { text: 'A header and one line at least' });
  if (rows.length > LINES_MAX)
    throw new Refusal('invalid', `At most ${LINES_MAX} lines at once: split the file`, { text: 'Split the file' });
  if (ask.columns) return { headers, rows, columns: ask.columns };
  const last = await db
    .selectFrom('dataImport')
    .select('columns')
    .where('roomId', '=', roomId)
    .where('kind', '=', ask.kind)
    .orderBy('id', 'desc')
    .executeTakeFirst();
  const remembered: Columns = last ? JSON.parse(last.columns) : {};
  return { headers, rows, columns: guessColumns(ask.kind, headers, remembered) };
}

/** Semicolons and tabs part columns as well as commas do: whichever the header holds most of. */
function linesIn(text: string): string[][] {
  const header = text.slice(0, text.search(/[\r\n]|$/));
  const [delimiter = ','] = [',', ';', '\t'].sort((a, b) => header.split(b).length - header.split(a).length);
  try {
    const options = { delimiter, bom: true, relax_column_count: true, skip_empty_lines: true, trim: true };
    return parse(text, { ...options, skip_records_with_empty_values: true });
  } catch {
    throw new Refusal('invalid', 'This is not a CSV file that can be read', { text: 'Save the sheet as CSV (UTF-8)' });
  }
}

const countHeaders = ({ kind }: ImportAsk, { headers }: Sheet): string[] =>
  kind === 'broods' ? headers.filter((header) => monthOf(header) !== null) : [];

async function bringIn(scope: Scope, ask: ImportAsk, sheet: Sheet): Promise<Tried> {
  const tried: Tried = { made: [], bad: [], badRows: 0 };
  for (const [i, cells] of sheet.rows.entries()) {
    const unreadable: BadLine[] = [];
    try {
      const line = lineOf(ask, sheet, { cells, row: i + 2, unreadable });
      tried.made.push(...(await LINES[ask.kind](scope, line)));
    } catch (error) {
      if (unreadable.length === 0) unreadable.push(...refused(error, sheet, { cells, row: i + 2 }));
    }
    if (unreadable.length === 0) continue;
    tried.badRows += 1;
    if (tried.bad.length < BAD_SHOWN) tried.bad.push(...unreadable);
  }
  return tried;
}

type At = { cells: string[]; row: number };

function lineOf(
  { kind, units }: ImportAsk,
  sheet: Sheet,
  { cells, row, unreadable }: At & { unreadable: BadLine[] },
): Line {
  const cellOf = (header: string | null | undefined) => (header ? (cells[sheet.headers.indexOf(header)] ?? '') : '');
  const text = (field: string) => cellOf(sheet.columns[field]).trim() || null;
  const attempt = <T>(header: string, value: string, as: (typed: string) => T): T => {
    try {
      return as(value);
    } catch (error) {
      if (error instanceof Unreadable)
        unreadable.push({ row, column: header, value: value.slice(0, 100), why: error.message });
      throw error;
    }
  };
  const read: Line['read'] = (field, as) =>
    attempt(sheet.columns[field] ?? field, text(field) ?? '', (typed) => {
      if (typed === '') throw new Unreadable('This is needed');
      return as(typed);
    });
  const counts = countHeadersOf(kind, sheet.headers).flatMap(({ header, day }) => {
    const typed = cellOf(header).trim();
    return typed === '' ? [] : [{ day, heads: attempt(header, typed, headsIn) }];
  });
  return { text, read, maybe: (field, as) => (text(field) === null ? null : read(field, as)), counts, units };
}

const countHeadersOf = (kind: ImportAsk['kind'], headers: string[]) =>
  (kind === 'broods' ? headers : [])
    .flatMap((header) => {
      const day = monthOf(header);
      return day ? [{ header, day }] : [];
    })
    .sort((a, b) => a.day.localeCompare(b.day));

/** What a rule said, beside the column that it is about. */
function refused(error: unknown, { columns, headers }: Sheet, { cells, row }: At): BadLine[] {
  if (!(error instanceof Refusal)) throw error;
  const [[path = '', why = error.message] = []] = Object.entries(error.fields);
  const field = {
    codes: 'code',
    onDay: 'day',
    startedOn: 'day',
    bornOn: 'born',
    arrivedOn: 'arrived',
    heaterC: 'heater',
  }[path.split('.')[0] ?? ''];
  const column = columns[field ?? path.split('.')[0] ?? ''] ?? columns['code'] ?? columns['brood'] ?? headers[0] ?? '';
  return [{ row, column, value: (cells[headers.indexOf(column)] ?? '').slice(0, 100), why }];
}
