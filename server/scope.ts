import type { Logger } from 'pino';
import { Refusal } from '../shared/refusal';
import type { Action, Role } from '../shared/roles';
import { may } from '../shared/roles';
import type { Db } from './db/open';
import type { House } from './house';

/** What every answer may know of the request, whoever asks. Inside a write, `db` is the transaction: use nothing else. */
export type Asked = {
  db: Db;
  house: House;
  /** UTC text; one instant for the whole request. */
  now: string;
  requestId: string;
  log: Logger;
  address: string;
  device: string;
};

export type SignedIn = Asked & { accountId: string; sessionId: string };

/** A fishroom, whoever asks: its members, a buyer by a link, the card service. */
export type RoomAsked = Asked & {
  roomId: string;
  timeZone: string;
  currency: string;
  /** The fishroom's calendar day. */
  today: string;
};

/** A member at work in a fishroom. Every query of a fishroom starts from here. */
export type Scope = SignedIn & RoomAsked & { actorId: string; role: Role };

export function mustBeAllowed(
  scope: { role: Role },
  action: Action,
  sentence = 'Your role in this fishroom does not allow that',
): void {
  if (!may(scope.role, action)) throw new Refusal('forbidden', sentence);
}
