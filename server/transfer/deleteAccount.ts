import { Refusal } from '../../shared/refusal';
import { mustKnowPassword } from '../accounts';
import { audit } from '../db/audit';
import type { SignedIn } from '../scope';
import { FORMER_MEMBER } from './exportArchive';

/**
 * Takes away who somebody was: name, address, password, sign-ins. What they recorded stays, under "a former member". A fishroom
 * must not be left without an owner.
 */
export async function deleteAccount(asked: SignedIn, current: string | null): Promise<void> {
  await mustKnowPassword(asked, current);
  await asked.db.transaction().execute(async (db) => {
    const { accountId: id, now } = asked;
    const inside = { ...asked, db };
    await mustLeaveNoRoomAlone(inside);
    const { email } = await db.selectFrom('account').select('email').where('id', '=', id).executeTakeFirstOrThrow();
    for (const table of ['session', 'recoveryCode', 'mailToken', 'member'] as const)
      await db.deleteFrom(table).where('accountId', '=', id).execute();
    await db.deleteFrom('mailToken').where('email', '=', email).execute();
    await db.deleteFrom('letter').where('toAddress', '=', email).execute();
    await db
      .updateTable('invitation')
      .set({ withdrawnAt: now })
      .where('invitedBy', '=', id)
      .where('acceptedAt', 'is', null)
      .where('withdrawnAt', 'is', null)
      .execute();
    await db
      .updateTable('task')
      .set({ assignedTo: null })
      .where('assignedTo', '=', id)
      .where('doneAt', 'is', null)
      .execute();
    await db.updateTable('buyer').set({ accountId: null }).where('accountId', '=', id).execute();
    const nowhere = `${id}@former.invalid`;
    await db
      .updateTable('account')
      .set({
        email: nowhere,
        emailFolded: nowhere,
        name: FORMER_MEMBER,
        passwordHash: null,
        emailVerifiedAt: null,
        disabledAt: now,
        choices: '{}',
        totpSecret: null,
        totpEnabledAt: null,
        totpLastStep: null,
      })
      .where('id', '=', id)
      .execute();
    await audit(inside, { action: 'deleted', about: 'account', aboutId: id });
  });
  asked.log.info({ event: 'accountDeleted', outcome: 'ok', accountId: asked.accountId }, 'account deleted');
}

async function mustLeaveNoRoomAlone({ db, accountId }: SignedIn): Promise<void> {
  const alone = await db
    .selectFrom('member')
    .innerJoin('room', 'room.id', 'member.roomId')
    .where('member.accountId', '=', accountId)
    .where('member.role', '=', 'owner')
    .where(({ not, exists, selectFrom }) =>
      not(
        exists(
          selectFrom('member as other')
            .whereRef('other.roomId', '=', 'member.roomId')
            .where('other.role', '=', 'owner')
            .where('other.accountId', '!=', accountId)
            .select('other.accountId'),
        ),
      ),
    )
    .select('room.name')
    .execute();
  if (alone.length === 0) return;
  const names = alone.map(({ name }) => name).join(', ');
  throw new Refusal(
    'conflict',
    `You are the last owner of ${names}. Make somebody else an owner, or delete the fishroom, first.`,
  );
}
