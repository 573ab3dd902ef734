import type { Request } from 'express';
import { dayOf } from '../../shared/days';
import type { Needs } from '../../shared/endpoint';
import { isId } from '../../shared/ids';
import { notFound, Refusal } from '../../shared/refusal';
import { may } from '../../shared/roles';
import type { House } from '../house';
import type { Asked, Scope, SignedIn } from '../scope';
import { sessionOf } from './session';

declare module 'express-serve-static-core' {
  interface Locals {
    house: House;
    requestId: string;
    now: string;
  }
}

export function askedOf(req: Request): Asked {
  const house: House = req.app.locals['house'];
  const { requestId, now } = req.res?.locals ?? {};
  return {
    db: house.db,
    house,
    now: String(now),
    requestId: String(requestId),
    log: req.log,
    address: req.ip ?? '',
    device: (req.get('user-agent') ?? 'unknown device').slice(0, 300),
  };
}

export async function signedInOf(req: Request): Promise<SignedIn> {
  const asked = askedOf(req);
  const session = await sessionOf(asked, req);
  if (!session) throw new Refusal('signed-out', 'Sign in first');
  return { ...asked, ...session };
}

/** Order of judgement: signed in, a member (else the fishroom does not exist), the role. Judged anew at every request. */
export async function roomScope(req: Request, needs: Needs): Promise<{ scope: Scope; changeNumber: number }> {
  const signedIn = await signedInOf(req);
  const roomId = req.params['roomId'];
  if (typeof roomId !== 'string' || !isId(roomId)) throw notFound();
  const room = await signedIn.db
    .selectFrom('member')
    .innerJoin('room', 'room.id', 'member.roomId')
    .where('member.roomId', '=', roomId)
    .where('member.accountId', '=', signedIn.accountId)
    .select(['member.role', 'room.timeZone', 'room.currency', 'room.changeNumber'])
    .executeTakeFirst();
  if (!room) throw notFound();
  if (needs !== 'public' && needs !== 'signedIn' && needs !== 'buyer' && !may(room.role, needs)) {
    const { accountId, address } = signedIn;
    signedIn.log.warn({ event: 'forbidden', outcome: 'refused', accountId, roomId, needs, address }, 'refused by role');
    throw new Refusal('forbidden', 'Your role in this fishroom does not allow that. Ask an owner.');
  }
  const { role, timeZone, currency, changeNumber } = room;
  const today = dayOf(Date.parse(signedIn.now), timeZone);
  return { scope: { ...signedIn, roomId, actorId: signedIn.accountId, role, timeZone, currency, today }, changeNumber };
}
