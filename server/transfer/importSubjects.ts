import { Unreadable } from '../../shared/transfer/importValues';
import type { Scope } from '../scope';
import type { Line } from './importLines';

const TABLES = { strain: 'strain', colony: 'colony', tank: 'tank', female: 'fish', male: 'fish' } as const;
const isKnown = (field: string): field is keyof typeof TABLES => field in TABLES;

/** The id of what the file names by its code. */
export async function idOf({ db, roomId }: Scope, line: Line, field: string): Promise<string> {
  const code = line.read(field, (text) => text.trim());
  const table = isKnown(field) ? TABLES[field] : 'fish';
  const row = await db
    .selectFrom(table)
    .select('id')
    .where('roomId', '=', roomId)
    .where('code', '=', table === 'strain' ? code.toUpperCase() : code)
    .executeTakeFirst();
  return row?.id ?? line.read(field, () => reject(`There is no ${table} ${code} here yet`));
}

function reject(words: string): never {
  throw new Unreadable(words);
}

/** The one batch that a brood swims in. */
export async function batchOf({ db, roomId }: Scope, line: Line): Promise<string> {
  const code = line.read('brood', (text) => text.trim());
  const rows = await db
    .selectFrom('brood')
    .innerJoin('batchSource', (join) =>
      join.onRef('batchSource.roomId', '=', 'brood.roomId').onRef('batchSource.broodId', '=', 'brood.id'),
    )
    .where('brood.roomId', '=', roomId)
    .where('brood.code', '=', code)
    .select('batchSource.batchId')
    .distinct()
    .execute();
  const [only, more] = rows;
  if (only && !more) return only.batchId;
  return line.read('brood', () =>
    reject(
      more ? `Brood ${code} swims in several batches: count them one by one` : `There is no brood ${code} here yet`,
    ),
  );
}

/** A brood, or else a fish, of that code. */
export async function subjectOf({ db, roomId }: Scope, line: Line): Promise<{ thing: 'brood' | 'fish'; id: string }> {
  const code = line.read('brood', (text) => text.trim());
  for (const thing of ['brood', 'fish'] as const) {
    const row = await db
      .selectFrom(thing)
      .select('id')
      .where('roomId', '=', roomId)
      .where('code', '=', code)
      .executeTakeFirst();
    if (row) return { thing, id: row.id };
  }
  return line.read('brood', () => reject(`There is no brood or fish ${code} here yet`));
}
