import * as z from 'zod/mini';
import { DayText } from '../days';
import { Id } from '../ids';
import { Version } from '../shapes';
import { PAYMENT_KINDS, PAYMENT_METHODS } from './money';
import { LOTS } from './price';
import { ORDER_STATES, ORDER_WAYS } from './state';

const Place = z.strictObject({ id: Id, code: z.string() });

/** A line as everyone sees it who may see the order: what, how many, of which brood. */
export const OrderLine = z.strictObject({
  id: Id,
  broodId: z.nullable(Id),
  fishId: z.nullable(Id),
  code: z.string(),
  speciesName: z.nullable(z.string()),
  locality: z.nullable(z.string()),
  lot: z.enum(LOTS),
  heads: z.number(),
  /** Mean of the last sample, and its day. */
  lengthTenthsMm: z.nullable(z.number()),
  measuredOn: z.nullable(DayText),
  lostHeads: z.number(),
  returnedHeads: z.number(),
  /** Heads that are missing since deaths. */
  short: z.number(),
  /** Absent for roles that do not see money. */
  cents: z.nullable(z.number()),
  note: z.nullable(z.string()),
});
export type OrderLine = z.output<typeof OrderLine>;

/** An order in the list. Buyer and money are absent for roles that may not see them. */
export const OrderRow = z.strictObject({
  id: Id,
  version: Version,
  number: z.number(),
  state: z.enum(ORDER_STATES),
  way: z.enum(ORDER_WAYS),
  /** The heads are free again: the time for which they were held is over, or the payment was declined. */
  lapsed: z.boolean(),
  hasDeposit: z.boolean(),
  buyer: z.nullable(Place),
  lines: z.array(OrderLine),
  agreedTime: z.nullable(z.string()),
  reservedUntil: z.nullable(z.string()),
  madeOn: DayText,
  handedOverAt: z.nullable(z.string()),
  short: z.number(),
  totalCents: z.nullable(z.number()),
  toPayCents: z.nullable(z.number()),
  toReturnCents: z.nullable(z.number()),
  flaggedCents: z.nullable(z.number()),
  unread: z.nullable(z.number()),
});
export type OrderRow = z.output<typeof OrderRow>;

export const Message = z.strictObject({
  id: Id,
  fromBuyer: z.boolean(),
  by: z.nullable(z.string()),
  body: z.string(),
  at: z.string(),
});

export const Payment = z.strictObject({
  id: Id,
  kind: z.enum(PAYMENT_KINDS),
  method: z.enum(PAYMENT_METHODS),
  cents: z.number(),
  onDay: DayText,
  needsRefund: z.boolean(),
  refunds: z.nullable(Id),
  refundableCents: z.number(),
  note: z.nullable(z.string()),
});
export type Payment = z.output<typeof Payment>;

export const Packed = z.strictObject({ bags: z.number(), waterL: z.number(), boxes: z.number() });

/** Where the fish of a line swim, and how many to take from which tank. */
export const Catch = z.strictObject({
  lineId: Id,
  tanks: z.array(
    z.strictObject({ batchId: z.nullable(Id), tank: z.nullable(Place), balance: z.number(), heads: z.number() }),
  ),
});

/** How the heads of a brood are spoken for. */
export const Stand = z.strictObject({
  broodId: Id,
  code: z.string(),
  heads: z.number(),
  orders: z.array(z.strictObject({ orderId: Id, number: z.number(), heads: z.number() })),
  kept: z.number(),
  available: z.number(),
});

export const SheetLink = z.strictObject({ id: Id, number: z.string(), token: z.string(), code: z.string() });
