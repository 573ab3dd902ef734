import type { HeadLine } from '../../shared/broods/contract';
import { checkEntry } from '../../shared/broods/headCheck';
import { type HeadCountInFull, headCountOf, NotEnoughHeads } from '../../shared/broods/headCount';
import type { HeadKind, LossCause } from '../../shared/broods/headEntry';
import { Refusal } from '../../shared/refusal';
import { newId } from '../db/newId';
import type { RoomAsked, Scope } from '../scope';

export type Line = HeadLine & { batchId: string };

/** The stored lines of some batches, oldest first. Balances are replays of these, never stored. */
export async function linesOf({ db, roomId }: RoomAsked, batchIds?: string[]): Promise<Line[]> {
  if (batchIds?.length === 0) return [];
  let query = db
    .selectFrom('headEntry')
    .innerJoin('account', 'account.id', 'headEntry.actorId')
    .where('headEntry.roomId', '=', roomId)
    .select([
      'headEntry.id',
      'headEntry.batchId',
      'headEntry.onDay as on',
      'headEntry.at',
      'headEntry.kind',
      'headEntry.heads',
      'headEntry.cause',
      'headEntry.reverses',
      'headEntry.note',
      'headEntry.entryId',
      'account.name as by',
    ]);
  if (batchIds) query = query.where('headEntry.batchId', 'in', batchIds);
  return query.orderBy('headEntry.onDay').orderBy('headEntry.id').execute();
}

export async function countOf(scope: Scope, batchId: string): Promise<HeadCountInFull> {
  return headCountOf(await linesOf(scope, [batchId]));
}

type NewLine = {
  batchId: string;
  kind: HeadKind;
  onDay: string;
  heads: number;
  cause?: LossCause;
  reverses?: string;
  pairId?: string;
  purchaseLineId?: string;
  note?: string | null;
  entryId: string | null;
};

/** Adds a line: deaths and counts always may be, fish that are not there cannot leave alive. Answers the line's id. */
export async function addLine(scope: Scope, line: NewLine): Promise<string> {
  const { db, roomId, actorId, now } = scope;
  const { cause = null, reverses = null, pairId = null, purchaseLineId = null, note = null, ...facts } = line;
  const id = newId(now);
  const { batchId, kind, onDay, heads } = facts;
  try {
    checkEntry(await linesOf(scope, [batchId]), { id, on: onDay, at: now, kind, heads, cause, reverses });
  } catch (error) {
    if (!(error instanceof NotEnoughHeads)) throw error;
    throw new Refusal('conflict', `Only ${error.there} are there`, { heads: `At most ${error.there}` });
  }
  await db
    .insertInto('headEntry')
    .values({ roomId, id, ...facts, cause, reverses, pairId, purchaseLineId, note, at: now, actorId })
    .execute();
  return id;
}
