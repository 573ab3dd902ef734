import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { listBroods, readBrood } from '@/shared/broods/contract';
import { headCountOf } from '@/shared/broods/headCount';
import { readFish } from '@/shared/fish/contract';
import { listHolds, proposeSires, readHold } from '@/shared/holds/contract';
import { undoEntry } from '@/shared/record/contract';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { broodIn, type Colony, colonyIn, holdIn, NO_NUMBERS, record, TODAY, tankIn, tryRecord } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;
let colony: Colony;

beforeAll(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  colony = await colonyIn(owner, roomId);
});
afterAll(() => app.close());

const pageOf = (broodId: string) => owner.get(readBrood, { params: { roomId, broodId } });

describe('a hold', () => {
  test('has one open hold a female, and shows the one that is there', async () => {
    const holdId = await holdIn(owner, roomId, colony, { holderId: colony.females[1] ?? null });
    const again = await tryRecord(owner, roomId, {
      kind: 'holdingSeen',
      holdId: makeId(),
      tankId: colony.tankId,
      colonyId: colony.colonyId,
      holderId: colony.females[1],
      plan: 'leave',
      note: null,
      firstSeenOn: TODAY,
      spawnEarliest: TODAY,
      spawnLatest: TODAY,
      parentage: { paternity: 'single', basis: null, sires: [], dams: [] },
    });
    expect(again.status).toBe(409);
    expect(again.body.error?.fields).toEqual({ holderId: 'Already holding' });
    expect(again.body.error?.current).toMatchObject({ hold: { id: holdId } });
  });

  test('proposes shares by the days each male was dominant in the interval and the fortnight before it', async () => {
    const [first = '', second = ''] = colony.males;
    await record(owner, roomId, { kind: 'dominant', fishId: first, onDay: '2026-03-01', note: null });
    await record(owner, roomId, { kind: 'dominant', fishId: second, onDay: '2026-03-31', note: null });
    const { sires } = await owner.get(proposeSires, {
      params: { roomId, tankId: colony.tankId },
      query: { from: '2026-04-02', until: '2026-04-04' },
    });
    // 19 Mar to 4 Apr are 17 days: 12 of them the first's, 19 to 30 March, and 5 the second's; each weighs a day more.
    expect(sires.map(({ fishId, dominantDays, ofDays }) => [fishId, dominantDays, ofDays])).toEqual([
      [first, 12, 17],
      [second, 5, 17],
    ]);
    expect(sires[0]?.share).toBeCloseTo(13 / 19, 12);
  });

  test('cannot have a female as a father, nor be held by a male', async () => {
    const parentage = { paternity: 'single', basis: null, sires: [{ fishId: colony.females[2], weight: 1 }], dams: [] };
    const seen = {
      kind: 'holdingSeen',
      holdId: makeId(),
      tankId: colony.tankId,
      colonyId: null,
      holderId: null,
      plan: 'strip',
      note: null,
      firstSeenOn: TODAY,
      spawnEarliest: TODAY,
      spawnLatest: TODAY,
    };
    const wrong = await tryRecord(owner, roomId, { ...seen, parentage });
    expect([wrong.status, wrong.body.error?.fields]).toEqual([
      422,
      { 'parentage.sires.0.fishId': 'A female cannot be the father' },
    ]);
    const male = await tryRecord(owner, roomId, {
      ...seen,
      holderId: colony.males[0],
      parentage: { ...parentage, sires: [] },
    });
    expect([male.status, male.body.error?.fields]).toEqual([
      422,
      { holderId: 'Choose a female, or correct the sex first' },
    ]);
  });

  test('that is checked and ends swallowed makes no brood, and undo opens it again', async () => {
    const holdId = await holdIn(owner, roomId, colony, { holderId: colony.females[3] ?? null });
    await record(owner, roomId, { kind: 'holdCheck', holdId, onDay: '2026-04-20', seen: 'notHolding', note: null });
    const ended = await record(owner, roomId, {
      kind: 'holdEnded',
      holdId,
      onDay: '2026-04-20',
      outcome: 'swallowed',
      brood: null,
      note: null,
    });
    expect(ended.said).toBe('Swallowed');
    expect((await owner.get(readHold, { params: { roomId, holdId } })).hold).toMatchObject({
      outcome: 'swallowed',
      endedOn: '2026-04-20',
      checkedOn: ['2026-04-20'],
    });
    await owner.get(undoEntry, { params: { roomId, entryId: ended.id } });
    const { holds } = await owner.get(listHolds, { params: { roomId }, query: { which: 'open' } });
    expect(holds.map(({ id }) => id)).toContain(holdId);
  });
});

describe('a brood', () => {
  test('starts with the strip, counts heads by its ledger, and never sells what is not there', async () => {
    const { broodId, batchId, holdId } = await broodIn(owner, roomId, colony, { opening: 34 });
    await record(owner, roomId, {
      kind: 'headsLost',
      batchId,
      onDay: '2026-05-01',
      heads: 2,
      cause: 'foundDead',
      note: null,
    });
    await record(owner, roomId, { kind: 'headCounted', batchId, onDay: '2026-05-05', heads: 31, note: null });
    const { brood, batches, stageCounts } = await pageOf(broodId);
    expect(brood).toMatchObject({ heads: 31, opened: 34, lost: 2, available: 31, hold: holdId, code: 'MOKA-26A' });
    expect(stageCounts[0]?.numbers).toEqual({ ...NO_NUMBERS, total: 36, dead: 2 });
    // 34 less 2 dead are 32; 31 seen: one corrected, not lost.
    expect(headCountOf(batches[0]?.lines ?? []).corrections).toBe(-1);
    const sold = await tryRecord(owner, roomId, {
      kind: 'headsLeft',
      batchId,
      onDay: TODAY,
      how: 'sold',
      heads: 32,
      note: null,
    });
    expect([sold.status, sold.body.error?.fields]).toEqual([409, { heads: 'At most 31' }]);
  });

  test('gives a holdback that knows its parents through the brood, and has left the batch', async () => {
    const { broodId, batchId } = await broodIn(
      owner,
      roomId,
      { ...colony, females: [colony.females[4] ?? ''] },
      { opening: 10, code: 'MOKA-26B' },
    );
    const fishId = makeId();
    await record(owner, roomId, {
      kind: 'heldBack',
      batchId,
      onDay: TODAY,
      fish: [{ id: fishId, code: 'MOKA-B01', sex: 'unknown' }],
      keptAs: 'holdback',
      tankId: null,
      colonyId: null,
      note: null,
    });
    expect((await pageOf(broodId)).brood).toMatchObject({ heads: 9, available: 9 });
    const { fish } = await owner.get(readFish, { params: { roomId, fishId } });
    expect(fish).toMatchObject({
      code: 'MOKA-B01',
      origin: 'bred',
      brood: { code: 'MOKA-26B' },
      tank: { code: 'N-MOKA-26B' },
      bornOn: '2026-04-04',
    });
  });

  test('joined with another weighs its sources by heads, and undo takes them apart', async () => {
    const one = await broodIn(
      owner,
      roomId,
      { ...colony, females: [colony.females[5] ?? ''] },
      { opening: 30, code: 'MOKA-26C' },
    );
    const two = await broodIn(owner, roomId, { ...colony, females: [] }, { opening: 10, code: 'MOKA-26D' });
    const joined = await record(owner, roomId, {
      kind: 'batchJoined',
      batchId: two.batchId,
      intoBatchId: one.batchId,
      onDay: TODAY,
      heads: 10,
      note: null,
    });
    const mixed = (await pageOf(one.broodId)).batches.find(({ id }) => id === one.batchId);
    expect(mixed?.balance).toBe(40);
    expect(mixed?.sources.map(({ code, share }) => [code, share])).toEqual([
      ['MOKA-26C', 0.75],
      ['MOKA-26D', 0.25],
    ]);
    expect((await pageOf(two.broodId)).brood).toMatchObject({ heads: 10, headsAreShare: true });
    await owner.get(undoEntry, { params: { roomId, entryId: joined.id } });
    expect((await pageOf(one.broodId)).brood).toMatchObject({ heads: 30, headsAreShare: false });
  });

  test('of an undone strip leaves nothing behind but the trail', async () => {
    const holdId = await holdIn(owner, roomId, { ...colony, females: [] });
    const tankId = await tankIn(owner, roomId, 'N-undo', 60);
    const [broodId, batchId] = [makeId(), makeId()];
    const ended = await record(owner, roomId, {
      kind: 'holdEnded',
      holdId,
      onDay: TODAY,
      outcome: 'released',
      note: null,
      brood: { broodId, batchId, code: 'MOKA-26Z', tankId, opening: 12, numbers: NO_NUMBERS },
    });
    const line = await owner.get(undoEntry, { params: { roomId, entryId: ended.id } });
    expect(line.undone).not.toBeNull();
    const { broods } = await owner.get(listBroods, { params: { roomId }, query: { which: 'all' } });
    expect(broods.map(({ code }) => code)).not.toContain('MOKA-26Z');
  });

  test('sent twice is stored once; the same number with other content is a conflict', async () => {
    const { broodId, batchId } = await broodIn(
      owner,
      roomId,
      { ...colony, females: [] },
      { opening: 20, code: 'MOKA-26E' },
    );
    const id = makeId();
    const loss = { kind: 'headsLost', batchId, onDay: TODAY, heads: 1, cause: 'jumped', note: null } as const;
    await record(owner, roomId, loss, id);
    await record(owner, roomId, loss, id);
    expect((await pageOf(broodId)).brood.heads).toBe(19);
    const other = await tryRecord(owner, roomId, { ...loss, heads: 2 }, id);
    expect([other.status, other.body.error?.reason]).toEqual([409, 'conflict']);
  });

  test('can be recorded by a helper, not by a viewer, and not seen from another fishroom', async () => {
    const { broodId, batchId } = await broodIn(
      owner,
      roomId,
      { ...colony, females: [] },
      { opening: 5, code: 'MOKA-26F' },
    );
    const loss = { kind: 'headsLost', batchId, onDay: TODAY, heads: 1, cause: 'jumped', note: null };
    const helper = await memberOf(app, roomId, 'helper');
    const viewer = await memberOf(app, roomId, 'viewer');
    const stranger = (await ownerWithRoom(app)).owner;
    expect((await tryRecord(helper, roomId, loss)).status).toBe(200);
    expect((await tryRecord(viewer, roomId, loss)).status).toBe(403);
    expect((await stranger.ask(readBrood, { params: { roomId, broodId } })).status).toBe(404);
    const sale = await tryRecord(helper, roomId, {
      kind: 'headsLeft',
      batchId,
      onDay: TODAY,
      how: 'sold',
      heads: 1,
      note: null,
    });
    expect(sale.status).toBe(403);
  });
});
