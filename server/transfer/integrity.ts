import type { IntegrityReport } from '../../shared/transfer/contract';
import { batchesBelowZero } from '../broods';
import type { Db } from '../db/open';
import type { PictureReport } from '../pictures';

/** Pictures against rows, hashes against files, and the head counts. `look` reads the pictures' folder. */
export async function contentReport(
  db: Db,
  look: (rows: { roomId: string; id: string; sha256: string }[]) => Promise<PictureReport>,
  roomId?: string,
): Promise<Omit<IntegrityReport, 'database' | 'references'>> {
  let photos = db.selectFrom('photo').select(['roomId', 'id', 'sha256']);
  if (roomId) photos = photos.where('roomId', '=', roomId);
  const report = await look(await photos.execute());
  const ids = (keys: { id: string }[]) => keys.map(({ id }) => id);
  return {
    pictures: report.checked,
    missing: ids(report.missing),
    damaged: ids(report.damaged),
    unclaimed: ids(report.unclaimed),
    belowZero: await batchesBelowZero(db, roomId),
  };
}

export const isWhole = (report: IntegrityReport): boolean =>
  report.database === 'ok' &&
  [report.references, report.missing, report.damaged, report.unclaimed, report.belowZero].every(
    (list) => list.length === 0,
  );
