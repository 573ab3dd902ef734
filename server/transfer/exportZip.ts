import { once } from 'node:events';
import { join } from 'node:path';
import { Readable, type Writable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { ZipArchive } from 'archiver';
import { sql } from 'kysely';
import { type Db, openForReading } from '../db/open';
import type { House } from '../house';
import { DATABASE } from './backup';

type Add = {
  text: (name: string, lines: AsyncIterable<string> | Iterable<string>) => Promise<void>;
  file: (name: string, path: string) => Promise<void>;
};

/** Writes a zip as it is made, out of one instant of the database, which other requests go on changing. */
export async function writeZip(
  { config }: Pick<House, 'config'>,
  { to, date }: { to: Writable; date: Date },
  fill: (db: Db, add: Add) => Promise<void>,
): Promise<void> {
  const reader = openForReading(join(config.dataFolder, DATABASE));
  const zip = new ZipArchive({ zlib: { level: 6 } });
  const sent = pipeline(zip, to);
  /** One at a time, so that no more than one file is open and no more than a page of rows is held. */
  const added = async (append: () => unknown) => {
    const entry = once(zip, 'entry');
    append();
    await Promise.race([entry, sent]);
  };
  try {
    await reader.transaction().execute(async (db) => {
      // The first read fixes the instant.
      await sql`select 1 from room limit 1`.execute(db);
      await fill(db, {
        text: (name, lines) => added(() => zip.append(Readable.from(lines, { objectMode: false }), { name, date })),
        file: (name, path) => added(() => zip.file(path, { name, date, mode: 0o644, ...{ store: true } })),
      });
    });
    await zip.finalize();
    await sent;
  } catch (error) {
    zip.abort();
    to.destroy();
    await sent.catch(() => {});
    throw error;
  } finally {
    await reader.destroy();
  }
}
