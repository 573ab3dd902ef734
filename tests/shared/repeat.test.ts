import { describe, expect, test } from 'vitest';
import { due, isDueKey, lateDaysOf } from '@/shared/today/due';
import { nextDueOn, repeatTrouble, repeatWords } from '@/shared/today/repeat';
import { whenOf } from '@/shared/today/when';

// 14 May 2026 is a Thursday: by any calendar, and by Zeller's congruence.
const THURSDAY = '2026-05-14';

describe('when a task is due again', () => {
  test.each([
    ['once', { everyDays: null, onWeekday: null }, '2026-05-14', null],
    ['three days after it was done', { everyDays: 3, onWeekday: null }, '2026-05-14', '2026-05-17'],
    ['three days after it was done, late as that was', { everyDays: 3, onWeekday: null }, '2026-05-20', '2026-05-23'],
    ['every Thursday', { everyDays: 7, onWeekday: 4 }, '2026-05-14', '2026-05-21'],
    ['every Thursday, done on the Saturday after', { everyDays: 7, onWeekday: 4 }, '2026-05-16', '2026-05-21'],
    ['every Thursday, done on the very next one', { everyDays: 7, onWeekday: 4 }, '2026-05-21', '2026-05-28'],
    ['every Thursday, done on the Tuesday before', { everyDays: 7, onWeekday: 4 }, '2026-05-12', '2026-05-21'],
    // 14 May, 28 May, 11 June: three weeks late it keeps to its own fortnights.
    ['every second Thursday, three weeks late', { everyDays: 14, onWeekday: 4 }, '2026-06-04', '2026-06-11'],
    ['over the end of a year', { everyDays: 365, onWeekday: null }, '2026-05-14', '2027-05-14'],
  ])('%s', (_name, rhythm, settledOn, next) => {
    expect(nextDueOn({ dueOn: THURSDAY, ...rhythm }, settledOn)).toBe(next);
  });
});

test('a weekday takes whole weeks, and the day that it is due must be one of them', () => {
  expect(repeatTrouble({ dueOn: THURSDAY, everyDays: 14, onWeekday: 4 })).toEqual({});
  expect(repeatTrouble({ dueOn: THURSDAY, everyDays: 10, onWeekday: 4 })).toHaveProperty('everyDays');
  expect(repeatTrouble({ dueOn: THURSDAY, everyDays: null, onWeekday: 4 })).toHaveProperty('everyDays');
  expect(repeatTrouble({ dueOn: THURSDAY, everyDays: 7, onWeekday: 1 })).toEqual({
    dueOn: 'Choose a day among the Mondays',
  });
});

test.each([
  [null, null, null],
  [1, null, 'every day'],
  [3, null, 'every 3 days'],
  [7, null, 'every week'],
  [28, null, 'every 4 weeks'],
  [7, 1, 'on Mondays'],
  [14, 7, 'on Sundays, every 2 weeks'],
])('every %s days, weekday %s, is said as "%s"', (everyDays, onWeekday, words) => {
  expect(repeatWords({ everyDays, onWeekday })).toBe(words);
});

test.each([
  [1, 'late'],
  [0, 'today'],
  [-1, 'tomorrow'],
  [-7, 'week'],
  [-8, 'later'],
])('%i days late stands under %s', (lateDays, when) => {
  expect(whenOf(lateDays)).toBe(when);
});

test.each([
  ['2026-05-09', -1],
  ['2026-05-10', 0],
  ['2026-05-17', 0],
  ['2026-05-19', 2],
])('a window from 10 to 17 May is on %s late by %i days', (today, lateDays) => {
  expect(lateDaysOf({ dueOn: '2026-05-10', untilOn: '2026-05-17' }, today)).toBe(lateDays);
});

test('a key names the thing and the day, so that the next occasion is not hidden with it', () => {
  const id = '0196c9a0-0000-7000-8000-000000000001';
  const count = (dueOn: string) => due({ kind: 'headCount', thing: 'batch', id, code: 'MOKA-26A', dueOn }, THURSDAY);
  expect(count('2026-05-12')).toMatchObject({ key: `headCount:${id}:2026-05-12`, lateDays: 2 });
  expect(count('2026-05-26').key).not.toBe(count('2026-05-12').key);
  expect(isDueKey(count('2026-05-12').key)).toBe(true);
  for (const odd of ['own:1', `own:${id}:2026-05-12`, `cook:${id}:2026-05-12`, `headCount:${id}`, 'headCount'])
    expect(isDueKey(odd), odd).toBe(false);
});
