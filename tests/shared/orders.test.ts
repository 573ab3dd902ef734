import { describe, expect, test } from 'vitest';
import { yearSum } from '@/shared/orders/books';
import { depositOf, moneyOf, type PaymentLine, refundableOf } from '@/shared/orders/money';
import { packingFor } from '@/shared/orders/packing';
import { priceOf } from '@/shared/orders/price';
import { type ReceiptContent, receiptPages } from '@/shared/orders/receipt';
import { shortfalls } from '@/shared/orders/shortfall';
import { afterMove, movesOf, ORDER_STATES, refusalOf, stepsOf } from '@/shared/orders/state';
import { termsText } from '@/shared/orders/terms';
import { LocalTime } from '@/shared/orders/times';
import { textsOf } from '@/shared/print/page';

describe('the way of an order', () => {
  test.each([
    ['requested', ['reserve', 'cancel']],
    ['reserved', ['askDeposit', 'payDeposit', 'markReady', 'cancel']],
    ['depositAsked', ['forgoDeposit', 'payDeposit', 'cancel']],
    ['depositPaid', ['markReady', 'cancel']],
    ['ready', ['collect', 'send', 'cancel']],
    ['collected', ['close']],
    ['sent', ['close']],
    ['closed', []],
    ['cancelled', []],
  ] as const)('from %s there is %j', (state, moves) => {
    expect(movesOf({ state, lapsed: false })).toEqual(moves);
  });

  test.each(['reserved', 'depositAsked'] as const)(
    'an order that is %s and not held any more reserves again, or ends',
    (state) => {
      expect(movesOf({ state, lapsed: true })).toEqual(['reserve', 'cancel']);
      expect(afterMove({ state, lapsed: true }, 'reserve')).toBe('reserved');
      expect(refusalOf({ state, lapsed: true }, 'payDeposit')).toBe(
        'The time for which the fish were held is over. Reserve them again first.',
      );
    },
  );

  test('the bars name the state that they stand on', () => {
    expect(stepsOf('depositAsked', true)).toEqual({
      steps: ['Deposit asked', 'Deposit paid', 'Ready', 'Collected'],
      current: 0,
    });
    expect(stepsOf('depositPaid', false)).toEqual({ steps: ['Paid', 'Ready', 'Collected'], current: 0 });
    expect(stepsOf('sent', true)).toEqual({ steps: ['Reserved', 'Deposit paid', 'Ready', 'Sent'], current: 3 });
    expect(ORDER_STATES.filter((state) => stepsOf(state, true).current < 0)).toEqual(['requested', 'cancelled']);
  });
});

const paid = (id: string, cents: number, more: Partial<PaymentLine> = {}): PaymentLine => ({
  id,
  kind: cents > 0 ? 'balance' : 'refund',
  cents,
  needsRefund: false,
  refunds: null,
  ...more,
});

describe('the money of an order', () => {
  const of = (state: (typeof ORDER_STATES)[number], payments: PaymentLine[], way: 'sale' | 'gift' = 'sale') =>
    moneyOf({ state, way, lineCents: [9600, 4200], discountCents: 800, payments });

  test('is its lines less the discount, less what was paid', () => {
    // 96.00 + 42.00 - 8.00 = 130.00; 39.00 paid.
    expect(of('depositPaid', [paid('a', 3900)])).toEqual({
      linesCents: 13800,
      totalCents: 13000,
      receivedCents: 3900,
      toPayCents: 9100,
      toReturnCents: 0,
      flaggedCents: 0,
    });
  });

  test('a payment that must go back pays for nothing, also after half of it went', () => {
    const payments = [paid('a', 3900, { needsRefund: true }), paid('b', -1500, { refunds: 'a' })];
    expect(of('depositAsked', payments)).toMatchObject({ receivedCents: 0, toPayCents: 13000, flaggedCents: 2400 });
    expect(refundableOf(payments[0] ?? paid('', 1), payments)).toBe(2400);
  });

  test('given back before the fish leave it has to be paid again; afterwards it makes them cheaper', () => {
    const payments = [paid('a', 13000), paid('b', -1400, { refunds: 'a' })];
    expect(of('ready', payments)).toMatchObject({ toPayCents: 1400, totalCents: 13000 });
    expect(of('collected', payments)).toMatchObject({ toPayCents: 0, totalCents: 11600 });
  });

  test('cancelled, all that was paid is to return; a gift costs nothing', () => {
    expect(of('cancelled', [paid('a', 3900)])).toMatchObject({ totalCents: 0, toPayCents: 0, toReturnCents: 3900 });
    expect(of('reserved', [], 'gift')).toMatchObject({ totalCents: 0, toPayCents: 0 });
  });

  test.each([
    // 30 % of 168.00 is 50.40, asked in whole euros; yen have no smaller unit; never more than the price.
    [16800, 30, 2, 5100],
    [15000, 30, 0, 4500],
    [150, 50, 2, 100],
    [50, 100, 2, 50],
    [9900, 0, 2, 0],
  ])('the deposit of %i at %i %% with %i decimals is %i', (total, percent, digits, deposit) => {
    expect(depositOf(total, percent, digits)).toBe(deposit);
  });
});

describe('the price of a line', () => {
  const prices = {
    classes: [
      { fromTenthsMm: 600, cents: 2000 },
      { fromTenthsMm: 400, cents: 1500 },
    ],
    lots: [
      { lot: 'pair' as const, cents: 2800 },
      { lot: 'group' as const, heads: 8, cents: 10000 },
    ],
  };
  test.each([
    ['single', 3, 450, 4500],
    ['single', 3, 600, 6000],
    ['single', 3, 200, 4500],
    ['single', 1, null, 1500],
    ['pair', 4, 450, 5600],
    ['pair', 3, 450, null],
    ['group', 16, 450, 20000],
    ['trio', 3, 450, null],
  ] as const)('%s of %i at %s is %s', (lot, heads, lengthTenthsMm, cents) => {
    expect(priceOf(prices, { lot, heads, lengthTenthsMm })).toBe(cents);
  });
});

test('when fewer live than are held, the latest fall short first', () => {
  const claims = [
    { id: 'first', heads: 4 },
    { id: 'second', heads: 5 },
    { id: 'third', heads: 2 },
  ];
  expect([...shortfalls(11, claims)]).toEqual([]);
  expect([...shortfalls(8, claims)]).toEqual([
    ['second', 1],
    ['third', 2],
  ]);
  expect([...shortfalls(0, claims)]).toEqual([
    ['first', 4],
    ['second', 5],
    ['third', 2],
  ]);
});

test('bags are counted by length, brood by brood', () => {
  // 9 small fish: two bags of up to 8; 3 of 9.5 cm: one each. Five bags, ten litres, one box.
  expect(
    packingFor([
      { heads: 9, lengthTenthsMm: 350 },
      { heads: 3, lengthTenthsMm: 950 },
    ]),
  ).toEqual({ bags: 5, waterL: 10, boxes: 1 });
  expect(packingFor([{ heads: 25, lengthTenthsMm: null }])).toEqual({ bags: 7, waterL: 14, boxes: 2 });
});

test.each([
  ['2026-06-20T10:30', true],
  ['2026-02-30T10:30', false],
  ['2026-06-20T24:00', false],
  ['2026-06-20 10:30', false],
  ['2026-06-20T10:30:00Z', false],
])('%s as a time of the fishroom’s clock: %s', (text, good) => {
  expect(LocalTime.safeParse(text).success).toBe(good);
});

test('terms are told in words', () => {
  expect(termsText({ holdDays: 1, depositPercent: 0, lossDays: 0, words: 'No dogs.', bank: null })).toBe(
    'The fish are held for one day.\nLosses after the fish have left are not made good.\nNo dogs.',
  );
});

test('a year of the books adds up by month and by way of paying', () => {
  const line = (onDay: string, method: 'card' | 'cash', cents: number, needsRefund = false) => ({
    onDay,
    method,
    cents,
    needsRefund,
    refundableCents: Math.max(0, cents),
  });
  const sum = yearSum(2026, [
    line('2025-12-31', 'cash', 9999),
    line('2026-01-05', 'cash', 4000),
    line('2026-01-31', 'card', 2000, true),
    line('2026-12-31', 'card', -500),
  ]);
  expect(sum).toMatchObject({ receivedCents: 6000, givenCents: 500, flaggedCents: 2000 });
  expect(sum.months[0]).toEqual({ month: '2026-01', receivedCents: 6000, givenCents: 0 });
  expect(sum.months[11]).toEqual({ month: '2026-12', receivedCents: 0, givenCents: 500 });
  expect(sum.methods).toEqual([
    { method: 'card', receivedCents: 2000, givenCents: 500 },
    { method: 'cash', receivedCents: 4000, givenCents: 0 },
    { method: 'transfer', receivedCents: 0, givenCents: 0 },
  ]);
});

test('a receipt of forty lines runs over to a second page, and says every amount', () => {
  const content: ReceiptContent = {
    number: 1042,
    issuedOn: '2026-06-20',
    roomName: 'Back Room',
    place: null,
    currency: 'EUR',
    by: 'Nora',
    way: 'Trade',
    lines: Array.from({ length: 40 }, (_, i) => ({
      heads: i + 1,
      code: `MOKA-26${i}`,
      what: 'Tropheus moorii',
      cents: 100 * i,
    })),
    discountCents: 1234,
    totalCents: 76766,
    payments: [{ words: 'Deposit, card', onDay: '2026-05-03', cents: 5040 }],
    toPayCents: 71726,
    sheets: ['2026-0031'],
  };
  const pages = receiptPages(content, 'Wanda Prest', 'letter');
  expect(pages).toHaveLength(2);
  const text = pages.flatMap(textsOf).join(' ');
  for (const says of [
    'Receipt for order 1042',
    'For Wanda Prest',
    '€39.00',
    '-€12.34',
    '€767.66',
    '3 May 2026',
    '-€50.40',
    '€717.26',
    '2026-0031',
    'left as: trade',
  ])
    expect(text).toContain(says);
});
