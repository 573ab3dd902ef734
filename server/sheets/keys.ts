import { createHash } from 'node:crypto';
import { type KeySet, PublicJwk, type Recalled } from '../../shared/sheets/sheetFile';
import { audit } from '../db/audit';
import type { Asked, Scope } from '../scope';
import { keySet, newSheetKey, openSheetKey, type SheetKey } from './signing';

type Room = Pick<Asked, 'db' | 'house' | 'now'> & { roomId: string };

/** The key that signs now; made at the first need. Making a key takes a moment, so it is done before a transaction. */
export async function currentKeyId(scope: Room): Promise<string> {
  const known = await scope.db
    .selectFrom('roomKey')
    .where('roomId', '=', scope.roomId)
    .where('retiredAt', 'is', null)
    .where('sealedPrivateJwk', 'is not', null)
    .select('id')
    .orderBy('createdAt', 'desc')
    .executeTakeFirst();
  return known?.id ?? (await makeKey(scope));
}

async function makeKey({ db, house, now, roomId }: Room): Promise<string> {
  const { keyId, publicJwk, sealedPrivateJwk } = await newSheetKey(house.config.secret);
  await db
    .insertInto('roomKey')
    .values({
      roomId,
      id: keyId,
      publicJwk: JSON.stringify(publicJwk),
      sealedPrivateJwk,
      createdAt: now,
      retiredAt: null,
    })
    .execute();
  return keyId;
}

export async function openKey({ db, house, roomId }: Room, keyId: string): Promise<SheetKey> {
  const row = await db
    .selectFrom('roomKey')
    .where('roomId', '=', roomId)
    .where('id', '=', keyId)
    .select('sealedPrivateJwk')
    .executeTakeFirstOrThrow();
  const secrets = [house.config.secret, ...(house.config.previousSecret ? [house.config.previousSecret] : [])];
  return openSheetKey(row.sealedPrivateJwk ?? '', secrets);
}

export async function rotate(scope: Scope): Promise<string> {
  await scope.db
    .updateTable('roomKey')
    .set({ retiredAt: scope.now })
    .where('roomId', '=', scope.roomId)
    .where('retiredAt', 'is', null)
    .execute();
  const id = await makeKey(scope);
  await audit(scope, { action: 'key changed', about: 'fishroom', aboutId: scope.roomId });
  return id;
}

/** Every key the fishroom ever had, retired ones too: old sheets stay checkable. */
async function publicKeys({ db, roomId }: Pick<Room, 'db' | 'roomId'>): Promise<PublicJwk[]> {
  const rows = await db
    .selectFrom('roomKey')
    .where('roomId', '=', roomId)
    .select('publicJwk')
    .orderBy('createdAt')
    .execute();
  return rows.map(({ publicJwk }) => PublicJwk.parse(JSON.parse(publicJwk)));
}

/** Which sheets no longer count, by digest: published with the keys, so that a file is not taken for valid elsewhere. */
async function recalledSheets({ db, roomId }: Pick<Room, 'db' | 'roomId'>): Promise<Recalled[]> {
  const rows = await db
    .selectFrom('sheet')
    .where('roomId', '=', roomId)
    .where(({ eb, or }) => or([eb('withdrawnAt', 'is not', null), eb('replacedAt', 'is not', null)]))
    .select(['jws', 'withdrawnAt', 'replacedAt'])
    .orderBy('number')
    .execute();
  return rows.map(({ jws, withdrawnAt, replacedAt }) => ({
    sheet: createHash('sha256').update(jws).digest('base64url'),
    state: withdrawnAt ? 'withdrawn' : 'replaced',
    on: (withdrawnAt ?? replacedAt ?? '').slice(0, 10),
  }));
}

/** All that the fishroom publishes for whoever checks its sheets. */
export async function publishedKeys(room: Pick<Room, 'db' | 'roomId'>): Promise<KeySet> {
  return { ...keySet(await publicKeys(room)), recalled: await recalledSheets(room) };
}
