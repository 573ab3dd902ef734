import type { Writable } from 'node:stream';
import { sql } from 'kysely';
import { ARCHIVE_FORMAT, ARCHIVE_VERSION, type ArchiveNote, type ArchivePeople } from '../../shared/transfer/archive';
import { migrations } from '../db/migrations';
import type { Db } from '../db/open';
import type { House } from '../house';
import { writeZip } from './exportZip';
import { rowsOf, type TableShape, tableShapes } from './tables';

/** The whole fishroom: every row as JSON, every picture. What another installation makes an equal fishroom of. */
export async function writeArchive(house: House, roomId: string, now: string, to: Writable): Promise<void> {
  const note: ArchiveNote = {
    format: ARCHIVE_FORMAT,
    version: ARCHIVE_VERSION,
    schema: Object.keys(migrations).sort().at(-1) ?? '',
    roomId,
    madeAt: now,
  };
  await writeZip(house, { to, date: new Date(now) }, async (db, add) => {
    const shapes = await tableShapes(db);
    await add.text('kinwater.json', [JSON.stringify(note)]);
    await add.text('people.json', [JSON.stringify(await peopleIn(db, roomId, shapes))]);
    for (const shape of shapes) await add.text(`tables/${shape.name}.jsonl`, linesOf(db, roomId, shape));
    const photos = await db.selectFrom('photo').select('id').where('roomId', '=', roomId).orderBy('id').execute();
    for (const { id } of photos) {
      await add.file(`pictures/${id}/1280.webp`, house.pictures.fileOf(roomId, id, 'large'));
      await add.file(`pictures/${id}/320.webp`, house.pictures.fileOf(roomId, id, 'small'));
    }
  });
}

async function* linesOf(db: Db, roomId: string, shape: TableShape): AsyncGenerator<string> {
  for await (const row of rowsOf(db, roomId, shape)) yield `${JSON.stringify(row)}\n`;
}

async function peopleIn(db: Db, roomId: string, shapes: TableShape[]): Promise<ArchivePeople> {
  const ids = new Set<string>();
  for (const { name, columns } of shapes) {
    for (const column of columns.filter(({ refersTo }) => refersTo === 'account')) {
      const { rows } = await sql<{ id: string }>`
        select distinct ${sql.ref(column.name)} as id from ${sql.table(name)}
        where ${sql.ref('roomId')} = ${roomId} and ${sql.ref(column.name)} is not null
      `.execute(db);
      for (const { id } of rows) ids.add(id);
    }
  }
  const people: ArchivePeople = [];
  for (const id of [...ids].sort()) {
    const known = await db.selectFrom('account').select(['id', 'name']).where('id', '=', id).executeTakeFirst();
    people.push(known ?? { id, name: FORMER_MEMBER });
  }
  return people;
}

/** How somebody is called whose account was deleted. */
export const FORMER_MEMBER = 'a former member';
