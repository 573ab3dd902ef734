import type * as z from 'zod/mini';
import type { AccountChange, Me, SignUp } from '../../shared/accounts/contract';
import { Choices } from '../../shared/accounts/contract';
import { foldedEmail } from '../../shared/accounts/shapes';
import { dayOf } from '../../shared/days';
import { Refusal } from '../../shared/refusal';
import { isUniqueViolation } from '../db/constraint';
import { newId } from '../db/newId';
import { touchRooms } from '../db/touchRooms';
import { hashOfToken } from '../mail/tokens';
import { unitsOf } from '../rooms';
import type { Asked, SignedIn } from '../scope';
import { mustBeUncommon } from './commonPasswords';
import { sendVerifyLetter } from './letters';
import { hashPassword } from './passwords';

/** Makes an account; its letter asks to confirm the address, unless an invitation sent there proves it already. */
export async function makeAccount(asked: Asked, draft: z.output<typeof SignUp>): Promise<string> {
  const { name, email, password, invitation } = draft;
  mustBeUncommon(password, { name, email });
  const passwordHash = await hashPassword(password, asked.house.config.passwordCost);
  const id = newId(asked.now);
  const person = { id, name, email, emailFolded: foldedEmail(email) };
  try {
    await asked.db.transaction().execute(async (db) => {
      const inside = { ...asked, db };
      const proved = invitation !== undefined && (await isInvited(inside, invitation, person.emailFolded));
      await db
        .insertInto('account')
        .values({
          ...person,
          passwordHash,
          emailVerifiedAt: proved ? asked.now : null,
          disabledAt: null,
          totpSecret: null,
          totpEnabledAt: null,
          totpLastStep: null,
          createdAt: asked.now,
        })
        .execute();
      if (!proved) await sendVerifyLetter(inside, person);
    });
  } catch (error) {
    if (!isUniqueViolation(error, 'account.emailFolded')) throw error;
    throw new Refusal('conflict', 'This address has an account already', {
      email: 'This address has an account already. Sign in, or ask for a link by e-mail.',
    });
  }
  asked.log.info({ event: 'signUp', outcome: 'ok', accountId: id, address: asked.address }, 'account made');
  return id;
}

async function isInvited({ db, now }: Asked, token: string, emailFolded: string): Promise<boolean> {
  const row = await db
    .selectFrom('invitation')
    .where('tokenHash', '=', hashOfToken(token))
    .where('acceptedAt', 'is', null)
    .where('withdrawnAt', 'is', null)
    .where('expiresAt', '>', now)
    .select('email')
    .executeTakeFirst();
  return row !== undefined && foldedEmail(row.email) === emailFolded;
}

/** The account of whoever is signed in. */
export const accountOf = ({ db, accountId }: SignedIn) =>
  db.selectFrom('account').where('id', '=', accountId).selectAll().executeTakeFirstOrThrow();

const choicesOf = (text: string): Choices => {
  const known = Choices.safeParse(JSON.parse(text));
  return known.success ? known.data : { units: null };
};

export async function meOf(asked: SignedIn): Promise<Me> {
  const account = await accountOf(asked);
  const rooms = await asked.db
    .selectFrom('member')
    .innerJoin('room', 'room.id', 'member.roomId')
    .where('member.accountId', '=', account.id)
    .select(['room.id', 'room.name', 'room.slug', 'room.timeZone', 'room.currency', 'room.settings', 'member.role'])
    .orderBy('room.name')
    .execute();
  return {
    account: {
      id: account.id,
      name: account.name,
      email: account.email,
      emailVerified: account.emailVerifiedAt !== null,
      hasPassword: account.passwordHash !== null,
      secondStep: account.totpEnabledAt !== null,
      choices: choicesOf(account.choices),
      version: account.version,
    },
    rooms: rooms.map(({ settings, ...room }) => ({
      ...room,
      today: dayOf(Date.parse(asked.now), room.timeZone),
      units: unitsOf(settings),
    })),
    invitations: account.emailVerifiedAt ? await openInvitations(asked, account.emailFolded) : [],
  };
}

/** Only for a confirmed address: whoever merely claims it must not see who invites its owner. */
async function openInvitations({ db, now, accountId }: SignedIn, emailFolded: string): Promise<Me['invitations']> {
  return db
    .selectFrom('invitation')
    .innerJoin('room', 'room.id', 'invitation.roomId')
    .innerJoin('account as inviter', 'inviter.id', 'invitation.invitedBy')
    .where('invitation.email', '=', emailFolded)
    .where('invitation.acceptedAt', 'is', null)
    .where('invitation.withdrawnAt', 'is', null)
    .where('invitation.expiresAt', '>', now)
    .where(({ not, exists, selectFrom }) =>
      not(
        exists(
          selectFrom('member')
            .whereRef('member.roomId', '=', 'invitation.roomId')
            .where('member.accountId', '=', accountId)
            .select('member.roomId'),
        ),
      ),
    )
    .select([
      'invitation.id',
      'room.name as roomName',
      'invitation.role',
      'inviter.name as invitedBy',
      'invitation.expiresAt',
    ])
    .orderBy('invitation.createdAt', 'desc')
    .execute();
}

export async function changeMe(asked: SignedIn, { name, choices, version }: z.output<typeof AccountChange>) {
  const changed = await asked.db
    .updateTable('account')
    .set(({ eb }) => ({
      ...(name === undefined ? {} : { name }),
      ...(choices === undefined ? {} : { choices: JSON.stringify(choices) }),
      version: eb('version', '+', 1),
    }))
    .where('id', '=', asked.accountId)
    .where('version', '=', version)
    .returning('id')
    .executeTakeFirst();
  if (changed) {
    // The name stands on everything that the person recorded.
    if (name !== undefined) await touchRooms(asked.db, await roomIdsOf(asked));
    return;
  }
  const { account } = await meOf(asked);
  throw new Refusal('conflict', 'This was changed elsewhere in the meantime', {}, { current: account });
}

async function roomIdsOf({ db, accountId }: SignedIn): Promise<string[]> {
  const rows = await db.selectFrom('member').where('accountId', '=', accountId).select('roomId').execute();
  return rows.map(({ roomId }) => roomId);
}
