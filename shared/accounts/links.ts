import * as z from 'zod/mini';
import { Done, endpoint } from '../endpoint';
import { SignedInAnswer } from './contract';
import { Email, LinkToken, NewPassword } from './shapes';

/*
 * What a letter's link does. Its page only shows a button; pressing it sends the token, so a mail scanner that opens the link
 * changes nothing. Asking for a letter answers the same whether or not the address has an account.
 */

export const AskForLetter = z.strictObject({ email: Email });
const UseLink = z.strictObject({ token: LinkToken });

/** Another letter that asks to confirm the address. */
export const askVerifyLetter = endpoint({
  method: 'POST',
  path: '/api/me/verify-letter',
  needs: 'signedIn',
  output: Done,
});

/** Confirms the address of a new account, or a changed one. */
export const verifyEmail = endpoint({
  method: 'POST',
  path: '/api/verified-addresses',
  needs: 'public',
  body: UseLink,
  output: z.strictObject({ ok: z.literal(true), email: z.string() }),
});

export const askSignInLink = endpoint({
  method: 'POST',
  path: '/api/sign-in-links',
  needs: 'public',
  body: AskForLetter,
  output: Done,
});

export const signInByLink = endpoint({
  method: 'POST',
  path: '/api/sessions/by-link',
  needs: 'public',
  body: UseLink,
  output: SignedInAnswer,
});

export const askPasswordReset = endpoint({
  method: 'POST',
  path: '/api/password-resets',
  needs: 'public',
  body: AskForLetter,
  output: Done,
});

export const ResetPassword = z.strictObject({ token: LinkToken, password: NewPassword });

/** Sets the password, confirms the address, and ends every session of the account. */
export const resetPassword = endpoint({
  method: 'PUT',
  path: '/api/password-resets',
  needs: 'public',
  body: ResetPassword,
  output: Done,
});
