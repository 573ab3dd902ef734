import type * as z from 'zod/mini';
import type { ResetPassword } from '../../shared/accounts/links';
import { foldedEmail } from '../../shared/accounts/shapes';
import { Refusal } from '../../shared/refusal';
import { isUniqueViolation } from '../db/constraint';
import { deadLink, newMailToken, spendMailToken } from '../mail/tokens';
import type { Asked, SignedIn } from '../scope';
import { accountOf } from './accounts';
import { mustBeUncommon } from './commonPasswords';
import { GOOD_FOR, sendNotice, sendResetLetter, sendSignInLetter, sendVerifyLetter } from './letters';
import { hashPassword } from './passwords';

const PERSON = ['id', 'email', 'emailFolded', 'name', 'emailVerifiedAt', 'disabledAt'] as const;

/**
 * Writes the letter that was asked for, in a transaction that does as much for an address nobody has: a dead row is written in
 * place of the live one, so that neither the answer nor its time tells who has an account.
 */
export async function askForLetter(asked: Asked, email: string, purpose: 'signIn' | 'reset'): Promise<void> {
  const emailFolded = foldedEmail(email);
  await asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    const person = await db
      .selectFrom('account')
      .where('emailFolded', '=', emailFolded)
      .select(PERSON)
      .executeTakeFirst();
    if (!person || person.disabledAt) {
      await newMailToken(inside, { purpose, email: emailFolded, accountId: null, minutes: GOOD_FOR[purpose] });
      return;
    }
    // Who reads the post of an unconfirmed address may not be who chose the password: they choose their own.
    if (purpose === 'signIn' && person.emailVerifiedAt) await sendSignInLetter(inside, person);
    else await sendResetLetter(inside, person);
  });
  asked.log.info({ event: 'letterAsked', purpose, address: asked.address }, 'letter asked for');
}

export async function askToVerify(asked: SignedIn): Promise<void> {
  const person = await accountOf(asked);
  if (person.emailVerifiedAt) throw new Refusal('conflict', 'This address is confirmed already');
  await asked.db.transaction().execute((db) => sendVerifyLetter({ ...asked, db }, person));
}

/** Confirms the address of a new account, or moves an account to its new one. Answers the address. */
export async function confirmAddress(asked: Asked, token: string): Promise<string> {
  return asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    const change = await spendMailToken(inside, ['verify', 'changeEmail'], token);
    const person = await livingPerson(inside, change.accountId);
    if (change.purpose === 'changeEmail') return moveTo(inside, person, newAddressOf(change.payload));
    // The letter proves the address it went to, which the account may have left since.
    if (change.email !== person.emailFolded) throw deadLink();
    await db.updateTable('account').set({ emailVerifiedAt: asked.now }).where('id', '=', person.id).execute();
    return person.email;
  });
}

const newAddressOf = (payload: string | null): string => String(JSON.parse(payload ?? '{}')['email'] ?? '');

async function moveTo(inside: Asked, person: Awaited<ReturnType<typeof livingPerson>>, email: string): Promise<string> {
  try {
    await inside.db
      .updateTable('account')
      .set(({ eb }) => ({
        email,
        emailFolded: foldedEmail(email),
        emailVerifiedAt: inside.now,
        version: eb('version', '+', 1),
      }))
      .where('id', '=', person.id)
      .execute();
  } catch (error) {
    if (!isUniqueViolation(error, 'account.emailFolded')) throw error;
    throw new Refusal('conflict', 'Another account has this address by now');
  }
  await sendNotice(inside, person, 'Your address was changed', [
    `${person.name} signs in to Kinwater with another address from now on: ${email}.`,
    'If that was not you, someone else can use your account. Answer this letter.',
  ]);
  return email;
}

async function livingPerson({ db }: Asked, accountId: string | null) {
  const person = await db
    .selectFrom('account')
    .where('id', '=', accountId ?? '')
    .select([...PERSON, 'totpEnabledAt'])
    .executeTakeFirst();
  if (!person || person.disabledAt) throw deadLink();
  return person;
}

export function accountByLink(asked: Asked, token: string) {
  return asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    const { accountId } = await spendMailToken(inside, ['signIn'], token);
    return livingPerson(inside, accountId);
  });
}

/** The new password, the address confirmed, every session ended. The hash is made before the link is spent: it may be refused. */
export async function setPasswordByLink(asked: Asked, { token, password }: z.output<typeof ResetPassword>) {
  const passwordHash = await hashPassword(password, asked.house.config.passwordCost);
  const accountId = await asked.db.transaction().execute(async (db) => {
    const inside = { ...asked, db };
    const link = await spendMailToken(inside, ['reset'], token);
    const person = await livingPerson(inside, link.accountId);
    mustBeUncommon(password, person);
    await db
      .updateTable('account')
      .set(({ eb }) => ({
        passwordHash,
        emailVerifiedAt: eb.fn.coalesce('emailVerifiedAt', eb.val(asked.now)),
        version: eb('version', '+', 1),
      }))
      .where('id', '=', person.id)
      .execute();
    await endSessionsOf(inside, person.id);
    await sendNotice(inside, person, 'Your password was changed', [
      `A new password was chosen for ${person.name}, and every device was signed out.`,
      'If that was not you, ask for a new password at once: the link goes to this address only.',
    ]);
    return person.id;
  });
  asked.log.info({ event: 'passwordReset', outcome: 'ok', accountId, address: asked.address }, 'password set by link');
}

/** Ends the sessions of an account; all, or all but one. */
export async function endSessionsOf({ db, now }: Pick<Asked, 'db' | 'now'>, accountId: string, but?: string) {
  let query = db
    .updateTable('session')
    .set({ endedAt: now })
    .where('accountId', '=', accountId)
    .where('endedAt', 'is', null);
  if (but) query = query.where('id', '!=', but);
  await query.execute();
}
