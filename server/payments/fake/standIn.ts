import { randomBytes } from 'node:crypto';
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import Stripe from 'stripe';
import type { Config } from '../../config';
import type { House } from '../../house';

export type FakeSession = {
  id: string;
  intent: string;
  cents: number;
  currency: string;
  title: string;
  returnUrl: string;
  expiresAt: number;
  metadata: Record<string, string>;
  status: 'open' | 'complete' | 'expired';
  paid: boolean;
  refundedCents: number;
};

export type FakeEvent = { id: string; type: string; body: string; sent: number };

/** Stands in for the card service on this machine: the few endpoints that are used, and its messages. Never in production. */
export type StandIn = {
  port: number;
  /** Where messages go; the product's own address. */
  deliverTo: string;
  sessions: Map<string, FakeSession>;
  /** Every message made, held back or delivered. */
  events: FakeEvent[];
  /** Answers nothing while true, as when the card service is away. */
  isAway: boolean;
  make(type: string, session: FakeSession, more?: Record<string, unknown>): FakeEvent;
  deliver(event: FakeEvent): Promise<number>;
  close(): Promise<void>;
};

export async function openStandIn(config: Config, clock: House['clock']): Promise<StandIn> {
  const kept = new Map<string, { status: number; body: unknown }>();
  const seconds = () => Math.floor(clock.now().getTime() / 1000);
  const standIn: StandIn = {
    port: 0,
    deliverTo: `http://${config.host}:${config.port}/webhooks/stripe`,
    sessions: new Map(),
    events: [],
    isAway: false,
    make(type, session, more = {}) {
      const id = `evt_${randomBytes(8).toString('hex')}`;
      const object = { ...sessionJson(session), ...more };
      const body = JSON.stringify({ id, object: 'event', type, created: seconds(), data: { object } });
      const event = { id, type, body, sent: 0 };
      standIn.events.push(event);
      return event;
    },
    async deliver(event) {
      event.sent += 1;
      const signature = Stripe.webhooks.generateTestHeaderString({
        payload: event.body,
        secret: config.stripeWebhookSecret,
        timestamp: seconds(),
      });
      const headers = { 'content-type': 'application/json', 'stripe-signature': signature };
      return (await fetch(standIn.deliverTo, { method: 'POST', headers, body: event.body })).status;
    },
    close: () =>
      new Promise((closed) => {
        server.close(() => closed());
        server.closeAllConnections();
      }),
  };
  const server = createServer((req, res) => {
    if (standIn.isAway) return void req.socket.destroy();
    answer(standIn, kept, { req, res, config }).catch(() => send(res, 500, { error: { message: 'stand-in' } }));
  });
  await new Promise<void>((ready, failed) => {
    server.once('error', failed);
    server.listen(0, '127.0.0.1', () => ready());
  });
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('The stand-in of the card service has no port');
  standIn.port = address.port;
  return standIn;
}

/** The session as the card service tells it (Stripe API reference, "The Checkout Session object"). */
const sessionJson = (session: FakeSession) => ({
  id: session.id,
  object: 'checkout.session',
  amount_total: session.cents,
  currency: session.currency,
  metadata: session.metadata,
  payment_intent: session.intent,
  payment_status: session.paid ? 'paid' : 'unpaid',
  status: session.status,
  expires_at: session.expiresAt,
});

function send(res: ServerResponse, status: number, body: unknown): void {
  res.writeHead(status, { 'content-type': 'application/json' }).end(JSON.stringify(body));
}

type Call = { req: IncomingMessage; res: ServerResponse; config: Config };

/** The same idempotency key is answered as before, and does nothing. */
async function answer(
  standIn: StandIn,
  kept: Map<string, { status: number; body: unknown }>,
  { req, res, config }: Call,
) {
  const chunks: Buffer[] = [];
  for await (const chunk of req) chunks.push(Buffer.from(chunk));
  const form = new URLSearchParams(Buffer.concat(chunks).toString('utf8'));
  const key = String(req.headers['idempotency-key'] ?? '');
  const done = kept.get(key) ?? judge(standIn, `${req.method} ${req.url}`, { form, config });
  if (key) kept.set(key, done);
  send(res, done.status, done.body);
}

type Asked = { form: URLSearchParams; config: Config };

function judge(standIn: StandIn, call: string, asked: Asked): { status: number; body: unknown } {
  if (call === 'POST /v1/checkout/sessions') return { status: 200, body: openSession(standIn, asked) };
  if (call === 'POST /v1/refunds') return refund(standIn, asked);
  return refused(404, 'Unrecognized request URL');
}

const refused = (status: number, message: string) => ({
  status,
  body: { error: { type: 'invalid_request_error', message } },
});

function metadataIn(form: URLSearchParams): Record<string, string> {
  const found = [...form].flatMap(([name, value]) => {
    const key = /^metadata\[(\w+)\]$/.exec(name)?.[1];
    return key ? [[key, value] as const] : [];
  });
  return Object.fromEntries(found);
}

function openSession({ sessions }: StandIn, { form, config }: Asked) {
  const id = `cs_test_${randomBytes(12).toString('hex')}`;
  const session: FakeSession = {
    id,
    intent: `pi_${randomBytes(12).toString('hex')}`,
    cents: Number(form.get('line_items[0][price_data][unit_amount]')),
    currency: form.get('line_items[0][price_data][currency]') ?? '',
    title: form.get('line_items[0][price_data][product_data][name]') ?? '',
    returnUrl: form.get('success_url') ?? '',
    expiresAt: Number(form.get('expires_at')),
    metadata: metadataIn(form),
    status: 'open',
    paid: false,
    refundedCents: 0,
  };
  sessions.set(id, session);
  return { ...sessionJson(session), url: `${config.origin}/dev/pay/${id}` };
}

function refund({ sessions }: StandIn, { form }: Asked) {
  const session = [...sessions.values()].find(({ intent }) => intent === form.get('payment_intent'));
  const cents = Number(form.get('amount'));
  if (!session?.paid) return refused(404, 'No such payment_intent');
  if (session.refundedCents + cents > session.cents)
    return refused(400, 'Refund amount is greater than unrefunded amount');
  session.refundedCents += cents;
  const id = `re_${randomBytes(12).toString('hex')}`;
  return {
    status: 200,
    body: { id, object: 'refund', amount: cents, status: 'succeeded', payment_intent: session.intent },
  };
}
