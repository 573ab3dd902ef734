import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { readFish } from '@/shared/fish/contract';
import { mergeFish, readPedigree } from '@/shared/lineage/contract';
import { ownerWithRoom } from '../support/accounts';
import { makeId, type Person, type TestApp, testApp } from '../support/testApp';
import { type ThreeBroods, threeBroods } from '../support/threeBroods';

let app: TestApp;
let owner: Person;
let roomId: string;
let room: ThreeBroods;

beforeEach(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  room = await threeBroods(owner, roomId);
});
afterEach(() => app.close());

const idOf = (code: string): string => room.fish[code] ?? '';
const nodes = async () => (await owner.get(readPedigree, { params: { roomId } })).nodes;

describe('two records of one fish', () => {
  test('become one: it stands once in the pedigree, and what was found goes along', async () => {
    // Two sisters of different mouthfuls turn out to be one fish.
    const body = { intoId: idOf('MOKA-K3'), note: null };
    const before = (await nodes()).length;
    await owner.get(mergeFish, { params: { roomId, fishId: idOf('MOKA-K4') }, body });
    expect((await nodes()).length).toBe(before - 1);
    const { fish } = await owner.get(readFish, { params: { roomId, fishId: idOf('MOKA-K4') } });
    expect(fish.exit).toMatchObject({ kind: 'merged' });
  });

  test.each([
    ['of different sexes', 'MOKA-K1', 'MOKA-K2', /recorded as male/],
    ['the same record', 'MOKA-K1', 'MOKA-K1', /another record/],
  ])('%s are refused', async (_what, from, into, words) => {
    const answer = await owner.ask(mergeFish, {
      params: { roomId, fishId: idOf(from) },
      body: { intoId: idOf(into), note: null },
    });
    expect(answer.status).toBe(422);
    expect(answer.body.error?.fields?.['intoId']).toMatch(words);
  });

  test('a mother and her daughter cannot be one fish', async () => {
    const params = { roomId, fishId: room.colony.females[0] ?? '' };
    const answer = await owner.ask(mergeFish, { params, body: { intoId: idOf('MOKA-K2'), note: null } });
    expect(answer.status).toBe(422);
    expect(answer.body.error?.fields?.['intoId']).toMatch(/ancestor/);
    const { fish } = await owner.get(readFish, { params });
    expect(fish.exit).toBeNull();
  });

  test('an id that nobody has is a wrong field', async () => {
    const params = { roomId, fishId: idOf('MOKA-K4') };
    const answer = await owner.ask(mergeFish, { params, body: { intoId: makeId(), note: null } });
    expect(answer.status).toBe(422);
  });
});
