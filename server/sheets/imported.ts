import { sql } from 'kysely';
import type * as z from 'zod/mini';
import { notFound } from '../../shared/refusal';
import { SheetContent } from '../../shared/sheets/content';
import type { ImportedRow, readImported } from '../../shared/sheets/importContract';
import type { Scope } from '../scope';

type Which = { id?: string; fishId?: string | undefined };

/** Sheets that were taken in, newest first. */
export async function importedRows(scope: Pick<Scope, 'db' | 'roomId'>, which: Which = {}): Promise<ImportedRow[]> {
  const { db, roomId } = scope;
  let query = db
    .selectFrom('importedSheet as source')
    .innerJoin('account', 'account.id', 'source.importedBy')
    .where('source.roomId', '=', roomId)
    .select([
      'source.id',
      'source.number',
      'source.signature',
      'source.keysFrom',
      'source.createdAt',
      'account.name as by',
      // A sheet with thousands of ancestors is not read through for a line of a list.
      sql<string>`json_extract(source.content, '$.fishroom.name')`.as('room'),
      sql<string>`json_extract(source.content, '$.fishroom.address')`.as('address'),
      sql<string>`json_extract(source.content, '$.subject.code')`.as('subject'),
      sql<string>`json_extract(source.content, '$.issue.on')`.as('issuedOn'),
    ]);
  if (which.id) query = query.where('source.id', '=', which.id);
  if (which.fishId)
    query = query.where('source.id', 'in', (eb) =>
      eb
        .selectFrom('toldFish')
        .where('roomId', '=', roomId)
        .where('fishId', '=', which.fishId ?? '')
        .select('importedSheetId'),
    );
  const rows = await query.orderBy('source.createdAt', 'desc').orderBy('source.id', 'desc').execute();
  const told = await toldOf(scope);
  return rows.map(({ createdAt, signature, ...row }) => {
    const animals = told.get(row.id) ?? [];
    return {
      ...row,
      takenInOn: createdAt.slice(0, 10),
      signature: signature === 'valid' ? 'valid' : 'keyUnknown',
      fish: animals.filter(({ here }) => here === 1).map(({ fishId, code }) => ({ id: fishId, code })),
      ancestors: animals.filter(({ here }) => here === 0).length,
    };
  });
}

async function toldOf({ db, roomId }: Pick<Scope, 'db' | 'roomId'>) {
  const rows = await db
    .selectFrom('toldFish')
    .innerJoin('fish', (join) =>
      join.onRef('fish.roomId', '=', 'toldFish.roomId').onRef('fish.id', '=', 'toldFish.fishId'),
    )
    .where('toldFish.roomId', '=', roomId)
    .select(['toldFish.importedSheetId', 'toldFish.fishId', 'toldFish.here', 'fish.code'])
    .orderBy('fish.code')
    .orderBy('fish.id')
    .execute();
  const bySheet = new Map<string, typeof rows>();
  for (const row of rows) {
    const known = bySheet.get(row.importedSheetId);
    if (known) known.push(row);
    else bySheet.set(row.importedSheetId, [row]);
  }
  return bySheet;
}

export async function oneImported(scope: Pick<Scope, 'db' | 'roomId'>, id: string): Promise<ImportedRow> {
  const [row] = await importedRows(scope, { id });
  if (!row) throw notFound('That sheet');
  return row;
}

export async function importedPage(scope: Scope, id: string): Promise<z.input<typeof readImported.output>> {
  const row = await oneImported(scope, id);
  const { content, jws } = await scope.db
    .selectFrom('importedSheet')
    .where('roomId', '=', scope.roomId)
    .where('id', '=', id)
    .select(['content', 'jws'])
    .executeTakeFirstOrThrow();
  return { row, content: SheetContent.parse(JSON.parse(content)), jws };
}
