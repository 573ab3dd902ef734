import type { LetterKind } from '../../shared/orders/letterKinds';
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
