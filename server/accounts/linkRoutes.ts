import {
  askPasswordReset,
  askSignInLink,
  askVerifyLetter,
  resetPassword,
  signInByLink,
  verifyEmail,
} from '../../shared/accounts/links';
import { foldedEmail } from '../../shared/accounts/shapes';
import { DONE } from '../../shared/endpoint';
import type { Raw, Serve } from '../http/serve';
import type { Limits } from './limits';
import { accountByLink, askForLetter, askToVerify, confirmAddress, setPasswordByLink } from './links';
import { openSession } from './signIn';

/** Letters with one-time links, and what their links do. */
export function linkRoutes(serve: Serve, limits: Limits): void {
  /** Taken, not done: 202 whether or not there is such an account. */
  const letterLimits = async (raw: Raw, email: string) => {
    await limits.lettersFromAddress(raw);
    await limits.lettersToAddress(raw, foldedEmail(email));
    raw.res.status(202);
  };
  serve.open(askSignInLink, async (asked, { body }, raw) => {
    await letterLimits(raw, body.email);
    await askForLetter(asked, body.email, 'signIn');
    return DONE;
  });
  serve.open(askPasswordReset, async (asked, { body }, raw) => {
    await letterLimits(raw, body.email);
    await askForLetter(asked, body.email, 'reset');
    return DONE;
  });
  serve.signedIn(askVerifyLetter, async (asked, _input, raw) => {
    await limits.lettersToAddress(raw, asked.accountId);
    await askToVerify(asked);
    return DONE;
  });
  serve.open(verifyEmail, async (asked, { body }, raw) => {
    await limits.linksFromAddress(raw);
    return { ...DONE, email: await confirmAddress(asked, body.token) };
  });
  serve.open(signInByLink, async (asked, { body }, raw) => {
    await limits.linksFromAddress(raw);
    const account = await accountByLink(asked, body.token);
    return { ...DONE, secondStep: await openSession(asked, raw, account, 'link') };
  });
  serve.open(resetPassword, async (asked, { body }, raw) => {
    await limits.linksFromAddress(raw);
    await setPasswordByLink(asked, body);
    return DONE;
  });
}
