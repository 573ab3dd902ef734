import { PublicJwk } from '../../shared/sheets/sheetFile';
import { audit } from '../db/audit';
import type { Asked, Scope } from '../scope';
import { newSheetKey, openSheetKey, type SheetKey } from './signing';

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
export async function publicKeys({ db, roomId }: Pick<Room, 'db' | 'roomId'>): Promise<PublicJwk[]> {
  const rows = await db
    .selectFrom('roomKey')
    .where('roomId', '=', roomId)
    .select('publicJwk')
    .orderBy('createdAt')
    .execute();
  return rows.map(({ publicJwk }) => PublicJwk.parse(JSON.parse(publicJwk)));
}

/** Where the fishroom's keys are published. */
export const keysAddress = (origin: string, roomId: string): string => `${origin}/keys/${roomId}.json`;
