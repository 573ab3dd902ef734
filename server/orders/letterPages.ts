import type { LetterKind } from '../../shared/orders/letterKinds';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { htmlBody, textBody } from '../mail/letterBody';
import { tokenOf } from '../mail/tokens';
import { TOKEN_HERE } from '../mail/writeLetter';
import type { Scope } from '../scope';
import { orderLetter } from './letters';

/** What a letter would say; the owner sees it with its link. */
export async function letterPreview(scope: Scope, orderId: string, kind: LetterKind) {
  const draft = await orderLetter(scope, orderId, kind, { message: 'Your message stands here.' });
  const room = await scope.db
    .selectFrom('room')
    .where('id', '=', scope.roomId)
    .select('name')
    .executeTakeFirstOrThrow();
  const token = tokenOf(scope.house.config, orderId);
  const filled = (body: string) => body.replaceAll(TOKEN_HERE, token);
  const foot = { roomName: room.name };
  return {
    to: draft.to,
    subject: draft.subject,
    text: filled(textBody(draft, foot)),
    html: filled(htmlBody(draft.subject, draft, foot)),
  };
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
