import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { addOrder, agreeTime } from '@/shared/orders/contract';
import { addTask, changeTask, decideTask, readTask, readToday } from '@/shared/today/contract';
import type { Due } from '@/shared/today/due';
import { type Today, todayOf } from '@/shared/today/todayOf';
import { METRIC } from '@/shared/units';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { buyerIn, draftOf, lineOf, offered } from '../support/sales';
import { broodIn, type Colony, colonyIn, holdIn, NO_NUMBERS, record, TODAY, tankIn, tryRecord } from '../support/stock';
import { makeId, type Person, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let keeper: Known;
let helper: Known;
let viewer: Known;
let roomId: string;

const todayFor = async (person: Person): Promise<Today> =>
  todayOf(await person.get(readToday, { params: { roomId } }), METRIC);
const findIn = ({ due, ahead }: Today, test: (one: Due) => boolean) => [...due, ...ahead].find(test);

beforeAll(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  keeper = await memberOf(app, roomId, 'keeper');
  helper = await memberOf(app, roomId, 'helper');
  viewer = await memberOf(app, roomId, 'viewer');
});
afterAll(() => app.close());

/*
 * A fishroom on Thursday 14 May 2026, Oslo time. Every kind of task that is worked out, with its day worked out by hand.
 */
describe('what the program works out', () => {
  let today: Today;
  let colony: Colony;
  let holdId: string;
  let batchId: string;

  beforeAll(async () => {
    colony = await colonyIn(owner, roomId, { females: 8 });
    // 27 °C throughout: the temperature for which the species' days are given, so that no rate comes into it.
    const tested = await tryRecord(owner, roomId, {
      kind: 'waterTested',
      tankId: colony.tankId,
      onDay: '2026-04-20',
      celsius: 27,
      ph: null,
      ghCaCo3MgL: null,
      khCaCo3MgL: null,
      totalAmmoniaNMgL: null,
      nitriteNMgL: null,
      nitrateNMgL: null,
      conductivityUs: null,
      asRead: {},
      note: null,
    });
    expect(tested.status).toBe(200);
    const spawn = { from: '2026-04-20', until: '2026-04-20' };
    holdId = await holdIn(owner, roomId, colony, { holderId: colony.females[1] ?? null, ...spawn });
    ({ batchId } = await eggsOf(colony));
    await care(colony.tankId);
    await sale(colony);
    today = await todayFor(owner);
  });

  /** Stripped as eggs on 12 May, not yet counted as fry. */
  async function eggsOf({ females, tankId, colonyId, males }: Colony) {
    const [broodId, batch] = [makeId(), makeId()];
    const from = { strainId: '', tankId, colonyId, males, females };
    const eggs = await holdIn(owner, roomId, from, {
      holderId: females[2] ?? null,
      from: '2026-05-01',
      until: '2026-05-01',
    });
    await record(owner, roomId, {
      kind: 'holdEnded',
      holdId: eggs,
      onDay: '2026-05-12',
      outcome: 'stripped',
      note: null,
      brood: {
        broodId,
        batchId: batch,
        code: 'MOKA-26E',
        tankId: await tankIn(owner, roomId, 'E1', 20),
        opening: null,
        numbers: { ...NO_NUMBERS, total: 18 },
      },
    });
    return { batchId: batch };
  }

  async function care(tankId: string) {
    await record(owner, roomId, {
      kind: 'treatmentStarted',
      careId: makeId(),
      tankId,
      onDay: '2026-05-09',
      what: 'Praziquantel',
      why: 'Flukes seen in a scrape',
      dose: null,
      untilDay: '2026-05-16',
      note: null,
    });
    await record(owner, roomId, {
      kind: 'quarantineStarted',
      careId: makeId(),
      tankId: await tankIn(owner, roomId, 'Q1', 100),
      onDay: '2026-04-10',
      untilDay: '2026-05-08',
      why: null,
      note: null,
    });
  }

  async function sale(from: Colony) {
    const { broodId } = await broodIn(owner, roomId, from);
    await offered(app, roomId, broodId);
    const buyer = await buyerIn(app, roomId);
    const order = () => draftOf(buyer.id, [lineOf(broodId, 2)]);
    await owner.get(addOrder, { params: { roomId }, body: order() });
    const { id, version } = await owner.get(addOrder, { params: { roomId }, body: order() });
    const body = { version, time: '2026-05-15T16:30' };
    await owner.get(agreeTime, { params: { roomId, orderId: id }, body });
  }

  const NAMES: Record<string, () => string> = {
    hold: () => holdId,
    batch: () => batchId,
  };
  test.each([
    // First seen on 20 April, looked at every 7 days: 27 April, 17 days ago.
    ['holdCheck', 'hold', '2026-04-27', 17],
    // T. moorii is stripped from day 21 to 28 of 28, day 1 being the spawn: from 10 to 17 May, and so not late today.
    ['stripWindow', 'hold', '2026-05-10', 0],
    // 28 days after 20 April.
    ['release', 'hold', '2026-05-18', -4],
    // Eggs of 12 May, looked at every second day.
    ['stageCount', 'batch', '2026-05-14', 0],
    // Counted as 34 fry on 28 April, again after 14 days.
    ['headCount', 'MOKA-26A', '2026-05-12', 2],
    ['lengthSample', 'MOKA-26A', '2026-05-12', 2],
    // Tested on 20 April, every 14 days.
    ['waterTest', 'T-MOKA', '2026-05-04', 10],
    // Never changed since the fish came in on 1 January, every 7 days: due on 8 January, which is 126 days ago.
    ['waterChange', 'T-MOKA', '2026-01-08', 126],
    ['treatmentEnd', 'T-MOKA', '2026-05-16', -2],
    ['quarantineEnd', 'Q1', '2026-05-08', 6],
    // Fish are held for 7 days from today: until 21 May. A word two days before.
    ['reservationEnds', '1001', '2026-05-19', -5],
    ['collection', '1002', '2026-05-15', -1],
  ])('%s of %s is due on %s', (kind, of, dueOn, lateDays) => {
    const id = NAMES[of]?.();
    const found = findIn(today, (one) => one.kind === kind && (id ? one.id === id : one.code === of));
    expect(found && { dueOn: found.dueOn, lateDays: found.lateDays }).toEqual({ dueOn, lateDays });
  });

  test('what is recorded settles its task', async () => {
    const before = findIn(today, ({ kind, code }) => kind === 'waterChange' && code === 'T-MOKA');
    const changed = { kind: 'waterChanged', tankId: colony.tankId, onDay: TODAY, percent: 40, note: null };
    expect((await tryRecord(owner, roomId, changed)).status).toBe(200);
    const after = findIn(await todayFor(owner), ({ kind, code }) => kind === 'waterChange' && code === 'T-MOKA');
    expect(before?.dueOn).toBe('2026-01-08');
    expect(after).toMatchObject({ dueOn: '2026-05-21', amount: 40 });
  });

  test('a keeper sees what to catch without a price, a helper and a viewer no order at all', async () => {
    const seen = async (person: Person) => (await person.get(readToday, { params: { roomId } })).orders;
    expect((await seen(owner)).map(({ toPayCents }) => typeof toPayCents)).toContain('number');
    const ofKeeper = await seen(keeper);
    expect(ofKeeper.length).toBeGreaterThan(0);
    for (const order of ofKeeper)
      expect([order.toPayCents, order.buyerName, order.waitsSince]).toEqual([null, null, null]);
    for (const person of [helper, viewer]) {
      expect(await seen(person)).toEqual([]);
      const { due, ahead } = await todayFor(person);
      expect([...due, ...ahead].filter(({ thing }) => thing === 'order')).toEqual([]);
    }
  });
});

const NOTHING = { because: null, until: null, assignedTo: null };
const decide = (person: Person, taskKey: string, decision: object) =>
  person.ask(decideTask, { params: { roomId, taskKey }, body: { ...NOTHING, ...decision } });
const own = (facts: object = {}) => ({
  id: makeId(),
  title: 'Clean the canister of rack B',
  dueOn: TODAY,
  everyDays: null,
  onWeekday: null,
  assignedTo: null,
  about: null,
  ...facts,
});
const add = (facts: object = {}, person: Person = helper) =>
  person.get(addTask, { params: { roomId }, body: own(facts) });
const titled = (today: Today, title: string) => [...today.due, ...today.ahead].filter((one) => one.title === title);

describe('deciding about a task', () => {
  let key: string;
  beforeAll(async () => {
    key = (await todayFor(helper)).due.find(({ kind }) => kind === 'headCount')?.key ?? '';
    expect(key).toMatch(/^headCount:/);
  });
  const there = async () => findIn(await todayFor(helper), (one) => one.key === key);

  test('skipped with a reason it is gone, with who and why, and comes back when brought back', async () => {
    expect((await decide(helper, key, { decision: 'skip' })).body.error?.fields).toEqual({
      because: 'Say why it is skipped',
    });
    const { body } = await decide(helper, key, { decision: 'skip', because: 'The tank is being treated' });
    expect(body).toMatchObject({ skippedBecause: 'The tank is being treated', doneBy: helper.name });
    expect(await there()).toBeUndefined();
    expect((await todayFor(owner)).settled.map((one) => one.key)).toContain(key);
    await decide(keeper, key, { decision: 'open' });
    expect(await there()).toMatchObject({ lateDays: 2 });
  });

  test('put off it waits until its day, and no longer', async () => {
    for (const until of [null, TODAY, '2026-05-01'])
      expect((await decide(helper, key, { decision: 'snooze', until })).status).toBe(422);
    await decide(helper, key, { decision: 'snooze', until: '2026-05-17' });
    expect(await there()).toMatchObject({ dueOn: '2026-05-17', putOffFrom: '2026-05-12', lateDays: -3 });
    const { due } = todayOf({ ...(await helper.get(readToday, { params: { roomId } })), today: '2026-05-17' }, METRIC);
    expect(due.find((one) => one.key === key)).toMatchObject({ lateDays: 0 });
  });

  test('given to a member it stays where it is; a viewer or a stranger cannot be given it', async () => {
    await decide(helper, key, { decision: 'assign', assignedTo: helper.id });
    expect(await there()).toMatchObject({ assignedTo: { id: helper.id, name: helper.name }, dueOn: '2026-05-17' });
    const stranger = (await ownerWithRoom(app)).owner;
    for (const assignedTo of [viewer.id, stranger.id, makeId()]) {
      const { status, body } = await decide(owner, key, { decision: 'assign', assignedTo });
      expect([status, Object.keys(body.error?.fields ?? {})]).toEqual([422, ['assignedTo']]);
    }
  });

  test('a viewer decides nothing, and a key that no task can have is not found', async () => {
    expect((await decide(viewer, key, { decision: 'done' })).status).toBe(403);
    for (const odd of [makeId(), 'headCount', `own:${makeId()}`, `headCount:${makeId()}:2026-02-31x`])
      expect((await decide(owner, odd, { decision: 'done' })).status, odd).toBe(404);
  });
});

describe('tasks of one’s own', () => {
  test('done once, it is gone', async () => {
    const { id } = await add({ title: 'Fit the new lamp' });
    expect(titled(await todayFor(viewer), 'Fit the new lamp')).toHaveLength(1);
    await decide(helper, `own:${id}`, { decision: 'done' });
    expect(titled(await todayFor(viewer), 'Fit the new lamp')).toEqual([]);
  });

  test('every three days it comes back three days after it was done, once, whoever pressed as well', async () => {
    const { id } = await add({ title: 'Feed the cultures', dueOn: '2026-05-11', everyDays: 3, assignedTo: helper.id });
    await Promise.all([1, 2, 3].map(() => decide(helper, `own:${id}`, { decision: 'done' })));
    const left = titled(await todayFor(owner), 'Feed the cultures');
    expect(left.map(({ dueOn, assignedTo }) => [dueOn, assignedTo?.id])).toEqual([['2026-05-17', helper.id]]);
  });

  test('on Mondays it comes back on the next Monday, also when skipped', async () => {
    // 11 May 2026 is a Monday.
    const facts = { title: 'Weigh the food', dueOn: '2026-05-11', everyDays: 7, onWeekday: 1 };
    const { id } = await add(facts);
    await decide(keeper, `own:${id}`, { decision: 'skip', because: 'The scales are away' });
    expect(titled(await todayFor(owner), 'Weigh the food').map(({ dueOn }) => dueOn)).toEqual(['2026-05-18']);
    const wrong = await owner.ask(addTask, { params: { roomId }, body: own({ ...facts, dueOn: TODAY }) });
    expect([wrong.status, wrong.body.error?.fields]).toEqual([422, { dueOn: 'Choose a day among the Mondays' }]);
  });

  test('brought back, the next one goes; not once that was done too', async () => {
    const { id } = await add({ title: 'Rinse the sponges', everyDays: 7 });
    await decide(owner, `own:${id}`, { decision: 'done' });
    await decide(owner, `own:${id}`, { decision: 'open' });
    expect(titled(await todayFor(owner), 'Rinse the sponges').map(({ dueOn }) => dueOn)).toEqual([TODAY]);
    await decide(owner, `own:${id}`, { decision: 'done' });
    const [next] = titled(await todayFor(owner), 'Rinse the sponges');
    await decide(owner, next?.key ?? '', { decision: 'done' });
    expect((await decide(owner, `own:${id}`, { decision: 'open' })).status).toBe(409);
  });

  test('changed by whoever saw its last version; a new day ends what was put off', async () => {
    const { id, version } = await add({ title: 'Check the seals' });
    await decide(helper, `own:${id}`, { decision: 'snooze', until: '2026-06-01' });
    const { id: _id, about: _about, ...facts } = own({ title: 'Check the door seals', dueOn: '2026-05-20' });
    const send = (body: object) => keeper.ask(changeTask, { params: { roomId, taskId: id }, body });
    expect((await send({ ...facts, version })).status).toBe(409);
    expect((await send({ ...facts, version: version + 1 })).body).toMatchObject({ snoozedUntil: null });
    expect(titled(await todayFor(owner), 'Check the door seals')).toMatchObject([{ dueOn: '2026-05-20' }]);
  });

  test('about a tank it tells its code, and is read by any member', async () => {
    const tankId = await tankIn(owner, roomId, 'T77', 100);
    const { id } = await add({ title: 'Reseal', about: { thing: 'tank', id: tankId } });
    expect(titled(await todayFor(viewer), 'Reseal')).toMatchObject([{ code: 'T77' }]);
    expect((await viewer.get(readTask, { params: { roomId, taskId: id } })).title).toBe('Reseal');
    const stranger = (await ownerWithRoom(app)).owner;
    expect((await stranger.ask(readTask, { params: { roomId, taskId: id } })).status).toBe(404);
  });

  test('every decision stands in the audit trail', async () => {
    const { id } = await add({ title: 'Oil the pump' });
    await decide(helper, `own:${id}`, { decision: 'done' });
    const rows = await app.house.db
      .selectFrom('audit')
      .where('roomId', '=', roomId)
      .where('aboutId', '=', id)
      .select(['action', 'actorId'])
      .orderBy('id')
      .execute();
    expect(rows).toEqual([
      { action: 'task added', actorId: helper.id },
      { action: 'task done', actorId: helper.id },
    ]);
  });
});
