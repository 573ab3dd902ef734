import type * as z from 'zod/mini';
import type { SignIn } from '../../shared/accounts/contract';
import { foldedEmail } from '../../shared/accounts/shapes';
import { Refusal } from '../../shared/refusal';
import type { Raw } from '../http/serve';
import { endSession, startSession } from '../http/session';
import type { Asked } from '../scope';
import { isPassword } from './passwords';

type Account = { id: string; totpEnabledAt: string | null };

/** One sentence for every way to fail: which part was wrong, and whether there is an account, stays unsaid. */
const wrong = () => new Refusal('signed-out', 'That address and password do not go together');

/** Whose password it is; as slow, and in the same words, for an address that nobody has. */
export async function accountByPassword(asked: Asked, { email, password }: z.output<typeof SignIn>): Promise<Account> {
  const account = await asked.db
    .selectFrom('account')
    .where('emailFolded', '=', foldedEmail(email))
    .select(['id', 'passwordHash', 'disabledAt', 'totpEnabledAt'])
    .executeTakeFirst();
  const right = await isPassword(password, account?.passwordHash ?? null, asked.house.config.passwordCost);
  if (account && right && !account.disabledAt) return account;
  logSignIn(asked, 'refused', account?.id, 'password');
  throw wrong();
}

/** Starts a session in place of the one that the browser had, if any: a cookie planted before is worth nothing after. */
export async function openSession(asked: Asked, { req, res }: Raw, account: Account, how: string): Promise<boolean> {
  await endSession(asked, req, res);
  res.removeHeader('Set-Cookie');
  const secondStep = account.totpEnabledAt !== null;
  await startSession(asked, res, { id: account.id, secondStep: secondStep ? 'waiting' : 'notNeeded' });
  logSignIn(asked, secondStep ? 'waiting' : 'ok', account.id, how);
  return secondStep;
}

export function logSignIn(
  asked: Asked,
  outcome: 'ok' | 'refused' | 'waiting',
  accountId: string | undefined,
  how: string,
) {
  const line = { event: 'signIn', outcome, how, accountId: accountId ?? null, address: asked.address };
  if (outcome === 'refused') asked.log.warn(line, 'sign-in refused');
  else asked.log.info(line, 'sign-in');
}
