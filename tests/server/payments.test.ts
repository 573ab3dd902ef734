import pino from 'pino';
import Stripe from 'stripe';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { readBrood } from '@/shared/broods/contract';
import { giveBack, moveOrder, recordPayment } from '@/shared/orders/contract';
import { payOwnOrder, readOwnOrder } from '@/shared/orders/own';
import { type Known, ownerWithRoom } from '../support/accounts';
import { asked, buyerIn, now, offered, ordered, type Sale, standInOf, tokenOfOrder } from '../support/sales';
import { broodIn, type Colony, colonyIn, TODAY } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

/*
 * Quality lines S53, S54 and S64: what the card service says, and what others say in its name. The stand-in signs as the
 * service does, and the product checks by the service's own library.
 */

let app: TestApp;
let owner: Known;
let roomId: string;
let colony: Colony;
let sale: Sale;
let count = 0;
const logged: string[] = [];

beforeAll(async () => {
  app = await testApp({}, pino({ level: 'info' }, { write: (text: string) => void logged.push(text) }));
  ({ owner, roomId } = await ownerWithRoom(app));
  colony = await colonyIn(owner, roomId, { females: 40 });
});
afterAll(() => app.close());

beforeEach(async () => {
  count += 1;
  const code = `MOKA-26${'ABCDEFGHJKLMNPQRSTUVWXYZ'[count % 24]}`;
  const brood = await broodIn(
    owner,
    roomId,
    { ...colony, females: colony.females.slice(count) },
    { opening: 10, code },
  );
  await offered(app, roomId, brood.broodId);
  const buyer = await buyerIn(app, roomId, `Payer ${count}`, `payer${count}@pond.example`);
  sale = { app, owner, roomId, broodId: brood.broodId, buyerId: buyer.id };
});

const available = async () =>
  (await owner.get(readBrood, { params: { roomId, broodId: sale.broodId } })).brood.available;
const secret = () => app.house.config.stripeWebhookSecret;
const seconds = () => Math.floor(app.house.clock.now().getTime() / 1000);

async function post(
  body: string,
  { timestamp = seconds(), key = secret(), header }: { timestamp?: number; key?: string; header?: string } = {},
) {
  const signed = Stripe.webhooks.generateTestHeaderString({ payload: body, secret: key, timestamp });
  const headers = { 'content-type': 'application/json', 'stripe-signature': header ?? signed };
  const answer = await app.person().raw('POST', '/webhooks/stripe', { headers, body });
  return { status: answer.status, body: await answer.json() };
}

describe('a message that the card service did not send', () => {
  test('unsigned, signed with another key, written anew, or kept for six minutes: refused, and nothing changes', async () => {
    const { order, session, standIn } = await asked(sale);
    session.status = 'complete';
    session.paid = true;
    const { body } = standIn.make('checkout.session.completed', session);
    const signed = Stripe.webhooks.generateTestHeaderString({ payload: body, secret: secret(), timestamp: seconds() });
    const unsigned = await app
      .person()
      .raw('POST', '/webhooks/stripe', { headers: { 'content-type': 'application/json' }, body });
    expect(unsigned.status).toBe(400);
    expect((await post(body, { key: 'whsec_somebody_else' })).status).toBe(400);
    expect((await post(JSON.stringify(JSON.parse(body), null, 1), { header: signed })).status).toBe(400);
    expect((await post(body, { timestamp: seconds() - 360 })).status).toBe(400);
    expect((await now(sale, order)).order.state).toBe('depositAsked');
    expect(logged.join('')).toMatch(/"event":"webhook","outcome":"refused"/);
    expect(logged.join('')).not.toContain(secret());
    expect((await post(body)).body).toEqual({ received: true, outcome: 'paid' });
  });

  test('is not asked for by GET', async () => {
    const answer = await app.person().raw('GET', '/webhooks/stripe');
    expect(answer.status).toBe(405);
    expect(answer.headers.get('allow')).toBe('POST');
  });
});

describe('a message of the card service', () => {
  test('books the money once: five times over, and twenty at the same time', async () => {
    const { order, session, standIn } = await asked(sale);
    session.status = 'complete';
    session.paid = true;
    const event = standIn.make('checkout.session.completed', session);
    for (let i = 0; i < 5; i += 1) expect(await standIn.deliver(event)).toBe(200);
    const twin = standIn.make('checkout.session.async_payment_succeeded', session);
    const answers = await Promise.all(Array.from({ length: 20 }, (_, i) => standIn.deliver(i % 2 ? event : twin)));
    expect(new Set(answers)).toEqual(new Set([200]));
    const page = await now(sale, order);
    expect(page.order).toMatchObject({ state: 'depositPaid', toPayCents: 4000, flaggedCents: 0 });
    expect(page.owner?.payments).toMatchObject([{ kind: 'deposit', method: 'card', cents: 2000, needsRefund: false }]);
    expect(page.owner?.letters.filter(({ kind }) => kind === 'received')).toHaveLength(1);
  });

  test('may come in any order', async () => {
    const { order, session, standIn } = await asked(sale);
    session.status = 'complete';
    const first = standIn.make('checkout.session.completed', session);
    const failed = standIn.make('checkout.session.expired', session);
    session.paid = true;
    await standIn.deliver(standIn.make('checkout.session.async_payment_succeeded', session));
    await standIn.deliver(first);
    await standIn.deliver(failed);
    const page = await now(sale, order);
    expect(page.order).toMatchObject({ state: 'depositPaid', lapsed: false });
    expect(page.owner?.payments).toHaveLength(1);
  });

  test.each([
    ['amount', { amount_total: 1999 }],
    ['currency', { currency: 'usd' }],
  ])('of another %s is flagged, and pays for nothing', async (_what, more) => {
    const { order, session, standIn } = await asked(sale);
    session.paid = true;
    await standIn.deliver(standIn.make('checkout.session.completed', session, more));
    const page = await now(sale, order);
    expect(page.order).toMatchObject({ state: 'depositAsked', toPayCents: 6000 });
    expect(page.order.flaggedCents).toBeGreaterThan(0);
    expect(page.owner?.payments).toMatchObject([{ needsRefund: true }]);
  });

  test('for another fishroom’s order is refused', async () => {
    const { order, session, standIn } = await asked(sale);
    const { roomId: other } = await ownerWithRoom(app);
    session.paid = true;
    const metadata = { ...session.metadata, roomId: other };
    const { body } = standIn.make('checkout.session.completed', session, { metadata });
    expect((await post(body)).status).toBe(400);
    expect((await now(sale, order)).order.state).toBe('depositAsked');
  });

  test('of a kind or a page that is not ours is taken and ignored', async () => {
    const { session, standIn } = await asked(sale);
    expect((await post(standIn.make('customer.created', session).body)).body).toEqual({
      received: true,
      outcome: 'ignored',
    });
    const stranger = standIn.make('checkout.session.completed', { ...session, id: 'cs_test_of_a_shop' });
    expect((await post(stranger.body)).body).toEqual({ received: true, outcome: 'not ours' });
  });
});

describe('money that does not come, or comes too late', () => {
  test.each([
    ['declined', 'decline'],
    ['expired', 'expire'],
  ])('%s, the fish are free', async (_what, act) => {
    const { order, session } = await asked(sale, 6);
    expect(await available()).toBe(4);
    const answer = await app.person().raw('POST', `/dev/pay/${session.id}/${act}`);
    expect(answer.status).toBe(303);
    expect((await now(sale, order)).order).toMatchObject({ state: 'depositAsked', lapsed: true });
    expect(await available()).toBe(10);
  });

  test('after the fish were freed it is flagged, and goes back by card once', async () => {
    const { order, session, token, standIn } = await asked(sale, 6);
    app.later({ days: 8 });
    try {
      session.status = 'complete';
      session.paid = true;
      await standIn.deliver(standIn.make('checkout.session.completed', session));
      const page = await now(sale, order);
      expect(page.order).toMatchObject({ lapsed: true, flaggedCents: 2000, toPayCents: 9000 });
      expect((await app.person().get(readOwnOrder, { params: { token } })).payNow).toBeNull();
      const [payment] = page.owner?.payments ?? [];
      const body = { id: makeId(), paymentId: payment?.id, cents: 2000, because: 'refund', note: null };
      const params = { roomId, orderId: order.id };
      const answers = await Promise.all([1, 2, 3].map(() => owner.ask(giveBack, { params, body })));
      expect(answers.filter(({ status }) => status === 200).length).toBeGreaterThan(0);
      expect(session.refundedCents).toBe(2000);
      const after = await now(sale, order);
      expect(after.order.flaggedCents).toBe(0);
      expect(after.owner?.payments.filter(({ cents }) => cents < 0)).toHaveLength(1);
      expect(after.owner?.letters.filter(({ kind }) => kind === 'refunded')).toHaveLength(1);
    } finally {
      app.later({ days: -8 });
    }
  });

  test('paid a second time by another way, the second is flagged', async () => {
    const { order, session, standIn } = await asked(sale);
    const params = { roomId, orderId: order.id };
    const body = { id: makeId(), kind: 'balance', method: 'transfer', cents: 6000, onDay: TODAY, note: null };
    await owner.get(recordPayment, { params, body });
    session.paid = true;
    await standIn.deliver(standIn.make('checkout.session.completed', session));
    expect((await now(sale, order)).order).toMatchObject({ state: 'depositPaid', toPayCents: 0, flaggedCents: 2000 });
    expect((await owner.ask(recordPayment, { params, body: { ...body, id: makeId(), cents: 1 } })).status).toBe(409);
  });
});

describe('the page on which a buyer pays', () => {
  test('is the same for two taps, asks the server’s price, and ends with the hold', async () => {
    const { order, token, session } = await asked(sale);
    const again = await Promise.all([1, 2].map(() => app.person().get(payOwnOrder, { params: { token } })));
    for (const { url } of again) expect(url).toContain(session.id);
    expect(session).toMatchObject({ cents: 2000, currency: 'eur', metadata: { roomId, orderId: order.id } });
    expect(await (await app.person().raw('GET', `/dev/pay/${session.id}`)).text()).toContain('€20.00');
    const priced = await app.person().ask(payOwnOrder, { params: { token }, body: { cents: 1 } });
    expect(priced.status).toBe(422);
  });

  test('shows each way of paying: late, five times, in the wrong order', async () => {
    for (const act of ['payLate', 'payTwice', 'payReordered']) {
      const { order, session, standIn } = await asked(sale, 2);
      await app.person().raw('POST', `/dev/pay/${session.id}/${act}`);
      if (act === 'payLate') {
        expect((await now(sale, order)).order.state).toBe('depositAsked');
        const held = standIn.events.at(-1);
        await app.person().raw('POST', `/dev/pay/messages/${held?.id}`);
      }
      const page = await now(sale, order);
      expect(page.order.state, act).toBe('depositPaid');
      expect(page.owner?.payments, act).toHaveLength(1);
    }
  });

  test('does not open while the card service is away: no order is paid, and the buyer is told to try again', async () => {
    const made = await ordered(sale, 4);
    await owner.get(moveOrder, {
      params: { roomId, orderId: made.id },
      body: { version: made.version, move: 'askDeposit', depositCents: 2000 },
    });
    const token = await tokenOfOrder(sale, made);
    const standIn = standInOf(app);
    standIn.isAway = true;
    try {
      const answer = await app.person().ask(payOwnOrder, { params: { token } });
      expect(answer.status).toBe(503);
      expect(answer.headers.get('x-request-id')).toBeTruthy();
      expect(answer.headers.get('retry-after')).toBe('30');
    } finally {
      standIn.isAway = false;
    }
    expect((await now(sale, made)).order.state).toBe('depositAsked');
    expect((await app.person().ask(payOwnOrder, { params: { token } })).status).toBe(200);
  });
});
