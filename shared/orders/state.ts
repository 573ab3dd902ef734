/** How an order goes, from the question to the closed book. */
export const ORDER_STATES = [
  'requested',
  'reserved',
  'depositAsked',
  'depositPaid',
  'ready',
  'collected',
  'sent',
  'closed',
  'cancelled',
] as const;
export type OrderState = (typeof ORDER_STATES)[number];

export const ORDER_STATE_WORDS: Record<OrderState, string> = {
  requested: 'Requested',
  reserved: 'Reserved',
  depositAsked: 'Deposit asked',
  depositPaid: 'Deposit paid',
  ready: 'Ready',
  collected: 'Collected',
  sent: 'Sent',
  closed: 'Closed',
  cancelled: 'Cancelled',
};

/** By which way fish leave; the ledger has a word of its own for each. */
export const ORDER_WAYS = ['sale', 'gift', 'trade', 'auction'] as const;
export type OrderWay = (typeof ORDER_WAYS)[number];

export const ORDER_WAY_WORDS: Record<OrderWay, string> = {
  sale: 'Sale',
  gift: 'Gift',
  trade: 'Trade',
  auction: 'Auction',
};

export const LEDGER_KIND = { sale: 'sold', gift: 'given', trade: 'traded', auction: 'auctioned' } as const;

const MOVES = {
  /** Also from a reservation that ran out: the heads are asked for anew. */
  reserve: { from: ['requested', 'reserved', 'depositAsked'], to: 'reserved' },
  askDeposit: { from: ['reserved'], to: 'depositAsked' },
  forgoDeposit: { from: ['depositAsked'], to: 'reserved' },
  payDeposit: { from: ['reserved', 'depositAsked'], to: 'depositPaid' },
  markReady: { from: ['reserved', 'depositPaid'], to: 'ready' },
  collect: { from: ['ready'], to: 'collected' },
  send: { from: ['ready'], to: 'sent' },
  close: { from: ['collected', 'sent'], to: 'closed' },
  cancel: { from: ['requested', 'reserved', 'depositAsked', 'depositPaid', 'ready'], to: 'cancelled' },
} as const satisfies Record<string, { from: readonly OrderState[]; to: OrderState }>;
export type OrderMove = keyof typeof MOVES;

export const MOVE_WORDS: Record<OrderMove, string> = {
  reserve: 'Reserve',
  askDeposit: 'Ask for the deposit',
  forgoDeposit: 'Do without the deposit',
  payDeposit: 'Deposit received',
  markReady: 'Mark ready',
  collect: 'Hand over',
  send: 'Send',
  close: 'Close',
  cancel: 'Cancel order',
};

/** What an order may stand on: heads that are held, or not any more. */
export type OrderNow = { state: OrderState; lapsed: boolean };

/** The state after a move; null when the order does not allow it. An order whose heads are free again has to reserve first. */
export function afterMove({ state, lapsed }: OrderNow, move: OrderMove): OrderState | null {
  const { from, to } = MOVES[move];
  const known: readonly OrderState[] = from;
  if (!known.includes(state)) return null;
  if (move === 'reserve') return state === 'requested' || lapsed ? to : null;
  if (lapsed && move !== 'cancel') return null;
  return to;
}

export const movesOf = (now: OrderNow): OrderMove[] => MOVE_ORDER.filter((move) => afterMove(now, move) !== null);

const MOVE_ORDER: readonly OrderMove[] = [
  'reserve',
  'askDeposit',
  'forgoDeposit',
  'payDeposit',
  'markReady',
  'collect',
  'send',
  'close',
  'cancel',
];

/** Heads are held for the order: from the reservation until the fish leave. */
export const HOLDING_STATES = ['reserved', 'depositAsked', 'depositPaid', 'ready'] as const;
export const isHoldingState = (state: OrderState): boolean => HOLDING_STATES.some((held) => held === state);

/** The fish are with the buyer. */
export const hasLeft = (state: OrderState): boolean => state === 'collected' || state === 'sent' || state === 'closed';

export const isOpen = (state: OrderState): boolean => state === 'requested' || isHoldingState(state);

/** "Hand over refused: …", why a move is not possible from here. */
export function refusalOf({ state, lapsed }: OrderNow, move: OrderMove): string {
  if (lapsed && move !== 'reserve' && isHoldingState(state))
    return 'The time for which the fish were held is over. Reserve them again first.';
  if (move === 'reserve' && isHoldingState(state)) return 'The fish of this order are held already';
  return `This order is ${ORDER_STATE_WORDS[state].toLowerCase()}: that is not possible now`;
}

/** The bars of an order and which of them it stands on, from 0; below before the first. */
export function stepsOf(state: OrderState, deposit: boolean): { steps: string[]; current: number } {
  const steps = [...(deposit ? ['Reserved', 'Deposit paid'] : ['Reserved']), 'Ready', 'Collected'];
  const ready = steps.length - 2;
  const at: Record<OrderState, number> = {
    requested: -1,
    cancelled: -1,
    reserved: 0,
    depositAsked: 0,
    depositPaid: ready - 1,
    ready,
    collected: ready + 1,
    sent: ready + 1,
    closed: ready + 1,
  };
  const current = at[state];
  const word = state === 'depositPaid' && !deposit ? 'Paid' : ORDER_STATE_WORDS[state];
  return { steps: steps.map((step, i) => (i === current ? word : step)), current };
}
