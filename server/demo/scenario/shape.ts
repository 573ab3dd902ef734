import type * as z from 'zod/mini';
import type { Day } from '../../../shared/days';
import type { EntryContent } from '../../../shared/record/kinds';
import type { Role } from '../../../shared/roles';
import type { StrainFacts } from '../../../shared/strains/contract';
import type { TankFacts } from '../../../shared/tanks/contract';
import type { Description, Orientation } from '../drawings';

/** Names a thing of the scenario before it has an id: 'tank:R1', 'fish:MOIL-A04', 'brood:m3'. */
export type Key = `${KeyKind}:${string}`;
export const KEY_KINDS = [
  'account',
  'batch',
  'brood',
  'buyer',
  'care',
  'colony',
  'fish',
  'hold',
  'lot',
  'order',
  'photo',
  'request',
  'reservation',
  'sample',
  'strain',
  'tank',
  'task',
] as const;
type KeyKind = (typeof KEY_KINDS)[number];

/** Days from today; the past is below zero. All of the story is told in these. */
export type Ago = number;

/** An entry as it is sent, with keys in the places of ids. */
export type Entry = z.input<typeof EntryContent>;

type Picture = { drawing: Description; takenAt: string; orientation: Orientation };

/** When something was written down: the fishroom's day and wall-clock time, and by whom. */
type Noted = { on: Day; time: string; by: Key };

export type Recorded = Noted & {
  what: 'entry';
  entry: Entry;
  /** Comes with an entry of the kind 'photoTaken'. */
  picture?: Picture;
  /** These heads left with this order: where orders are kept, the order books them out itself. */
  order?: Key;
};
export type Founders = Noted & {
  what: 'founders';
  strain: Key;
  lot: Key;
  /** They begin in a colony, or alone in a tank. */
  colony: Key | null;
  tank: Key | null;
  fish: { key: Key; code: string | null; sex: 'male' | 'female' | 'unknown'; mark: string | null }[];
};
export type ColonyStarted = Noted & {
  what: 'colony';
  key: Key;
  code: string;
  strain: Key;
  tank: Key;
  note: string | null;
};
export type Happening = Recorded | Founders | ColonyStarted;

export type Member = { key: Key; name: string; email: string; role: Role };
export type Strain = z.input<typeof StrainFacts> & { key: Key };
export type Lot = {
  key: Key;
  strain: Key;
  receivedOn: Day;
  fromWhom: string;
  provenance: 'wildCaught' | 'bredElsewhere' | 'unknown';
  generation: number | null;
  heads: number;
  deadOnArrival: number;
  quarantineUntil: Day | null;
  papers: string | null;
  mayBeSibs: boolean;
  note: string | null;
};
export type Tank = z.input<typeof TankFacts> & { key: Key };

export type Task = {
  key: Key;
  title: string;
  dueOn: Day;
  everyDays: number | null;
  assignedTo: Key | null;
  about: Key | null;
};

export type Buyer = { key: Key; name: string; email: string; phone: string | null; note: string | null };
/** Prices in cents, by length class from the smallest up. */
export type Listing = { brood: Key; classes: { fromTenthsMm: number; cents: number }[]; note: string | null };
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
export type Order = {
  key: Key;
  number: number;
  buyer: Key;
  state: (typeof ORDER_STATES)[number];
  madeOn: Day;
  /** Agreed or past hand-over, local wall-clock time. */
  handOverAt: string | null;
  reservedUntil: Day | null;
  lines: { brood: Key; heads: number; cents: number }[];
  depositCents: number | null;
  payments: { kind: 'deposit' | 'balance' | 'refund'; method: 'card' | 'cash' | 'transfer'; cents: number; on: Day }[];
  messages: { fromBuyer: boolean; on: Day; body: string }[];
  cancelledBecause: string | null;
};
/** The waiting list: fish of a brood, or a word when a strain reaches a length. */
export type Request = {
  key: Key;
  buyer: Key;
  madeOn: Day;
  heads: number | null;
  lengthTenthsMm: number | null;
  words: string | null;
} & ({ kind: 'fish'; brood: Key } | { kind: 'notice'; strain: Key });

export type Scenario = {
  today: Day;
  room: { name: string; slug: string; place: string; timeZone: string; currency: 'EUR' };
  members: Member[];
  strains: Strain[];
  lots: Lot[];
  tanks: Tank[];
  /** In the order in which they happened. */
  happenings: Happening[];
  tasks: Task[];
  buyers: Buyer[];
  listings: Listing[];
  orders: Order[];
  requests: Request[];
};
