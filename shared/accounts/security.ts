import * as z from 'zod/mini';
import { Done, endpoint } from '../endpoint';
import { Id } from '../ids';
import { Email, NewPassword, Password } from './shapes';

/** `current` is null only for an account that has no password yet. */
const Current = z.nullable(Password);

export const ChangePassword = z.strictObject({ current: Current, password: NewPassword });

/** Ends every other session. */
export const changePassword = endpoint({
  method: 'PUT',
  path: '/api/me/password',
  needs: 'signedIn',
  body: ChangePassword,
  output: Done,
});

export const ChangeEmail = z.strictObject({ current: Current, email: Email });

/** Sends a letter to the new address; nothing changes before its link is used. */
export const changeEmail = endpoint({
  method: 'POST',
  path: '/api/me/email',
  needs: 'signedIn',
  body: ChangeEmail,
  output: Done,
});

export const SessionLine = z.strictObject({
  id: Id,
  current: z.boolean(),
  /** "Firefox on Android", as far as the device tells. */
  device: z.string(),
  address: z.nullable(z.string()),
  createdAt: z.string(),
  lastSeenAt: z.string(),
});
export type SessionLine = z.output<typeof SessionLine>;

export const listSessions = endpoint({
  method: 'GET',
  path: '/api/sessions',
  needs: 'signedIn',
  output: z.strictObject({ sessions: z.array(SessionLine) }),
});

export const endOneSession = endpoint({
  method: 'DELETE',
  path: '/api/sessions/:sessionId',
  needs: 'signedIn',
  params: z.strictObject({ sessionId: Id }),
  output: Done,
});

/** All but the one that asks. */
export const endOtherSessions = endpoint({ method: 'DELETE', path: '/api/sessions', needs: 'signedIn', output: Done });

const Code = z
  .string('Type the code')
  .check(z.trim(), z.minLength(6, 'Type the six digits, or a recovery code'), z.maxLength(20, 'That is too long'));

/** A code of the authenticator, or a recovery code. */
export const SecondStep = z.strictObject({ code: Code });

/** After the password, while the session waits. */
export const passSecondStep = endpoint({
  method: 'POST',
  path: '/api/sessions/second-step',
  needs: 'public',
  body: SecondStep,
  output: Done,
});

export const ProvePassword = z.strictObject({ current: Current });

/** A fresh secret for the authenticator, not in force until a code of it was typed. */
export const startSecondStep = endpoint({
  method: 'POST',
  path: '/api/me/second-step/secret',
  needs: 'signedIn',
  body: ProvePassword,
  output: z.strictObject({
    secret: z.string(),
    address: z.string(),
    /** The address as a square code: its side in modules, and its dark bars. */
    square: z.strictObject({
      size: z.number(),
      bars: z.array(z.strictObject({ row: z.number(), column: z.number(), length: z.number() })),
    }),
  }),
});

const RecoveryCodes = z.strictObject({ recoveryCodes: z.array(z.string()) });

export const turnOnSecondStep = endpoint({
  method: 'PUT',
  path: '/api/me/second-step',
  needs: 'signedIn',
  body: SecondStep,
  output: RecoveryCodes,
});

export const turnOffSecondStep = endpoint({
  method: 'DELETE',
  path: '/api/me/second-step',
  needs: 'signedIn',
  body: SecondStep,
  output: Done,
});

/** New recovery codes; the earlier ones are dead. */
export const renewRecoveryCodes = endpoint({
  method: 'POST',
  path: '/api/me/second-step/recovery-codes',
  needs: 'signedIn',
  body: SecondStep,
  output: RecoveryCodes,
});
