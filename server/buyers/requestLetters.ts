import type { AskDraft } from '../../shared/buyers/ask';
import type { RequestLetter } from '../../shared/buyers/requestLetters';
import { askedWords } from '../../shared/buyers/requestWords';
import { formatDay } from '../../shared/days';
import { htmlBody, textBody } from '../mail/letterBody';
import { hashOfToken, tokenOf } from '../mail/tokens';
import { type LetterDraft, TOKEN_HERE, writeLetter } from '../mail/writeLetter';
import type { Asked, RoomAsked, Scope } from '../scope';
import { oneRequest, type StoredRequest } from './stored';
import { whatOf } from './what';

type Named = { name: string; locality: string | null };

const linkOf = ({ house }: Pick<Asked, 'house'>): string => `${house.config.origin}/asked/${TOKEN_HERE}`;

type Confirming = { tokenId: string; draft: AskDraft; roomName: string; what: Named };

/** Asks whether the address is the visitor's own. It is no letter of the fishroom yet, which learns of nothing before. */
export async function confirmLetter(asked: Asked, { tokenId, draft, roomName, what }: Confirming): Promise<void> {
  const { asks, name, email } = draft;
  await writeLetter(asked, {
    ...confirmWords({ kind: asks.kind, name, roomName, what: askedWords(asks.kind, { ...what, ...asks }) }),
    to: email,
    toName: name,
    tokenId,
    button: { label: 'Confirm', url: linkOf(asked) },
  });
}

type Said = Omit<LetterDraft, 'to'>;
type Facts = { kind: 'fish' | 'notice'; name: string; roomName: string; what: string };

const confirmWords = ({ kind, name, roomName, what }: Facts): Said => ({
  kind: 'confirmRequest',
  subject: `Confirm what you asked of ${roomName}`,
  paragraphs: [
    `Dear ${name},`,
    kind === 'fish'
      ? `somebody asked ${roomName} for fish and left this address. If that was you, confirm it: then your request stands in the row.`
      : `somebody asked ${roomName} to be told of fish and left this address. If that was you, confirm it.`,
  ],
  facts: [[kind === 'fish' ? 'Asked for' : 'To be told of', what]],
  after: ['The link is good for three days. If it was not you, do nothing: what was typed is forgotten then.'],
});

type Told = Facts & { available: number; keptUntil: string };

const NOTICES: Record<Exclude<RequestLetter, 'confirmRequest'>, (told: Told) => Said> = {
  fishFree: ({ name, roomName, what, available, keptUntil }) => ({
    kind: 'fishFree',
    subject: `${roomName}: fish have come free`,
    paragraphs: [
      `Dear ${name},`,
      `of the fish that you asked for, ${available} are available now. Your place in the row is kept until ${keptUntil}; ${roomName} will answer you.`,
    ],
    facts: [['Asked for', what]],
    after: ['If you don’t want them any more, say so by the link: then the next in the row is asked.'],
  }),
  sizeReached: ({ name, roomName, what, available }) => ({
    kind: 'sizeReached',
    subject: `${roomName}: the fish have reached your size`,
    paragraphs: [
      `Dear ${name},`,
      `you asked to be told. Half of the fish or more have reached that length, and ${available} are available.`,
    ],
    facts: [['Asked for', what]],
    after: [`Ask for them on the page of ${roomName}, or wait: it works the list in order and may write to you.`],
  }),
};

export type NoticeFacts = { available: number; keptUntil: string };

/** A letter of a request as it would be written now. */
async function draftOf(
  scope: RoomAsked,
  request: StoredRequest,
  kind: RequestLetter,
  facts: NoticeFacts,
): Promise<Said> {
  const { db, roomId, today } = scope;
  const room = await db.selectFrom('room').where('id', '=', roomId).select('name').executeTakeFirstOrThrow();
  const what = askedWords(request.kind, { ...(await whatOf(scope, request)), ...request });
  const told = { kind: request.kind, name: request.buyerName, roomName: room.name, what };
  const said =
    kind === 'confirmRequest'
      ? confirmWords(told)
      : NOTICES[kind]({ ...told, ...facts, keptUntil: formatDay(facts.keptUntil, today) });
  const label = kind === 'confirmRequest' ? 'Confirm' : 'See your request';
  return {
    ...said,
    toName: request.buyerName,
    aboutId: request.id,
    tokenId: request.id,
    button: { label, url: linkOf(scope) },
    ...(kind === 'confirmRequest' ? {} : { stopUrl: linkOf(scope) }),
  };
}

/** Puts a notice in the outbox. The link is worked out from the request's id; its hash is set where it was not. */
export async function writeNotice(
  scope: RoomAsked,
  request: StoredRequest & { email: string },
  kind: 'fishFree' | 'sizeReached',
  facts: NoticeFacts,
): Promise<void> {
  await scope.db
    .updateTable('request')
    .set({ tokenHash: hashOfToken(tokenOf(scope.house.config, request.id)) })
    .where('roomId', '=', scope.roomId)
    .where('id', '=', request.id)
    .execute();
  await writeLetter(scope, { ...(await draftOf(scope, request, kind, facts)), to: request.email });
}

/** What a letter would say; the owner sees it without the visitor's link. */
export async function requestLetter(scope: Scope, requestId: string, kind: RequestLetter) {
  const request = await oneRequest(scope, requestId);
  const draft = await draftOf(scope, request, kind, { available: request.heads ?? 6, keptUntil: scope.today });
  const room = await scope.db
    .selectFrom('room')
    .where('id', '=', scope.roomId)
    .select('name')
    .executeTakeFirstOrThrow();
  const foot = { roomName: kind === 'confirmRequest' ? null : room.name };
  const filled = (body: string) => body.replaceAll(TOKEN_HERE, 'the-visitors-own-link');
  return {
    to: request.email,
    subject: draft.subject,
    text: filled(textBody(draft, foot)),
    html: filled(htmlBody(draft.subject, draft, foot)),
  };
}
