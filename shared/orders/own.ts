import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint } from '../endpoint';
import { Id } from '../ids';
import { line } from '../shapes';
import { MessageDraft } from './contract';
import { Message, OrderLine, SheetLink } from './shapes';
import { ORDER_STATES, ORDER_WAYS } from './state';
import { LocalTime } from './times';

/*
 * What a buyer sees and does, by the link from a letter (256 bits, stored hashed) and nothing else: one order of one
 * fishroom. With an account of the same, confirmed address the orders are listed, each with its link.
 */

const Token = z.string('The link is needed').check(z.regex(/^[\w-]{43}$/, 'That is not an order’s link'));
const byToken = z.strictObject({ token: Token });

export const OwnOrder = z.strictObject({
  room: z.strictObject({ name: z.string(), place: z.nullable(z.string()), currency: z.string(), slug: z.string() }),
  today: DayText,
  number: z.number(),
  buyerName: z.string(),
  state: z.enum(ORDER_STATES),
  way: z.enum(ORDER_WAYS),
  lapsed: z.boolean(),
  hasDeposit: z.boolean(),
  lines: z.array(OrderLine),
  discountCents: z.number(),
  totalCents: z.number(),
  receivedCents: z.number(),
  toPayCents: z.number(),
  depositCents: z.nullable(z.number()),
  payments: z.array(z.strictObject({ kind: z.string(), method: z.string(), cents: z.number(), onDay: DayText })),
  /** What can be paid by card now; null: nothing, or not by card. */
  payNow: z.nullable(z.strictObject({ kind: z.enum(['deposit', 'balance']), cents: z.number() })),
  bank: z.nullable(z.string()),
  reservedUntil: z.nullable(z.string()),
  offeredTimes: z.array(z.string()),
  agreedTime: z.nullable(z.string()),
  mayCancel: z.boolean(),
  termsText: z.nullable(z.string()),
  cautions: z.array(z.string()),
  messages: z.array(Message),
  sheets: z.array(SheetLink),
  hasReceipt: z.boolean(),
});
export type OwnOrder = z.output<typeof OwnOrder>;

export const readOwnOrder = endpoint({
  method: 'GET',
  path: '/api/orders/:token',
  needs: 'public',
  params: byToken,
  output: OwnOrder,
});

/** Answers where to pay; asking again while that page is open answers the same one. */
export const payOwnOrder = endpoint({
  method: 'POST',
  path: '/api/orders/:token/checkout',
  needs: 'public',
  params: byToken,
  output: z.strictObject({ url: z.string() }),
});

export const pickOwnTime = endpoint({
  method: 'POST',
  path: '/api/orders/:token/time',
  needs: 'public',
  params: byToken,
  body: z.strictObject({ time: LocalTime }),
  output: OwnOrder,
});

export const writeOwnMessage = endpoint({
  method: 'POST',
  path: '/api/orders/:token/messages',
  needs: 'public',
  params: byToken,
  body: MessageDraft,
  output: OwnOrder,
});

/** Before anything was paid, at once; afterwards it is the owner who gives the money back. */
export const cancelOwnOrder = endpoint({
  method: 'POST',
  path: '/api/orders/:token/cancellation',
  needs: 'public',
  params: byToken,
  body: z.strictObject({ because: line(300, 'Say why') }),
  output: OwnOrder,
});

export const printOwnReceipt = endpoint({
  method: 'GET',
  path: '/api/orders/:token/receipt/:paper',
  needs: 'public',
  kind: 'file',
  params: z.strictObject({ token: Token, paper: z.enum(['a4', 'letter']) }),
  output: z.unknown(),
});

/** The orders of the account's confirmed address, in every fishroom; `token` opens each. */
export const listOwnOrders = endpoint({
  method: 'GET',
  path: '/api/own-orders',
  needs: 'signedIn',
  output: z.strictObject({
    orders: z.array(
      z.strictObject({
        id: Id,
        token: Token,
        roomName: z.string(),
        number: z.number(),
        state: z.enum(ORDER_STATES),
        madeOn: DayText,
        agreedTime: z.nullable(z.string()),
        what: z.string(),
      }),
    ),
  }),
});
