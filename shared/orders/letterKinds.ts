/** The letters of an order, in the order in which a buyer may get them. */
export const LETTER_KINDS = [
  'reserved',
  'depositAsked',
  'received',
  'ready',
  'timeAgreed',
  'reminder',
  'sheet',
  'cancelled',
  'refunded',
  'message',
] as const;
export type LetterKind = (typeof LETTER_KINDS)[number];

export const LETTER_KIND_WORDS: Record<LetterKind, string> = {
  reserved: 'Fish reserved',
  depositAsked: 'Deposit asked',
  received: 'Money received',
  ready: 'Ready to collect',
  timeAgreed: 'Time agreed',
  reminder: 'The day before',
  sheet: 'Lineage sheets',
  cancelled: 'Cancelled',
  refunded: 'Money given back',
  message: 'A message',
};
