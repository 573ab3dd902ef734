import { sql } from 'kysely';
import { PublicPage } from '../../shared/buyers/offers';
import { Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import type { RoomAsked, Scope } from '../scope';

type InRoom = Pick<RoomAsked, 'db' | 'roomId'>;

const NOTHING_SAID: PublicPage = { words: null, contact: null, photoId: null };

/** What the owner says on the public page besides the fish. */
export async function pageOf({ db, roomId }: InRoom): Promise<PublicPage> {
  const { settings } = await db
    .selectFrom('room')
    .where('id', '=', roomId)
    .select('settings')
    .executeTakeFirstOrThrow();
  const known = PublicPage.safeParse(JSON.parse(settings)['availability']);
  return known.success ? known.data : NOTHING_SAID;
}

export async function setPage(scope: Scope, page: PublicPage): Promise<PublicPage> {
  const { db, roomId } = scope;
  if (page.photoId) await mustBePhoto(scope, page.photoId);
  await db
    .updateTable('room')
    .set({ settings: sql<string>`json_set(settings, '$.availability', json(${JSON.stringify(page)}))` })
    .where('id', '=', roomId)
    .execute();
  await audit(scope, { action: 'availability page changed', about: 'fishroom', aboutId: roomId });
  return page;
}

export async function mustBePhoto({ db, roomId }: InRoom, photoId: string): Promise<void> {
  const photo = await db
    .selectFrom('photo')
    .where('roomId', '=', roomId)
    .where('id', '=', photoId)
    .select('id')
    .executeTakeFirst();
  if (!photo) throw new Refusal('invalid', 'That photo was not found', { photoId: 'Choose another photo' });
}
