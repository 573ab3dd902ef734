import { createWriteStream } from 'node:fs';
import { mkdir, readdir, rename, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { sql } from 'kysely';
import { Refusal } from '../../shared/refusal';
import { WAITING_DAYS } from '../../shared/transfer/contract';
import { audit } from '../db/audit';
import type { Db } from '../db/open';
import type { House } from '../house';
import type { Scope } from '../scope';
import { writeArchive } from './exportArchive';

const DAY = 86_400_000;
/** How long the last archive of a deleted fishroom lies in the data folder, for whoever runs the installation. */
const KEPT_DAYS = 30;

export async function deletionOf({ db, roomId }: Scope): Promise<{ deleteAfter: string | null }> {
  return db.selectFrom('room').select('deleteAfter').where('id', '=', roomId).executeTakeFirstOrThrow();
}

/** Nothing goes yet: the fishroom works on until the day, and any owner may call it off. */
export async function askToDelete(scope: Scope, typed: string): Promise<{ deleteAfter: string | null }> {
  const { db, roomId, now } = scope;
  const room = await db.selectFrom('room').select('name').where('id', '=', roomId).executeTakeFirstOrThrow();
  if (typed.trim() !== room.name)
    throw new Refusal('invalid', 'That is not its name', { name: `Type ${room.name} to confirm` });
  const deleteAfter = new Date(Date.parse(now) + WAITING_DAYS * DAY).toISOString();
  await db.updateTable('room').set({ deleteAfter }).where('id', '=', roomId).execute();
  await audit(scope, { action: 'deletion asked for', about: 'fishroom', aboutId: roomId });
  return { deleteAfter };
}

export async function callOff(scope: Scope): Promise<{ deleteAfter: string | null }> {
  await scope.db.updateTable('room').set({ deleteAfter: null }).where('id', '=', scope.roomId).execute();
  await audit(scope, { action: 'deletion called off', about: 'fishroom', aboutId: scope.roomId });
  return { deleteAfter: null };
}

/** Deletes every fishroom whose time is over: its last archive first, then its rows, then its pictures. */
export async function deleteDue(house: House): Promise<number> {
  const now = house.clock.now().toISOString();
  const due = await house.db.selectFrom('room').select('id').where('deleteAfter', '<', now).execute();
  for (const { id } of due) {
    await keepLastArchive(house, id, now);
    const gone = await house.db.transaction().execute((db) => deleteRows(db, id, now));
    if (!gone) continue;
    await house.pictures.removeRoom(id);
    house.log.info({ event: 'fishroom deleted', roomId: id }, 'fishroom deleted');
  }
  await dropOldArchives(house);
  return due.length;
}

const lastArchives = ({ config }: House): string => join(config.dataFolder, 'last-archives');

async function keepLastArchive(house: House, roomId: string, now: string): Promise<void> {
  await mkdir(lastArchives(house), { recursive: true });
  const path = join(lastArchives(house), `${roomId}.zip`);
  await writeArchive(house, roomId, now, createWriteStream(`${path}.part`, { mode: 0o600 }));
  await rename(`${path}.part`, path);
}

async function dropOldArchives(house: House): Promise<void> {
  for (const name of await readdir(lastArchives(house)).catch(() => [])) {
    const path = join(lastArchives(house), name);
    if ((await stat(path)).mtimeMs < house.clock.now().getTime() - KEPT_DAYS * DAY) await rm(path, { force: true });
  }
}

/** The room first: what may only be added to (head counts, payments, the trail) lets go once it is gone. False: called off. */
async function deleteRows(db: Db, roomId: string, now: string): Promise<boolean> {
  await sql`pragma defer_foreign_keys = on`.execute(db);
  const gone = await db.deleteFrom('room').where('id', '=', roomId).where('deleteAfter', '<', now).executeTakeFirst();
  if (gone.numDeletedRows === 0n) return false;
  const { rows } = await sql<{ name: string }>`
    select name from sqlite_master m where type = 'table'
      and exists (select 1 from pragma_table_info(m.name) where name = 'roomId')
  `.execute(db);
  for (const { name } of rows)
    await sql`delete from ${sql.table(name)} where ${sql.ref('roomId')} = ${roomId}`.execute(db);
  return true;
}

const HOUR = 3_600_000;

/** Once at the start and every hour. */
export async function deleteInTime(house: House): Promise<{ stop(): Promise<void> }> {
  let running: Promise<unknown> = Promise.resolve();
  const look = () => {
    running = deleteDue(house).catch((error: unknown) =>
      house.log.error({ event: 'deletion failed', error: String(error) }, 'a fishroom could not be deleted'),
    );
  };
  look();
  const timer = setInterval(look, HOUR);
  return {
    stop: async () => {
      clearInterval(timer);
      await running;
    },
  };
}
