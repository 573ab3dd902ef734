import type * as z from 'zod/mini';
import { foldedEmail } from '../../shared/accounts/shapes';
import type { InvitationLine, Invite } from '../../shared/members/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { ROLE_WORDS, type Role } from '../../shared/roles';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { hashOfToken, tokenOf } from '../mail/tokens';
import { TOKEN_HERE, writeLetter } from '../mail/writeLetter';
import type { Scope } from '../scope';

const GOOD_FOR_DAYS = 14;
const DAY_MS = 86_400_000;
/** Open at once in a fishroom: letters go to addresses that nobody has proved. */
const OPEN_MAX = 30;

/** Accepted and withdrawn ones are gone from the list; those past their day stay until withdrawn or sent again. */
export async function invitationsOf({ db, roomId }: Scope): Promise<InvitationLine[]> {
  const rows = await db
    .selectFrom('invitation')
    .innerJoin('account as inviter', 'inviter.id', 'invitation.invitedBy')
    .leftJoin('letter', (join) =>
      join
        .onRef('letter.roomId', '=', 'invitation.roomId')
        .on('letter.state', '=', 'failed')
        .onRef('letter.aboutId', '=', 'invitation.id'),
    )
    .where('invitation.roomId', '=', roomId)
    .where('invitation.acceptedAt', 'is', null)
    .where('invitation.withdrawnAt', 'is', null)
    .select([
      'invitation.id',
      'invitation.email',
      'invitation.role',
      'inviter.name as invitedBy',
      'invitation.createdAt',
      'invitation.expiresAt',
      'letter.id as failedLetter',
    ])
    .orderBy('invitation.createdAt', 'desc')
    .execute();
  return rows.map(({ failedLetter, ...row }) => ({ ...row, letterFailed: failedLetter !== null }));
}

export async function invite(scope: Scope, { email, role }: z.output<typeof Invite>): Promise<{ id: string }> {
  const { db, actorId } = scope;
  const folded = foldedEmail(email);
  const inviter = await db
    .selectFrom('account')
    .where('id', '=', actorId)
    .select(['name', 'emailVerifiedAt'])
    .executeTakeFirstOrThrow();
  if (!inviter.emailVerifiedAt)
    throw new Refusal('conflict', 'Confirm your own e-mail address first, then invite others');
  await mustNotBeMember(scope, folded);
  const open = await invitationsOf(scope);
  if (open.some((one) => one.email === folded))
    throw new Refusal('conflict', 'This address is invited already', {
      email: 'Invited already. Send that letter again, or withdraw it first.',
    });
  if (open.length >= OPEN_MAX)
    throw new Refusal('conflict', `${OPEN_MAX} invitations are open. Withdraw some that are not wanted any more.`);
  const id = await writeInvitation(scope, { email, folded, role, inviterName: inviter.name });
  await audit(scope, { action: 'invited', about: 'member', aboutId: id, change: { role: [null, role] } });
  return { id };
}

async function mustNotBeMember({ db, roomId }: Scope, folded: string): Promise<void> {
  const member = await db
    .selectFrom('member')
    .innerJoin('account', 'account.id', 'member.accountId')
    .where('member.roomId', '=', roomId)
    .where('account.emailFolded', '=', folded)
    .select('account.id')
    .executeTakeFirst();
  if (member) throw new Refusal('conflict', 'A member already', { email: 'This address belongs to a member already' });
}

type Wanted = { email: string; folded: string; role: Role; inviterName: string };

async function writeInvitation(scope: Scope, { email, folded, role, inviterName }: Wanted): Promise<string> {
  const { db, roomId, actorId, now, house } = scope;
  const id = newId(now);
  await db
    .insertInto('invitation')
    .values({
      roomId,
      id,
      email: folded,
      role,
      tokenHash: hashOfToken(tokenOf(house.config, id)),
      invitedBy: actorId,
      createdAt: now,
      expiresAt: new Date(Date.parse(now) + GOOD_FOR_DAYS * DAY_MS).toISOString(),
      acceptedAt: null,
      withdrawnAt: null,
    })
    .execute();
  const room = await db.selectFrom('room').where('id', '=', roomId).select('name').executeTakeFirstOrThrow();
  await writeLetter(scope, {
    kind: 'invitation',
    to: email,
    subject: `${inviterName} invites you to ${room.name}`,
    paragraphs: [`${inviterName} wants you in the fishroom ${room.name}.`],
    facts: [['Your role', `${ROLE_WORDS[role].name}. ${ROLE_WORDS[role].says}`]],
    button: { label: 'See the invitation', url: `${house.config.origin}/join/${TOKEN_HERE}` },
    after: [`It is open for ${GOOD_FOR_DAYS} days. If you do not know ${inviterName}, do nothing.`],
    aboutId: id,
    tokenId: id,
  });
  return id;
}

export async function withdraw(scope: Scope, id: string): Promise<{ email: string; role: Role }> {
  const gone = await scope.db
    .updateTable('invitation')
    .set({ withdrawnAt: scope.now })
    .where('roomId', '=', scope.roomId)
    .where('id', '=', id)
    .where('acceptedAt', 'is', null)
    .where('withdrawnAt', 'is', null)
    .returning(['email', 'role'])
    .executeTakeFirst();
  if (!gone) throw notFound('That invitation');
  await audit(scope, { action: 'invitation withdrawn', about: 'member', aboutId: id });
  return gone;
}

/** A new letter with a new link; the earlier link is dead. */
export async function sendAgain(scope: Scope, id: string): Promise<void> {
  const { email, role } = await withdraw(scope, id);
  await invite(scope, { email, role });
}
