import * as z from 'zod/mini';
import { Email } from '../accounts/shapes';
import { DayText } from '../days';
import { Done, endpoint } from '../endpoint';
import { Id } from '../ids';
import { Heads, line, Note } from '../shapes';
import { TenthsMm } from '../units';
import { RoomWord } from './available';

const Few = Heads.check(z.maximum(500, 'For more than 500 write to the fishroom'));

/** What a visitor asks for: fish of a brood, or to be told when a strain has reached a length. */
export const Asked = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('fish'),
    broodId: Id,
    heads: Few,
    /** No shorter than this; null: as they are. */
    lengthTenthsMm: z.nullable(TenthsMm),
  }),
  z.strictObject({ kind: z.literal('notice'), strainId: Id, heads: z.nullable(Few), lengthTenthsMm: TenthsMm }),
]);
export type Asked = z.output<typeof Asked>;

export const AskDraft = z.strictObject({
  asks: Asked,
  name: line(80, 'Type your name'),
  email: Email,
  words: Note,
});
export type AskDraft = z.output<typeof AskDraft>;

/** Nothing of it is kept in the fishroom before the address is confirmed. */
export const askForFish = endpoint({
  method: 'POST',
  path: '/api/available/:slug/requests',
  needs: 'public',
  params: z.strictObject({ slug: RoomWord }),
  body: AskDraft,
  output: Done,
});

export const REQUEST_STATES = ['unconfirmed', 'waiting', 'notified', 'ordered', 'closed'] as const;

/** A request as whoever made it sees it, by the link of a letter. */
export const OwnRequest = z.strictObject({
  room: z.strictObject({ name: z.string(), slug: z.string() }),
  today: DayText,
  state: z.enum(REQUEST_STATES),
  kind: z.enum(['fish', 'notice']),
  /** "Tropheus moorii Ilangi". */
  name: z.string(),
  broodCode: z.nullable(z.string()),
  heads: z.nullable(z.number()),
  lengthTenthsMm: z.nullable(z.number()),
  waitsForFish: z.boolean(),
  /** Where it stands in the row, from 1; null when it does not. */
  place: z.nullable(z.number()),
  noticesStopped: z.boolean(),
});
export type OwnRequest = z.output<typeof OwnRequest>;

const Token = z.string('Open the link of the letter').check(z.regex(/^[\w-]{43}$/, 'The link was cut short'));
const byToken = z.strictObject({ token: Token });

export const readOwnRequest = endpoint({
  method: 'GET',
  path: '/api/asked/:token',
  needs: 'public',
  params: byToken,
  output: OwnRequest,
});

/** The address is the visitor's own: from now on the request stands in the row. Twice does no harm. */
export const confirmRequest = endpoint({
  method: 'POST',
  path: '/api/asked/:token/confirmation',
  needs: 'public',
  params: byToken,
  output: OwnRequest,
});

export const withdrawRequest = endpoint({
  method: 'POST',
  path: '/api/asked/:token/end',
  needs: 'public',
  params: byToken,
  output: OwnRequest,
});

/** No more notices from this fishroom, whatever they were to be about. */
export const stopNotices = endpoint({
  method: 'POST',
  path: '/api/asked/:token/notices-stopped',
  needs: 'public',
  params: byToken,
  output: OwnRequest,
});
