import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { readColony } from '@/shared/colonies/contract';
import { readFish } from '@/shared/fish/contract';
import { clockOf } from '@/shared/holds/clockOf';
import { HoldClash, proposeSires, readHold } from '@/shared/holds/contract';
import type { HoldFacts } from '@/shared/holds/entries';
import { listEntries, undoEntry } from '@/shared/record/contract';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { broodIn, type Colony, colonyIn, holdIn, record, TODAY, tankIn, tryRecord } from '../support/stock';
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

const pageOf = (holdId: string) => owner.get(readHold, { params: { roomId, holdId } });
const proposalFor = (tankId: string, from = '2026-05-08', until = TODAY) =>
  owner.get(proposeSires, { params: { roomId, tankId }, query: { from, until } });

const seen = (more: object) => ({
  kind: 'holdingSeen',
  holdId: makeId(),
  tankId: colony.tankId,
  colonyId: colony.colonyId,
  plan: 'strip',
  note: null,
  firstSeenOn: TODAY,
  spawnEarliest: '2026-05-12',
  spawnLatest: TODAY,
  parentage: { paternity: 'single', basis: null, sires: [], dams: [] },
  ...more,
});

describe('what is proposed when a full mouth is seen', () => {
  test('says how each strain of the tank carries, and enough to run its clock before anything is saved', async () => {
    const { strains } = await proposalFor(colony.tankId);
    expect(strains.map(({ strainCode, displayName, mode }) => [strainCode, displayName, mode])).toEqual([
      ['MOKA', 'Tropheus moorii', 'maternalMouthbrooder'],
    ]);
    const run = strains[0] && clockOf(strains[0].clock, { spawnEarliest: TODAY, spawnLatest: TODAY }, TODAY);
    // The same days that the hold has once it is saved.
    const saving = await tryRecord(owner, roomId, seen({ holderId: colony.females[5], spawnEarliest: TODAY }));
    const { hold } = await pageOf(saving.body.made['hold'] ?? '');
    const saved = clockOf(hold.clock, hold, TODAY);
    expect(run?.clock.releaseOn).toBe(saved?.clock.releaseOn);
    expect(run?.clock.stripFrom).toBe(saved?.clock.stripFrom);
    expect(run?.clock.releaseOn).not.toBeUndefined();
  });

  test('remembers when someone last looked into the tank, and when her last hold ended', async () => {
    const other = await colonyIn(owner, roomId, { code: 'MOKB' });
    expect((await proposalFor(other.tankId)).lookedOn).toBeNull();
    await record(owner, roomId, { kind: 'seenWell', tankId: other.tankId, onDay: '2026-05-09', note: null });
    const later = await record(owner, roomId, {
      kind: 'seenWell',
      tankId: other.tankId,
      onDay: '2026-05-11',
      note: null,
    });
    const changed = await tryRecord(owner, roomId, {
      kind: 'waterChanged',
      tankId: other.tankId,
      onDay: '2026-05-13',
      percent: 40,
      note: null,
    });
    expect(changed.status).toBe(200);
    expect((await proposalFor(other.tankId)).lookedOn).toBe('2026-05-11');
    await owner.get(undoEntry, { params: { roomId, entryId: later.id } });
    expect((await proposalFor(other.tankId)).lookedOn).toBe('2026-05-09');

    const holdId = await holdIn(owner, roomId, other);
    await record(owner, roomId, {
      kind: 'holdEnded',
      holdId,
      onDay: '2026-04-20',
      outcome: 'swallowed',
      brood: null,
      note: null,
    });
    const { females } = await proposalFor(other.tankId);
    expect(females.find(({ fishId }) => fishId === other.females[0])).toMatchObject({
      lastEndedOn: '2026-04-20',
      openHoldId: null,
      strainId: other.strainId,
    });
  });

  test('of a tank of another fishroom is not found', async () => {
    const { owner: stranger, roomId: theirs } = await ownerWithRoom(app);
    const asked = await stranger.ask(proposeSires, {
      params: { roomId: theirs, tankId: colony.tankId },
      query: { from: TODAY, until: TODAY },
    });
    expect(asked.status).toBe(404);
  });
});

test('a female that holds is shown with the day that her days count from, the middle of the interval', async () => {
  const own = await colonyIn(owner, roomId, { code: 'MOKE' });
  await holdIn(owner, roomId, own, { from: '2026-04-02', until: '2026-04-06' });
  const { females } = await proposalFor(own.tankId);
  expect(females.find(({ fishId }) => fishId === own.females[0])?.holdingSince).toBe('2026-04-04');
});

test('a male may hold where the species’ males do', async () => {
  const fathers = await colonyIn(owner, roomId, { code: 'SAGA', speciesId: 'sarotherodon-melanotheron' });
  const kept = await tryRecord(
    owner,
    roomId,
    seen({ tankId: fathers.tankId, colonyId: fathers.colonyId, holderId: fathers.males[0], plan: 'leave' }),
  );
  expect(kept.status).toBe(200);
  const { sires } = await proposalFor(fathers.tankId);
  expect(sires.map(({ fishId, openHoldId }) => [fishId, openHoldId])).toEqual([
    [fathers.males[0], kept.body.made['hold']],
    [fathers.males[1], null],
  ]);
});

describe('two people saw the same mouth', () => {
  test('the record that is there is shown with who wrote it, when, and whom they named as sires', async () => {
    const helper = await memberOf(app, roomId, 'helper');
    const holderId = colony.females[0] ?? '';
    const holdId = await holdIn(owner, roomId, colony, { holderId });
    const refused = await tryRecord(helper, roomId, seen({ holderId }));
    expect(refused.status).toBe(409);
    const { hold, by, sires, madeAt } = HoldClash.parse(refused.body.error?.current);
    expect([hold.id, by, madeAt?.slice(0, 10)]).toEqual([holdId, owner.name, TODAY]);
    expect(sires.map(({ fishId, share }) => [fishId, share])).toEqual([
      [colony.males[0], 0.75],
      [colony.males[1], 0.25],
    ]);
  });

  test('an end that is there already is shown too', async () => {
    const { holdId } = await broodIn(owner, roomId, await colonyIn(owner, roomId, { code: 'MOKC' }), {
      code: 'MOKC-26A',
    });
    const refused = await tryRecord(owner, roomId, {
      kind: 'holdCheck',
      holdId,
      onDay: TODAY,
      seen: 'holding',
      note: null,
    });
    expect(refused.status).toBe(409);
    expect(HoldClash.parse(refused.body.error?.current).hold).toMatchObject({
      outcome: 'stripped',
      brood: { code: 'MOKC-26A' },
    });
  });
});

describe('a hold that was written down wrongly', () => {
  const was: HoldFacts = {
    holderId: null,
    spawnSeen: false,
    spawnEarliest: '2026-04-02',
    spawnLatest: '2026-04-04',
    firstSeenOn: '2026-04-04',
  };
  const correction = (holdId: string, now: Partial<HoldFacts>, before: HoldFacts = was) => ({
    kind: 'holdCorrected',
    holdId,
    onDay: TODAY,
    was: before,
    now: { ...before, ...now },
    parentage: null,
    note: null,
  });

  test('gets its female when she can be told, who is the mother from then on, and loses both by undo', async () => {
    const holdId = await holdIn(owner, roomId, colony, { holderId: null });
    const mother = colony.females[1] ?? '';
    const told = await tryRecord(owner, roomId, correction(holdId, { holderId: mother, spawnEarliest: '2026-04-03' }));
    expect(told.status).toBe(200);
    expect(told.body.said).toBe('The female is MOKA-A04');
    const page = await pageOf(holdId);
    expect(page.hold).toMatchObject({ holder: { id: mother }, spawnEarliest: '2026-04-03' });
    expect(page.parentage).toMatchObject({ turn: 2, dams: [{ fishId: mother, share: 1 }] });
    expect(page.parentage.sires.map(({ share }) => share)).toEqual([0.75, 0.25]);
    await owner.get(undoEntry, { params: { roomId, entryId: told.body.id } });
    const after = await pageOf(holdId);
    expect(after.hold).toMatchObject({ holder: null, spawnEarliest: '2026-04-02' });
    expect(after.parentage).toMatchObject({ turn: 1, dams: [] });
    const { entries } = await owner.get(listEntries, { params: { roomId }, query: { thing: 'hold', thingId: holdId } });
    expect(entries.map(({ kind, undone }) => [kind, undone !== null])).toEqual([
      ['holdCorrected', true],
      ['holdingSeen', false],
    ]);
  });

  test('is not corrected over someone else’s correction, nor by a helper, nor with days the wrong way round', async () => {
    const holdId = await holdIn(owner, roomId, colony, { holderId: null });
    expect((await tryRecord(owner, roomId, correction(holdId, { spawnEarliest: '2026-04-01' }))).status).toBe(200);
    const stale = await tryRecord(owner, roomId, correction(holdId, { spawnEarliest: '2026-04-03' }));
    expect([stale.status, stale.body.error?.message]).toEqual([409, 'Someone corrected this hold meanwhile']);
    const now = { ...was, spawnEarliest: '2026-04-01' };
    const late = await tryRecord(owner, roomId, correction(holdId, { spawnLatest: '2026-04-09' }, now));
    expect([late.status, Object.keys(late.body.error?.fields ?? {})]).toEqual([422, ['now.spawnEarliest']]);
    const helper = await memberOf(app, roomId, 'helper');
    expect((await tryRecord(helper, roomId, correction(holdId, { spawnEarliest: '2026-04-02' }, now))).status).toBe(
      403,
    );
  });

  test('cannot be given to a female that holds already', async () => {
    const holdId = await holdIn(owner, roomId, colony, { holderId: null });
    await holdIn(owner, roomId, colony, { holderId: colony.females[2] ?? null });
    const refused = await tryRecord(owner, roomId, correction(holdId, { holderId: colony.females[2] ?? null }));
    expect([refused.status, refused.body.error?.fields]).toEqual([409, { holderId: 'Already holding' }]);
  });
});

test('a female that dies holding leaves her colony, and is back in it after undo', async () => {
  const holderId = colony.females[3] ?? '';
  const holdId = await holdIn(owner, roomId, colony, { holderId });
  const end = { kind: 'holdEnded', holdId, onDay: TODAY, outcome: 'diedHolding', brood: null, note: null } as const;
  const ended = await record(owner, roomId, end);
  const membersNow = async () =>
    (await owner.get(readColony, { params: { roomId, colonyId: colony.colonyId } })).members.map(({ id }) => id);
  expect(await membersNow()).not.toContain(holderId);
  const { fish } = await owner.get(readFish, { params: { roomId, fishId: holderId } });
  expect([fish.exit?.kind, fish.exit?.cause, fish.tank]).toEqual(['died', 'died holding', null]);
  await owner.get(undoEntry, { params: { roomId, entryId: ended.id } });
  expect(await membersNow()).toContain(holderId);
});

test('her earlier holds say how many fry each gave', async () => {
  const own = await colonyIn(owner, roomId, { code: 'MOKD' });
  await broodIn(owner, roomId, own, { opening: 34, code: 'MOKD-26A' });
  const eggsOnly = await holdIn(owner, roomId, own, { from: '2026-04-29', until: '2026-04-30' });
  const tankId = await tankIn(owner, roomId, 'N-MOKD-B', 40);
  await record(owner, roomId, {
    kind: 'holdEnded',
    holdId: eggsOnly,
    onDay: '2026-05-06',
    outcome: 'stripped',
    note: null,
    brood: {
      broodId: makeId(),
      batchId: makeId(),
      code: 'MOKD-26B',
      tankId,
      opening: null,
      numbers: { total: 21, eggs: null, wrigglers: 21, freeSwimming: null, dead: null, deformed: null },
    },
  });
  const holdId = await holdIn(owner, roomId, own, { from: TODAY, until: TODAY });
  const { earlier } = await pageOf(holdId);
  expect(earlier.map(({ brood, fry }) => [brood?.code, fry])).toEqual([
    ['MOKD-26B', 21],
    ['MOKD-26A', 34],
  ]);
});
