import { resolve } from 'node:path';
import { backUp, examine, isWhole, reportWords, restore } from './transfer';

const USAGE = 'usage: npm run backup -- NEW_FOLDER | npm run restore -- BACKUP_FOLDER | npm run doctor\n';

/** The commands for whoever runs an installation. They need two folders of the environment, and no secret. */
async function command([task = '', folder = '']: string[]): Promise<number> {
  const folders = {
    dataFolder: resolve(process.env['DATA_FOLDER'] ?? 'data'),
    uploadsFolder: resolve(process.env['UPLOADS_FOLDER'] ?? 'uploads'),
  };
  if (task === 'doctor') {
    const report = await examine(folders);
    process.stdout.write(reportWords(report));
    return isWhole(report) ? 0 : 1;
  }
  if (!folder || (task !== 'backup' && task !== 'restore')) {
    process.stderr.write(USAGE);
    return 2;
  }
  if (task === 'backup') {
    const { pictures, gone } = await backUp(folders, resolve(folder), new Date());
    const words = gone > 0 ? `, ${gone} taken away meanwhile or missing` : '';
    process.stdout.write(`Backed up to ${resolve(folder)}: the database and ${pictures} pictures${words}\n`);
    return 0;
  }
  const { madeAt, pictures } = await restore(folders, resolve(folder));
  process.stdout.write(`Restored the backup of ${madeAt}: the database and ${pictures} pictures.\n`);
  process.stdout.write('Start Kinwater with the same SECRET as before: it opens the keys that sign lineage sheets.\n');
  return 0;
}

command(process.argv.slice(2)).then(
  (code) => process.exit(code),
  (error: unknown) => {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  },
);
