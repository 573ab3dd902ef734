import * as z from 'zod/mini';
import { notFound, Refusal } from '../../shared/refusal';
import type { ImportLine } from '../../shared/transfer/contract';
import { audit } from '../db/audit';
import { undo } from '../record';
import type { Scope } from '../scope';
import type { Made } from './importLines';

const COLUMNS = ['id', 'kind', 'fileName', 'rows', 'createdAt', 'undoneAt'] as const;

export async function importsOf({ db, roomId }: Scope): Promise<{ imports: ImportLine[] }> {
  const imports = await db
    .selectFrom('dataImport')
    .select(COLUMNS)
    .where('roomId', '=', roomId)
    .orderBy('id', 'desc')
    .limit(50)
    .execute();
  return { imports };
}

const MadeRows = z.array(z.strictObject({ table: z.enum(['entry', 'tank', 'fish', 'colony']), id: z.string() }));

/** Takes a whole import back, last line first; refused as a whole when anything was built on any of it. */
export async function takeBack(scope: Scope, importId: string): Promise<ImportLine> {
  const { db, roomId, now } = scope;
  const found = await db
    .selectFrom('dataImport')
    .select([...COLUMNS, 'made'])
    .where('roomId', '=', roomId)
    .where('id', '=', importId)
    .executeTakeFirst();
  if (!found) throw notFound('That import');
  const { made, ...line } = found;
  if (line.undoneAt) return line;
  const rows = MadeRows.parse(JSON.parse(made)).reverse();
  try {
    await dropOwnLedgers(scope, rows);
    for (const { table, id } of rows) {
      if (table === 'entry') await undo(scope, id, { whenever: true });
      else await dropRow(scope, table, id);
    }
  } catch (error) {
    const built = error instanceof Error && 'code' in error && error.code === 'SQLITE_CONSTRAINT_FOREIGNKEY';
    if (!built && !(error instanceof Refusal)) throw error;
    throw new Refusal('conflict', 'Something was recorded on top of this import. It stays; correct it line by line.');
  }
  await db
    .updateTable('dataImport')
    .set({ undoneAt: now })
    .where('roomId', '=', roomId)
    .where('id', '=', importId)
    .execute();
  await audit(scope, { action: 'import taken back', about: line.kind, aboutId: importId });
  return { ...line, undoneAt: now };
}

/**
 * Head counts of batches that came in with it go with the batch: the ledger lets go of lines whose entry was undone. That
 * includes counts of another import that was taken back before.
 */
async function dropOwnLedgers({ db, roomId, now, actorId }: Scope, rows: Made[]): Promise<void> {
  const ids = rows.filter(({ table }) => table === 'entry').map(({ id }) => id);
  const batches = await db
    .selectFrom('batch')
    .select(['id', 'entryId'])
    .where('roomId', '=', roomId)
    .where('entryId', 'is not', null)
    .execute();
  const own = batches.filter(({ entryId }) => entryId !== null && ids.includes(entryId)).map(({ id }) => id);
  const mark = async (undone: { undoneAt: string | null; undoneBy: string | null }) => {
    for (const id of ids)
      await db.updateTable('entry').set(undone).where('roomId', '=', roomId).where('id', '=', id).execute();
  };
  await mark({ undoneAt: now, undoneBy: actorId });
  for (const batchId of own) {
    await db
      .deleteFrom('headEntry')
      .where('roomId', '=', roomId)
      .where('batchId', '=', batchId)
      .where(
        'entryId',
        'in',
        db.selectFrom('entry').select('id').where('roomId', '=', roomId).where('undoneAt', 'is not', null),
      )
      .execute();
  }
  await mark({ undoneAt: null, undoneBy: null });
}

/** With what was made beside it. What an entry changed since then holds on to it, and the row cannot go. */
async function dropRow({ db, roomId }: Scope, table: 'tank' | 'fish' | 'colony', id: string): Promise<void> {
  if (table !== 'tank') {
    const column = table === 'fish' ? 'fishId' : 'colonyId';
    for (const beside of ['stay', 'colonyMember'] as const)
      await db
        .deleteFrom(beside)
        .where('roomId', '=', roomId)
        .where(column, '=', id)
        .where('entryId', 'is', null)
        .where('endEntryId', 'is', null)
        .execute();
  }
  if (table === 'fish')
    await db
      .deleteFrom('finding')
      .where('roomId', '=', roomId)
      .where('fishId', '=', id)
      .where('entryId', 'is', null)
      .execute();
  await db.deleteFrom(table).where('roomId', '=', roomId).where('id', '=', id).execute();
}
