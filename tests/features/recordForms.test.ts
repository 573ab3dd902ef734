import { describe, expect, test } from 'vitest';
import { APART, type Move, moveOf, ONE_FISH } from '@/features/fishEntries/moving';
import { RECORD_GROUPS } from '@/features/record/actions';
import { tankOnLabel } from '@/features/record/readLabel';
import { incidentOf } from '@/features/water/happening';
import { emptyTest, readSoFar, testDraft, testOf } from '@/features/water/testing';
import type { Resident, TankRow } from '@/shared/tanks/contract';
import { METRIC, US } from '@/shared/units';

const tank = (id: string, code: string, residents: Partial<Resident>[] = []): TankRow => ({
  id,
  version: 1,
  code,
  place: null,
  walkOrder: 0,
  lengthTenthsMm: null,
  widthTenthsMm: null,
  heightTenthsMm: null,
  fillTenthsMm: null,
  glassTenthsMm: null,
  standKg: null,
  litres: 450 as TankRow['litres'], // a brand: litres are litres
  heaterC: null,
  purpose: 'colony',
  note: null,
  retiredOn: null,
  residents: residents.map((one) => ({
    thing: 'batch',
    id: '',
    code: '',
    strainId: null,
    strainCode: null,
    displayName: null,
    heads: 0,
    since: '2026-05-01',
    ...one,
  })),
});

test('the sheet has no half rows: every group is even', () => {
  expect(RECORD_GROUPS.map(({ actions }) => actions.length % 2)).toEqual(RECORD_GROUPS.map(() => 0));
});

describe('a move', () => {
  const from = tank('from', 'G1', [{ id: 'batch', heads: 31 }]);
  const to = tank('to', 'G2', [
    { id: 'other', heads: 12 },
    { thing: 'colony', id: 'colony' },
  ]);
  const value = (more: Partial<Move>): Move => ({
    what: 'batch:batch',
    fishId: undefined,
    heads: null,
    toTankId: 'to',
    joins: APART,
    colony: 'leave',
    onDay: '2026-05-14',
    note: null,
    ...more,
  });
  const moved = (more: Partial<Move>) => moveOf(value(more), from, to, (what) => `new ${what}`);

  test('of all of a batch takes the batch along', () => {
    expect(moved({})).toMatchObject({ kind: 'moved', thing: 'batch', id: 'batch', toTankId: 'to' });
    expect(moved({ heads: 31 })).toMatchObject({ kind: 'moved' });
  });

  test('of a part of it makes a batch of its own', () => {
    expect(moved({ heads: 10 })).toMatchObject({ kind: 'batchSplit', heads: 10, newBatchId: 'new batch' });
  });

  test('into another batch mixes them, all or some', () => {
    expect(moved({ joins: 'other' })).toMatchObject({ kind: 'batchJoined', intoBatchId: 'other', heads: 31 });
    expect(moved({ joins: 'other', heads: 5 })).toMatchObject({ kind: 'batchJoined', heads: 5 });
  });

  test('of one fish leaves its colony, stays in it, or joins the one that lives there', () => {
    const fish = { what: ONE_FISH, fishId: 'fish' };
    expect(moved({ ...fish, colony: 'leave' })).toMatchObject({ thing: 'fish', id: 'fish', colonyId: null });
    expect(moved({ ...fish, colony: 'join' })).toMatchObject({ colonyId: 'colony' });
    expect(moved({ ...fish, colony: 'stay' })).not.toHaveProperty('colonyId');
  });
});

describe('a label', () => {
  const id = '0192f0a0-0000-7000-8000-000000000001';
  const colonyId = '0192f0a0-0000-7000-8000-000000000002';
  const tanks = [tank(id, 'T07', [{ thing: 'colony', id: colonyId }]), tank('other', 'T08')];

  test('is read by the address on it, a colony’s too, or by a code painted by hand', () => {
    const codeOf = (text: string) => tankOnLabel(text, tanks)?.code;
    expect(codeOf(`https://fish.example/r/0192f0a0-0000-7000-8000-00000000000a/tanks/${id}`)).toBe('T07');
    expect(codeOf(`https://fish.example/r/0192f0a0-0000-7000-8000-00000000000a/colonies/${colonyId}`)).toBe('T07');
    expect(codeOf(' t08 ')).toBe('T08');
  });

  test('of another fishroom means none of these tanks', () => {
    expect(tankOnLabel('https://fish.example/r/x/tanks/0192f0a0-0000-7000-8000-000000000009', tanks)).toBeNull();
    expect(tankOnLabel('WIFI:S:net;;', tanks)).toBeNull();
  });
});

describe('a water test', () => {
  const draft = { ...emptyTest('2026-05-14'), celsius: '78,8', ph: '8.4', totalAmmoniaNMgL: '0.5' };

  test('is stored in the units of the table and kept as it was read', () => {
    const units = { ...US, ammoniaAs: 'NH4' as const };
    const test = testDraft(units).parse({ ...draft, note: undefined, ...blank });
    const { celsius, totalAmmoniaNMgL, asRead } = testOf('tank', test, draft, units);
    // 78.8 °F are exactly 26 °C; 14.007 / 18.039 of ammonium is nitrogen (IUPAC).
    expect(celsius).toBeCloseTo(26, 9);
    expect(totalAmmoniaNMgL).toBeCloseTo(0.5 * (14.007 / 18.039), 9);
    expect(asRead).toMatchObject({
      celsius: { value: 78.8, unit: '°F' },
      totalAmmoniaNMgL: { value: 0.5, unit: 'mg/L NH4' },
    });
    expect(Object.keys(asRead)).toHaveLength(3);
  });

  test('says nothing yet of a field that is empty or half typed', () => {
    const soFar = readSoFar({ ...draft, ph: '8.', nitriteNMgL: 'x' }, METRIC);
    expect([soFar.ph, soFar.nitriteNMgL, soFar.ghCaCo3MgL]).toEqual([null, null, null]);
  });

  test('needs one reading at least', () => {
    const empty = testDraft(METRIC).safeParse({ onDay: '2026-05-14' });
    expect(empty.error?.issues[0]?.message).toBe('Type at least one reading');
  });
});

const blank = {
  nitriteNMgL: undefined,
  nitrateNMgL: undefined,
  ghCaCo3MgL: undefined,
  khCaCo3MgL: undefined,
  conductivityUs: undefined,
};

test('an incident counts only what died in the tanks it touched', () => {
  const entry = incidentOf(
    {
      what: 'Power cut',
      tankIds: ['t1'],
      cause: 'equipment',
      losses: { here: 3, elsewhere: 2, well: null },
      fishDied: ['fish', 'gone'],
      onDay: '2026-05-14',
      note: null,
    },
    (id) => id === 'here' || id === 'fish' || id === 'well',
  );
  expect(entry.losses).toEqual([{ batchId: 'here', heads: 3, cause: 'equipment' }]);
  expect(entry.fishDied).toEqual(['fish']);
});
