import type { PublicPage } from '../../../shared/buyers/offers';
import { addDays, type Day } from '../../../shared/days';
import type { Ago, Key, Listing, Order, Request } from './shape';

/** Cents a fish by strain: what a keeper of these species might ask (common practice, no source). */
const CENTS = { MOIL: 2400, LEMP: 1400, MEUT: 1500, ESMI: 900, CALI: 800, CATE: 1600 } as const;

type Paid = Order['payments'][number]['method'];

/** Orders that were fetched: buyer, day the heads left, brood, heads, price of one. */
const FETCHED: readonly (readonly [
  number,
  string,
  Ago,
  string,
  number,
  number,
  Paid,
  ('collected' | 'sent' | 'closed')?,
])[] = [
  [1001, 'quay', -542, 's1', 6, CENTS.ESMI, 'transfer'],
  [1002, 'torvund', -403, 'l1', 3, CENTS.LEMP, 'cash'],
  [1003, 'rowse', -344, 'm1', 3, CENTS.MOIL, 'cash'],
  [1004, 'odile', -393, 'l2', 6, CENTS.LEMP, 'card'],
  [1005, 'halvard', -400, 'e1', 10, CENTS.MEUT, 'transfer'],
  [1006, 'quay', -360, 'e1', 8, CENTS.MEUT, 'transfer'],
  [1007, 'quay', -270, 'a1', 20, CENTS.CATE - 300, 'transfer'],
  [1008, 'jun', -250, 'e2', 12, CENTS.MEUT, 'card'],
  [1009, 'torvund', -165, 'm2', 4, CENTS.MOIL, 'card'],
  [1010, 'quay', -220, 'a1', 18, CENTS.CATE - 300, 'transfer'],
  [1011, 'odile', -45, 'e3', 9, CENTS.MEUT, 'card', 'sent'],
  [1012, 'wanda', -128, 'a1', 6, CENTS.CATE, 'cash'],
  [1013, 'halvard', -235, 's3', 8, CENTS.ESMI, 'cash'],
  [1014, 'quay', -229, 'f1', 10, CENTS.ESMI - 200, 'transfer'],
  [1015, 'quay', -180, 's4', 12, CENTS.ESMI - 200, 'transfer'],
  [1016, 'jun', -430, 'c1', 4, CENTS.CALI, 'cash'],
  [1017, 'rowse', -22, 'a2', 10, CENTS.CATE, 'card', 'collected'],
];

type OpenOrder = Omit<
  Order,
  'key' | 'madeOn' | 'reservedUntil' | 'handOverAt' | 'lines' | 'payments' | 'messages' | 'buyer'
> & {
  buyer: string;
  made: Ago;
  until?: Ago;
  handOver?: readonly [Ago, string];
  lines: readonly (readonly [brood: string, heads: number, centsEach: number])[];
  deposit?: readonly [Ago, Paid];
  refunded?: Ago;
  messages?: readonly (readonly [Ago, 'buyer' | 'us', string])[];
};

const OPEN: OpenOrder[] = [
  {
    number: 1018,
    buyer: 'torvund',
    state: 'depositPaid',
    made: -16,
    until: 14,
    handOver: [6, '10:00'],
    lines: [['m3', 4, CENTS.MOIL]],
    depositCents: 2880,
    deposit: [-14, 'card'],
    cancelledBecause: null,
    messages: [
      [-16, 'buyer', 'Could the four be from the larger ones?'],
      [-15, 'us', 'Yes, they will be sorted the day before.'],
    ],
  },
  {
    number: 1019,
    buyer: 'halvard',
    state: 'ready',
    made: -12,
    until: 3,
    handOver: [0, '16:30'],
    lines: [['l4', 5, CENTS.LEMP]],
    depositCents: 2100,
    deposit: [-11, 'card'],
    cancelledBecause: null,
    messages: [[-2, 'us', 'They are in a tank of their own since Monday and eat well. Please bring a box with a lid.']],
  },
  {
    number: 1020,
    buyer: 'quay',
    state: 'depositAsked',
    made: -3,
    until: 4,
    lines: [
      ['e3', 12, CENTS.MEUT - 300],
      ['a2', 12, CENTS.CATE - 300],
    ],
    depositCents: 9000,
    cancelledBecause: null,
  },
  {
    number: 1021,
    buyer: 'wanda',
    state: 'reserved',
    made: -2,
    until: 5,
    lines: [['c3', 6, CENTS.CALI]],
    depositCents: null,
    cancelledBecause: null,
  },
  {
    number: 1022,
    buyer: 'jun',
    state: 'requested',
    made: -1,
    lines: [['a2', 6, CENTS.CATE]],
    depositCents: null,
    cancelledBecause: null,
    messages: [[-1, 'buyer', 'Are they black already, and can you send?']],
  },
  {
    number: 1023,
    buyer: 'odile',
    state: 'cancelled',
    made: -40,
    lines: [['s5', 6, CENTS.ESMI]],
    depositCents: 1620,
    deposit: [-38, 'card'],
    refunded: -30,
    cancelledBecause: 'Her tank is not ready before summer',
  },
];

export function ordersOn(today: Day): Order[] {
  const day = (on: Ago): Day => addDays(today, on);
  const fetched = FETCHED.map(([number, buyer, on, brood, heads, each, method, state = 'closed']): Order => {
    const cents = heads * each;
    return {
      key: `order:${number}`,
      number,
      buyer: `buyer:${buyer}`,
      state,
      madeOn: day(on - 9),
      handOverAt: `${day(on)}T17:00`,
      reservedUntil: null,
      lines: [{ brood: `brood:${brood}`, heads, cents }],
      depositCents: null,
      payments: [{ kind: 'balance', method, cents, on: day(on) }],
      messages: [],
      cancelledBecause: null,
    };
  });
  const open = OPEN.map(
    ({ buyer, made, until, handOver, lines, deposit, refunded, messages = [], ...order }): Order => {
      const paid = order.depositCents ?? 0;
      return {
        ...order,
        key: `order:${order.number}`,
        buyer: `buyer:${buyer}`,
        madeOn: day(made),
        reservedUntil: until === undefined ? null : day(until),
        handOverAt: handOver ? `${day(handOver[0])}T${handOver[1]}` : null,
        lines: lines.map(([brood, heads, each]) => ({ brood: `brood:${brood}`, heads, cents: heads * each })),
        payments: [
          ...(deposit ? [{ kind: 'deposit', method: deposit[1], cents: paid, on: day(deposit[0]) } as const] : []),
          ...(refunded === undefined
            ? []
            : [{ kind: 'refund', method: 'card', cents: -paid, on: day(refunded) } as const]),
        ],
        messages: messages.map(([on, from, body]) => ({ fromBuyer: from === 'buyer', on: day(on), body })),
      };
    },
  );
  return [...fetched, ...open];
}

/** What the public page says besides the fish. */
export const PUBLIC_PAGE: Omit<PublicPage, 'photoId'> = {
  words:
    'Mouthbrooders of the three lakes, bred here, each brood with its lineage sheet. Collection, or by courier in the warm months.',
  contact: 'fish@underhill.example',
};

/** The picture beside them. */
export const COVER: Key = 'photo:colony MOIL-A -180';

/** What is shown on the public page; a possible hybrid is not offered. */
export const LISTINGS: Listing[] = [
  { brood: 'brood:m3', classes: [{ fromTenthsMm: 400, cents: CENTS.MOIL }], note: 'Groups of four or more' },
  { brood: 'brood:l4', classes: [{ fromTenthsMm: 350, cents: CENTS.LEMP }], note: null },
  { brood: 'brood:l5', classes: [{ fromTenthsMm: 350, cents: CENTS.LEMP }], note: null },
  {
    brood: 'brood:e3',
    classes: [
      { fromTenthsMm: 400, cents: CENTS.MEUT },
      { fromTenthsMm: 600, cents: CENTS.MEUT + 500 },
    ],
    note: null,
  },
  { brood: 'brood:a2', classes: [{ fromTenthsMm: 350, cents: CENTS.CATE }], note: null },
  {
    brood: 'brood:c3',
    classes: [{ fromTenthsMm: 300, cents: CENTS.CALI }],
    note: 'Origin not known: sold at an auction as Lion’s Cove',
  },
  {
    brood: 'brood:s5',
    classes: [{ fromTenthsMm: 300, cents: CENTS.ESMI }],
    note: 'Parents closely related: not for breeding among themselves',
  },
];

const WAITING: readonly {
  id: string;
  buyer: Key;
  made: Ago;
  of: Key;
  heads?: number;
  tenthsMm?: number;
  words: string | null;
}[] = [
  {
    id: 'r1',
    buyer: 'buyer:rowse',
    made: -33,
    of: 'strain:MOIL',
    tenthsMm: 500,
    words: 'Eight, unsexed, if possible of two broods',
  },
  { id: 'r2', buyer: 'buyer:school', made: -20, of: 'strain:CALI', tenthsMm: 400, words: null },
  { id: 'r3', buyer: 'buyer:wanda', made: -8, of: 'strain:LEMP', tenthsMm: 500, words: 'Two males with yellow tails' },
  {
    id: 'r4',
    buyer: 'buyer:halvard',
    made: -5,
    of: 'brood:e4',
    heads: 8,
    words: 'When they are large enough to travel',
  },
];

export const requestsOn = (today: Day): Request[] =>
  WAITING.map(({ id, buyer, made, of, heads, tenthsMm, words }) => ({
    key: `request:${id}`,
    buyer,
    madeOn: addDays(today, made),
    heads: heads ?? null,
    lengthTenthsMm: tenthsMm ?? null,
    words,
    ...(of.startsWith('brood:') ? { kind: 'fish', brood: of } : { kind: 'notice', strain: of }),
  }));
