import type * as z from 'zod/mini';
import type { LetterRow } from '../../shared/letters/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import type { Scope } from '../scope';

/** As many as anyone looks through. */
const SHOWN = 300;

export function letterRows({ db, roomId }: Scope): Promise<z.input<typeof LetterRow>[]> {
  return (
    db
      .selectFrom('letter')
      .where('roomId', '=', roomId)
      // Members' daily letters are their own affair, unless one could not be sent.
      .where(({ eb, or }) => or([eb('kind', '<>', 'daily'), eb('state', '=', 'failed')]))
      .select([
        'id',
        'kind',
        'toAddress as to',
        'subject',
        'state',
        'attempts',
        'lastError',
        'createdAt as at',
        'sentAt',
      ])
      .orderBy('id', 'desc')
      .limit(SHOWN)
      .execute()
  );
}

/** A letter that was not taken, once more from the beginning. */
export async function letterAgain(scope: Scope, letterId: string): Promise<void> {
  const { db, roomId, now } = scope;
  const letter = await db
    .selectFrom('letter')
    .where('roomId', '=', roomId)
    .where('id', '=', letterId)
    .select('state')
    .executeTakeFirst();
  if (!letter) throw notFound('That letter');
  if (letter.state !== 'failed') throw new Refusal('conflict', 'That letter has not failed');
  await db
    .updateTable('letter')
    .set({ state: 'waiting', attempts: 0, nextTryAt: now, lastError: null })
    .where('roomId', '=', roomId)
    .where('id', '=', letterId)
    .execute();
  await audit(scope, { action: 'letter sent again', about: 'letter', aboutId: letterId });
}
