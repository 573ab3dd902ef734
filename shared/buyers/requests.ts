import * as z from 'zod/mini';
import { DayText } from '../days';
import { Done, endpoint, inRoom } from '../endpoint';
import { SizeToday } from '../growth/sizeToday';
import { Id } from '../ids';
import { LOTS } from '../orders/price';
import { Heads, Version } from '../shapes';
import { REQUEST_STATES } from './ask';
import { REQUEST_LETTERS } from './requestLetters';

const Place = z.strictObject({ id: Id, code: z.string() });

/** A brood that a request may be answered from. */
const Source = z.strictObject({
  broodId: Id,
  code: z.string(),
  available: z.number(),
  size: z.nullable(SizeToday),
});

/** A request as the owner works it. */
export const RequestRow = z.strictObject({
  id: Id,
  version: Version,
  kind: z.enum(['fish', 'notice']),
  state: z.enum(REQUEST_STATES),
  buyer: z.strictObject({ id: Id, name: z.string(), email: z.nullable(z.string()) }),
  /** "Tropheus moorii". */
  name: z.string(),
  locality: z.nullable(z.string()),
  brood: z.nullable(Place),
  strain: z.nullable(Place),
  heads: z.nullable(z.number()),
  lengthTenthsMm: z.nullable(z.number()),
  words: z.nullable(z.string()),
  madeOn: DayText,
  notifiedOn: z.nullable(DayText),
  order: z.nullable(z.strictObject({ id: Id, number: z.number() })),
  waitsForFish: z.boolean(),
  /** From 1 within its row: those who asked for the same brood, or the same strain. Null when it is over. */
  place: z.nullable(z.number()),
  /** Heads that those before it in the row ask for. */
  before: z.number(),
  sources: z.array(Source),
});
export type RequestRow = z.output<typeof RequestRow>;

const inRequest = inRoom({ requestId: Id });

/** Open ones first, each row in the order in which the addresses were confirmed. */
export const listRequests = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/requests',
  needs: 'buyer:see',
  params: inRoom({}),
  output: z.strictObject({ requests: z.array(RequestRow) }),
});

export const orderRequest = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/requests/:requestId/order',
  needs: 'sale:write',
  params: inRequest,
  body: z.strictObject({
    version: Version,
    orderId: Id,
    lineId: Id,
    broodId: Id,
    heads: Heads,
    lot: z.enum(LOTS, 'Choose how they go'),
    /** Hold the heads at once. */
    reserve: z.boolean('Say yes or no'),
    /** The owner knows that others asked before. */
    outOfTurn: z.boolean('Say yes or no'),
  }),
  output: z.strictObject({ orderId: Id, number: z.number() }),
});

export const closeRequest = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/requests/:requestId/end',
  needs: 'sale:write',
  params: inRequest,
  body: z.strictObject({ version: Version }),
  output: Done,
});

/** A letter of a request as it would go out now; nothing is sent. */
export const previewRequestLetter = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/requests/:requestId/letter-preview',
  needs: 'buyer:see',
  params: inRequest,
  query: z.strictObject({ kind: z.enum(REQUEST_LETTERS, 'Choose a letter') }),
  output: z.strictObject({ to: z.nullable(z.string()), subject: z.string(), text: z.string(), html: z.string() }),
});
