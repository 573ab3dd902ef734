import { foldedEmail } from '../../shared/accounts/shapes';
import { notFound, Refusal } from '../../shared/refusal';
import type { Role } from '../../shared/roles';
import { audit } from '../db/audit';
import { touchRooms } from '../db/touchRooms';
import { hashOfToken } from '../mail/tokens';
import type { Asked, SignedIn } from '../scope';

const gone = () => new Refusal('not-found', 'This invitation was used, withdrawn, or is too old. Ask for another one.');

const openOne = ({ db, now }: Asked) =>
  db
    .selectFrom('invitation')
    .innerJoin('room', 'room.id', 'invitation.roomId')
    .innerJoin('account as inviter', 'inviter.id', 'invitation.invitedBy')
    .where('invitation.acceptedAt', 'is', null)
    .where('invitation.withdrawnAt', 'is', null)
    .where('invitation.expiresAt', '>', now)
    .select([
      'invitation.id',
      'invitation.roomId',
      'room.name as roomName',
      'invitation.role',
      'inviter.name as invitedBy',
      'invitation.email',
      'invitation.expiresAt',
    ]);

/** Whoever has the link may read it, and nothing more of the fishroom. Reading changes nothing. */
export async function readByToken(asked: Asked, token: string) {
  const row = await openOne(asked).where('invitation.tokenHash', '=', hashOfToken(token)).executeTakeFirst();
  if (!row) throw gone();
  const account = await asked.db
    .selectFrom('account')
    .where('emailFolded', '=', foldedEmail(row.email))
    .select('id')
    .executeTakeFirst();
  const { roomName, role, invitedBy, email, expiresAt } = row;
  return { roomName, role, invitedBy, email, hasAccount: account !== undefined, expiresAt };
}

export function joinByToken(asked: SignedIn, token: string): Promise<{ roomId: string }> {
  return asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    const row = await openOne(inside).where('invitation.tokenHash', '=', hashOfToken(token)).executeTakeFirst();
    if (!row) throw gone();
    return join(inside, row);
  });
}

/** Only what was sent to the account's own confirmed address. */
async function mine(inside: SignedIn, invitationId: string) {
  const account = await inside.db
    .selectFrom('account')
    .where('id', '=', inside.accountId)
    .select(['emailFolded', 'emailVerifiedAt'])
    .executeTakeFirstOrThrow();
  const row = await openOne(inside).where('invitation.id', '=', invitationId).executeTakeFirst();
  if (!row || !account.emailVerifiedAt || row.email !== account.emailFolded) throw notFound('That invitation');
  return row;
}

export function acceptMine(asked: SignedIn, invitationId: string): Promise<{ roomId: string }> {
  return asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    return join(inside, await mine(inside, invitationId));
  });
}

export function declineMine(asked: SignedIn, invitationId: string): Promise<void> {
  return asked.db.transaction().execute(async (db) => {
    const { id, roomId } = await mine({ ...asked, db }, invitationId);
    await db
      .updateTable('invitation')
      .set({ withdrawnAt: asked.now })
      .where('roomId', '=', roomId)
      .where('id', '=', id)
      .execute();
    await touchRooms(db, [roomId]);
    await audit({ ...asked, db }, { action: 'invitation declined', about: 'member', aboutId: id, roomId });
  });
}

/** Uses the invitation up. A member already in the fishroom keeps the role they have. */
async function join(inside: SignedIn, { id, roomId, role }: { id: string; roomId: string; role: Role }) {
  const { db, now, accountId } = inside;
  await db
    .updateTable('invitation')
    .set({ acceptedAt: now })
    .where('roomId', '=', roomId)
    .where('id', '=', id)
    .execute();
  await db
    .insertInto('member')
    .values({ roomId, accountId, role, joinedAt: now })
    .onConflict((clash) => clash.doNothing())
    .execute();
  await touchRooms(db, [roomId]);
  await audit(inside, {
    action: 'joined',
    about: 'member',
    aboutId: accountId,
    roomId,
    change: { role: [null, role] },
  });
  return { roomId };
}
