import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import pino from 'pino';
import type { Config } from './config';
import { takeLock } from './db/lock';
import { brokenReferences, type Db, integrityOf, keepStatistics, migrateToLatest, openFile } from './db/open';
import type { House } from './house';
import { openMailer } from './mail';
import { openSink } from './mail/sink';
import { openPayments } from './payments';
import { openPictures } from './pictures';

/** Opens everything the server is made of, and says how to close it again. */
export async function buildHouse(config: Config, clock: House['clock'] = { now: () => new Date() }) {
  mkdirSync(config.dataFolder, { recursive: true });
  mkdirSync(config.uploadsFolder, { recursive: true });
  const lock = takeLock(config.dataFolder);
  const log = pino({ level: config.logLevel, base: null, timestamp: pino.stdTimeFunctions.isoTime });
  const db = openFile(join(config.dataFolder, 'kinwater.db'));
  if (lock.unclean) await checkAfterCrash(db, log);
  await migrateToLatest(db);
  await keepStatistics(db);
  const sink = config.smtpUrl ? null : await openSink();
  const mailer = openMailer(config.smtpUrl ?? sink?.url ?? '', config.mailFrom);
  const pictures = await openPictures({ folder: config.uploadsFolder, maxBytes: 25_000_000, crashAt: config.crashAt });
  const { payments, standIn } = await openPayments(config, clock);
  const house: House = { config, db, log, clock, mailer, sink, payments, standIn, pictures, demoWords: '' };
  const close = async () => {
    await keepStatistics(db);
    mailer.close();
    await sink?.close();
    await standIn?.close();
    await db.destroy();
    lock.release();
  };
  return { house, close };
}

/** SQLite has replayed its log by now. A file that is damaged all the same must not be written to. */
async function checkAfterCrash(db: Db, log: House['log']): Promise<void> {
  const found = await integrityOf(db);
  const broken = await brokenReferences(db);
  log.warn({ event: 'unclean start', integrity: found, broken: broken.length }, 'the last run did not end by itself');
  if (found === 'ok' && broken.length === 0) return;
  await db.destroy();
  throw new Error('The database is damaged after a crash. Look with `npm run doctor`; README.md says how to restore.');
}
