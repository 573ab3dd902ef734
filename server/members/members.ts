import type { MemberLine } from '../../shared/members/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { may, type Role } from '../../shared/roles';
import { audit } from '../db/audit';
import type { Scope } from '../scope';

export async function membersOf({ db, roomId, role }: Scope): Promise<MemberLine[]> {
  const rows = await db
    .selectFrom('member')
    .innerJoin('account', 'account.id', 'member.accountId')
    .where('member.roomId', '=', roomId)
    .select(['member.accountId', 'account.name', 'account.email', 'member.role', 'member.joinedAt', 'member.version'])
    .orderBy('member.joinedAt')
    .orderBy('account.name')
    .execute();
  const showEmail = may(role, 'member:manage');
  return rows.map((row) => ({ ...row, email: showEmail ? row.email : null }));
}

/** Inside the transaction that holds the write lock, so that two owners who step down at once cannot both succeed. */
async function mustLeaveAnOwner({ db, roomId }: Scope, accountId: string): Promise<void> {
  const other = await db
    .selectFrom('member')
    .innerJoin('account', 'account.id', 'member.accountId')
    .where('member.roomId', '=', roomId)
    .where('member.role', '=', 'owner')
    .where('member.accountId', '!=', accountId)
    .where('account.disabledAt', 'is', null)
    .select('member.accountId')
    .executeTakeFirst();
  if (!other) throw new Refusal('conflict', 'A fishroom needs an owner. Make somebody else an owner first.');
}

/** The acting owner's role may have gone in the moment before the lock: it is judged again under it. */
async function mustStillManage({ db, roomId, actorId }: Scope): Promise<void> {
  const actor = await db
    .selectFrom('member')
    .where('roomId', '=', roomId)
    .where('accountId', '=', actorId)
    .select('role')
    .executeTakeFirst();
  if (!actor) throw notFound();
  if (!may(actor.role, 'member:manage'))
    throw new Refusal('forbidden', 'Your role in this fishroom does not allow that. Ask an owner.');
}

async function memberRow({ db, roomId }: Scope, accountId: string) {
  const member = await db
    .selectFrom('member')
    .where('roomId', '=', roomId)
    .where('accountId', '=', accountId)
    .select(['role', 'version'])
    .executeTakeFirst();
  if (!member) throw notFound('That member');
  return member;
}

export async function setRole(scope: Scope, accountId: string, change: { role: Role; version: number }) {
  await mustStillManage(scope);
  const member = await memberRow(scope, accountId);
  if (member.version !== change.version)
    throw new Refusal('conflict', 'This role was changed elsewhere in the meantime', {}, { current: member });
  if (member.role === change.role) return;
  if (member.role === 'owner') await mustLeaveAnOwner(scope, accountId);
  await scope.db
    .updateTable('member')
    .set({ role: change.role, version: member.version + 1 })
    .where('roomId', '=', scope.roomId)
    .where('accountId', '=', accountId)
    .execute();
  const line = { about: 'member', aboutId: accountId, change: { role: [member.role, change.role] as [Role, Role] } };
  await audit(scope, { action: 'changed', ...line });
}

/** Takes a member out; what they recorded stays, under their name. */
export async function takeOut(scope: Scope, accountId: string): Promise<void> {
  const leaves = accountId === scope.actorId;
  if (!leaves) await mustStillManage(scope);
  const member = await memberRow(scope, accountId);
  if (member.role === 'owner') await mustLeaveAnOwner(scope, accountId);
  await scope.db.deleteFrom('member').where('roomId', '=', scope.roomId).where('accountId', '=', accountId).execute();
  const action = leaves ? 'left' : 'removed';
  await audit(scope, { action, about: 'member', aboutId: accountId, change: { role: [member.role, null] } });
}
