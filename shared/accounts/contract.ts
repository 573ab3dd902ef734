import * as z from 'zod/mini';
import { DayText } from '../days';
import { Done, endpoint } from '../endpoint';
import { Id } from '../ids';
import { ROLES } from '../roles';
import { Version } from '../shapes';
import { UnitChoices } from '../units';
import { Email, LinkToken, NewPassword, Password, PersonName } from './shapes';

/** What a person chose for themselves. `units` null: those of the fishroom. */
export const Choices = z.strictObject({ units: z.nullable(UnitChoices) });
export type Choices = z.output<typeof Choices>;

const Account = z.strictObject({
  id: Id,
  name: z.string(),
  email: z.string(),
  emailVerified: z.boolean(),
  hasPassword: z.boolean(),
  secondStep: z.boolean(),
  choices: Choices,
  version: Version,
});

const RoomOfMine = z.strictObject({
  id: Id,
  name: z.string(),
  slug: z.string(),
  role: z.enum(ROLES),
  timeZone: z.string(),
  currency: z.string(),
  today: DayText,
  units: UnitChoices,
});

const OpenInvitation = z.strictObject({
  id: Id,
  roomName: z.string(),
  role: z.enum(ROLES),
  invitedBy: z.string(),
  expiresAt: z.string(),
});

export const Me = z.strictObject({
  account: Account,
  rooms: z.array(RoomOfMine),
  invitations: z.array(OpenInvitation),
});
export type Me = z.output<typeof Me>;

export const getMe = endpoint({ method: 'GET', path: '/api/me', needs: 'signedIn', output: Me });

export const SignUp = z.strictObject({
  name: PersonName,
  email: Email,
  password: NewPassword,
  /** From an invitation's letter: it proves the address that it was sent to. */
  invitation: z.optional(LinkToken),
});

export const signUp = endpoint({ method: 'POST', path: '/api/accounts', needs: 'public', body: SignUp, output: Done });

export const SignIn = z.strictObject({ email: Email, password: Password });

/** `secondStep`: the password was right, and a code of the authenticator is still wanted. */
export const SignedInAnswer = z.strictObject({ ok: z.literal(true), secondStep: z.boolean() });

export const signIn = endpoint({
  method: 'POST',
  path: '/api/sessions',
  needs: 'public',
  body: SignIn,
  output: SignedInAnswer,
});

export const signOut = endpoint({ method: 'DELETE', path: '/api/sessions/current', needs: 'public', output: Done });

export const AccountChange = z.strictObject({
  name: z.optional(PersonName),
  choices: z.optional(Choices),
  version: Version,
});

export const changeAccount = endpoint({
  method: 'PATCH',
  path: '/api/me',
  needs: 'signedIn',
  body: AccountChange,
  output: Done,
});
