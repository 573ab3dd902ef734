import { existsSync } from 'node:fs';
import { mkdir, rename, rm, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { sql } from 'kysely';
import * as z from 'zod/mini';
import { brokenReferences, integrityOf, openFile, openForReading } from '../db/open';
import { copySafely, flush, sha256Of } from './safeFiles';

export const DATABASE = 'kinwater.db';
export const PICTURE_FILES = ['1280.webp', '320.webp'] as const;

/** `backup.json`: what the copy is, so that restore can tell a whole one from half of one. */
export const BackupNote = z.strictObject({
  format: z.literal('kinwater-backup'),
  version: z.literal(1),
  madeAt: z.string(),
  migrations: z.array(z.string()),
  databaseSha256: z.string(),
  pictures: z.number(),
  /** Pictures that were taken away while the copy was being made. */
  gone: z.number(),
});
export type BackupNote = z.output<typeof BackupNote>;

type Folders = { dataFolder: string; uploadsFolder: string };

/**
 * Copies a running or a stopped installation into `target`, which must not exist. The database first, as of one instant;
 * pictures after it, so that every row has its file. Nothing is under the target's name until all of it is on the disk.
 */
export async function backUp({ dataFolder, uploadsFolder }: Folders, target: string, now: Date): Promise<BackupNote> {
  if (existsSync(target)) throw new Error(`${target} is there already. Name a folder that is not.`);
  const source = join(dataFolder, DATABASE);
  if (!existsSync(source)) throw new Error(`There is no database in ${dataFolder}. Set DATA_FOLDER.`);
  const draft = `${target}.part`;
  await rm(draft, { recursive: true, force: true });
  await mkdir(join(draft, 'uploads'), { recursive: true });
  try {
    const copied = await copyDatabase(source, join(draft, DATABASE));
    const gone = await copyPictures(copied.photos, uploadsFolder, join(draft, 'uploads'));
    const note: BackupNote = {
      format: 'kinwater-backup',
      version: 1,
      madeAt: now.toISOString(),
      migrations: copied.migrations,
      databaseSha256: await sha256Of(join(draft, DATABASE)),
      pictures: copied.photos.length - gone,
      gone,
    };
    await writeFile(join(draft, 'backup.json'), `${JSON.stringify(note, null, 2)}\n`);
    for (const path of ['backup.json', DATABASE, 'uploads', '.']) await flush(join(draft, path));
    await rename(draft, target);
    await flush(dirname(target));
    return note;
  } finally {
    await rm(draft, { recursive: true, force: true });
  }
}

async function copyDatabase(source: string, to: string) {
  const db = openForReading(source);
  try {
    await sql`vacuum into ${to}`.execute(db);
  } finally {
    await db.destroy();
  }
  const copy = openFile(to);
  try {
    await sql`pragma journal_mode = delete`.execute(copy);
    return await provenFacts(copy);
  } finally {
    await copy.destroy();
  }
}

/** Refuses a copy that is not whole; answers what else there is to know of it. */
export async function provenFacts(db: ReturnType<typeof openFile>) {
  const integrity = await integrityOf(db);
  if (integrity !== 'ok') throw new Error(`The database is damaged: ${integrity}`);
  if ((await brokenReferences(db)).length > 0) throw new Error('The database has rows that refer to nothing');
  const { rows } = await sql<{ name: string }>`select name from kysely_migration order by name`.execute(db);
  const photos = await db.selectFrom('photo').select(['roomId', 'id', 'sha256']).execute();
  return { migrations: rows.map(({ name }) => name), photos };
}

/** Answers how many were gone in the meantime. */
async function copyPictures(photos: { roomId: string; id: string }[], from: string, to: string): Promise<number> {
  let gone = 0;
  for (const { roomId, id } of photos) {
    try {
      for (const name of PICTURE_FILES) await copySafely(join(from, roomId, id, name), join(to, roomId, id, name));
      await flush(join(to, roomId, id));
    } catch (error) {
      if (!(error instanceof Error && 'code' in error && error.code === 'ENOENT')) throw error;
      await rm(join(to, roomId, id), { recursive: true, force: true });
      gone += 1;
    }
  }
  return gone;
}
