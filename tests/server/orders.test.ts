import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { remind, touchLapsed } from '@/server/orders';
import { readBrood } from '@/shared/broods/contract';
import { readFish } from '@/shared/fish/contract';
import { exportBooks, readBooks } from '@/shared/orders/books';
import {
  addOrder,
  agreeTime,
  bookLoss,
  cancelOrder,
  changeLine,
  changeOrder,
  changeTerms,
  giveBack,
  handOver,
  listOrders,
  moveOrder,
  offerTimes,
  previewLetter,
  printReceipt,
  readOrder,
  recordPayment,
  returnFish,
  sendMessage,
} from '@/shared/orders/contract';
import { LETTER_KINDS } from '@/shared/orders/letterKinds';
import {
  cancelOwnOrder,
  listOwnOrders,
  pickOwnTime,
  printOwnReceipt,
  readOwnOrder,
  writeOwnMessage,
} from '@/shared/orders/own';
import { eraseBuyer, exportBuyer } from '@/shared/orders/privacy';
import { checkSheetPage } from '@/shared/sheets/contract';
import { addTank } from '@/shared/tanks/contract';
import { readToday } from '@/shared/today/contract';
import { type Known, lettersTo, memberOf, ownerWithRoom, personWithAccount } from '../support/accounts';
import { readPdf } from '../support/readPdf';
import { buyerIn, draftOf, lineOf, now, offered, ordered, type Sale, tokenOfOrder } from '../support/sales';
import { broodIn, type Colony, colonyIn, record, TODAY } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let keeper: Known;
let helper: Known;
let viewer: Known;
let roomId: string;
let colony: Colony;
let brood: Awaited<ReturnType<typeof broodIn>>;
let sale: Sale;
let buyer: Awaited<ReturnType<typeof buyerIn>>;
let broods = 0;

beforeAll(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  keeper = await memberOf(app, roomId, 'keeper');
  helper = await memberOf(app, roomId, 'helper');
  viewer = await memberOf(app, roomId, 'viewer');
  colony = await colonyIn(owner, roomId, { females: 40 });
});
afterAll(() => app.close());

/** A brood of ten fish and a buyer, for each test its own. */
beforeEach(async () => {
  broods += 1;
  const letter = 'ABCDEFGHJKLMNPQRSTUVWXYZ'[broods % 24];
  const code = `MOKA-${broods < 24 ? '26' : '25'}${letter}`;
  brood = await broodIn(owner, roomId, { ...colony, females: colony.females.slice(broods) }, { opening: 10, code });
  await offered(app, roomId, brood.broodId);
  buyer = await buyerIn(app, roomId, `Buyer ${broods}`, `buyer${broods}@pond.example`);
  sale = { app, owner, roomId, broodId: brood.broodId, buyerId: buyer.id };
});

const at = (orderId: string) => ({ params: { roomId, orderId } });
const move = async (orderId: string, what: string, depositCents: number | null = null) => {
  const { order } = await now(sale, { id: orderId });
  return owner.ask(moveOrder, { ...at(orderId), body: { version: order.version, move: what, depositCents } });
};
const available = async () =>
  (await owner.get(readBrood, { params: { roomId, broodId: brood.broodId } })).brood.available;

describe('no fish is sold twice', () => {
  test('fifty who ask at once for ten fish get exactly ten', async () => {
    const answers = await Promise.all(
      Array.from({ length: 50 }, () =>
        owner.ask(addOrder, { params: { roomId }, body: draftOf(buyer.id, [lineOf(brood.broodId, 1)]) }),
      ),
    );
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(10);
    expect(answers.filter(({ status }) => status === 409)).toHaveLength(40);
    expect(await available()).toBe(0);
    expect(new Set(answers.flatMap(({ status, body }) => (status === 200 ? [body.number] : []))).size).toBe(10);
  });

  test('an order of two broods holds both or neither', async () => {
    const other = await broodIn(
      owner,
      roomId,
      { ...colony, females: colony.females.slice(39) },
      { opening: 3, code: 'MOKA-24A' },
    );
    const lines = [lineOf(brood.broodId, 6), lineOf(other.broodId, 4)];
    const answer = await owner.ask(addOrder, { params: { roomId }, body: draftOf(buyer.id, lines) });
    expect(answer.status).toBe(409);
    expect(answer.body.error?.fields).toEqual({ 'lines.1.heads': 'At most 3' });
    expect(await available()).toBe(10);
  });

  test('twenty who ask at once for one fish with a code: one gets it', async () => {
    const fishId = colony.males[0] ?? '';
    const line = () => ({ id: makeId(), broodId: null, fishId, lot: 'single', heads: 1, note: null });
    const answers = await Promise.all(
      Array.from({ length: 20 }, () => owner.ask(addOrder, { params: { roomId }, body: draftOf(buyer.id, [line()]) })),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, ...Array(19).fill(409)]);
    const made = answers.find(({ status }) => status === 200)?.body;
    const { version } = await owner.get(changeLine, {
      params: { roomId, orderId: made?.id, lineId: made?.lines[0]?.id },
      body: { version: made?.version, heads: 1, cents: 4500 },
    });
    expect((await now(sale, { id: made?.id ?? '' })).order.totalCents).toBe(4500);
    const ready = await owner.get(moveOrder, {
      ...at(made?.id ?? ''),
      body: { version, move: 'markReady', depositCents: null },
    });
    await keeper.get(handOver, {
      ...at(made?.id ?? ''),
      body: { version: ready.version, how: 'collect', catches: [], issueSheets: true, paid: null },
    });
    const { fish } = await owner.get(readFish, { params: { roomId, fishId } });
    expect(fish.exit).toMatchObject({ kind: 'sold', onDay: TODAY });
  });

  test.each([0, -1, 1e9, 1.5, '2', null])('%s heads are refused, the field named', async (heads) => {
    const body = draftOf(buyer.id, [lineOf(brood.broodId, 1, { heads })]);
    const answer = await owner.ask(addOrder, { params: { roomId }, body });
    expect(answer.status).toBe(422);
    expect(Object.keys(answer.body.error?.fields ?? {})).toEqual(['lines.0.heads']);
  });

  test('a price from outside is refused; the server works it out by length and by lot', async () => {
    const priced = await owner.ask(addOrder, {
      params: { roomId },
      body: draftOf(buyer.id, [lineOf(brood.broodId, 1, { cents: 1 })]),
    });
    expect(priced.status).toBe(422);
    // Nobody measured: the first class, 15.00. A pair by lot: 28.00.
    const lines = [lineOf(brood.broodId, 3), lineOf(brood.broodId, 2, { lot: 'pair' })];
    const small = await owner.get(addOrder, { params: { roomId }, body: draftOf(buyer.id, lines) });
    expect(small.lines.map(({ cents }) => cents)).toEqual([4500, 2800]);
    expect(small.totalCents).toBe(7300);
    await record(owner, roomId, {
      kind: 'lengthSampled',
      sampleId: makeId(),
      of: { thing: 'batch', id: brood.batchId },
      onDay: '2026-05-10',
      measure: 'total',
      method: 'ruler',
      note: null,
      readings: [510, 530].map((lengthTenthsMm) => ({ lengthTenthsMm: lengthTenthsMm as never, weightG: null })),
    });
    // 5.2 cm on average: the class from 5 cm, 20.00.
    expect((await ordered(sale, 2)).totalCents).toBe(4000);
  });

  test('what is held is free again after the days that the owner set, and has to be reserved anew', async () => {
    const { terms } = { terms: { holdDays: 3, depositPercent: 30, lossDays: 2, words: null, bank: null } };
    await owner.get(changeTerms, { params: { roomId }, body: terms });
    const made = await ordered(sale, 8);
    expect(made.reservedUntil).toBe('2026-05-17T09:12:00.000Z');
    expect(await available()).toBe(2);
    app.later({ days: 3 });
    try {
      // A copy from before is not called unchanged once the hold is over.
      const { changeNumber } = await app.house.db
        .selectFrom('room')
        .where('id', '=', roomId)
        .select('changeNumber')
        .executeTakeFirstOrThrow();
      expect(await touchLapsed(app.house, '2026-05-17T09:00:00.000Z', '2026-05-17T09:12:00.000Z')).toBe(1);
      const after = await app.house.db
        .selectFrom('room')
        .where('id', '=', roomId)
        .select('changeNumber')
        .executeTakeFirstOrThrow();
      expect(after.changeNumber).toBe(changeNumber + 1);
      const { order } = await now(sale, made);
      expect(order).toMatchObject({ state: 'reserved', lapsed: true, reservedUntil: null });
      expect(await available()).toBe(10);
      expect((await move(made.id, 'askDeposit', 2000)).status).toBe(409);
      expect((await move(made.id, 'markReady')).status).toBe(409);
      const again = await move(made.id, 'reserve');
      expect(again.body).toMatchObject({ state: 'reserved', lapsed: false });
      expect(await available()).toBe(2);
    } finally {
      app.later({ days: -3 });
    }
  });

  test('deaths name the orders that fall short, latest first', async () => {
    const first = await ordered(sale, 4);
    const second = await ordered(sale, 5);
    await record(owner, roomId, {
      kind: 'headsLost',
      batchId: brood.batchId,
      onDay: TODAY,
      heads: 3,
      cause: 'foundDead',
      note: null,
    } as never);
    // Seven live: four for the first order, three of five for the second.
    const { orders } = await owner.get(listOrders, { params: { roomId }, query: { which: 'open' } });
    expect(orders.find(({ id }) => id === first.id)?.short).toBe(0);
    expect(orders.find(({ id }) => id === second.id)?.short).toBe(2);
    const today = await owner.get(readToday, { params: { roomId } });
    expect(today.orders.find(({ id }) => id === second.id)).toMatchObject({
      short: 2,
      what: expect.stringContaining('5 ×'),
    });
    expect((await move(second.id, 'markReady')).status).toBe(409);
    const lineId = second.lines[0]?.id ?? '';
    const fewer = await owner.get(changeLine, {
      params: { roomId, orderId: second.id, lineId },
      body: { version: second.version, heads: 3, cents: null },
    });
    expect(fewer).toMatchObject({ short: 0, totalCents: 4500 });
  });
});

describe('an order', () => {
  test('goes its way to the closed book: heads, sheet, receipt and money agree', async () => {
    const made = await ordered(sale, 4);
    expect(made).toMatchObject({ state: 'reserved', totalCents: 6000, toPayCents: 6000 });
    expect((await move(made.id, 'askDeposit', 2000)).body).toMatchObject({ state: 'depositAsked', hasDeposit: true });
    const paid = await owner.get(recordPayment, {
      ...at(made.id),
      body: { id: makeId(), kind: 'deposit', method: 'transfer', cents: 2000, onDay: TODAY, note: null },
    });
    expect(paid).toMatchObject({ state: 'depositPaid', toPayCents: 4000, reservedUntil: null });
    expect((await move(made.id, 'close')).status).toBe(409);
    const ready = await move(made.id, 'markReady');
    expect(ready.body.state).toBe('ready');

    const page = await keeper.get(readOrder, at(made.id));
    expect(page.catches[0]?.tanks[0]).toMatchObject({ batchId: brood.batchId, balance: 10, heads: 4 });
    const gone = await owner.get(handOver, {
      ...at(made.id),
      body: {
        version: ready.body.version,
        how: 'collect',
        catches: [],
        issueSheets: true,
        paid: { id: makeId(), method: 'cash', cents: 4000 },
      },
    });
    expect(gone).toMatchObject({ state: 'collected', toPayCents: 0 });
    const { brood: after, batches } = await owner.get(readBrood, { params: { roomId, broodId: brood.broodId } });
    expect(after).toMatchObject({ heads: 6, reserved: 0, available: 6 });
    expect(batches[0]?.lines.at(-1)).toMatchObject({ kind: 'sold', heads: 4, note: `Order ${made.number}` });

    const whole = await now(sale, made);
    expect(whole.sheets).toHaveLength(1);
    const sheet = await app.person().get(checkSheetPage, { params: { token: whole.sheets[0]?.token } });
    expect(sheet.state).toBe('valid');
    const pdf = await owner.raw('GET', `/api/rooms/${roomId}/orders/${made.id}/receipt/a4`);
    expect(pdf.headers.get('content-type')).toBe('application/pdf');
    const pages = await readPdf(Buffer.from(await pdf.arrayBuffer()));
    const text = pages.flatMap(({ lines }) => lines.map((line) => line.text)).join('\n');
    for (const says of [`order ${made.number}`, buyer.name, '€60.00', '-€20.00', '-€40.00'])
      expect(text.replace(/−/g, '-')).toContain(says);

    expect((await move(made.id, 'close')).body.state).toBe('closed');
    const subjects = (await lettersTo(app, buyer.email)).map(({ subject }) =>
      subject.replace(`Order ${made.number}: `, ''),
    );
    expect(subjects).toEqual([
      'the fish are held for you',
      'a deposit of €20.00',
      'your payment has arrived',
      'your fish are ready',
      'the lineage sheets',
    ]);
  });

  test('refuses every step out of its order', async () => {
    const made = await owner.get(addOrder, {
      params: { roomId },
      body: draftOf(buyer.id, [lineOf(brood.broodId, 2)], { reserve: false }),
    });
    expect(made.state).toBe('requested');
    for (const step of ['askDeposit', 'forgoDeposit', 'markReady', 'close'])
      expect((await move(made.id, step, 500)).status, step).toBe(409);
    const early = await keeper.ask(handOver, {
      ...at(made.id),
      body: { version: made.version, how: 'collect', catches: [], issueSheets: false, paid: null },
    });
    expect(early.status).toBe(409);
    expect((await move(made.id, 'reserve')).status).toBe(200);
    expect((await move(made.id, 'reserve')).status).toBe(409);
    expect((await move(made.id, 'collect')).status).toBe(422);
  });

  test('is not handed over by halves: when one line can’t leave, nothing does', async () => {
    const made = await owner.get(addOrder, {
      params: { roomId },
      body: draftOf(buyer.id, [lineOf(brood.broodId, 2), lineOf(brood.broodId, 3)]),
    });
    const { body } = await move(made.id, 'markReady');
    const wrong = await keeper.ask(handOver, {
      ...at(made.id),
      body: {
        version: body.version,
        how: 'collect',
        catches: [{ lineId: made.lines[1]?.id, batchId: brood.batchId, heads: 2 }],
        issueSheets: true,
        paid: null,
      },
    });
    expect(wrong.status).toBe(409);
    const page = await now(sale, made);
    expect(page.order.state).toBe('ready');
    expect(page.sheets).toEqual([]);
    const { brood: after } = await owner.get(readBrood, { params: { roomId, broodId: brood.broodId } });
    expect(after).toMatchObject({ heads: 10, reserved: 5 });
  });

  test('that was seen in an older state is not changed, and comes back as it is', async () => {
    const made = await ordered(sale, 2);
    await owner.get(changeOrder, {
      ...at(made.id),
      body: { version: made.version, discountCents: 500, note: 'From the fair' },
    });
    const late = await owner.ask(cancelOrder, { ...at(made.id), body: { version: made.version, because: 'No' } });
    expect(late.status).toBe(409);
    expect(late.body.error?.current).toMatchObject({ id: made.id, totalCents: 2500 });
  });

  test('gives no more discount than it costs', async () => {
    const made = await ordered(sale, 2);
    const answer = await owner.ask(changeOrder, {
      ...at(made.id),
      body: { version: made.version, discountCents: 3001, note: null },
    });
    expect(answer.body.error?.fields).toEqual({ discountCents: 'At most €30.00' });
  });

  test('as a gift costs nothing and leaves as given', async () => {
    const made = await owner.get(addOrder, {
      params: { roomId },
      body: draftOf(buyer.id, [lineOf(brood.broodId, 2)], { way: 'gift' }),
    });
    expect(made.totalCents).toBe(0);
    const { body } = await move(made.id, 'markReady');
    await keeper.get(handOver, {
      ...at(made.id),
      body: { version: body.version, how: 'collect', catches: [], issueSheets: false, paid: null },
    });
    const { batches } = await owner.get(readBrood, { params: { roomId, broodId: brood.broodId } });
    expect(batches[0]?.lines.at(-1)).toMatchObject({ kind: 'given', heads: 2 });
  });

  test('cancelled frees its fish and shows what must go back', async () => {
    const made = await ordered(sale, 4);
    const body = { id: makeId(), kind: 'balance', method: 'cash', cents: 1000, onDay: TODAY, note: null };
    const paid = await owner.get(recordPayment, { ...at(made.id), body });
    const off = await owner.get(cancelOrder, { ...at(made.id), body: { version: paid.version, because: 'No tank' } });
    expect(off).toMatchObject({ state: 'cancelled', toPayCents: 0, toReturnCents: 1000 });
    expect(await available()).toBe(10);
    const refund = (cents: number) =>
      owner.ask(giveBack, {
        ...at(made.id),
        body: { id: makeId(), paymentId: body.id, cents, because: 'refund', note: null },
      });
    expect((await refund(1001)).status).toBe(409);
    expect((await refund(1000)).body).toMatchObject({ toReturnCents: 0 });
    expect((await refund(1)).status).toBe(409);
  });
});

describe('after the fish have left', () => {
  const handed = async (heads = 4) => {
    const made = await ordered(sale, heads);
    const { body } = await move(made.id, 'markReady');
    return owner.get(handOver, {
      ...at(made.id),
      body: { version: body.version, how: 'send', catches: [], issueSheets: true, paid: null },
    });
  };

  test('what comes back goes to quarantine and is not available', async () => {
    const gone = await handed();
    const tankId = makeId();
    const tank = { id: tankId, code: `Q${broods}`, place: null, walkOrder: 0, litres: 60, heaterC: 26, note: null };
    const sides = {
      lengthTenthsMm: null,
      widthTenthsMm: null,
      heightTenthsMm: null,
      fillTenthsMm: null,
      glassTenthsMm: null,
      standKg: null,
    };
    await owner.get(addTank, { params: { roomId }, body: { ...tank, ...sides, purpose: 'quarantine' } });
    const body = { id: makeId(), lineId: gone.lines[0]?.id, heads: 2, onDay: TODAY, note: 'Too small for his tank' };
    const wrong = await keeper.ask(returnFish, { ...at(gone.id), body: { ...body, tankId: brood.tankId } });
    expect(wrong.body.error?.fields).toEqual({ tankId: 'Choose a quarantine tank' });
    const back = await keeper.get(returnFish, { ...at(gone.id), body: { ...body, tankId } });
    expect(back.lines[0]?.returnedHeads).toBe(2);
    const { brood: after, batches } = await owner.get(readBrood, { params: { roomId, broodId: brood.broodId } });
    expect(after).toMatchObject({ heads: 8, available: 6 });
    expect(batches.find(({ tank: here }) => here?.id === tankId)?.balance).toBe(2);
  });

  test('losses on the way are made good within the days of the terms', async () => {
    await owner.get(changeTerms, {
      params: { roomId },
      body: { holdDays: 7, depositPercent: 30, lossDays: 2, words: null, bank: null },
    });
    const gone = await handed();
    const book = (heads: number, beyondTerms = false) =>
      owner.ask(bookLoss, { ...at(gone.id), body: { lineId: gone.lines[0]?.id, heads, beyondTerms } });
    expect((await book(5)).status).toBe(409);
    expect((await book(1)).body.lines[0]?.lostHeads).toBe(1);
    app.later({ days: 3 });
    try {
      expect((await book(1)).status).toBe(409);
      expect((await book(1, true)).status).toBe(200);
    } finally {
      app.later({ days: -3 });
    }
  });
});

describe('who sees what', () => {
  test('a keeper what to catch and when, and neither money nor the buyer; helpers and viewers no order at all', async () => {
    const made = await ordered(sale, 4);
    await owner.get(sendMessage, { ...at(made.id), body: { id: makeId(), body: 'They eat well' } });
    const page = await keeper.get(readOrder, at(made.id));
    expect(page.owner).toBeNull();
    expect(page.order).toMatchObject({
      buyer: null,
      totalCents: null,
      toPayCents: null,
      toReturnCents: null,
      flaggedCents: null,
      unread: null,
    });
    expect(page.order.lines[0]).toMatchObject({ heads: 4, cents: null });
    const whole = JSON.stringify(await keeper.get(listOrders, { params: { roomId } })) + JSON.stringify(page);
    for (const secret of [buyer.name, buyer.email, 'Weir Lane', '1234567', 'Comes by train', '6000'])
      expect(whole).not.toContain(secret);
    for (const person of [helper, viewer]) {
      expect((await person.ask(listOrders, { params: { roomId } })).status).toBe(403);
      expect((await person.ask(readOrder, at(made.id))).status).toBe(403);
      expect((await person.get(readToday, { params: { roomId } })).orders).toEqual([]);
    }
    const today = await keeper.get(readToday, { params: { roomId } });
    expect(today.orders.find(({ id }) => id === made.id)).toMatchObject({ buyerName: null, toPayCents: null });
    const money = {
      version: made.version,
      how: 'collect',
      catches: [],
      issueSheets: false,
      paid: { id: makeId(), method: 'cash', cents: 1 },
    };
    expect((await keeper.ask(handOver, { ...at(made.id), body: money })).status).toBe(403);
  });

  test('the buyer sees the own order by the link, picks an offered time, writes, and nothing else', async () => {
    const made = await ordered(sale, 4);
    const token = await tokenOfOrder(sale, made);
    expect(token).toMatch(/^[\w-]{43}$/);
    const stored = await app.house.db
      .selectFrom('purchase')
      .where('id', '=', made.id)
      .select('tokenHash')
      .executeTakeFirstOrThrow();
    expect(stored.tokenHash).not.toContain(token);
    const guest = app.person();
    const wrong = `${token.startsWith('A') ? 'B' : 'A'}${token.slice(1)}`;
    expect((await guest.ask(readOwnOrder, { params: { token: wrong } })).status).toBe(404);
    const { version } = await owner.get(offerTimes, {
      ...at(made.id),
      body: { version: made.version, times: ['2026-05-20T10:30', '2026-05-21T17:00'] },
    });
    expect((await guest.ask(pickOwnTime, { params: { token }, body: { time: '2026-05-22T10:00' } })).status).toBe(409);
    const picked = await guest.get(pickOwnTime, { params: { token }, body: { time: '2026-05-20T10:30' } });
    expect(picked.agreedTime).toBe('2026-05-20T10:30');
    await guest.get(writeOwnMessage, { params: { token }, body: { id: makeId(), body: 'May I bring my daughter?' } });
    const waiting = await owner.get(readToday, { params: { roomId } });
    expect(waiting.orders.find(({ id }) => id === made.id)?.waitsSince).toBe(TODAY);
    const seen = await keeper.get(readToday, { params: { roomId } });
    expect(seen.orders.find(({ id }) => id === made.id)?.waitsSince).toBeNull();
    const { order } = await now(sale, made);
    expect(order).toMatchObject({ agreedTime: '2026-05-20T10:30', unread: 1 });
    expect(order.version).toBeGreaterThan(version);
    const answer = await guest.ask(readOwnOrder, { params: { token } });
    expect(answer.headers.get('x-robots-tag')).toBe('noindex');
    expect(answer.headers.get('referrer-policy')).toBe('no-referrer');
    expect(JSON.stringify(answer.body)).not.toContain('Comes by train');
    const letter = (await lettersTo(app, buyer.email)).at(-1);
    expect(letter?.subject).toContain('Wed 20 May, 10:30');
    expect(letter?.attachments[0]?.content.toString()).toMatch(/DTSTART;VALUE=DATE:20260520\r\n/);
    expect((await guest.get(cancelOwnOrder, { params: { token }, body: { because: 'Flooded' } })).state).toBe(
      'cancelled',
    );
    expect(await available()).toBe(10);
  });

  test('an account of the same, confirmed address lists its orders', async () => {
    const made = await ordered(sale, 1);
    const same = await personWithAccount(app, { email: buyer.email.toUpperCase() });
    expect((await same.get(listOwnOrders)).orders).toMatchObject([
      { number: made.number, token: await tokenOfOrder(sale, made) },
    ]);
    const unsure = await personWithAccount(app, { email: `x${buyer.email}`, verified: false });
    await app.house.db
      .updateTable('buyer')
      .set({ email: `x${buyer.email}` })
      .where('id', '=', buyer.id)
      .execute();
    expect((await unsure.get(listOwnOrders)).orders).toEqual([]);
  });

  test('no order holds what is another fishroom’s', async () => {
    const { owner: bob, roomId: his } = await ownerWithRoom(app);
    const theirs = await buyerIn(app, his);
    const alien = await bob.ask(addOrder, {
      params: { roomId: his },
      body: draftOf(theirs.id, [lineOf(brood.broodId, 1)]),
    });
    expect(alien.body.error?.fields).toEqual({ 'lines.0.broodId': 'Choose a brood' });
    const stranger = await bob.ask(addOrder, {
      params: { roomId: his },
      body: draftOf(buyer.id, [lineOf(brood.broodId, 1)]),
    });
    expect(stranger.body.error?.fields).toEqual({ buyerId: 'Choose a buyer' });
  });
});

describe('letters, books, and what is held about a buyer', () => {
  test('every letter can be read before it goes', async () => {
    const made = await ordered(sale, 4);
    for (const kind of LETTER_KINDS) {
      const letter = await owner.get(previewLetter, { ...at(made.id), query: { kind } });
      expect(letter.to, kind).toBe(buyer.email);
      expect(letter.subject, kind).toContain(String(made.number));
      expect(letter.text, kind).toContain(await tokenOfOrder(sale, made));
      expect(letter.html, kind).not.toContain('{{token}}');
    }
    expect((await keeper.ask(previewLetter, { ...at(made.id), query: { kind: 'ready' } })).status).toBe(403);
  });

  test('the day before a collection, one letter says so', async () => {
    const made = await ordered(sale, 2);
    await owner.get(agreeTime, { ...at(made.id), body: { version: made.version, time: '2026-05-15T16:00' } });
    expect(await remind(app.house)).toBe(1);
    expect(await remind(app.house)).toBe(0);
    const letter = (await lettersTo(app, buyer.email)).at(-1);
    expect(letter?.subject).toBe(`Order ${made.number}: your fish, tomorrow, 16:00`);
    expect(letter?.text).toContain('Never release fish');
  });

  test('the books list every payment once, and a name can’t become a formula', async () => {
    await app.house.db
      .updateTable('buyer')
      .set({ name: '=HYPERLINK("http://evil.test")' })
      .where('id', '=', buyer.id)
      .execute();
    const made = await ordered(sale, 2);
    const paymentId = makeId();
    const body = { id: paymentId, kind: 'balance', method: 'cash', cents: 1234, onDay: '2026-05-03', note: '+49' };
    await owner.get(recordPayment, { ...at(made.id), body });
    expect((await owner.ask(recordPayment, { ...at(made.id), body })).status).toBe(409);
    const books = await owner.get(readBooks, { params: { roomId }, query: { year: '2026' } });
    expect(books.lines.filter(({ id }) => id === paymentId)).toHaveLength(1);
    const may = books.sum.months.find(({ month }) => month === '2026-05');
    expect(may?.receivedCents).toBe(
      books.lines
        .filter(({ onDay, cents }) => onDay.startsWith('2026-05') && cents > 0)
        .reduce((sum, { cents }) => sum + cents, 0),
    );
    const csv = await (await owner.raw('GET', `/api/rooms/${roomId}/books/csv?year=2026`)).text();
    expect(csv).toContain(
      `2026-05-03,${made.number},"'=HYPERLINK(""http://evil.test"")",Payment,cash,12.34,,EUR,,'+49`,
    );
    for (const person of [keeper, helper, viewer]) {
      expect((await person.ask(readBooks, { params: { roomId } })).status).toBe(403);
      expect((await person.ask(exportBooks, { params: { roomId } })).status).toBe(403);
    }
  });

  test('a payment is never edited and never deleted', async () => {
    const made = await ordered(sale, 2);
    const body = { id: makeId(), kind: 'balance', method: 'cash', cents: 100, onDay: TODAY, note: null };
    await owner.get(recordPayment, { ...at(made.id), body });
    const { db } = app.house;
    await expect(db.updateTable('payment').set({ cents: 1 }).where('id', '=', body.id).execute()).rejects.toThrow(
      /append-only/,
    );
    await expect(db.deleteFrom('payment').where('id', '=', body.id).execute()).rejects.toThrow(/append-only/);
  });

  test('a buyer gets a copy of all that is held, and is erased: numbers stay, the name goes', async () => {
    const made = await ordered(sale, 2);
    const at1 = { params: { roomId, buyerId: buyer.id } };
    expect((await owner.ask(eraseBuyer, at1)).status).toBe(409);
    const { body } = await move(made.id, 'markReady');
    const gone = await owner.get(handOver, {
      ...at(made.id),
      body: {
        version: body.version,
        how: 'collect',
        catches: [],
        issueSheets: true,
        paid: { id: makeId(), method: 'cash', cents: 3000 },
      },
    });
    await app.person().get(writeOwnMessage, {
      params: { token: await tokenOfOrder(sale, gone) },
      body: { id: makeId(), body: 'Thank you, Bo' },
    });
    const copy = await (await owner.raw('GET', `/api/rooms/${roomId}/buyers/${buyer.id}/data`)).text();
    for (const held of [buyer.name, 'Weir Lane 2', 'Thank you, Bo', String(made.number)]) expect(copy).toContain(held);
    expect((await keeper.ask(exportBuyer, at1)).status).toBe(403);
    await owner.get(eraseBuyer, at1);
    const page = await now(sale, made);
    expect(page.order.buyer?.code).toBe('Erased buyer');
    expect(page.owner?.payments).toHaveLength(1);
    expect(page.sheets).toHaveLength(1);
    const rows = await app.house.db.selectFrom('buyer').where('id', '=', buyer.id).selectAll().execute();
    const left = JSON.stringify([
      page,
      rows,
      await app.house.db.selectFrom('letter').selectAll().execute(),
      await app.house.db.selectFrom('receipt').selectAll().execute(),
    ]);
    for (const person of [`"${buyer.name}"`, buyer.email, 'Weir Lane 2', 'Thank you, Bo'])
      expect(left).not.toContain(person);
    const pdf = await owner.ask(printReceipt, { params: { roomId, orderId: made.id, paper: 'letter' } });
    expect(pdf.status).toBe(200);
    expect(
      (await app.person().ask(printOwnReceipt, { params: { token: await tokenOfOrder(sale, made), paper: 'a4' } }))
        .status,
    ).toBe(200);
  });
});
