import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import {
  addDays,
  addMonths,
  ageWords,
  DayText,
  dayOf,
  daysBetween,
  daysFrom,
  dayWords,
  formatDate,
  formatDay,
  formatShortDay,
  fromToday,
  isDay,
  isoWeek,
  isTimeZone,
} from '@/shared/days';

const anyDay = fc.integer({ min: 0, max: 100_000 }).map((n) => addDays('1901-01-01', n));

describe('a day on the calendar', () => {
  test.each(['2026-05-14', '2024-02-29', '1900-01-01', '2199-12-31'])('%s exists', (text) => {
    expect(isDay(text)).toBe(true);
  });

  test.each([
    '2026-02-29',
    '2026-13-01',
    '2026-00-10',
    '2026-5-14',
    '14.05.2026',
    '2026-05-14T00:00',
    '0000-01-01',
    '9999-01-01',
    '',
    'today',
  ])('%s does not', (text) => {
    expect(isDay(text)).toBe(false);
    expect(DayText.safeParse(text).success).toBe(false);
  });

  test('says what to type instead', () => {
    const result = DayText.safeParse('31.2.2026');
    expect(result.error?.issues[0]?.message).toBe('Type a date such as 2026-05-14');
  });
});

// ISO 8601 civil dates, recomputed with two calendars; the first crosses 29 February, the others a clock change in Europe.
test.each([
  ['2024-02-28', '2024-03-01', 2],
  ['2026-03-28', '2026-03-30', 2],
  ['2025-10-25', '2025-10-27', 2],
  ['2026-03-01', '2026-02-28', -1],
])('from %s to %s are %i days', (from, to, days) => {
  expect(daysBetween(from, to)).toBe(days);
});

test('28 days after 10 February 2026 is 10 March', () => {
  expect(addDays('2026-02-10', 28)).toBe('2026-03-10');
});

test('counting days forth and back comes home', () => {
  fc.assert(
    fc.property(anyDay, fc.integer({ min: -300, max: 8000 }), (day, count) => {
      const there = addDays(day, count);
      expect(daysBetween(day, there)).toBe(count);
      expect(addDays(there, -count)).toBe(day);
    }),
  );
});

test('later days compare as later text', () => {
  fc.assert(
    fc.property(anyDay, anyDay, (a, b) => {
      expect(a < b).toBe(daysBetween(a, b) > 0);
    }),
  );
});

test('a list of days includes both ends', () => {
  expect(daysFrom('2026-02-27', '2026-03-02')).toEqual(['2026-02-27', '2026-02-28', '2026-03-01', '2026-03-02']);
  expect(daysFrom('2026-03-02', '2026-03-01')).toEqual([]);
});

test.each([
  ['2026-01-31', 1, '2026-02-28'],
  ['2024-01-31', 1, '2024-02-29'],
  ['2026-03-31', -1, '2026-02-28'],
  ['2026-11-15', 3, '2027-02-15'],
  ['2026-05-14', -12, '2025-05-14'],
])('%s and %i months is %s', (day, months, expected) => {
  expect(addMonths(day, months)).toBe(expected);
});

// ISO 8601 week dates: the two examples of the standard's year boundary, then the first and last days of common years.
test.each([
  ['2008-12-29', 2009, 1, 1],
  ['2010-01-03', 2009, 53, 7],
  ['2026-01-01', 2026, 1, 4],
  ['2026-12-31', 2026, 53, 4],
  ['2026-05-14', 2026, 20, 4],
])('%s is in week %i-%i, weekday %i', (day, year, week, weekday) => {
  expect(isoWeek(day)).toEqual({ year, week, weekday });
});

describe('the day in the fishroom', () => {
  const lateEvening = Date.parse('2026-05-14T22:30:00Z');

  test.each([
    ['Europe/Oslo', '2026-05-15'],
    ['UTC', '2026-05-14'],
    ['America/New_York', '2026-05-14'],
    ['Pacific/Auckland', '2026-05-15'],
    ['Asia/Kolkata', '2026-05-15'],
  ])('at half past ten UTC it is, in %s, %s', (zone, day) => {
    expect(dayOf(lateEvening, zone)).toBe(day);
  });

  test('does not move at a clock change', () => {
    expect(dayOf(Date.parse('2026-03-28T23:30:00Z'), 'Europe/Oslo')).toBe('2026-03-29');
    expect(dayOf(Date.parse('2026-03-29T21:30:00Z'), 'Europe/Oslo')).toBe('2026-03-29');
    expect(dayOf(Date.parse('2026-03-29T22:30:00Z'), 'Europe/Oslo')).toBe('2026-03-30');
  });

  test('needs a zone that exists and an instant', () => {
    expect(() => dayOf(lateEvening, 'Moon/Crater')).toThrow(BadValue);
    expect(() => dayOf(Number.NaN, 'UTC')).toThrow('Instant');
    expect(isTimeZone('Europe/Oslo')).toBe(true);
    expect(isTimeZone('Moon/Crater')).toBe(false);
    expect(isTimeZone('')).toBe(false);
  });
});

describe('in words', () => {
  const today = '2026-05-14';

  test.each([
    ['2026-05-14', 'today'],
    ['2026-05-15', 'tomorrow'],
    ['2026-05-13', 'Wed 13 May'],
    ['2026-05-20', 'Wed 20 May'],
    ['2025-11-14', 'Fri 14 Nov'],
    ['2025-11-13', 'Thu 13 Nov 2025'],
    ['2026-11-14', 'Sat 14 Nov'],
    ['2026-11-15', 'Sun 15 Nov 2026'],
  ])('%s reads %s', (day, words) => {
    expect(dayWords(day, today)).toBe(words);
  });

  test('today is a date where a date is wanted', () => {
    expect(formatDay(today, today)).toBe('Thu 14 May');
    expect(formatDate(today)).toBe('14 May 2026');
    expect(formatShortDay(today)).toBe('14 May');
  });

  test.each([
    ['2026-04-13', '31 days ago'],
    ['2026-05-13', '1 day ago'],
    ['2026-05-14', 'today'],
    ['2026-05-15', 'tomorrow'],
    ['2026-05-20', 'in 6 days'],
  ])('%s was or is %s', (day, words) => {
    expect(fromToday(day, today)).toBe(words);
  });

  test.each([
    [0, '0 days'],
    [1, '1 day'],
    [13, '13 days'],
    [14, '2 weeks'],
    [84, '12 weeks'],
    [91, '13 weeks'],
    [92, '3 months'],
    [364, '11 months'],
    [365, '12 months'],
    [730, '2 years'],
    [830, '2 years 3 months'],
    [1095, '3 years'],
  ])('%i days old is %s', (days, words) => {
    expect(ageWords(days)).toBe(words);
  });
});

test.each([
  ['a day that does not exist', () => addDays('2026-02-30', 1), 'Day'],
  ['half a day', () => addDays('2026-02-10', 1.5), 'Days to add'],
  ['the end of the calendar', () => addDays('2199-12-31', 1), 'Day'],
  ['text for a day', () => daysBetween('2026-02-10', 'soon'), 'Day'],
  ['a negative age', () => ageWords(-1), 'Age in days'],
])('%s is refused by name', (_, act, what) => {
  expect(act).toThrow(BadValue);
  expect(act).toThrow(what);
});
