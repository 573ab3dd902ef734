import { performance } from 'node:perf_hooks';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { addOrder } from '@/shared/orders/contract';
import { namePages, searchAll } from '@/shared/search/contract';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { buyerIn, draftOf, lineOf, offered } from '../support/sales';
import { broodIn, type Colony, colonyIn, record, TODAY } from '../support/stock';
import { makeId, type Person, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let stranger: Known;
let roomId: string;
let colony: Colony;
let broodId: string;
let orderId: string;

beforeAll(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  colony = await colonyIn(owner, roomId);
  ({ broodId } = await broodIn(owner, roomId, colony));
  await offered(app, roomId, broodId);
  const buyer = await buyerIn(app, roomId, 'Wanda Prest');
  ({ id: orderId } = await owner.get(addOrder, { params: { roomId }, body: draftOf(buyer.id, [lineOf(broodId, 2)]) }));
  const other = await ownerWithRoom(app);
  stranger = other.owner;
  await colonyIn(other.owner, other.roomId, { code: 'SECR' });
});
afterAll(() => app.close());

const find = async (q: string, person: Person = owner) =>
  (await person.get(searchAll, { params: { roomId }, query: { q } })).found.map(
    ({ thing, code }) => `${thing} ${code}`,
  );

test('one search finds strain, colony, brood, fish, tank, order and species by what they are called', async () => {
  const found = await find('moka');
  expect(found.slice(0, 3)).toEqual(['strain MOKA', 'colony MOKA-A', 'brood MOKA-26A']);
  expect(found).toContain('fish MOKA-A01');
  expect(await find('26a')).toContain('brood MOKA-26A');
  expect(await find('a03')).toEqual(['fish MOKA-A03']);
  expect((await find('t-mo'))[0]).toBe('tank T-MOKA');
  expect(await find('1001')).toEqual(['order 1001']);
  expect(await find('wanda')).toEqual(['order 1001']);
  expect(await find('kasanga')).toContain('colony MOKA-A');
  expect(await find('tropheus dub')).toEqual(['species Tropheus duboisi']);
});

test('orders only for those who may see them, buyers’ names only for the owner', async () => {
  const keeper = await memberOf(app, roomId, 'keeper');
  expect(await find('1001', keeper)).toEqual(['order 1001']);
  expect(await find('wanda', keeper)).toEqual([]);
  for (const role of ['helper', 'viewer'] as const) {
    const person = await memberOf(app, roomId, role);
    expect(await find('1001', person), role).toEqual([]);
    const pages = { params: { roomId }, query: { pages: `order:${orderId},brood:${broodId}` } };
    expect(
      (await person.get(namePages, pages)).found.map(({ thing }) => thing),
      role,
    ).toEqual(['brood']);
  }
});

test('signs that mean something to a database mean only themselves, and another fishroom stays unseen', async () => {
  for (const q of ["' or 1=1 --", '%', '_', '\\', '*']) expect(await find(q), q).toEqual([]);
  expect(await find('secr')).toEqual([]);
  expect((await stranger.ask(searchAll, { params: { roomId }, query: { q: 'moka' } })).status).toBe(404);
});

test('what a device opened is named as it is called now, in its order; what is not there is left out', async () => {
  const pages = [
    `fish:${colony.females[0]}`,
    `brood:${broodId}`,
    `tank:${makeId()}`,
    'cook:1',
    'species:tropheus-moorii',
  ];
  const { found } = await owner.get(namePages, { params: { roomId }, query: { pages: pages.join(',') } });
  expect(found.map(({ thing, code }) => `${thing} ${code}`)).toEqual([
    'fish MOKA-A03',
    'brood MOKA-26A',
    'species Tropheus moorii',
  ]);
});

test('a fish that left is still found, after those that are here', async () => {
  const fishId = colony.females[5] ?? '';
  await record(owner, roomId, { kind: 'fishLeft', fishId, onDay: TODAY, how: 'died', cause: null, note: null });
  const { found } = await owner.get(searchAll, { params: { roomId }, query: { q: 'moka-a' } });
  expect(found.filter(({ thing }) => thing === 'fish').at(-1)).toMatchObject({ id: fishId, gone: true });
});

test('among 5,000 fish an answer is there before the next letter is typed', async () => {
  const rows = Array.from({ length: 5000 }, (_, i) => ({
    roomId,
    id: makeId(),
    code: `BULK-${String(i).padStart(4, '0')}`,
    strainId: colony.strainId,
    origin: 'founder' as const,
    createdAt: app.house.clock.now().toISOString(),
  }));
  for (let i = 0; i < rows.length; i += 500)
    await app.house.db
      .insertInto('fish')
      .values(rows.slice(i, i + 500))
      .execute();
  const took: number[] = [];
  for (const q of ['b', 'bulk', '4321', 'bulk-1', 'trop', 'nothing']) {
    const before = performance.now();
    await find(q);
    took.push(performance.now() - before);
  }
  expect(await find('4321')).toEqual(['fish BULK-4321']);
  took.sort((a, b) => a - b);
  // The pause after a letter is 150 ms; this machine may be busy with other things.
  expect(took[2]).toBeLessThan(150);
});
