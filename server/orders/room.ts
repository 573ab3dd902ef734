import { dayOf } from '../../shared/days';
import { notFound } from '../../shared/refusal';
import { may, type Role } from '../../shared/roles';
import type { Asked, RoomAsked } from '../scope';

/** Whoever acts on an order: a member, or (without an account of the fishroom) its buyer or the card service. */
export type Acting = RoomAsked & { actorId?: string };

/** A fishroom entered by a link or a message rather than by its members. */
export async function roomAsked(asked: Asked, roomId: string): Promise<RoomAsked> {
  const room = await asked.db
    .selectFrom('room')
    .where('id', '=', roomId)
    .select(['timeZone', 'currency'])
    .executeTakeFirst();
  if (!room) throw notFound('That fishroom');
  return { ...asked, ...room, roomId, today: dayOf(Date.parse(asked.now), room.timeZone) };
}

/** What a reader may be told of orders. */
export type Sees = { money: boolean; buyer: boolean };

export const EVERYTHING: Sees = { money: true, buyer: true };
export const seesOf = ({ role }: { role: Role }): Sees => ({
  money: may(role, 'money:see'),
  buyer: may(role, 'buyer:see'),
});
