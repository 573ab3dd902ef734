import { beforeEach, describe, expect, test } from 'vitest';
import { tellThoseWhoWait } from '@/server/buyers';
import { askForFish, confirmRequest, readOwnRequest, stopNotices, withdrawRequest } from '@/shared/buyers/ask';
import { listOffers, setListing } from '@/shared/buyers/offers';
import { REQUEST_LETTERS } from '@/shared/buyers/requestLetters';
import { closeRequest, listRequests, orderRequest, previewRequestLetter } from '@/shared/buyers/requests';
import { listBuyerNames } from '@/shared/orders/buyerNames';
import { cancelOrder, readOrder } from '@/shared/orders/contract';
import { getRoom } from '@/shared/rooms/contract';
import { readToday } from '@/shared/today/contract';
import { TenthsMm } from '@/shared/units';
import { type Known, lettersTo, memberOf, ownerWithRoom } from '../support/accounts';
import { ordered } from '../support/sales';
import { broodIn, type Colony, colonyIn, record, TODAY } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;
let slug: string;
let colony: Colony;
let broodId: string;

/** A fishroom with one brood of ten, listed at 15.00. */
beforeEach(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  slug = (await owner.get(getRoom, { params: { roomId } })).slug;
  colony = await colonyIn(owner, roomId, { females: 3 });
  ({ broodId } = await broodIn(owner, roomId, colony, { opening: 10 }));
  await list();
  return () => app.close();
});

const list = () =>
  owner.get(setListing, {
    params: { roomId, broodId },
    body: {
      version: null,
      listed: true,
      classes: [{ fromTenthsMm: 300, cents: 1500 }],
      lots: [],
      note: null,
      photoId: null,
    },
  });

const asking = (heads: number, email: string, more: object = {}) => ({
  asks: { kind: 'fish', broodId, heads, lengthTenthsMm: null },
  name: 'Wanda Prest',
  email,
  words: 'Unsexed, please',
  ...more,
});
const ask = (body: object) => app.person().ask(askForFish, { params: { slug }, body });

/** Asks, and confirms by the link of the letter. */
async function asked(heads: number, email: string, more: object = {}) {
  expect((await ask(asking(heads, email, more))).status).toBe(202);
  const token = await tokenIn(email);
  return { token, told: await app.person().get(confirmRequest, { params: { token } }) };
}

async function tokenIn(email: string): Promise<string> {
  const letter = (await lettersTo(app, email)).findLast(({ subject }) => /^Confirm what you asked/.test(subject));
  return /\/asked\/([\w-]{43})/.exec(letter?.text ?? '')?.[1] ?? '';
}

const rows = async () => (await owner.get(listRequests, { params: { roomId } })).requests;
const orderOf = (request: { id: string; version: number }, more: object = {}) =>
  owner.ask(orderRequest, {
    params: { roomId, requestId: request.id },
    body: {
      ...{ version: request.version, orderId: makeId(), lineId: makeId(), broodId, heads: 4, lot: 'single' },
      ...{ reserve: true, outOfTurn: false, ...more },
    },
  });

describe('a visitor asks', () => {
  test('and the fishroom knows nothing of it before the address is confirmed', async () => {
    expect((await ask(asking(4, 'wanda@pond.example'))).status).toBe(202);
    expect(await rows()).toEqual([]);
    expect((await owner.get(listBuyerNames, { params: { roomId } })).buyers).toEqual([]);
    const token = await tokenIn('wanda@pond.example');
    expect(await app.person().get(readOwnRequest, { params: { token } })).toMatchObject({
      ...{ state: 'unconfirmed', heads: 4, name: 'Tropheus moorii', place: null },
    });
    expect(await rows()).toEqual([]);
  });

  test('confirms, and stands in the row once however often the link is pressed', async () => {
    const { token, told } = await asked(4, 'Wanda@Pond.example');
    expect(told).toMatchObject({ state: 'waiting', place: 1, waitsForFish: false });
    expect(await app.person().get(confirmRequest, { params: { token } })).toEqual(told);
    const [row, ...more] = await rows();
    expect(more).toEqual([]);
    expect(row).toMatchObject({
      ...{ kind: 'fish', heads: 4, words: 'Unsexed, please', place: 1, before: 0 },
      buyer: { name: 'Wanda Prest', email: 'Wanda@Pond.example' },
    });
  });

  test('of two questions asked before confirming neither link kills the other', async () => {
    await ask(asking(2, 'two@pond.example'));
    const first = await tokenIn('two@pond.example');
    await ask(asking(3, 'two@pond.example'));
    const second = await tokenIn('two@pond.example');
    for (const token of [first, second]) await app.person().get(confirmRequest, { params: { token } });
    expect((await rows()).map(({ heads, place }) => [heads, place])).toEqual([
      [2, 1],
      [3, 2],
    ]);
    expect((await owner.get(listBuyerNames, { params: { roomId } })).buyers).toHaveLength(1);
  });

  test('a stranger’s name is not written over one that the fishroom knows', async () => {
    await asked(2, 'wanda@pond.example');
    await asked(2, 'wanda@pond.example', { name: 'Somebody Else' });
    expect((await rows()).map(({ buyer }) => buyer.name)).toEqual(['Wanda Prest', 'Wanda Prest']);
  });

  test('what nobody confirms in three days is forgotten', async () => {
    await ask(asking(4, 'gone@pond.example'));
    const token = await tokenIn('gone@pond.example');
    app.later({ days: 3, minutes: 1 });
    expect((await app.person().ask(confirmRequest, { params: { token } })).status).toBe(404);
    await tellThoseWhoWait(app.house);
    expect(await app.house.db.selectFrom('mailToken').where('purpose', '=', 'buyer').selectAll().execute()).toEqual([]);
  });

  test('is refused beside the field, for fish that are not on the page, and after six letters in an hour', async () => {
    const bad = await ask(asking(0, 'not an address', { name: ' ' }));
    expect(bad.status).toBe(422);
    expect(Object.keys(bad.body.error?.fields ?? {}).sort()).toEqual(['asks.heads', 'email', 'name']);
    const elsewhere = await ask(asking(1, 'a@pond.example', { asks: { ...asking(1, '').asks, broodId: makeId() } }));
    expect(elsewhere.body.error?.fields).toEqual({ 'asks.broodId': 'Choose others' });
    const statuses = [];
    for (let i = 0; i < 7; i += 1) statuses.push((await ask(asking(1, 'same@pond.example'))).status);
    expect(statuses).toEqual([202, 202, 202, 202, 202, 202, 429]);
  });

  test('withdraws by the link, and cannot twice', async () => {
    const { token } = await asked(4, 'wanda@pond.example');
    expect(await app.person().get(withdrawRequest, { params: { token } })).toMatchObject({
      state: 'closed',
      place: null,
    });
    expect((await app.person().ask(withdrawRequest, { params: { token } })).status).toBe(409);
  });
});

describe('the list is worked in order', () => {
  test('a request becomes an order, its fish held and its price by the list', async () => {
    await asked(4, 'wanda@pond.example');
    const [row] = await rows();
    if (!row) throw new Error('No request');
    const made = await orderOf(row);
    expect(made.status).toBe(200);
    const { order, note } = await owner.get(readOrder, { params: { roomId, orderId: made.body.orderId } });
    expect(order).toMatchObject({ state: 'reserved', totalCents: 6000, buyer: { code: 'Wanda Prest' } });
    expect(note).toBe('Unsexed, please');
    expect(await rows()).toMatchObject([{ state: 'ordered', order: { number: order.number } }]);
    expect((await lettersTo(app, 'wanda@pond.example')).at(-1)?.subject).toMatch(/the fish are held for you/);
    expect((await orderOf(row)).status).toBe(409);
  });

  test('Today tells the owner who waits for an answer, and nobody of those who wait for fish', async () => {
    await asked(4, 'wanda@pond.example');
    await asked(12, 'many@pond.example', { name: 'Odile Marr' });
    const facts = await owner.get(readToday, { params: { roomId } });
    expect(facts.requests).toMatchObject([{ code: 'MOKA-26A', buyerName: 'Wanda Prest', waitsSince: TODAY }]);
    const keeper = await memberOf(app, roomId, 'keeper');
    expect((await keeper.get(readToday, { params: { roomId } })).requests).toEqual([]);
  });

  test('the second is answered before the first only knowingly', async () => {
    await asked(4, 'first@pond.example');
    await asked(4, 'second@pond.example');
    const second = (await rows())[1];
    if (!second) throw new Error('No second request');
    expect(second).toMatchObject({ place: 2, before: 4 });
    const refused = await orderOf(second);
    expect(refused.status).toBe(409);
    expect(Object.keys(refused.body.error?.fields ?? {})).toEqual(['outOfTurn']);
    expect((await orderOf(second, { outOfTurn: true })).status).toBe(200);
  });

  test('more than there are is not sold: nothing is made of it', async () => {
    await asked(12, 'many@pond.example');
    const [row] = await rows();
    if (!row) throw new Error('No request');
    expect((await orderOf(row, { heads: 12 })).status).toBe(409);
    expect(await rows()).toMatchObject([{ state: 'waiting', waitsForFish: true }]);
  });

  test('keepers see what to catch, not who asks', async () => {
    const keeper = await memberOf(app, roomId, 'keeper');
    expect((await keeper.ask(listRequests, { params: { roomId } })).status).toBe(403);
    expect((await keeper.ask(listOffers, { params: { roomId } })).status).toBe(200);
  });

  test('the owner closes one that nothing comes of', async () => {
    await asked(4, 'wanda@pond.example');
    const [row] = await rows();
    const params = { roomId, requestId: row?.id ?? '' };
    expect((await owner.ask(closeRequest, { params, body: { version: 7 } })).status).toBe(409);
    await owner.get(closeRequest, { params, body: { version: row?.version ?? 0 } });
    expect(await rows()).toMatchObject([{ state: 'closed', place: null }]);
  });
});

describe('those who wait are told', () => {
  const buyer = async () => {
    const row = (await rows()).at(-1);
    return row?.buyer.id ?? '';
  };

  test('when fish come free, the first in the row before the next, and once', async () => {
    await asked(1, 'helper@pond.example');
    const sale = { app, owner, roomId, broodId, buyerId: await buyer() };
    const order = await ordered(sale, 8);
    // Of ten, eight are held and one is asked for: one is left.
    await asked(3, 'first@pond.example');
    await asked(6, 'second@pond.example');
    expect(await tellThoseWhoWait(app.house)).toBe(0);
    await owner.get(cancelOrder, {
      params: { roomId, orderId: order.id },
      body: { version: order.version, because: 'Fell ill' },
    });
    // Ten are free: one, three and six are ten.
    expect(await tellThoseWhoWait(app.house)).toBe(2);
    expect(await tellThoseWhoWait(app.house)).toBe(0);
    const letter = (await lettersTo(app, 'first@pond.example')).at(-1);
    expect(letter?.subject).toMatch(/fish have come free/);
    expect(letter?.text).toContain('3 × Tropheus moorii');
    expect(letter?.headers['list-unsubscribe']).toMatch(/^<http.*\/asked\/[\w-]{43}>$/);
    expect((await rows()).map(({ state }) => state)).toEqual(['waiting', 'notified', 'notified']);
  });

  const strainAsk = (email: string, lengthTenthsMm = 500) =>
    asked(0, email, { asks: { kind: 'notice', strainId: colony.strainId, heads: null, lengthTenthsMm } });

  const measured = (meanMm: number) =>
    record(owner, roomId, {
      kind: 'lengthSampled',
      sampleId: makeId(),
      of: { thing: 'brood', id: broodId },
      onDay: TODAY,
      measure: 'total',
      method: 'ruler',
      readings: [-1, 0, 1].map((off) => ({ lengthTenthsMm: TenthsMm.parse((meanMm + off) * 10), weightG: null })),
      note: null,
    });

  test('when the strain has reached the size, with a link that ends it', async () => {
    const { token } = await strainAsk('wanda@pond.example');
    await measured(49);
    expect(await tellThoseWhoWait(app.house)).toBe(0);
    await measured(53);
    // Both samples are of one day: (49 + 53) / 2 = 51 mm is over 50.
    expect(await tellThoseWhoWait(app.house)).toBe(1);
    const letter = (await lettersTo(app, 'wanda@pond.example')).at(-1);
    expect(letter?.subject).toMatch(/have reached your size/);
    expect(letter?.text).toContain('at 5 cm');
    expect(letter?.text).toContain(`No more letters like this: ${app.house.config.origin}/asked/${token}`);
  });

  test('unless they stopped the notices', async () => {
    const { token } = await strainAsk('wanda@pond.example');
    await measured(53);
    expect(await app.person().get(stopNotices, { params: { token } })).toMatchObject({
      state: 'closed',
      noticesStopped: true,
    });
    expect(await tellThoseWhoWait(app.house)).toBe(0);
  });

  test('every letter can be read before it goes, without the visitor’s link', async () => {
    const { token } = await strainAsk('wanda@pond.example');
    const [row] = await rows();
    for (const kind of REQUEST_LETTERS) {
      const letter = await owner.get(previewRequestLetter, {
        params: { roomId, requestId: row?.id ?? '' },
        query: { kind },
      });
      expect(letter.to).toBe('wanda@pond.example');
      expect(letter.text).toContain('Dear Wanda Prest,');
      expect(letter.text).not.toContain(token);
    }
  });
});
