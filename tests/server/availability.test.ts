import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { readAvailable, showAvailablePhoto } from '@/shared/buyers/available';
import { listOffers, setListing, setPublicPage } from '@/shared/buyers/offers';
import { addOrder } from '@/shared/orders/contract';
import { getRoom } from '@/shared/rooms/contract';
import { TenthsMm } from '@/shared/units';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { buyerIn, draftOf, lineOf } from '../support/sales';
import { broodIn, colonyIn, record, TODAY } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;
let slug: string;
let broodId: string;
let shy: string;

/** A brood of ten, measured today at 48, 50 and 52 mm: the mean is 50. Another that nobody lists. */
beforeAll(async () => {
  app = await testApp({ webFolder: 'public' });
  ({ owner, roomId } = await ownerWithRoom(app));
  slug = (await owner.get(getRoom, { params: { roomId } })).slug;
  const colony = await colonyIn(owner, roomId, { females: 4 });
  ({ broodId } = await broodIn(owner, roomId, colony, { opening: 10 }));
  const other = { ...colony, females: colony.females.slice(1) };
  ({ broodId: shy } = await broodIn(owner, roomId, other, { opening: 5, code: 'MOKA-26B' }));
  await record(owner, roomId, {
    kind: 'lengthSampled',
    sampleId: makeId(),
    of: { thing: 'brood', id: broodId },
    onDay: TODAY,
    measure: 'total',
    method: 'ruler',
    readings: [480, 500, 520].map((mm) => ({ lengthTenthsMm: TenthsMm.parse(mm), weightG: null })),
    note: null,
  });
});
afterAll(() => app.close());

const said = (more: object = {}) => ({
  version: null,
  listed: true,
  classes: [
    { fromTenthsMm: 300, cents: 1500 },
    { fromTenthsMm: 500, cents: 2000 },
  ],
  lots: [{ lot: 'pair', heads: 2, cents: 3600 }],
  note: 'Groups of four or more',
  photoId: null,
  ...more,
});
const list = (body: object, who: Known = owner) => who.ask(setListing, { params: { roomId, broodId }, body });
const offerOf = async (who: Known = owner) =>
  (await who.get(listOffers, { params: { roomId } })).offers.find((one) => one.broodId === broodId);
const html = async (word = slug) => {
  const answer = await app.person().raw('GET', `/available/${word}`, { headers: { accept: 'text/html' } });
  return { status: answer.status, text: await answer.text() };
};

describe('before anything is listed', () => {
  test('there is no public page', async () => {
    expect((await app.person().ask(readAvailable, { params: { slug } })).status).toBe(404);
    expect((await html()).status).toBe(404);
    expect((await html('nowhere-at-all')).status).toBe(404);
  });

  test('a price of nothing, classes out of order and a pair of three are refused where they stand', async () => {
    const free = await list(said({ classes: [{ fromTenthsMm: 300, cents: 0 }] }));
    expect(free.body.error?.fields).toEqual({ 'classes.0.cents': 'Must be above zero' });
    const fallen = await list(said({ classes: [...said().classes].reverse() }));
    expect(fallen.body.error?.fields).toEqual({ classes: 'Each class begins above the one before' });
    const three = await list(said({ lots: [{ lot: 'pair', heads: 3, cents: 3600 }] }));
    expect(three.body.error?.fields).toEqual({ 'lots.0.heads': 'A pair is 2' });
  });
});

describe('what the owner lists', () => {
  test('is what the ledger has, less what is reserved, at its size today', async () => {
    expect((await list(said())).status).toBe(200);
    const buyer = await buyerIn(app, roomId);
    await owner.get(addOrder, { params: { roomId }, body: draftOf(buyer.id, [lineOf(broodId, 4)]) });
    const offer = await offerOf();
    expect(offer).toMatchObject({ heads: 10, reserved: 4, kept: 0, available: 6 });
    expect(offer?.size).toMatchObject({ meanTenthsMm: 500, measuredOn: TODAY, fish: 3, samples: 1 });
    expect(offer?.listing?.prices?.lots).toEqual([{ lot: 'pair', heads: 2, cents: 3600 }]);
  });

  test('an order is priced by the size today: at 5 cm the second class counts', async () => {
    const buyer = await buyerIn(app, roomId, 'Odile Marr', 'odile@pond.example');
    const draft = draftOf(buyer.id, [lineOf(broodId, 2)], { reserve: false });
    const order = await owner.get(addOrder, { params: { roomId }, body: draft });
    expect(order.totalCents).toBe(4000);
  });

  test('two who change it at once: the second is shown what is there now', async () => {
    const { listing } = (await offerOf()) ?? {};
    expect((await list(said({ version: listing?.version, note: 'Fed on flakes' }))).status).toBe(200);
    const late = await list(said({ version: listing?.version, note: 'Late' }));
    expect(late.status).toBe(409);
    expect(late.body.error?.current).toMatchObject({ listing: { note: 'Fed on flakes' } });
  });

  test('keepers see what there is and not what it costs; helpers see neither', async () => {
    const keeper = await memberOf(app, roomId, 'keeper');
    expect(await offerOf(keeper)).toMatchObject({ available: 6, listing: { listed: true, prices: null } });
    expect((await list(said(), keeper)).status).toBe(403);
    const helper = await memberOf(app, roomId, 'helper');
    expect((await helper.ask(listOffers, { params: { roomId } })).status).toBe(403);
  });
});

describe('the public page', () => {
  test('tells anyone of what is listed, and of nothing else', async () => {
    await owner.get(setPublicPage, {
      params: { roomId },
      body: { words: 'Tropheus & more <b>', contact: 'Ring 0151 2', photoId: null },
    });
    const page = await app.person().get(readAvailable, { params: { slug } });
    expect(page.fish.map(({ code }) => code)).toEqual(['MOKA-26A']);
    expect(page.fish[0]).toMatchObject({ available: 6, lengthTenthsMm: 500, eachCents: 2000, coming: null });
    expect(JSON.stringify(page)).not.toContain(shy);
    expect(JSON.stringify(page)).not.toContain('wanda@pond.example');
  });

  test('says generation, expected F and possible parents of wild parents', async () => {
    const { fish } = await app.person().get(readAvailable, { params: { slug } });
    // Of wild parents the young are F1; founders are taken as unrelated, which gives F = 0.
    expect(fish[0]?.lineage).toMatchObject({ generation: 'F1', inbreeding: 'F\u00a0=\u00a00.000' });
    expect(fish[0]?.lineage.parents.map(({ role, codes }) => [role, codes[0]])).toEqual([
      ['sire', 'MOKA-A01'],
      ['sire', 'MOKA-A02'],
      ['dam', 'MOKA-A03'],
    ]);
  });

  test('is readable as it is sent: name, number, size, price, how to ask', async () => {
    const { status, text } = await html();
    expect(status).toBe(200);
    const boot = text.slice(text.indexOf('<div id="boot">'), text.indexOf('<script type="application/json"'));
    for (const words of [
      'Tropheus moorii',
      '<b>6</b> <small>available',
      '5.0 cm',
      '€20.00',
      'How to ask',
      'Ring 0151 2',
    ])
      expect(boot).toContain(words);
    expect(boot).toContain('Tropheus &amp; more &lt;b&gt;');
    expect(text).toContain(`<meta property="og:title" content="`);
    expect(text).toMatch(/<meta name="description" content="Available now: 6 Tropheus moorii/);
    expect(text).toMatch(/<meta property="og:image" content="http[^"]+"/);
    expect(text.match(/<title>/g)).toHaveLength(1);
  });

  test('shows only the pictures that stand on it', async () => {
    const params = { slug, photoId: makeId(), size: 'small' };
    expect((await app.person().ask(showAvailablePhoto, { params })).status).toBe(404);
  });

  test('fish below their first class are coming; without any they are sold out', async () => {
    const { listing } = (await offerOf()) ?? {};
    const later = said({ version: listing?.version, classes: [{ fromTenthsMm: 700, cents: 2500 }] });
    expect((await list(later)).status).toBe(200);
    const { fish } = await app.person().get(readAvailable, { params: { slug } });
    expect(fish[0]?.coming).toEqual({ lengthTenthsMm: 700, on: null });
  });
});
