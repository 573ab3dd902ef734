import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { addDays, daysBetween } from '@/shared/days';
import { daysAt, developmentFrom } from '@/shared/holds/development';
import { type HoldProfile, holdClock } from '@/shared/holds/holdClock';
import { learnHoldProfile } from '@/shared/holds/learnHoldProfile';

const profile: HoldProfile = { days: 28, atC: 26, q10: 2.2, stripFrom: 0.75, stripTo: 0.9, spreadDays: 3 };
const seen = (day: string) => ({ spawnEarliest: day, spawnLatest: day });
const steady = (celsius: number, from = '2026-03-01') => [{ on: from, celsius }];

describe('the rate of development', () => {
  // Q10 = (D1 / D2)^(10 / (T2 - T1)): onset of feeding in O. niloticus, 8 d at 24 °C and 5 d at 28 °C (Rana 1990 part II).
  test('Rana’s fry at 28 °C follow from those at 24 °C', () => {
    expect(daysAt({ days: 8, atC: 24, q10: 3.238172324012421 }, 28)).toBeCloseTo(5, 9);
  });

  // D(T) = D_ref Q10^((T_ref - T) / 10), recomputed.
  test('31 days at 26 °C are 38.09 days at 24 °C with a Q10 of 2.8', () => {
    expect(daysAt({ days: 31, atC: 26, q10: 2.8 }, 24)).toBeCloseTo(38.08845005157757, 9);
  });

  test('adds up day by day: half the way warm, half the way cool', () => {
    const pace = { days: 28, atC: 26, q10: 2.2 };
    const readings = Array.from({ length: 60 }, (_, i) => ({
      on: addDays('2026-03-01', i),
      celsius: i < 14 ? 26 : 24,
    }));
    const release = developmentFrom('2026-03-01', pace, readings).until(1, 0);
    expect(release).toBeCloseTo(14 + 0.5 * 28 * 2.2 ** 0.2, 9); // hand-worked: 14 days at 26, the other half at 24
  });
});

describe('a spawn that was seen', () => {
  const spawn = seen('2026-04-23');

  test('is day 1 on its own day and day 22 three weeks later', () => {
    expect(holdClock(spawn, profile, [], '2026-04-23')).toMatchObject({ day: 1, progress: 0, stage: 'egg' });
    expect(holdClock(spawn, profile, [], '2026-05-14').day).toBe(22);
  });

  test('at the profile’s temperature is released after the profile’s days', () => {
    const clock = holdClock(seen('2026-02-10'), profile, [], '2026-02-10');
    expect(clock).toMatchObject({
      stripFrom: '2026-03-03', // 0.75 of 28 days: 21
      stripTo: '2026-03-07', // 0.9 of 28 days: 25.2
      releaseOn: '2026-03-10',
      releaseEarliest: '2026-03-07',
      releaseLatest: '2026-03-13',
    });
  });

  test.each([
    [24, 33], // 28 * 2.2^0.2 = 32.78
    [26, 28],
    [28, 24], // 28 * 2.2^-0.2 = 23.91
  ])('at %i °C is released after %i days', (celsius, days) => {
    const { releaseOn, temperature } = holdClock(spawn, profile, steady(celsius, '2026-04-23'), '2026-04-24');
    expect(daysBetween('2026-04-23', releaseOn)).toBe(days);
    expect(temperature).toMatchObject({ measuredDays: 1, meanC: celsius, beyondTrust: false });
  });

  test.each([
    [0, 'egg'],
    [7, 'egg'],
    [8, 'wriggler'], // 28 % of 28 days is 7.84
    [23, 'wriggler'],
    [24, 'fry'], // 85 % is 23.8
    [40, 'fry'],
  ])('after %i days holds %ss', (days, stage) => {
    const clock = holdClock(spawn, profile, [], addDays('2026-04-23', days));
    expect(clock.stage).toBe(stage);
    expect(clock.progress).toBeCloseTo(days / 28, 9);
  });
});

describe('a spawn that was not seen', () => {
  const spawn = { spawnEarliest: '2026-05-10', spawnLatest: '2026-05-14' };

  test('counts from the middle, and its release range covers all of it', () => {
    const clock = holdClock(spawn, profile, [], '2026-05-14');
    expect(clock).toMatchObject({
      startedOn: '2026-05-12',
      day: 3,
      releaseOn: '2026-06-09',
      releaseEarliest: '2026-06-04', // 10 May + 28 - 3
      releaseLatest: '2026-06-14', // 14 May + 28 + 3
    });
  });

  test('never shows a day before the first', () => {
    expect(holdClock(spawn, profile, [], '2026-05-10')).toMatchObject({ day: 1, progress: 0 });
  });
});

describe('recorded temperatures', () => {
  test('several on a day count as their mean, and days between are on a line', () => {
    const readings = [
      { on: '2026-03-01', celsius: 24 },
      { on: '2026-03-01', celsius: 26 },
      { on: '2026-03-05', celsius: 27 },
    ];
    const { celsius } = developmentFrom('2026-02-27', { days: 28, atC: 26, q10: 2.2 }, readings);
    expect([0, 2, 3, 4, 5, 6].map(celsius)).toEqual([25, 25, 25.5, 26, 26.5, 27]);
  });

  test('one cold night at the end does not steer the forecast', () => {
    const readings = Array.from({ length: 10 }, (_, i) => ({
      on: addDays('2026-03-01', i),
      celsius: i === 9 ? 19 : 26,
    }));
    const { celsius } = developmentFrom('2026-03-01', { days: 28, atC: 26, q10: 2.2 }, readings);
    expect(celsius(20)).toBe(25); // mean of the last week: six days of 26 and one of 19
  });

  test('outside 22 to 30 °C the nearer limit is used and the clock says so', () => {
    const cold = holdClock(seen('2026-03-01'), profile, steady(18), '2026-03-10');
    expect(cold.releaseOn).toBe(holdClock(seen('2026-03-01'), profile, steady(22), '2026-03-10').releaseOn);
    expect(cold.temperature.beyondTrust).toBe(true);
  });

  test('the order they are given in does not matter', () => {
    const reading = fc.record({
      on: fc.integer({ min: 0, max: 40 }).map((n) => addDays('2026-03-01', n)),
      celsius: fc.double({ min: 20, max: 32, noNaN: true }),
    });
    fc.assert(
      fc.property(fc.array(reading, { maxLength: 20 }), (readings) => {
        const forth = holdClock(seen('2026-03-01'), profile, readings, '2026-03-20');
        const back = holdClock(seen('2026-03-01'), profile, readings.toReversed(), '2026-03-20');
        expect(back.releaseOn).toBe(forth.releaseOn);
        expect(back.progress).toBeCloseTo(forth.progress, 9);
      }),
    );
  });

  test('warmer water never releases later', () => {
    const celsius = fc.double({ min: 20, max: 31, noNaN: true });
    fc.assert(
      fc.property(celsius, celsius, (a, b) => {
        const at = (c: number) => holdClock(seen('2026-03-01'), profile, steady(c), '2026-03-10').releaseOn;
        expect(at(Math.max(a, b)) <= at(Math.min(a, b))).toBe(true);
      }),
    );
  });
});

describe('what is learned from finished holds', () => {
  test('nothing, as long as there are none', () => {
    expect(learnHoldProfile(profile, [])).toEqual({ ...profile, basedOn: 0 });
  });

  test('one hold of 32 days moves 28 by a quarter of the way, since the species counts as three', () => {
    const learned = learnHoldProfile(profile, [{ days: 32, meanC: 26 }]);
    expect(learned).toMatchObject({ basedOn: 1, stripFrom: 0.75, q10: 2.2 });
    expect(learned.days).toBeCloseTo(29, 9);
  });

  test('holds at other temperatures are compared at the profile’s', () => {
    const learned = learnHoldProfile(profile, [{ days: 28 * 2.2 ** 0.2, meanC: 24 }]);
    expect(learned.days).toBeCloseTo(28, 9);
  });

  test('many holds that agree speak almost alone, and narrow the range', () => {
    const learned = learnHoldProfile(
      profile,
      Array.from({ length: 57 }, () => ({ days: 24, meanC: 26 })),
    );
    expect(learned.days).toBeCloseTo(24.2, 9); // (3 * 28 + 57 * 24) / 60
    expect(learned.spreadDays).toBe(1);
  });

  test('holds that disagree widen it', () => {
    const uneven = [20, 36, 22, 34].map((days) => ({ days, meanC: 26 }));
    expect(learnHoldProfile(profile, uneven).spreadDays).toBeGreaterThan(profile.spreadDays);
  });

  test('the learned days lie between the species’ and the fishroom’s', () => {
    const finished = fc.array(
      fc.record({ days: fc.double({ min: 10, max: 60, noNaN: true }), meanC: fc.constant(26) }),
      { minLength: 1 },
    );
    fc.assert(
      fc.property(finished, (holds) => {
        const own = holds.reduce((sum, { days }) => sum + days, 0) / holds.length;
        const { days } = learnHoldProfile(profile, holds);
        expect(days).toBeGreaterThanOrEqual(Math.min(own, 28) - 1e-9);
        expect(days).toBeLessThanOrEqual(Math.max(own, 28) + 1e-9);
      }),
    );
  });
});

test.each([
  [
    'a spawn interval the wrong way round',
    () => holdClock({ spawnEarliest: '2026-05-14', spawnLatest: '2026-05-10' }, profile, [], '2026-05-20'),
    'Latest day of the spawn',
  ],
  ['a spawn in the future', () => holdClock(seen('2026-05-21'), profile, [], '2026-05-20'), 'Today'],
  ['a day that does not exist', () => holdClock(seen('2026-02-30'), profile, [], '2026-05-20'), 'Day'],
  ['no days', () => holdClock(seen('2026-05-14'), { ...profile, days: 0 }, [], '2026-05-20'), 'Days'],
  [
    'a Q10 that is not a number',
    () => holdClock(seen('2026-05-14'), { ...profile, q10: Number.NaN }, [], '2026-05-20'),
    'Q10',
  ],
  [
    'a strip window that ends before it begins',
    () => holdClock(seen('2026-05-14'), { ...profile, stripTo: 0.5 }, [], '2026-05-20'),
    'End of the strip window',
  ],
  [
    'water of 80 °C',
    () => holdClock(seen('2026-05-14'), profile, [{ on: '2026-05-14', celsius: 80 }], '2026-05-20'),
    'Temperature',
  ],
  ['a finished hold of no days', () => learnHoldProfile(profile, [{ days: 0, meanC: 26 }]), 'Days of a finished hold'],
])('%s is refused by name', (_, act, what) => {
  expect(act).toThrow(BadValue);
  expect(act).toThrow(what);
});
