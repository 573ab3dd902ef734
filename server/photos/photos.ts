import type * as z from 'zod/mini';
import { fieldsOf } from '../../shared/fieldsOf';
import type { addPhoto, Photo } from '../../shared/photos/contract';
import { EntryDraft } from '../../shared/record/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { inTransaction, type Raw } from '../http/serve';
import { mustFitQuota } from '../pictures';
import { keepEntry, lineOf } from '../record';
import type { Scope } from '../scope';

type Wanted = { ids?: string[]; thing?: Photo['of']['thing'] | undefined; thingId?: string | undefined };

/** Newest first. Of a brood: its own, its batches' and its hold's as well. */
export async function photoRows(scope: Scope, { ids, thing, thingId }: Wanted): Promise<Photo[]> {
  const { db, roomId } = scope;
  let query = db
    .selectFrom('photo')
    .innerJoin('account', 'account.id', 'photo.actorId')
    .leftJoin('fish', (join) => join.onRef('fish.roomId', '=', 'photo.roomId').onRef('fish.id', '=', 'photo.fishId'))
    .leftJoin('brood', (join) =>
      join.onRef('brood.roomId', '=', 'photo.roomId').onRef('brood.id', '=', 'photo.broodId'),
    )
    .leftJoin('colony', (join) =>
      join.onRef('colony.roomId', '=', 'photo.roomId').onRef('colony.id', '=', 'photo.colonyId'),
    )
    .leftJoin('tank', (join) => join.onRef('tank.roomId', '=', 'photo.roomId').onRef('tank.id', '=', 'photo.tankId'))
    .where('photo.roomId', '=', roomId)
    .select([
      'photo.id',
      'photo.takenOn',
      'photo.takenAt',
      'photo.caption',
      'photo.width',
      'photo.height',
      'photo.entryId',
      'account.name as by',
      'photo.fishId',
      'photo.broodId',
      'photo.batchId',
      'photo.colonyId',
      'photo.holdId',
      'photo.tankId',
      'fish.code as fishCode',
      'brood.code as broodCode',
      'colony.code as colonyCode',
      'tank.code as tankCode',
    ]);
  if (ids) query = query.where('photo.id', 'in', ids);
  if (thing && thingId && thing !== 'brood') query = query.where(`photo.${thing}Id`, '=', thingId);
  if (thing === 'brood' && thingId) {
    query = query.where(({ or, eb, selectFrom }) =>
      or([
        eb('photo.broodId', '=', thingId),
        eb(
          'photo.batchId',
          'in',
          selectFrom('batchSource')
            .where('batchSource.roomId', '=', roomId)
            .where('batchSource.broodId', '=', thingId)
            .select('batchSource.batchId'),
        ),
        eb(
          'photo.holdId',
          'in',
          selectFrom('brood as of')
            .where('of.roomId', '=', roomId)
            .where('of.id', '=', thingId)
            .where('of.holdId', 'is not', null)
            .select('of.holdId'),
        ),
      ]),
    );
  }
  const rows = await query.orderBy('photo.takenOn', 'desc').orderBy('photo.id', 'desc').execute();
  return rows.map((row) => {
    const { id, takenOn, takenAt, caption, width, height, by, entryId } = row;
    const code = row.fishCode ?? row.broodCode ?? row.colonyCode ?? row.tankCode;
    return { id, of: { ...subjectOf(row), code }, takenOn, takenAt, caption, width, height, by, entryId };
  });
}

type Subjects = {
  fishId: string | null;
  broodId: string | null;
  batchId: string | null;
  colonyId: string | null;
  holdId: string | null;
  tankId: string | null;
};

function subjectOf({ fishId, broodId, batchId, colonyId, holdId, tankId }: Subjects): {
  thing: Photo['of']['thing'];
  id: string;
} {
  if (fishId) return { thing: 'fish', id: fishId };
  if (broodId) return { thing: 'brood', id: broodId };
  if (batchId) return { thing: 'batch', id: batchId };
  if (colonyId) return { thing: 'colony', id: colonyId };
  if (holdId) return { thing: 'hold', id: holdId };
  return { thing: 'tank', id: tankId ?? '' };
}

/** Takes in a picture and its entry: the files first, then entry and row in one transaction; a refusal takes the files away. */
export function takePhoto(scope: Scope, { req, res }: Raw): Promise<z.input<typeof addPhoto.output>> {
  const { pictures, config } = scope.house;
  return pictures.receive(req, res, async ({ file, fields }) => {
    const draft = draftIn(fields['entry']);
    const { content } = draft;
    if (content.kind !== 'photoTaken')
      throw new Refusal('invalid', 'A picture comes with a photo’s entry', { entry: 'Send a photo’s entry' });
    const stored = await pictures.store(file, scope.roomId, content.photoId);
    try {
      await inTransaction(scope, async (inside) => {
        const { isNew } = await keepEntry(inside, draft, { picture: stored });
        // The new row counts already: one transaction at a time makes the sum exact.
        if (isNew) mustFitQuota({ used: await bytesOf(inside), added: 0, quota: config.roomQuotaBytes });
      });
    } catch (error) {
      await stored.discard();
      throw error;
    }
    await stored.keep();
    const [photo] = await photoRows(scope, { ids: [content.photoId] });
    if (!photo) throw notFound('That photo');
    return { line: await lineOf(scope, draft.id), photo };
  });
}

function draftIn(text: string | undefined): EntryDraft {
  let json: unknown;
  try {
    json = JSON.parse(text ?? '');
  } catch {
    throw new Refusal('invalid', 'The photo’s entry could not be read', { entry: 'Send it as JSON' });
  }
  const draft = EntryDraft.safeParse(json);
  if (!draft.success) throw new Refusal('invalid', 'Some of that needs another look', fieldsOf(draft.error));
  return draft.data;
}

export async function bytesOf({ db, roomId }: Scope): Promise<number> {
  const row = await db
    .selectFrom('photo')
    .where('roomId', '=', roomId)
    .select(({ fn }) => fn.sum<number>('bytes').as('bytes'))
    .executeTakeFirst();
  return Number(row?.bytes ?? 0);
}

export async function showOne(
  scope: Scope,
  { photoId, size }: { photoId: string; size: 'small' | 'large' },
  { res }: Raw,
): Promise<null> {
  const photo = await scope.db
    .selectFrom('photo')
    .where('roomId', '=', scope.roomId)
    .where('id', '=', photoId)
    .select('takenOn')
    .executeTakeFirst();
  if (!photo) throw notFound('That photo');
  await scope.house.pictures.send(res, {
    roomId: scope.roomId,
    id: photoId,
    size,
    name: `photo-${photo.takenOn}`,
  });
  return null;
}

/** The row first, then the files: a crash between leaves files that the next start sweeps, never a row without a file. */
export async function removeOne(scope: Scope, photoId: string): Promise<{ ok: true }> {
  await inTransaction(scope, async (inside) => {
    const gone = await inside.db
      .deleteFrom('photo')
      .where('roomId', '=', scope.roomId)
      .where('id', '=', photoId)
      .executeTakeFirst();
    if (gone.numDeletedRows === 0n) throw notFound('That photo');
    await audit(inside, { action: 'photo removed', about: 'photo', aboutId: photoId });
  });
  await scope.house.pictures.remove(scope.roomId, photoId);
  return { ok: true };
}
