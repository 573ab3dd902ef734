import { sql } from 'kysely';
import type { Db } from '../db/open';

/** Tables of a fishroom that are not its own history: sign-in matters, letters on their way, the card service's sessions. */
const LEFT_OUT = new Set(['member', 'invitation', 'letter', 'job', 'checkout']);

/** Columns that open something, or that tie a row to this installation. An archive never holds them. */
const SECRET = /hash$|^token$|secret|^sealed|password/i;
const NOT_SECRET = new Set(['entry.contentHash', 'sheet.token']);
const TIED = new Set(['room.id', 'room.changeNumber', 'room.deleteAfter', 'buyer.accountId']);

export type Column = {
  name: string;
  type: string;
  mayBeEmpty: boolean;
  /** The table that it points to; an account is a person. */
  refersTo: string | null;
  isId: boolean;
};

export type TableShape = {
  name: string;
  columns: Column[];
  /** Written by no archive; filled anew when one is brought in. */
  omitted: { name: string; mayBeEmpty: boolean }[];
  order: string[];
};

type Info = { name: string; type: string; notnull: number; pk: number };
type Reference = { table: string; from: string };

/** The fishroom's tables as the migrations made them, read from SQLite itself: a new table is exported without being listed. */
export async function tableShapes(db: Db): Promise<TableShape[]> {
  const { rows } = await sql<{ name: string }>`
    select name from sqlite_master m where type = 'table' and (name = 'room'
      or exists (select 1 from pragma_table_info(m.name) where name = 'roomId')) order by name
  `.execute(db);
  const shapes: TableShape[] = [];
  for (const { name } of rows) if (!LEFT_OUT.has(name)) shapes.push(await shapeOf(db, name));
  return shapes;
}

async function shapeOf(db: Db, table: string): Promise<TableShape> {
  const { rows: infos } = await sql<Info>`select name, type, "notnull", pk from pragma_table_info(${table})`.execute(
    db,
  );
  const { rows: references } = await sql<Reference>`
    select "table", "from" from pragma_foreign_key_list(${table}) where "from" <> 'roomId'
  `.execute(db);
  const isOmitted = ({ name }: Info) =>
    TIED.has(`${table}.${name}`) || (SECRET.test(name) && !NOT_SECRET.has(`${table}.${name}`));
  const kept = infos.filter((info) => info.name !== 'roomId' && !isOmitted(info));
  return {
    name: table,
    columns: kept.map(({ name, type, notnull, pk }) => ({
      name,
      type,
      mayBeEmpty: notnull === 0 && pk === 0,
      refersTo: personColumn(table, name) ? 'account' : (references.find(({ from }) => from === name)?.table ?? null),
      isId: name === 'id' && !['roomKey', 'speciesOverride'].includes(table),
    })),
    omitted: infos
      .filter(isOmitted)
      .filter(({ name }) => name !== 'id')
      .map(({ name, notnull }) => ({ name, mayBeEmpty: notnull === 0 })),
    order: infos
      .filter(({ pk, name }) => pk > 0 && name !== 'roomId')
      .sort((a, b) => a.pk - b.pk)
      .map(({ name }) => name),
  };
}

/** The trail names a person without a foreign key, so that an account can go. */
const personColumn = (table: string, column: string): boolean => table === 'audit' && column === 'actorId';

const PAGE = 500;
export type Cell = string | number | null;
export type StoredRow = Record<string, Cell>;

/** A table's rows of one fishroom, in the order of their keys. `db` is a reader of its own that sees one instant. */
export async function* rowsOf(db: Db, roomId: string, { name, columns, order }: TableShape): AsyncGenerator<StoredRow> {
  const names = sql.join(columns.map((column) => sql.ref(column.name)));
  const room = sql.ref(name === 'room' ? 'id' : 'roomId');
  const by = order.length > 0 ? sql.join(order.map((column) => sql.ref(column))) : sql.raw('1');
  for (let from = 0; ; from += PAGE) {
    const { rows } = await sql<StoredRow>`
      select ${names} from ${sql.table(name)} where ${room} = ${roomId} order by ${by} limit ${PAGE} offset ${from}
    `.execute(db);
    yield* rows;
    if (rows.length < PAGE) return;
  }
}
