import type { OrderState, OrderWay } from './state';
import { hasLeft } from './state';

export const PAYMENT_KINDS = ['deposit', 'balance', 'refund', 'lossCredit'] as const;
export const PAYMENT_METHODS = ['card', 'cash', 'transfer'] as const;
export type PaymentMethod = (typeof PAYMENT_METHODS)[number];

export const PAYMENT_KIND_WORDS = {
  deposit: 'Deposit',
  balance: 'Payment',
  refund: 'Given back',
  lossCredit: 'Given back for losses',
};
export const PAYMENT_METHOD_WORDS = { card: 'card', cash: 'cash', transfer: 'bank transfer' };

/** A line of the payment ledger: above zero received, below given back. It is never edited. */
export type PaymentLine = {
  id: string;
  kind: (typeof PAYMENT_KINDS)[number];
  cents: number;
  /** It came too late, or was not what was asked: it pays for nothing and must go back. */
  needsRefund: boolean;
  /** The payment of which it gives money back. */
  refunds: string | null;
};

export type OrderMoney = {
  linesCents: number;
  totalCents: number;
  /** Received and kept, what was given back taken off. */
  receivedCents: number;
  toPayCents: number;
  /** Received more than the order costs, or for an order that was cancelled. */
  toReturnCents: number;
  /** Of payments that must go back, what has not gone back yet. */
  flaggedCents: number;
};

/** What an order costs and what is left to pay: sums over its lines and its payments, never stored. */
export function moneyOf(order: {
  state: OrderState;
  way: OrderWay;
  lineCents: number[];
  discountCents: number;
  payments: PaymentLine[];
}): OrderMoney {
  const { state, way, lineCents, discountCents, payments } = order;
  const linesCents = lineCents.reduce((sum, cents) => sum + cents, 0);
  const flagged = new Set(payments.filter(({ needsRefund }) => needsRefund).map(({ id }) => id));
  const isFlagged = ({ id, refunds }: PaymentLine) => flagged.has(id) || flagged.has(refunds ?? '');
  const sumOf = (some: PaymentLine[]) => some.reduce((sum, { cents }) => sum + cents, 0);
  const counted = payments.filter((payment) => !isFlagged(payment));
  const receivedCents = sumOf(counted);
  // Once the fish have left, what is given back makes them cheaper; before, it has to be paid again.
  const givenBack = hasLeft(state) ? -sumOf(counted.filter(({ cents }) => cents < 0)) : 0;
  const asked = state === 'cancelled' || way === 'gift' ? 0 : Math.max(0, linesCents - discountCents - givenBack);
  return {
    linesCents,
    totalCents: asked,
    receivedCents,
    toPayCents: Math.max(0, asked - receivedCents),
    toReturnCents: Math.max(0, receivedCents - asked),
    flaggedCents: sumOf(payments.filter(isFlagged)),
  };
}

/** What can still be given back of one payment. */
export function refundableOf(payment: PaymentLine, payments: PaymentLine[]): number {
  if (payment.cents <= 0) return 0;
  return payments
    .filter(({ refunds }) => refunds === payment.id)
    .reduce((left, { cents }) => left + cents, payment.cents);
}

/** The deposit of so many per cent, rounded up to the whole unit of the currency, at most the whole. */
export function depositOf(totalCents: number, percent: number, minorDigits: number): number {
  const unit = 10 ** minorDigits;
  return Math.min(totalCents, Math.ceil((totalCents * percent) / 100 / unit) * unit);
}
