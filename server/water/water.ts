import type { Care, WaterReading } from '../../shared/water/contract';
import type { Scope } from '../scope';

type Which = { tankId?: string | undefined; since?: string | undefined };

/** Newest first. */
export async function readingRows({ db, roomId }: Scope, { tankId, since }: Which): Promise<WaterReading[]> {
  let query = db
    .selectFrom('waterReading')
    .innerJoin('account', 'account.id', 'waterReading.actorId')
    .where('waterReading.roomId', '=', roomId)
    .select([
      'waterReading.id',
      'tankId',
      'onDay',
      'at',
      'source',
      'celsius',
      'ph',
      'ghCaCo3MgL',
      'khCaCo3MgL',
      'totalAmmoniaNMgL',
      'nitriteNMgL',
      'nitrateNMgL',
      'conductivityUs',
      'asRead',
      'note',
      'account.name as by',
      'entryId',
    ]);
  if (tankId) query = query.where('tankId', '=', tankId);
  if (since) query = query.where('onDay', '>=', since);
  const rows = await query.orderBy('onDay', 'desc').orderBy('at', 'desc').orderBy('waterReading.id', 'desc').execute();
  return rows.map((row) => ({ ...row, asRead: row.asRead ? JSON.parse(row.asRead) : null }));
}

export async function careRows({ db, roomId }: Scope, { tankId, since }: Which): Promise<Care[]> {
  let query = db
    .selectFrom('tankCare')
    .innerJoin('account', 'account.id', 'tankCare.actorId')
    .where('tankCare.roomId', '=', roomId)
    .select([
      'tankCare.id',
      'tankId',
      'kind',
      'onDay',
      'at',
      'untilDay',
      'percent',
      'what',
      'why',
      'dose',
      'note',
      'account.name as by',
      'entryId',
      'endEntryId',
    ]);
  if (tankId) query = query.where('tankId', '=', tankId);
  // What still runs is wanted however long ago it began.
  if (since)
    query = query.where(({ or, eb }) =>
      or([eb('onDay', '>=', since), eb('untilDay', 'is', null), eb('untilDay', '>=', since)]),
    );
  const rows = await query.orderBy('onDay', 'desc').orderBy('tankCare.id', 'desc').execute();
  return rows.map(({ endEntryId, ...row }) => ({ ...row, ended: endEntryId !== null }));
}
