import { parentPort, Worker } from 'node:worker_threads';
import * as z from 'zod/mini';
import { IntegrityReport } from '../../shared/transfer/contract';
import { openForReading } from '../db/open';
import { databaseReport } from './databaseReport';

const Found = z.pick(IntegrityReport, { database: true, references: true });

/** SQLite's own check in a thread of its own, so that the server goes on answering. */
export function checkFile(file: string): Promise<z.output<typeof Found>> {
  const thread = new Worker(new URL('./fileCheckThread.mjs', import.meta.url), { workerData: file });
  return new Promise((done, failed) => {
    thread.once('message', (found: unknown) => done(Found.parse(found)));
    thread.once('error', failed);
    thread.once('exit', () => failed(new Error('The check ended without a word')));
  });
}

/** What the thread does. */
export async function checkInThread(file: string): Promise<void> {
  const db = openForReading(file);
  const found = await databaseReport(db);
  await db.destroy();
  parentPort?.postMessage(found);
}
