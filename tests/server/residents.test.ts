import { afterAll, beforeAll, expect, test } from 'vitest';
import { listTanks, readTank } from '@/shared/tanks/contract';
import { type Known, ownerWithRoom } from '../support/accounts';
import { broodIn, colonyIn, holdIn, NO_NUMBERS, record, TODAY, tankIn } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;

beforeAll(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
});
afterAll(() => app.close());

const residentsOf = async (tankId: string) => {
  const { tanks } = await owner.get(listTanks, { params: { roomId } });
  return tanks.find(({ id }) => id === tankId)?.residents.map(({ code, heads }) => [code, heads]);
};

test('a batch that nobody is left of lives in its tank no longer, but did', async () => {
  const colony = await colonyIn(owner, roomId);
  const { batchId, tankId } = await broodIn(owner, roomId, colony, { opening: 3 });
  expect(await residentsOf(tankId)).toEqual([['MOKA-26A', 3]]);
  await record(owner, roomId, { kind: 'headsLost', batchId, onDay: TODAY, heads: 3, cause: 'equipment', note: null });
  expect(await residentsOf(tankId)).toEqual([]);
  const { stays } = await owner.get(readTank, { params: { roomId, tankId } });
  expect(stays.map(({ resident }) => resident.code)).toEqual(['MOKA-26A']);
});

test('eggs that are not counted as heads yet live in their tank', async () => {
  const colony = await colonyIn(owner, roomId, { code: 'MOKB' });
  const holdId = await holdIn(owner, roomId, colony);
  const tankId = await tankIn(owner, roomId, 'N9', 20);
  await record(owner, roomId, {
    kind: 'holdEnded',
    holdId,
    onDay: TODAY,
    outcome: 'stripped',
    note: null,
    brood: {
      broodId: makeId(),
      batchId: makeId(),
      code: 'MOKB-26A',
      tankId,
      opening: null,
      numbers: { ...NO_NUMBERS, total: 20, eggs: 20 },
    },
  });
  expect(await residentsOf(tankId)).toEqual([['MOKB-26A', 0]]);
});
