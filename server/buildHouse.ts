import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import pino from 'pino';
import type { Config } from './config';
import { takeLock } from './db/lock';
import { keepStatistics, migrateToLatest, openFile } from './db/open';
import type { House } from './house';
import { openMailer } from './mail';
import { openSink } from './mail/sink';
import { openPayments } from './payments';
import { openPictures } from './pictures';

/** Opens everything the server is made of, and says how to close it again. */
export async function buildHouse(config: Config, clock: House['clock'] = { now: () => new Date() }) {
  mkdirSync(config.dataFolder, { recursive: true });
  mkdirSync(config.uploadsFolder, { recursive: true });
  const unlock = takeLock(config.dataFolder);
  const log = pino({ level: config.logLevel, base: null, timestamp: pino.stdTimeFunctions.isoTime });
  const db = openFile(join(config.dataFolder, 'kinwater.db'));
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
    unlock();
  };
  return { house, close };
}
