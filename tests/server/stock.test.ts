import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { addColony, changeColony, listColonies, readColony } from '@/shared/colonies/contract';
import { addFish, changeFish, listFish, proposeFishCodes, readFish } from '@/shared/fish/contract';
import { undoEntry } from '@/shared/record/contract';
import { addSpecies, listSpecies, setSpecies } from '@/shared/species/contract';
import { addLot, addStrain, changeStrain, listStrains, readStrain } from '@/shared/strains/contract';
import { addTank, changeTank, listTanks, readTank } from '@/shared/tanks/contract';
import { type Known, ownerWithRoom } from '../support/accounts';
import { type Colony, colonyIn, record, strainIn, TODAY, tankIn, tryRecord } from '../support/stock';
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

describe('tanks', () => {
  test('show who lives in them and since when', async () => {
    const { tank, stays } = await owner.get(readTank, { params: { roomId, tankId: colony.tankId } });
    expect(tank.residents).toMatchObject([
      {
        thing: 'colony',
        code: 'MOKA-A',
        strainCode: 'MOKA',
        displayName: 'Tropheus moorii',
        heads: 8,
        since: '2026-01-01',
      },
    ]);
    expect(stays).toHaveLength(1);
  });

  test('have codes of their own, and are not retired with fish in them', async () => {
    const { tanks } = await owner.get(listTanks, { params: { roomId } });
    const { residents: _residents, id, ...facts } = tanks[0] ?? ({} as never);
    const twice = await owner.ask(addTank, {
      params: { roomId },
      body: bodyOf({ ...facts, id: makeId() }, ['version', 'retiredOn']),
    });
    expect([twice.status, twice.body.error?.fields]).toEqual([409, { code: 'Taken: choose another code' }]);
    const retired = await owner.ask(changeTank, {
      params: { roomId, tankId: id },
      body: { ...facts, retiredOn: TODAY },
    });
    expect([retired.status, retired.body.error?.fields]).toEqual([409, { retiredOn: 'Move its fish first' }]);
  });

  test('changed by two people at once keep the first change and show it to the second', async () => {
    const tankId = await tankIn(owner, roomId, 'G1');
    const { tank } = await owner.get(readTank, { params: { roomId, tankId } });
    const { residents: _residents, id: _id, ...facts } = tank;
    await owner.get(changeTank, { params: { roomId, tankId }, body: { ...facts, litres: 300 } });
    const late = await owner.ask(changeTank, { params: { roomId, tankId }, body: { ...facts, litres: 250 } });
    expect(late.status).toBe(409);
    expect(late.body.error?.current).toMatchObject({ litres: 300, version: 2 });
  });

  test('name the field that is wrong', async () => {
    const answer = await owner.ask(addTank, {
      params: { roomId },
      body: { id: makeId(), code: '', litres: -3, walkOrder: 1.5, purpose: 'pond', note: null, place: null },
    });
    expect(answer.status).toBe(422);
    expect(answer.body.error?.fields).toMatchObject({
      code: 'Type a code',
      litres: 'Must be above zero',
      walkOrder: 'A whole number',
      purpose: 'Choose what the tank is for',
    });
  });
});

const bodyOf = (facts: Record<string, unknown>, without: string[]) =>
  Object.fromEntries(Object.entries(facts).filter(([key]) => !without.includes(key)));

describe('strains', () => {
  test('count what lives of them, and take lots with their dead', async () => {
    const { strains } = await owner.get(listStrains, { params: { roomId } });
    expect(strains.find(({ code }) => code === 'MOKA')).toMatchObject({
      colonies: 1,
      livingFish: 8,
      broods: 0,
      displayName: 'Tropheus moorii',
    });
    const lot = {
      id: makeId(),
      receivedOn: '2025-11-02',
      fromWhom: 'Aurel Vint',
      provenance: 'wildCaught',
      generation: 0,
      heads: 12,
      deadOnArrival: 1,
      quarantineUntil: '2025-12-14',
      papers: null,
      mayBeSibs: true,
      note: null,
    };
    await owner.get(addLot, { params: { roomId, strainId: colony.strainId }, body: lot });
    expect((await owner.get(readStrain, { params: { roomId, strainId: colony.strainId } })).lots).toMatchObject([
      { heads: 12, deadOnArrival: 1 },
    ]);
    const wrong = await owner.ask(addLot, {
      params: { roomId, strainId: colony.strainId },
      body: { ...lot, id: makeId(), deadOnArrival: 13 },
    });
    expect(wrong.body.error?.fields).toEqual({ deadOnArrival: 'No more than the fish that came' });
  });

  test('can be of a species that is not described, from a place nobody knows', async () => {
    const id = makeId();
    await owner.get(addSpecies, {
      params: { roomId },
      body: {
        id,
        scientificName: 'Tropheus sp. "Ridge"',
        about: { mode: 'maternalMouthbrooder', carers: 'mother', kin: 'tropheini', body: 'deep', waters: 'tanganyika' },
        figures: {},
      },
    });
    const strain = {
      id: makeId(),
      code: 'TSRI',
      speciesId: id,
      naming: 'undescribed',
      scientificName: null,
      tradeName: 'Ridge',
      synonyms: null,
      locality: null,
      localityKnown: 'unknown',
      provenance: 'unknown',
      fromWhom: null,
      acquiredOn: null,
      papers: null,
      citesSource: null,
      note: null,
    };
    expect(await owner.get(addStrain, { params: { roomId }, body: strain })).toMatchObject({
      displayName: 'Tropheus sp. "Ridge"',
    });
    const nowhere = await owner.ask(addStrain, {
      params: { roomId },
      body: { ...strain, id: makeId(), code: 'TSRX', speciesId: 'no-such-fish' },
    });
    expect([nowhere.status, nowhere.body.error?.fields]).toEqual([
      422,
      { speciesId: 'Choose a species of the library, or add your own' },
    ]);
  });

  test('keep their code apart from others when changed', async () => {
    const strainId = await strainIn(owner, roomId, 'MOXX');
    const { strain } = await owner.get(readStrain, { params: { roomId, strainId } });
    const facts = bodyOf(strain, ['id', 'displayName', 'colonies', 'livingFish', 'broods']);
    const answer = await owner.ask(changeStrain, { params: { roomId, strainId }, body: { ...facts, code: 'MOKA' } });
    expect([answer.status, answer.body.error?.fields]).toEqual([409, { code: 'Taken: choose another code' }]);
  });
});

describe('a species', () => {
  test('takes a figure of the fishroom’s own with its source, within limits', async () => {
    const set = { version: 0, figures: { holdDays: { value: 31, source: 'Eleven holds of ours' } } };
    const stored = await owner.get(setSpecies, { params: { roomId, speciesId: 'tropheus-moorii' }, body: set });
    expect(stored).toMatchObject({ version: 1, figures: { holdDays: { value: 31, source: 'Eleven holds of ours' } } });
    const wrong = await owner.ask(setSpecies, {
      params: { roomId, speciesId: 'tropheus-moorii' },
      body: { version: 1, figures: { holdDays: { value: 900, source: 'x' }, wings: { value: 2, source: 'x' } } },
    });
    expect([wrong.status, wrong.body.error?.fields]).toEqual([
      422,
      { 'figures.holdDays.value': 'At most 200', 'figures.wings.value': 'There is no such figure' },
    ]);
    expect((await owner.get(listSpecies, { params: { roomId } })).set.map(({ id }) => id)).toContain('tropheus-moorii');
  });
});

describe('colonies and fish', () => {
  test('begin with coded fish, counted by sex', async () => {
    const { colonies } = await owner.get(listColonies, { params: { roomId } });
    expect(colonies.find(({ id }) => id === colony.colonyId)).toMatchObject({
      males: 2,
      females: 6,
      unsexed: 0,
      openHolds: 0,
      tank: { code: 'T-MOKA' },
    });
    const { members } = await owner.get(readColony, { params: { roomId, colonyId: colony.colonyId } });
    expect(members.map(({ code }) => code)).toEqual([
      'MOKA-A01',
      'MOKA-A02',
      'MOKA-A03',
      'MOKA-A04',
      'MOKA-A05',
      'MOKA-A06',
      'MOKA-A07',
      'MOKA-A08',
    ]);
    expect(
      (await owner.get(proposeFishCodes, { params: { roomId }, query: { stem: 'MOKA-A', count: 2 } })).codes,
    ).toEqual(['MOKA-A09', 'MOKA-A10']);
  });

  test('anonymous fish are fish without a code until someone tells them apart', async () => {
    const tankId = await tankIn(owner, roomId, 'Q1');
    const ids = [makeId(), makeId(), makeId()];
    const adding = {
      ids,
      codes: [null, null, null],
      strainId: colony.strainId,
      sex: 'unknown',
      keptAs: 'breeder',
      bornOn: null,
      arrivedOn: '2026-03-01',
      lotId: null,
      colonyId: null,
      tankId,
      mark: null,
      note: null,
    };
    await owner.get(addFish, { params: { roomId }, body: adding });
    const apart = await record(owner, roomId, {
      kind: 'toldApart',
      fishId: ids[0] ?? '',
      onDay: TODAY,
      code: 'MOKA-07',
      mark: 'white spot behind the left eye',
      note: null,
    });
    expect((await owner.get(readFish, { params: { roomId, fishId: ids[0] } })).fish).toMatchObject({
      code: 'MOKA-07',
      mark: 'white spot behind the left eye',
      tank: { code: 'Q1' },
    });
    await owner.get(undoEntry, { params: { roomId, entryId: apart.id } });
    expect((await owner.get(readFish, { params: { roomId, fishId: ids[0] } })).fish).toMatchObject({
      code: null,
      mark: null,
    });
  });

  test('there is one dominant male in a tank, and the other yields from that day', async () => {
    const [first = '', second = ''] = colony.males;
    await record(owner, roomId, { kind: 'dominant', fishId: first, onDay: '2026-05-01', note: null });
    await record(owner, roomId, { kind: 'dominant', fishId: second, onDay: '2026-05-08', note: null });
    const { fish } = await owner.get(listFish, { params: { roomId } });
    expect(fish.filter(({ dominant }) => dominant).map(({ id }) => id)).toEqual([second]);
    const female = await tryRecord(owner, roomId, {
      kind: 'dominant',
      fishId: colony.females[0],
      onDay: TODAY,
      note: null,
    });
    expect(female.status).toBe(422);
  });

  test('sex is a dated finding that can be taken back by another', async () => {
    const fishId = colony.females[5] ?? '';
    await record(owner, roomId, {
      kind: 'sexSeen',
      fishId,
      onDay: '2026-05-02',
      sex: 'male',
      how: 'vented',
      certain: true,
      note: null,
    });
    expect((await owner.get(readFish, { params: { roomId, fishId } })).fish.sex).toBe('male');
    await record(owner, roomId, {
      kind: 'sexSeen',
      fishId,
      onDay: '2026-05-03',
      sex: 'female',
      how: 'vented',
      certain: false,
      note: 'First look was wrong',
    });
    const page = await owner.get(readFish, { params: { roomId, fishId } });
    expect(page.fish).toMatchObject({ sex: 'female', sexCertain: false });
    expect(page.findings.filter(({ kind }) => kind === 'sex')).toHaveLength(3);
  });

  test('a fish that died leaves its colony, and cannot die twice', async () => {
    const fishId = colony.females[4] ?? '';
    const died = await record(owner, roomId, {
      kind: 'fishLeft',
      fishId,
      onDay: TODAY,
      how: 'died',
      cause: 'bloat',
      note: null,
    });
    const { members, former } = await owner.get(readColony, { params: { roomId, colonyId: colony.colonyId } });
    expect(members.map(({ id }) => id)).not.toContain(fishId);
    expect(former.map(({ fish }) => fish.exit)).toMatchObject([{ kind: 'died', cause: 'bloat', onDay: TODAY }]);
    expect(
      (await tryRecord(owner, roomId, { kind: 'fishLeft', fishId, onDay: TODAY, how: 'died', cause: null, note: null }))
        .status,
    ).toBe(409);
    await owner.get(undoEntry, { params: { roomId, entryId: died.id } });
    expect(
      (await owner.get(readColony, { params: { roomId, colonyId: colony.colonyId } })).members.map(({ id }) => id),
    ).toContain(fishId);
  });

  test('a colony moves as one, and its tank keeps the memory', async () => {
    const toTankId = await tankIn(owner, roomId, 'T20', 600);
    await record(owner, roomId, {
      kind: 'moved',
      thing: 'colony',
      id: colony.colonyId,
      toTankId,
      onDay: TODAY,
      note: null,
    });
    const { fish } = await owner.get(readFish, { params: { roomId, fishId: colony.males[0] } });
    expect(fish.tank?.code).toBe('T20');
    const { tank, stays } = await owner.get(readTank, { params: { roomId, tankId: colony.tankId } });
    expect(tank.residents).toEqual([]);
    expect(stays[0]).toMatchObject({ untilDay: TODAY });
    const early = await tryRecord(owner, roomId, {
      kind: 'moved',
      thing: 'colony',
      id: colony.colonyId,
      toTankId: colony.tankId,
      onDay: '2026-05-01',
      note: null,
    });
    expect(early.status).toBe(409);
  });

  test('codes are unique in the fishroom and editable', async () => {
    const fishId = colony.males[0] ?? '';
    const { fish, note } = await owner.get(readFish, { params: { roomId, fishId } });
    const change = {
      version: fish.version,
      code: 'MOKA-A02',
      keptAs: fish.keptAs,
      bornOn: fish.bornOn,
      arrivedOn: fish.arrivedOn,
      note,
    };
    const taken = await owner.ask(changeFish, { params: { roomId, fishId }, body: change });
    expect([taken.status, taken.body.error?.fields]).toEqual([409, { code: 'Taken: choose another code' }]);
    expect(
      await owner.get(changeFish, {
        params: { roomId, fishId },
        body: { ...change, code: 'Old Scar'.replace(' ', '-') },
      }),
    ).toMatchObject({ code: 'Old-Scar' });
  });

  test('a colony does not end while fish are in it, nor take fish of another fishroom', async () => {
    const ended = await owner.ask(changeColony, {
      params: { roomId, colonyId: colony.colonyId },
      body: { version: 1, code: 'MOKA-A', startedOn: '2026-01-01', endedOn: TODAY, note: null },
    });
    expect([ended.status, ended.body.error?.fields]).toEqual([409, { endedOn: 'Move its fish out first' }]);
    const other = await ownerWithRoom(app);
    const theirs = await colonyIn(other.owner, other.roomId);
    const tankId = await tankIn(owner, roomId, 'T30');
    const stolen = await owner.ask(addColony, {
      params: { roomId },
      body: {
        id: makeId(),
        code: 'MOKA-B',
        strainId: colony.strainId,
        startedOn: TODAY,
        note: null,
        tankId,
        fishIds: [theirs.males[0]],
        newFish: { males: 0, females: 0, unsexed: 0, lotId: null, coded: false },
      },
    });
    expect([stolen.status, stolen.body.error?.fields]).toEqual([422, { fishIds: 'Choose fish of this fishroom' }]);
    expect((await owner.get(listColonies, { params: { roomId } })).colonies.map(({ code }) => code)).not.toContain(
      'MOKA-B',
    );
  });
});
