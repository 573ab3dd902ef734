/** Why something was refused; each reason has one HTTP status. */
export const STATUS = {
  malformed: 400,
  'signed-out': 401,
  forbidden: 403,
  'not-found': 404,
  'wrong-method': 405,
  conflict: 409,
  'too-large': 413,
  unsupported: 415,
  invalid: 422,
  'too-many': 429,
  broken: 500,
  busy: 503,
  full: 507,
} as const;

export type Reason = keyof typeof STATUS;

/** Message by field path, such as `{ 'sires.0.weight': 'Type a share above zero' }`. */
export type Fields = Record<string, string>;

export const isReason = (text: string): text is Reason => text in STATUS;

/** A "no" in words that a keeper can read. Thrown by the server, rethrown unchanged in the browser. */
export class Refusal extends Error {
  override readonly name = 'Refusal';
  readonly reason: Reason;
  readonly fields: Fields;
  /** For a conflict: the row as it stands now, so that both versions can be shown. */
  readonly current: unknown;
  /** Seconds to wait before trying again, for `too-many` and `busy`. */
  readonly retryAfter: number | undefined;
  /** Set in the browser: names the request in the server's log. */
  readonly requestId: string | undefined;

  constructor(
    reason: Reason,
    message: string,
    fields: Fields = {},
    more: { current?: unknown; retryAfter?: number; requestId?: string } = {},
  ) {
    super(message);
    this.reason = reason;
    this.fields = fields;
    this.current = more.current;
    this.retryAfter = more.retryAfter;
    this.requestId = more.requestId;
  }
}

/** The one sentence for an id that does not exist or belongs to someone else: the two must not be told apart. */
export const notFound = (what = 'That'): Refusal => new Refusal('not-found', `${what} was not found`);
