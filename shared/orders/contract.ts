import * as z from 'zod/mini';
import { DayText } from '../days';
import { Done, endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { MinorUnits } from '../money';
import { Heads, line, Note, Version } from '../shapes';
import { LETTER_KINDS } from './letterKinds';
import { LOTS } from './price';
import { Catch, Message, OrderRow, Packed, Payment, SheetLink, Stand } from './shapes';
import { ORDER_WAYS } from './state';
import { OrderTerms } from './terms';
import { LocalTime } from './times';

const inOrder = inRoom({ orderId: Id });
const AboveZero = MinorUnits.check(z.minimum(1, 'Must be above zero'));

/** What an order is made of. There is no price in it: the server works that out. */
export const LineDraft = z.strictObject({
  id: Id,
  broodId: z.nullable(Id),
  fishId: z.nullable(Id),
  lot: z.enum(LOTS, 'Choose how they go'),
  heads: Heads,
  note: Note,
});
export type LineDraft = z.output<typeof LineDraft>;

export const OrderDraft = z.strictObject({
  id: Id,
  buyerId: Id,
  requestId: z.nullable(Id),
  way: z.enum(ORDER_WAYS, 'Choose how the fish go'),
  lines: z.array(LineDraft).check(z.minLength(1, 'Add at least one line'), z.maxLength(40, 'Forty lines at most')),
  note: Note,
  /** Hold the heads at once. */
  reserve: z.boolean('Say yes or no'),
});
export type OrderDraft = z.output<typeof OrderDraft>;

export const OrderPage = z.strictObject({
  order: OrderRow,
  note: z.nullable(z.string()),
  cancelledBecause: z.nullable(z.string()),
  offeredTimes: z.array(z.string()),
  packing: Packed,
  cautions: z.array(z.string()),
  catches: z.array(Catch),
  sheets: z.array(SheetLink),
  hasReceipt: z.boolean(),
  /** Absent for roles that do not see money or buyers. */
  owner: z.nullable(
    z.strictObject({
      buyer: z.strictObject({
        id: Id,
        name: z.string(),
        email: z.nullable(z.string()),
        phone: z.nullable(z.string()),
        address: z.nullable(z.string()),
        note: z.nullable(z.string()),
      }),
      /** What the buyer opens. */
      link: z.string(),
      discountCents: z.number(),
      linesCents: z.number(),
      receivedCents: z.number(),
      depositCents: z.nullable(z.number()),
      proposedDepositCents: z.number(),
      termsText: z.nullable(z.string()),
      stands: z.array(Stand),
      payments: z.array(Payment),
      messages: z.array(Message),
      letters: z.array(
        z.strictObject({
          id: Id,
          kind: z.string(),
          state: z.enum(['waiting', 'sent', 'failed']),
          at: z.string(),
          lastError: z.nullable(z.string()),
        }),
      ),
      log: z.array(z.strictObject({ id: Id, at: z.string(), action: z.string(), by: z.nullable(z.string()) })),
    }),
  ),
});
export type OrderPage = z.output<typeof OrderPage>;

export const listOrders = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/orders',
  needs: 'catch:see',
  params: inRoom({}),
  query: z.strictObject({ which: z.optional(z.enum(['open', 'all'])) }),
  output: z.strictObject({ orders: z.array(OrderRow) }),
});

export const readOrder = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/orders/:orderId',
  needs: 'catch:see',
  params: inOrder,
  output: OrderPage,
});

export const addOrder = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders',
  needs: 'sale:write',
  params: inRoom({}),
  body: OrderDraft,
  output: OrderRow,
});

export const changeOrder = endpoint({
  method: 'PATCH',
  path: '/api/rooms/:roomId/orders/:orderId',
  needs: 'sale:write',
  params: inOrder,
  body: z.strictObject({ version: Version, discountCents: MinorUnits, note: Note }),
  output: OrderRow,
});

/** How many, and the owner’s own price for the whole line; without one the server prices it by the list. */
export const changeLine = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/orders/:orderId/lines/:lineId',
  needs: 'sale:write',
  params: inRoom({ orderId: Id, lineId: Id }),
  body: z.strictObject({ version: Version, heads: Heads, cents: z.nullable(MinorUnits) }),
  output: OrderRow,
});

/** A step along the way. Asking for the deposit says how much; the others take null. */
export const moveOrder = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders/:orderId/moves',
  needs: 'sale:write',
  params: inOrder,
  body: z.strictObject({
    version: Version,
    move: z.enum(['reserve', 'askDeposit', 'forgoDeposit', 'markReady', 'close'], 'Choose what happens'),
    depositCents: z.nullable(AboveZero),
  }),
  output: OrderRow,
});

export const cancelOrder = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders/:orderId/cancellation',
  needs: 'sale:write',
  params: inOrder,
  body: z.strictObject({ version: Version, because: line(300, 'Say why it is cancelled') }),
  output: OrderRow,
});

export const offerTimes = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/orders/:orderId/times',
  needs: 'sale:write',
  params: inOrder,
  body: z.strictObject({
    version: Version,
    times: z.array(LocalTime).check(z.maxLength(12, 'Twelve times at most')),
  }),
  output: OrderRow,
});

/** A time that was agreed by other means; null: open again. */
export const agreeTime = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/orders/:orderId/time',
  needs: 'sale:write',
  params: inOrder,
  body: z.strictObject({ version: Version, time: z.nullable(LocalTime) }),
  output: OrderRow,
});

export const MessageDraft = z.strictObject({
  id: Id,
  body: z.pipe(
    z.pipe(
      z.string('Type a message'),
      z.transform((text: string) => text.trim()),
    ),
    z.string().check(z.minLength(1, 'Type a message'), z.maxLength(4000, 'Keep it under 4000 letters')),
  ),
});

export const sendMessage = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders/:orderId/messages',
  needs: 'sale:write',
  params: inOrder,
  body: MessageDraft,
  output: Message,
});

export const markRead = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders/:orderId/messages-read',
  needs: 'sale:write',
  params: inOrder,
  output: Done,
});

/** The fish leave: heads out of the ledger, sheets and receipt, at once or not at all. */
export const HandOver = z.strictObject({
  version: Version,
  how: z.enum(['collect', 'send'], 'Choose collected or sent'),
  /** From which tank how many; for a line that is left out, as proposed. */
  catches: z.array(z.strictObject({ lineId: Id, batchId: Id, heads: Heads })).check(z.maxLength(200, 'Too many')),
  issueSheets: z.boolean('Say yes or no'),
  /** Paid at the door, by hand; owners only. */
  paid: z.nullable(z.strictObject({ id: Id, method: z.enum(['cash', 'transfer']), cents: AboveZero })),
});
export type HandOver = z.output<typeof HandOver>;

export const handOver = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders/:orderId/hand-over',
  needs: 'hand:over',
  params: inOrder,
  body: HandOver,
  output: OrderRow,
});

/** Fish that came back: into a quarantine tank, and not into what is available. */
export const returnFish = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders/:orderId/returns',
  needs: 'hand:over',
  params: inOrder,
  body: z.strictObject({ id: Id, lineId: Id, heads: Heads, tankId: Id, onDay: DayText, note: Note }),
  output: OrderRow,
});

/** Fish that died on the way. Later than the terms say, only when the owner chooses so. */
export const bookLoss = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders/:orderId/losses',
  needs: 'sale:write',
  params: inOrder,
  body: z.strictObject({ lineId: Id, heads: Heads, beyondTerms: z.boolean('Say yes or no') }),
  output: OrderRow,
});

export const recordPayment = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders/:orderId/payments',
  needs: 'sale:write',
  params: inOrder,
  body: z.strictObject({
    id: Id,
    kind: z.enum(['deposit', 'balance'], 'Choose what it pays'),
    method: z.enum(['cash', 'transfer'], 'Choose cash or bank transfer'),
    cents: AboveZero,
    onDay: DayText,
    note: Note,
  }),
  output: OrderRow,
});

/** Money back: by card through the card service, by hand as it was given. */
export const giveBack = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/orders/:orderId/refunds',
  needs: 'sale:write',
  params: inOrder,
  body: z.strictObject({
    id: Id,
    paymentId: Id,
    cents: AboveZero,
    because: z.enum(['refund', 'lossCredit'], 'Choose why'),
    note: Note,
  }),
  output: OrderRow,
});

export const printReceipt = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/orders/:orderId/receipt/:paper',
  needs: 'money:see',
  kind: 'file',
  params: inRoom({ orderId: Id, paper: z.enum(['a4', 'letter']) }),
  output: z.unknown(),
});

/** A letter as it would go out now; nothing is sent. */
export const previewLetter = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/orders/:orderId/letter-preview',
  needs: 'buyer:see',
  params: inOrder,
  query: z.strictObject({ kind: z.enum(LETTER_KINDS, 'Choose a letter') }),
  output: z.strictObject({ to: z.nullable(z.string()), subject: z.string(), text: z.string(), html: z.string() }),
});

export const readTerms = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/order-terms',
  needs: 'money:see',
  params: inRoom({}),
  output: z.strictObject({ terms: OrderTerms, cards: z.boolean() }),
});

export const changeTerms = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/order-terms',
  needs: 'sale:write',
  params: inRoom({}),
  body: OrderTerms,
  output: z.strictObject({ terms: OrderTerms, cards: z.boolean() }),
});
