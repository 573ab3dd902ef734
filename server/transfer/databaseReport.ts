import type { IntegrityReport } from '../../shared/transfer/contract';
import { brokenReferences, type Db, integrityOf } from '../db/open';

/** What SQLite itself says of the file. Takes the processor for as long as it runs: the server asks a thread. */
export async function databaseReport(db: Db): Promise<Pick<IntegrityReport, 'database' | 'references'>> {
  return { database: await integrityOf(db), references: await brokenReferences(db) };
}
