import { Refusal } from '../../shared/refusal';
import type { Raw } from '../http/serve';
import { waitingSession } from '../http/session';
import type { Asked } from '../scope';
import type { Limits } from './limits';
import { mustBeCode } from './secondStep';
import { logSignIn, openSession } from './signIn';

/** How long a right password waits for its code. */
const WAITS_MS = 10 * 60_000;

/** The second step of a sign-in: the waiting session gives way to a full one, with an id of its own. */
export async function passStep(asked: Asked, code: string, raw: Raw, limits: Limits): Promise<void> {
  const waiting = await waitingSession(asked, raw.req);
  if (!waiting) throw new Refusal('signed-out', 'Sign in first');
  const { accountId, sessionId } = waiting;
  const { createdAt } = await asked.db
    .selectFrom('session')
    .where('id', '=', sessionId)
    .select('createdAt')
    .executeTakeFirstOrThrow();
  if (Date.parse(createdAt) + WAITS_MS < Date.parse(asked.now))
    throw new Refusal('signed-out', 'That took too long. Sign in again.');
  await limits.wrongCode(raw, accountId);
  try {
    await asked.db.transaction().execute((db) => mustBeCode({ ...asked, db }, accountId, code));
  } catch (error) {
    if (!(error instanceof Refusal)) throw error;
    logSignIn(asked, 'refused', accountId, 'code');
    throw new Refusal('signed-out', error.message, error.fields);
  }
  await openSession(asked, raw, { id: accountId, totpEnabledAt: null }, 'code');
}
