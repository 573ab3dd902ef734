import { stringify } from 'csv-stringify/sync';
import type { Response } from 'express';
import type * as z from 'zod/mini';
import { minorDigits } from '../../shared/money';
import { type BookLine, type readBooks, yearSum } from '../../shared/orders/books';
import { PAYMENT_KIND_WORDS, PAYMENT_METHOD_WORDS, refundableOf } from '../../shared/orders/money';
import type { Scope } from '../scope';
import { paymentsOf } from './ledger';

async function bookLines(scope: Scope): Promise<BookLine[]> {
  const orders = await scope.db
    .selectFrom('purchase')
    .innerJoin('buyer', (join) =>
      join.onRef('buyer.roomId', '=', 'purchase.roomId').onRef('buyer.id', '=', 'purchase.buyerId'),
    )
    .where('purchase.roomId', '=', scope.roomId)
    .select(['purchase.id', 'purchase.number', 'buyer.name'])
    .execute();
  const byId = new Map(orders.map((order) => [order.id, order]));
  const all = await paymentsOf(scope);
  return all.map((payment) => {
    const { id, kind, method, cents, onDay, needsRefund, refunds, note, purchaseId } = payment;
    const order = byId.get(purchaseId);
    return {
      ...{ id, kind, method, cents, onDay, needsRefund, refunds, note },
      refundableCents: refundableOf(payment, all),
      orderId: purchaseId,
      number: order?.number ?? 0,
      buyerName: order?.name ?? '',
    };
  });
}

/** The payment ledger of a year, and what it sums up to. */
export async function booksPage(scope: Scope, asked: number | undefined): Promise<z.input<typeof readBooks.output>> {
  const lines = await bookLines(scope);
  const present = Number(scope.today.slice(0, 4));
  const year = asked ?? present;
  const years = [...new Set([present, ...lines.map(({ onDay }) => Number(onDay.slice(0, 4)))])].sort((a, b) => b - a);
  const own = lines.filter(({ onDay }) => onDay.startsWith(`${year}-`)).reverse();
  return { year, years, currency: scope.currency, lines: own, sum: yearSum(year, lines) };
}

/** For the books: two columns of amounts, so that no cell begins with a sign that a spreadsheet would take for a formula. */
export async function sendBooks(scope: Scope, asked: number | undefined, res: Response): Promise<null> {
  const { year, lines, currency } = await booksPage(scope, asked);
  const digits = minorDigits(currency);
  const amount = (cents: number) => (cents > 0 ? (cents / 10 ** digits).toFixed(digits) : '');
  const rows = [...lines].reverse().map((line) => ({
    day: line.onDay,
    order: line.number,
    buyer: line.buyerName,
    what: PAYMENT_KIND_WORDS[line.kind],
    by: PAYMENT_METHOD_WORDS[line.method],
    received: amount(line.cents),
    given: amount(-line.cents),
    currency,
    toGiveBack: line.needsRefund ? amount(line.refundableCents) : '',
    note: line.note ?? '',
  }));
  const columns = {
    day: 'Day',
    order: 'Order',
    buyer: 'Buyer',
    what: 'What',
    by: 'By',
    received: 'Received',
    given: 'Given back',
    currency: 'Currency',
    toGiveBack: 'Must go back',
    note: 'Note',
  };
  res.set({
    'Content-Type': 'text/csv; charset=utf-8',
    'Content-Disposition': `attachment; filename="payments-${year}.csv"`,
    'Cache-Control': 'private, no-store',
  });
  res.send(stringify(rows, { header: true, columns, bom: true, escape_formulas: true }));
  return null;
}
