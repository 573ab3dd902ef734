import { existsSync } from 'node:fs';
import { join } from 'node:path';
import type { IntegrityReport } from '../../shared/transfer/contract';
import { openForReading } from '../db/open';
import { pictureReport } from '../pictures';
import { DATABASE } from './backup';
import { databaseReport } from './databaseReport';
import { contentReport } from './integrity';

/** The report on a whole installation, running or not. Reads only. */
export async function examine(folders: { dataFolder: string; uploadsFolder: string }): Promise<IntegrityReport> {
  const file = join(folders.dataFolder, DATABASE);
  if (!existsSync(file)) throw new Error(`There is no database in ${folders.dataFolder}. Set DATA_FOLDER.`);
  const db = openForReading(file);
  try {
    const database = await databaseReport(db);
    return { ...database, ...(await contentReport(db, (rows) => pictureReport(folders.uploadsFolder, rows))) };
  } finally {
    await db.destroy();
  }
}

/** One line for everything that was looked at. */
export function reportWords(report: IntegrityReport): string {
  const lines = [
    `database: ${report.database}`,
    `rows that refer to nothing: ${report.references.map((one) => `${one.count} ${one.table} → ${one.to}`).join(', ') || 'none'}`,
    `pictures compared: ${report.pictures}`,
    `  without their files: ${report.missing.join(', ') || 'none'}`,
    `  not as they were stored: ${report.damaged.join(', ') || 'none'}`,
    `files without a row (swept at the next start): ${report.unclaimed.join(', ') || 'none'}`,
    `batches below zero: ${report.belowZero.join(', ') || 'none'}`,
  ];
  return `${lines.join('\n')}\n`;
}
