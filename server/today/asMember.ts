import { dayOf } from '../../shared/days';
import { UnitChoices } from '../../shared/units';
import { unitsOf } from '../rooms';
import type { Asked, Scope } from '../scope';

export type MemberAsked = {
  scope: Scope;
  units: UnitChoices;
  roomName: string;
  person: { name: string; email: string };
};

/** A member's own view of the fishroom, for what is sent to them: with their role of this moment and their units. */
export async function asMember(asked: Asked, roomId: string, accountId: string): Promise<MemberAsked | null> {
  const row = await asked.db
    .selectFrom('member')
    .innerJoin('room', 'room.id', 'member.roomId')
    .innerJoin('account', 'account.id', 'member.accountId')
    .where('member.roomId', '=', roomId)
    .where('member.accountId', '=', accountId)
    .where('account.disabledAt', 'is', null)
    .select(['role', 'timeZone', 'currency', 'settings', 'choices', 'room.name as roomName', 'account.name', 'email'])
    .executeTakeFirst();
  if (!row) return null;
  const { role, timeZone, currency, settings, choices, roomName, name, email } = row;
  const today = dayOf(Date.parse(asked.now), timeZone);
  const member = { accountId, sessionId: '', actorId: accountId, roomId, role };
  const own = UnitChoices.safeParse(JSON.parse(choices)['units']);
  return {
    scope: { ...asked, ...member, timeZone, currency, today },
    units: own.success ? own.data : unitsOf(settings),
    roomName,
    person: { name, email },
  };
}
