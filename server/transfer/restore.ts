import { existsSync } from 'node:fs';
import { mkdir, readFile, rename, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { holderOf, takeLock } from '../db/lock';
import { migrations } from '../db/migrations';
import { openForReading } from '../db/open';
import { pictureReport } from '../pictures';
import { BackupNote, DATABASE, PICTURE_FILES, provenFacts } from './backup';
import { copySafely, flush, isEmpty, sha256Of } from './safeFiles';

type Folders = { dataFolder: string; uploadsFolder: string };

/** Brings a backup back into an installation that is stopped and empty. The database comes last: only then is it one. */
export async function restore({ dataFolder, uploadsFolder }: Folders, from: string): Promise<BackupNote> {
  await mustBeFree({ dataFolder, uploadsFolder });
  const note = await provenNote(from);
  const photos = await provenDatabase(from, note);
  await mkdir(dataFolder, { recursive: true });
  await mkdir(uploadsFolder, { recursive: true });
  const lock = takeLock(dataFolder);
  const draft = join(dataFolder, `${DATABASE}.part`);
  try {
    for (const { roomId, id } of photos) {
      if (!existsSync(join(from, 'uploads', roomId, id))) continue;
      for (const name of PICTURE_FILES)
        await copySafely(join(from, 'uploads', roomId, id, name), join(uploadsFolder, roomId, id, name));
    }
    await copySafely(join(from, DATABASE), draft);
    await rename(draft, join(dataFolder, DATABASE));
    await flush(dataFolder);
    return note;
  } finally {
    await rm(draft, { force: true });
    lock.release();
  }
}

async function mustBeFree({ dataFolder, uploadsFolder }: Folders): Promise<void> {
  const holder = holderOf(dataFolder);
  if (holder) throw new Error(`Kinwater is running (process ${holder}). Stop it first.`);
  if (existsSync(join(dataFolder, DATABASE)))
    throw new Error(`There is a database in ${dataFolder}. Move that folder away first: nothing is overwritten.`);
  if (!(await isEmpty(uploadsFolder)))
    throw new Error(`There are pictures in ${uploadsFolder}. Move that folder away first: nothing is overwritten.`);
}

async function provenNote(from: string): Promise<BackupNote> {
  const text = await readFile(join(from, 'backup.json'), 'utf8').catch(() => null);
  if (text === null) throw new Error(`${from} is not a backup: it has no backup.json`);
  const note = BackupNote.safeParse(jsonOf(text));
  if (!note.success) throw new Error(`${from} is not a backup that this version can read`);
  const newer = note.data.migrations.filter((name) => !(name in migrations));
  if (newer.length > 0)
    throw new Error(`The backup is of a newer version of Kinwater (${newer.at(-1)}). Update the program first.`);
  return note.data;
}

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

async function provenDatabase(from: string, note: BackupNote) {
  if ((await sha256Of(join(from, DATABASE))) !== note.databaseSha256)
    throw new Error('The backup’s database is not the one that was written: its hash differs');
  const db = openForReading(join(from, DATABASE));
  try {
    const { photos } = await provenFacts(db);
    const report = await pictureReport(join(from, 'uploads'), photos);
    if (report.damaged.length > 0 || report.missing.length > note.gone)
      throw new Error(
        `Pictures are missing or damaged in the backup: ${report.missing.length + report.damaged.length}`,
      );
    return photos;
  } finally {
    await db.destroy();
  }
}
