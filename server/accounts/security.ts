import type * as z from 'zod/mini';
import type { ChangeEmail, ChangePassword, SessionLine } from '../../shared/accounts/security';
import { foldedEmail } from '../../shared/accounts/shapes';
import { notFound, Refusal } from '../../shared/refusal';
import { IDLE_MS } from '../http/session';
import type { SignedIn } from '../scope';
import { accountOf } from './accounts';
import { mustBeUncommon } from './commonPasswords';
import { deviceName } from './deviceName';
import { sendChangeEmailLetter, sendNotice } from './letters';
import { endSessionsOf } from './links';
import { hashPassword, isPassword } from './passwords';

/** Whoever is signed in proves again that they know the password, where the account has one. */
export async function mustKnowPassword(asked: SignedIn, current: string | null): Promise<void> {
  const { passwordHash } = await accountOf(asked);
  if (passwordHash === null) return;
  const right = await isPassword(current ?? '', passwordHash, asked.house.config.passwordCost);
  if (right) return;
  asked.log.warn({ event: 'passwordCheck', outcome: 'refused', accountId: asked.accountId }, 'wrong current password');
  throw new Refusal('forbidden', 'That is not your password', { current: 'That is not your password' });
}

export async function setPassword(asked: SignedIn, { current, password }: z.output<typeof ChangePassword>) {
  await mustKnowPassword(asked, current);
  const person = await accountOf(asked);
  mustBeUncommon(password, person);
  const passwordHash = await hashPassword(password, asked.house.config.passwordCost);
  await asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    await db
      .updateTable('account')
      .set(({ eb }) => ({ passwordHash, version: eb('version', '+', 1) }))
      .where('id', '=', person.id)
      .execute();
    await endSessionsOf(inside, person.id, asked.sessionId);
    await sendNotice(inside, person, 'Your password was changed', [
      `${person.name} has a new password. Every other device was signed out.`,
      'If that was not you, ask for a new password at once: the link goes to this address only.',
    ]);
  });
  asked.log.info({ event: 'passwordChanged', outcome: 'ok', accountId: person.id }, 'password changed');
}

export async function askToChangeEmail(asked: SignedIn, { current, email }: z.output<typeof ChangeEmail>) {
  await mustKnowPassword(asked, current);
  const person = await accountOf(asked);
  const folded = foldedEmail(email);
  if (folded === person.emailFolded)
    throw new Refusal('invalid', 'That is your address already', { email: 'That is your address already' });
  await asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    // Whether somebody else has it is found out when the link is used, by whoever reads its post.
    await sendChangeEmailLetter(inside, person, email, folded);
    await sendNotice(inside, person, 'A new address was asked for', [
      `${person.name} wants to sign in to Kinwater with another address. It changes when the letter sent there is answered.`,
      'If that was not you, change your password at once.',
    ]);
  });
}

/** Where the account is signed in now, the latest first. */
export async function sessionsOf({ db, accountId, sessionId, now }: SignedIn): Promise<SessionLine[]> {
  const rows = await db
    .selectFrom('session')
    .where('accountId', '=', accountId)
    .where('endedAt', 'is', null)
    .where('expiresAt', '>', now)
    .where('lastSeenAt', '>', new Date(Date.parse(now) - IDLE_MS).toISOString())
    .where('secondStep', '!=', 'waiting')
    .select(['id', 'device', 'address', 'createdAt', 'lastSeenAt'])
    .orderBy('lastSeenAt', 'desc')
    .orderBy('id', 'desc')
    .execute();
  return rows.map((row) => ({ ...row, device: deviceName(row.device), current: row.id === sessionId }));
}

export async function endOne({ db, accountId, now }: SignedIn, sessionId: string): Promise<void> {
  const ended = await db
    .updateTable('session')
    .set({ endedAt: now })
    .where('id', '=', sessionId)
    .where('accountId', '=', accountId)
    .where('endedAt', 'is', null)
    .returning('id')
    .executeTakeFirst();
  if (!ended) throw notFound('That sign-in');
}
