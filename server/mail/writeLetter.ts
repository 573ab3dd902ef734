import { newId } from '../db/newId';
import type { Asked } from '../scope';
import { htmlBody, type LetterParts, textBody } from './letterBody';

/** Stands in a button's address for the secret word of the letter's one-time link. */
export const TOKEN_HERE = '{{token}}';

export type LetterDraft = LetterParts & {
  /** What it is for, such as `verify` or `reserved`; lists and the outbox's log show it. */
  kind: string;
  to: string;
  toName?: string | null;
  subject: string;
  aboutId?: string;
  /** The mail token (or invitation) whose link stands in the letter as `TOKEN_HERE`. */
  tokenId?: string;
  attachments?: { filename: string; contentType: string; content: Buffer | string }[];
};

/**
 * Puts a letter in the outbox as a row of the caller's transaction: it is sent if, and only if, what it tells of was saved.
 * In a fishroom's scope it carries the fishroom's name.
 */
export async function writeLetter(
  { db, now, roomId = null }: Pick<Asked, 'db' | 'now'> & { roomId?: string | null },
  draft: LetterDraft,
): Promise<string> {
  const room = roomId
    ? await db.selectFrom('room').where('id', '=', roomId).select('name').executeTakeFirst()
    : undefined;
  const foot = { roomName: room?.name ?? null };
  const subject = oneLine(draft.subject);
  const id = newId(now);
  await db
    .insertInto('letter')
    .values({
      id,
      roomId,
      kind: draft.kind,
      toAddress: draft.to,
      toName: draft.toName ? oneLine(draft.toName) : null,
      subject,
      bodyText: textBody(draft, foot),
      bodyHtml: htmlBody(subject, draft, foot),
      attachments: JSON.stringify((draft.attachments ?? []).map(packed)),
      aboutId: draft.aboutId ?? null,
      tokenId: draft.tokenId ?? null,
      stopUrl: draft.stopUrl ?? null,
      nextTryAt: now,
      lastError: null,
      createdAt: now,
      sentAt: null,
    })
    .execute();
  return id;
}

/** A header is one line, whatever a name holds. */
const oneLine = (text: string): string => text.replace(/\s+/g, ' ').trim();

const packed = (one: { filename: string; contentType: string; content: Buffer | string }) => ({
  filename: one.filename,
  contentType: one.contentType,
  base64: Buffer.from(one.content).toString('base64'),
});
