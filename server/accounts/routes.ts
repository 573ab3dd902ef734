import { changeAccount, getMe, signIn, signOut, signUp } from '../../shared/accounts/contract';
import { passSecondStep } from '../../shared/accounts/security';
import { foldedEmail } from '../../shared/accounts/shapes';
import { DONE } from '../../shared/endpoint';
import type { Serve } from '../http/serve';
import { endSession } from '../http/session';
import { changeMe, makeAccount, meOf } from './accounts';
import type { Limits } from './limits';
import { passStep } from './passStep';
import { accountByPassword, openSession } from './signIn';

/** The account itself, and signing in and out. */
export function accountRoutes(serve: Serve, limits: Limits): void {
  serve.open(signUp, async (asked, { body }, raw) => {
    await limits.signUpFromAddress(raw);
    const id = await makeAccount(asked, body);
    await openSession(asked, raw, { id, totpEnabledAt: null }, 'signUp');
    return DONE;
  });
  serve.open(signIn, async (asked, { body }, raw) => {
    await limits.wrongFromAddress(raw);
    await limits.wrongForAccount(raw, foldedEmail(body.email));
    const account = await accountByPassword(asked, body);
    return { ...DONE, secondStep: await openSession(asked, raw, account, 'password') };
  });
  serve.open(passSecondStep, async (asked, { body }, raw) => {
    await passStep(asked, body.code, raw, limits);
    return DONE;
  });
  serve.open(signOut, async (asked, _input, { req, res }) => {
    await endSession(asked, req, res);
    // What was fetched for this person must not be there for the next one at this device.
    res.setHeader('Clear-Site-Data', '"cache", "storage"');
    return DONE;
  });
  serve.signedIn(getMe, (asked) => meOf(asked));
  serve.signedIn(changeAccount, async (asked, { body }) => {
    await changeMe(asked, body);
    return DONE;
  });
}
