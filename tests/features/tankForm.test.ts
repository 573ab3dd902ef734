import { expect, test } from 'vitest';
import { emptyTank, tankAsTyped, tankDraft } from '@/features/tanks/tankForm';
import { TankRow } from '@/shared/tanks/contract';
import { METRIC, US } from '@/shared/units';
import { makeId } from '../support/testApp';

const tank = TankRow.parse({
  id: makeId(),
  version: 3,
  code: 'T07',
  place: 'left rack',
  walkOrder: 7,
  purpose: 'colony',
  litres: 473.2,
  heaterC: 25.5,
  lengthTenthsMm: 18_300,
  widthTenthsMm: 6_100,
  heightTenthsMm: 5_300,
  fillTenthsMm: null,
  glassTenthsMm: 120,
  standKg: null,
  note: 'lid is cracked',
  retiredOn: null,
  residents: [],
});

test.each([
  ['metric', METRIC],
  ['US', US],
])('a tank opens in its form as it was typed, in %s units, and saves as the same tank', (_name, units) => {
  const typed = tankAsTyped(tank, units);
  expect(typed.code).toBe('T07');
  expect(typed.note).toBe('lid is cracked');
  const { id: _id, version: _version, retiredOn: _retired, residents: _residents, ...facts } = tank;
  const again = tankDraft(units).parse(typed);
  expect({ ...again, litres: 0, lengthTenthsMm: 0 }).toMatchObject({
    code: facts.code,
    place: facts.place,
    walkOrder: facts.walkOrder,
    purpose: facts.purpose,
    note: facts.note,
    fillTenthsMm: null,
    glassTenthsMm: facts.glassTenthsMm,
  });
  // 1 US gal = 3.785411784 L (NIST Handbook 44, from memory): a tenth of a gallon is lost at most.
  expect(Math.abs(again.litres - facts.litres)).toBeLessThan(0.4);
  expect(Math.abs((again.lengthTenthsMm ?? 0) - (facts.lengthTenthsMm ?? 0))).toBeLessThanOrEqual(3);
});

test('a new tank asks for what is missing beside its field', () => {
  const result = tankDraft(METRIC).safeParse(emptyTank('T01', 1));
  expect(result.error?.issues.map(({ path }) => path[0])).toContain('litres');
});
