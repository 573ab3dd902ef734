import { createReadStream } from 'node:fs';
import { readFile, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { isId } from '../../shared/ids';
import { EntryContent } from '../../shared/record/kinds';
import { ARCHIVE_FORMAT, ARCHIVE_VERSION, ArchiveNote, ArchivePeople } from '../../shared/transfer/archive';
import { migrations } from '../db/migrations';
import type { Column, StoredRow, TableShape } from './tables';
import { badArchive } from './unzip';

export type Archive = { note: ArchiveNote; people: ArchivePeople; tables: Map<TableShape, StoredRow[]> };

/** Reads an unpacked archive and proves every row's shape before anything is stored. */
export async function readArchive(folder: string, names: string[], shapes: TableShape[]): Promise<Archive> {
  const note = noteOf(jsonOf(await textOf(folder, 'kinwater.json')));
  const people = ArchivePeople.safeParse(jsonOf(await textOf(folder, 'people.json')));
  if (!people.success) throw badArchive('people.json is not as it should be');
  const tables = new Map<TableShape, StoredRow[]>();
  for (const name of names.filter((one) => one.startsWith('tables/'))) {
    const shape = shapes.find((one) => name === `tables/${one.name}.jsonl`);
    if (!shape) throw badArchive(`${name} is of no table that this version knows`);
    tables.set(shape, await rowsIn(join(folder, name), shape, new Set(people.data.map(({ id }) => id))));
  }
  const rooms = [...tables].find(([{ name }]) => name === 'room')?.[1] ?? [];
  if (rooms.length !== 1) throw badArchive('it holds no fishroom');
  return { note, people: people.data, tables };
}

function noteOf(json: unknown): ArchiveNote {
  const note = ArchiveNote.safeParse(json);
  if (note.success) {
    if (note.data.schema in migrations) return note.data;
    throw badArchive(`it is of a newer version of Kinwater (${note.data.schema.slice(0, 40)})`);
  }
  const told = typeof json === 'object' && json !== null ? json : {};
  if ('format' in told && told.format === ARCHIVE_FORMAT && 'version' in told && told.version !== ARCHIVE_VERSION)
    throw badArchive(
      `its format is version ${String(told.version).slice(0, 10)}, this program reads version ${ARCHIVE_VERSION}`,
    );
  throw badArchive('kinwater.json is not as it should be');
}

async function textOf(folder: string, name: string): Promise<string> {
  const path = join(folder, name);
  const size = (await stat(path).catch(() => null))?.size;
  if (size === undefined) throw badArchive(`${name} is missing`);
  if (size > 5_000_000) throw badArchive(`${name} is too large`);
  return readFile(path, 'utf8');
}

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

async function rowsIn(path: string, shape: TableShape, people: Set<string>): Promise<StoredRow[]> {
  const rows: StoredRow[] = [];
  for await (const line of createInterface({ input: createReadStream(path), crlfDelay: Number.POSITIVE_INFINITY })) {
    if (line === '') continue;
    rows.push(rowOf(jsonOf(line), shape, people, `${shape.name} row ${rows.length + 1}`));
  }
  return rows;
}

function rowOf(json: unknown, shape: TableShape, people: Set<string>, where: string): StoredRow {
  if (typeof json !== 'object' || json === null || Array.isArray(json)) throw badArchive(`${where} is not a row`);
  const told = new Map<string, unknown>(Object.entries(json));
  const row: StoredRow = {};
  for (const column of shape.columns) {
    const value = told.get(column.name) ?? null;
    told.delete(column.name);
    if (!fits(value, column)) throw badArchive(`${where}: ${column.name} is not as it should be`);
    if (column.refersTo === 'account' && value !== null && !people.has(String(value)))
      throw badArchive(`${where}: ${column.name} names nobody in people.json`);
    row[column.name] = value;
  }
  const [unknown] = told.keys();
  if (unknown !== undefined) throw badArchive(`${where}: ${unknown.slice(0, 40)} is no column`);
  if (shape.name === 'entry' && !EntryContent.safeParse(jsonOf(String(row['content']))).success)
    throw badArchive(`${where}: what was recorded cannot be read`);
  return row;
}

/** SQLite's own checks (STRICT, CHECK, keys) come after this; here is what they do not say. */
function fits(value: unknown, column: Column): value is string | number | null {
  if (value === null) return column.mayBeEmpty;
  if (column.isId && !(typeof value === 'string' && isId(value))) return false;
  if (column.type === 'TEXT') return typeof value === 'string' && value.length <= 2_000_000;
  return typeof value === 'number' && (column.type === 'REAL' || Number.isSafeInteger(value));
}
