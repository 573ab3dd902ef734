import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { changeFish, readFish } from '@/shared/fish/contract';
import { changeParentage, listContradictions, previewParentage, readParentage } from '@/shared/lineage/contract';
import { issueSheet } from '@/shared/sheets/contract';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { broodIn, type Colony, colonyIn } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;
let colony: Colony;
let brood: Awaited<ReturnType<typeof broodIn>>;

beforeAll(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  colony = await colonyIn(owner, roomId);
  brood = await broodIn(owner, roomId, colony);
});
afterAll(() => app.close());

const male = (at: number) => colony.males[at] ?? '';
const female = (at: number) => colony.females[at] ?? '';
const draft = (sires: (string | null)[], dams: string[], more: object = {}) => ({
  paternity: 'single',
  basis: 'A DNA result',
  sires: sires.map((fishId) => ({ fishId, weight: 1 })),
  dams: dams.map((fishId) => ({ fishId, weight: 1 })),
  ...more,
});
const at = (animalId: string) => ({ roomId, animalId });
const read = (animalId: string) => owner.get(readParentage, { params: at(animalId) });
const set = async (animalId: string, parentage: object, who: Pick<Known, 'ask'> = owner) =>
  who.ask(changeParentage, { params: at(animalId), body: { turn: (await read(animalId)).turn, parentage } });
const preview = async (animalId: string, parentage: object) =>
  owner.get(previewParentage, { params: at(animalId), body: { turn: (await read(animalId)).turn, parentage } });

describe('the parents of a brood, set later', () => {
  test('show what would change before anything is written, and which sheets say otherwise', async () => {
    await owner.get(issueSheet, {
      params: { roomId },
      body: { thing: 'brood', subjectId: brood.broodId, heads: 3, replaces: null, because: null },
    });
    const told = await preview(brood.broodId, draft([null], [female(0)]));
    // Both parents known is one whole generation; one of them, half of it.
    expect(told.changes).toMatchObject([
      { id: brood.broodId, code: 'MOKA-26A', before: { known: 1 }, after: { known: 0.5 } },
    ]);
    expect(told.sheets.map(({ number }) => number)).toEqual(['2026-0001']);
    expect((await read(brood.broodId)).parentage.sires).toHaveLength(2);
  });

  test('come with the place and days of the spawn, to ask who was there', async () => {
    const told = await read(brood.broodId);
    // The brood's hold: spawned from 2 to 4 April in the colony's tank.
    expect(told.spawn).toEqual({
      tank: { id: colony.tankId, code: 'T-MOKA' },
      from: '2026-04-02',
      until: '2026-04-04',
    });
    expect((await read(brood.holdId)).spawn).toEqual(told.spawn);
    expect((await read(male(0))).spawn).toBeNull();
  });

  test('are a new turn; the one before stays readable', async () => {
    expect((await set(brood.broodId, draft([male(1)], [female(0)]))).status).toBe(200);
    const now = await read(brood.broodId);
    expect(now.parentage.sires.map(({ fishId }) => fishId)).toEqual([male(1)]);
    expect(now.turns.map(({ turn, basis }) => [turn, basis])).toEqual([
      [2, 'A DNA result'],
      [1, null],
    ]);
    // The hold shares the parentage with its brood.
    expect((await read(brood.holdId)).parentage).toEqual(now.parentage);
  });

  test('are refused when somebody set them meanwhile, with what they are now', async () => {
    const answer = await owner.ask(changeParentage, {
      params: at(brood.broodId),
      body: { turn: 1, parentage: draft([male(0)], []) },
    });
    expect(answer.status).toBe(409);
    expect(answer.body.error?.current).toMatchObject({ turn: 2 });
  });

  test('cannot be of the wrong sex, nor out of another fishroom', async () => {
    const wrong = await set(brood.broodId, draft([female(1)], [female(0)]));
    expect(wrong.body.error?.fields).toMatchObject({ 'parentage.sires.0.fishId': expect.stringContaining('female') });
    const foreign = await set(brood.broodId, draft([makeId()], []));
    expect(foreign.status).toBe(422);
    expect(foreign.body.error?.fields).toMatchObject({ 'parentage.sires.0.fishId': 'Choose a fish' });
  });

  test('are not for helpers and viewers to set', async () => {
    const helper = await memberOf(app, roomId, 'helper');
    expect((await set(brood.broodId, draft([male(0)], []), helper)).status).toBe(403);
  });
});

describe('S46: loops', () => {
  test('two requests at once cannot make two fish each other’s fathers', async () => {
    const [a, b] = [male(0), male(1)];
    const answers = await Promise.all([set(a, draft([b], [])), set(b, draft([a], []))]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 422]);
    const refused = answers.find(({ status }) => status === 422);
    expect(refused?.body.error?.message).toMatch(/its own ancestor: MOKA-A0\d, child of MOKA-A0\d/);
    const { contradictions } = await owner.get(listContradictions, { params: { roomId } });
    expect(contradictions.filter(({ kind }) => kind === 'loop')).toEqual([]);
  });

  test('a fish cannot be its own father', async () => {
    expect((await set(male(0), draft([male(0)], []))).status).toBe(422);
  });
});

describe('contradictions', () => {
  test('name a parent that was born after its young', async () => {
    const { fish, note } = await owner.get(readFish, { params: { roomId, fishId: female(0) } });
    await owner.get(changeFish, {
      params: { roomId, fishId: female(0) },
      body: {
        version: fish.version,
        code: fish.code,
        keptAs: fish.keptAs,
        bornOn: '2026-04-20',
        arrivedOn: null,
        note,
      },
    });
    const { contradictions } = await owner.get(listContradictions, { params: { roomId } });
    expect(contradictions).toContainEqual(
      expect.objectContaining({ kind: 'younger', id: brood.broodId, parent: { id: female(0), name: fish.code } }),
    );
  });

  test('name a sire that was not in the tank', async () => {
    const other = await colonyIn(owner, roomId, { code: 'KIGO', males: 1, females: 1 });
    const parentage = draft([other.males[0] ?? ''], [female(0)]);
    const { doubts } = await preview(brood.broodId, parentage);
    expect(doubts.join()).toContain('was not in the tank when it was spawned');
    expect((await set(brood.broodId, parentage)).status).toBe(200);
    const { contradictions } = await owner.get(listContradictions, { params: { roomId } });
    expect(contradictions.map(({ kind }) => kind)).toContain('away');
  });
});
