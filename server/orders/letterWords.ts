import type { LetterKind } from '../../shared/orders/letterKinds';
import { TRANSPORT_CAUTIONS } from '../../shared/orders/packing';
import type { OrderRow } from '../../shared/orders/shapes';
import { timeWords } from '../../shared/orders/times';
import type { StoredOrder } from './stored';

export type More = { cents?: number; message?: string };

/** What a letter is written from. */
export type Facts = {
  row: OrderRow;
  order: StoredOrder;
  room: { name: string; place: string | null };
  bank: string | null;
  sheets: { number: string; url: string }[];
  money: (cents: number | null) => string;
  day: (day: string) => string;
  today: string;
  more: More;
};

type Said = { subject: string; paragraphs: string[]; facts?: [string, string][]; button: string; after?: string[] };

function linesOf({ row, money }: Facts): [string, string][] {
  return [
    ...row.lines.map(({ heads, code, speciesName, cents }): [string, string] => [
      `${heads} × ${code}`,
      [speciesName, money(cents)].filter(Boolean).join(', '),
    ]),
    ['Together', money(row.totalCents)],
  ];
}

const fact = (name: string, value: string): [string, string] => [name, value];

const dues = ({ row, today, room, money }: Facts): [string, string][] => [
  ...(row.agreedTime ? [fact('Collection', timeWords(row.agreedTime, today))] : []),
  ...(row.agreedTime && room.place ? [fact('Where', room.place)] : []),
  ...(row.toPayCents ? [fact('To pay', money(row.toPayCents))] : []),
];

/** What each letter says. */
export const SAYS: Record<LetterKind, (facts: Facts) => Said> = {
  reserved: (facts) => ({
    subject: `Order ${facts.row.number}: the fish are held for you`,
    paragraphs: [
      facts.row.reservedUntil
        ? `These fish are held for you until ${facts.day(facts.row.reservedUntil.slice(0, 10))}.`
        : 'These fish are held for you.',
    ],
    facts: linesOf(facts),
    button: 'See the order',
    after: facts.order.termsText ? [facts.order.termsText] : [],
  }),
  depositAsked: (facts) => ({
    subject: `Order ${facts.row.number}: a deposit of ${facts.money(facts.order.depositCents)}`,
    paragraphs: ['Please pay the deposit, so that the fish stay yours until you collect them.'],
    facts: [
      ['Deposit', facts.money(facts.order.depositCents)],
      ...(facts.row.reservedUntil ? [fact('Held until', facts.day(facts.row.reservedUntil.slice(0, 10)))] : []),
    ],
    button: 'Pay the deposit',
    after: facts.bank ? [`By bank transfer, with the number ${facts.row.number}:\n${facts.bank}`] : [],
  }),
  received: (facts) => ({
    subject: `Order ${facts.row.number}: your payment has arrived`,
    paragraphs: [
      facts.more.cents === undefined
        ? 'Your payment has arrived. Thank you.'
        : `${facts.money(facts.more.cents)} has arrived. Thank you.`,
    ],
    facts: [['Still to pay', facts.money(facts.row.toPayCents)]],
    button: 'See the order',
  }),
  ready: (facts) => ({
    subject: `Order ${facts.row.number}: your fish are ready`,
    paragraphs: [
      'Your fish are ready.',
      facts.row.agreedTime ? 'They will be caught just before you come.' : 'Please choose a time for the collection.',
    ],
    facts: dues(facts),
    button: facts.row.agreedTime ? 'See the order' : 'Choose a time',
    after: [...TRANSPORT_CAUTIONS],
  }),
  timeAgreed: (facts) => ({
    subject: `Order ${facts.row.number}: ${facts.row.agreedTime ? timeWords(facts.row.agreedTime, facts.today) : 'a time is agreed'}`,
    paragraphs: ['The time is agreed. The calendar entry is attached.'],
    facts: dues(facts),
    button: 'See the order',
  }),
  reminder: (facts) => ({
    subject: `Order ${facts.row.number}: your fish, ${facts.row.agreedTime ? timeWords(facts.row.agreedTime, facts.today) : 'soon'}`,
    paragraphs: ['Your fish leave tomorrow. Please bring a box that holds the warmth.'],
    facts: dues(facts),
    button: 'See the order',
    after: [...TRANSPORT_CAUTIONS],
  }),
  sheet: (facts) => ({
    subject: `Order ${facts.row.number}: the lineage sheets`,
    paragraphs: [
      'The fish are yours. Their lineage sheets say where they come from, and can be checked by anyone with the link.',
    ],
    facts: facts.sheets.map(({ number, url }): [string, string] => [`Sheet ${number}`, url]),
    button: 'See order, sheets and receipt',
    after: facts.order.termsText ? [facts.order.termsText] : [],
  }),
  cancelled: (facts) => ({
    subject: `Order ${facts.row.number} is cancelled`,
    paragraphs: [
      'This order is cancelled, and the fish are no longer held.',
      ...(facts.order.cancelledBecause ? [`Because: ${facts.order.cancelledBecause}`] : []),
      ...(facts.row.toReturnCents
        ? [`${facts.money(facts.row.toReturnCents)} was paid; you will hear about it in a letter of its own.`]
        : []),
    ],
    button: 'See the order',
  }),
  refunded: (facts) => ({
    subject: `Order ${facts.row.number}: money given back`,
    paragraphs: [
      `${facts.more.cents === undefined ? 'Your money' : facts.money(facts.more.cents)} has been given back. By card it can take some days until your bank shows it.`,
    ],
    button: 'See the order',
  }),
  message: (facts) => ({
    subject: `Order ${facts.row.number}: a message from ${facts.room.name}`,
    paragraphs: [facts.more.message ?? ''],
    button: 'Answer',
  }),
};
