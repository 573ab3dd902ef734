import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { queryNumber } from '../shapes';
import { PAYMENT_METHODS, type PaymentMethod } from './money';
import { Payment } from './shapes';

const Year = queryNumber(2199);

export const BookLine = z.strictObject({
  ...Payment.shape,
  orderId: Id,
  number: z.number(),
  buyerName: z.string(),
  onDay: DayText,
});
export type BookLine = z.output<typeof BookLine>;

const ByMethod = z.strictObject({ method: z.enum(PAYMENT_METHODS), receivedCents: z.number(), givenCents: z.number() });

export const YearSum = z.strictObject({
  receivedCents: z.number(),
  givenCents: z.number(),
  /** Of what was received, what must still go back. */
  flaggedCents: z.number(),
  months: z.array(z.strictObject({ month: z.string(), receivedCents: z.number(), givenCents: z.number() })),
  methods: z.array(ByMethod),
});
export type YearSum = z.output<typeof YearSum>;

export const readBooks = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/books',
  needs: 'money:see',
  params: inRoom({}),
  query: z.strictObject({ year: z.optional(Year) }),
  output: z.strictObject({
    year: z.number(),
    years: z.array(z.number()),
    currency: z.string(),
    lines: z.array(BookLine),
    sum: YearSum,
  }),
});

export const exportBooks = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/books/csv',
  needs: 'money:see',
  kind: 'file',
  params: inRoom({}),
  query: z.strictObject({ year: z.optional(Year) }),
  output: z.unknown(),
});

type Line = Pick<BookLine, 'cents' | 'onDay' | 'method' | 'needsRefund' | 'refundableCents'>;

/** A year's books: what came in and what went back, by month and by way of paying. */
export function yearSum(year: number, lines: Line[]): YearSum {
  const own = lines.filter(({ onDay }) => onDay.startsWith(`${year}-`));
  const months = Array.from({ length: 12 }, (_, i) => `${year}-${String(i + 1).padStart(2, '0')}`);
  return {
    ...inAndOut(own),
    flaggedCents: own.reduce((sum, line) => sum + (line.needsRefund ? line.refundableCents : 0), 0),
    months: months.map((month) => ({ month, ...inAndOut(own.filter(({ onDay }) => onDay.startsWith(month))) })),
    methods: PAYMENT_METHODS.map((method: PaymentMethod) => ({
      method,
      ...inAndOut(own.filter((line) => line.method === method)),
    })),
  };
}

const inAndOut = (lines: Line[]) => ({
  receivedCents: lines.reduce((sum, { cents }) => sum + Math.max(0, cents), 0),
  givenCents: lines.reduce((sum, { cents }) => sum + Math.max(0, -cents), 0),
});
