import { formatDay } from '../../shared/days';
import { formatMoney } from '../../shared/money';
import type { LetterKind } from '../../shared/orders/letterKinds';
import { hashOfToken, tokenOf } from '../mail/tokens';
import { type LetterDraft, TOKEN_HERE, writeLetter } from '../mail/writeLetter';
import type { RoomAsked } from '../scope';
import { sheetRows } from '../sheets';
import { collectionDay } from './calendar';
import { type Facts, type More, SAYS } from './letterWords';
import { type Acting, EVERYTHING } from './room';
import { oneOrder } from './rows';
import { changeStored, storedOrder } from './stored';
import { termsOf } from './terms';

/** Puts a letter to the buyer in the outbox; none, when there is no address to write to. */
export async function writeOrderLetter(
  scope: Acting,
  orderId: string,
  kind: LetterKind,
  more: More = {},
): Promise<void> {
  const draft = await orderLetter(scope, orderId, kind, more);
  if (!draft.to) return;
  await linkStands(scope, orderId);
  await writeLetter(scope, { ...draft, to: draft.to });
}

/** The link is worked out from the order's id; after a change of the installation's secret the new one takes over here. */
async function linkStands(scope: Acting, orderId: string): Promise<void> {
  const { tokenHash } = await storedOrder(scope, orderId);
  const hash = hashOfToken(tokenOf(scope.house.config, orderId));
  if (hash !== tokenHash) await changeStored(scope, orderId, { tokenHash: hash });
}

/** A letter as it would be written now. */
export async function orderLetter(
  scope: RoomAsked,
  orderId: string,
  kind: LetterKind,
  more: More = {},
): Promise<Omit<LetterDraft, 'to'> & { to: string | null }> {
  const { house, now } = scope;
  const facts = await factsOf(scope, orderId, more);
  const { row, room } = facts;
  const { button, ...said } = SAYS[kind](facts);
  const buyer = await buyerOf(scope, facts.order.buyerId);
  const withCalendar = row.agreedTime && (kind === 'ready' || kind === 'timeAgreed' || kind === 'reminder');
  const calendar = withCalendar
    ? collectionDay({
        id: row.id,
        time: row.agreedTime ?? '',
        roomName: room.name,
        place: room.place,
        number: row.number,
        what: whatOf(row),
        now,
      })
    : null;
  return {
    kind,
    to: buyer.email,
    toName: buyer.name,
    aboutId: orderId,
    tokenId: orderId,
    ...said,
    paragraphs: [`Dear ${buyer.name},`, ...said.paragraphs],
    button: { label: button, url: `${house.config.origin}/order/${TOKEN_HERE}` },
    ...(calendar
      ? {
          attachments: [
            { filename: `order-${row.number}.ics`, contentType: 'text/calendar; charset=utf-8', content: calendar },
          ],
        }
      : {}),
  };
}

async function factsOf(scope: RoomAsked, orderId: string, more: More): Promise<Facts> {
  const { db, roomId, currency, today, house } = scope;
  const order = await storedOrder(scope, orderId);
  const row = await oneOrder(scope, EVERYTHING, orderId);
  const room = await db.selectFrom('room').where('id', '=', roomId).select(['name', 'place']).executeTakeFirstOrThrow();
  return {
    order,
    row,
    room,
    today,
    more,
    bank: (await termsOf(scope)).bank,
    sheets: (await sheetsOf(scope, row)).map(({ number, token }) => ({
      number,
      url: `${house.config.origin}/sheet/${token}`,
    })),
    money: (cents) => formatMoney(cents ?? 0, currency),
    day: (day) => formatDay(day, today),
  };
}

async function buyerOf({ db, roomId }: RoomAsked, buyerId: string) {
  return db
    .selectFrom('buyer')
    .where('roomId', '=', roomId)
    .where('id', '=', buyerId)
    .select(['name', 'email'])
    .executeTakeFirstOrThrow();
}

/** The sheets that went with an order, newest first. */
export async function sheetsOf(scope: Pick<RoomAsked, 'db' | 'roomId'>, { lines }: { lines: { id: string }[] }) {
  const rows = await scope.db
    .selectFrom('sheet')
    .where('roomId', '=', scope.roomId)
    .where(
      'purchaseLineId',
      'in',
      lines.map(({ id }) => id),
    )
    .select('id')
    .execute();
  if (rows.length === 0) return [];
  const ids = new Set(rows.map(({ id }) => id));
  return (await sheetRows(scope)).filter(({ id }) => ids.has(id));
}

/** "6 × MOKA-26A, 4 × MOKA-26B". */
export const whatOf = ({ lines }: { lines: { heads: number; code: string }[] }): string =>
  lines.map(({ heads, code }) => `${heads} × ${code}`).join(', ');
