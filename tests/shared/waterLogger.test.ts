import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { readLogger } from '@/shared/water/loggerText';

const celsius = { unit: 'C', timeZone: 'Europe/Oslo' } as const;
const daysOf = (text: string, how: Parameters<typeof readLogger>[1] = celsius) =>
  readLogger(text, how).days.map(({ on, meanC }) => [on, Number(meanC.toFixed(3))]);

test('a logger’s file becomes a mean, lowest and highest for each day', () => {
  const text =
    'Plot Title: rack 3\n#,Date Time,Temp °C\n1,2026-03-01 06:00,25.0\n2,2026-03-01 18:00,26.0\n3,2026-03-02 06:00,24.5\n';
  expect(readLogger(text, celsius)).toEqual({
    days: [
      { on: '2026-03-01', meanC: 25.5, lowestC: 25, highestC: 26, readings: 2 },
      { on: '2026-03-02', meanC: 24.5, lowestC: 24.5, highestC: 24.5, readings: 1 },
    ],
    skipped: [],
    isDateUnclear: false,
  });
});

describe('is read however it is written', () => {
  test.each([
    ['semicolons and decimal commas', '14.03.2026;06:00;25,4\n14.03.2026;18:00;25,6'],
    ['commas for everything', '14.03.2026 06:00,25,4\n14.03.2026 18:00,25,6'],
    ['tabs', '2026/03/14\t06:00:00\t25.4 °C\n2026/03/14\t18:00:00\t25.6 °C'],
    [
      'quotes, a mark at the start and Windows lines',
      '\uFEFF"2026-03-14 06:00","25.4"\r\n"2026-03-14 18:00","25.6"\r\n',
    ],
    ['the month first, with am and pm', '3/14/2026,6:00 AM,25.4\n3/14/2026,6:00 PM,25.6'],
    ['days alone', '2026-03-14,25.5'],
  ])('%s', (_, text) => {
    expect(daysOf(text)).toEqual([['2026-03-14', 25.5]]);
  });

  test('in Fahrenheit', () => {
    expect(daysOf('2026-03-14 06:00,78.8', { ...celsius, unit: 'F' })).toEqual([['2026-03-14', 26]]);
  });

  test('with instants, which fall on the room’s day', () => {
    expect(daysOf('2026-03-14T23:30:00Z,26')).toEqual([['2026-03-15', 26]]);
    expect(daysOf('2026-03-14T23:30:00Z,26', { ...celsius, timeZone: 'America/New_York' })).toEqual([
      ['2026-03-14', 26],
    ]);
  });
});

test('dates that could be read both ways are asked about, and read again with the answer', () => {
  const text = '3/4/2026 06:00,25\n4/4/2026 06:00,26';
  expect(readLogger(text, celsius).isDateUnclear).toBe(true);
  expect(daysOf(text, { ...celsius, dateOrder: 'dayFirst' })).toEqual([
    ['2026-04-03', 25],
    ['2026-04-04', 26],
  ]);
  expect(daysOf(text, { ...celsius, dateOrder: 'monthFirst' })).toEqual([
    ['2026-03-04', 25],
    ['2026-04-04', 26],
  ]);
});

test('what cannot be a temperature is skipped, with its line', () => {
  const text = 'Date,Temp\n2026-03-14,25\n2026-03-15,\n2026-03-16,error\n2026-03-17,-127\n2026-02-30,25\n2026-03-18,85';
  const { days, skipped } = readLogger(text, celsius);
  expect(days).toHaveLength(1);
  expect(skipped).toEqual([
    { line: 3, why: 'noTemperature' },
    { line: 4, why: 'noTemperature' },
    { line: 5, why: 'notATemperature' },
    { line: 6, why: 'noSuchDay' },
    { line: 7, why: 'notATemperature' },
  ]);
});

test('a year of readings every quarter of an hour becomes its 365 days', () => {
  const lines = Array.from({ length: 35_040 }, (_, i) => {
    const at = new Date(Date.UTC(2025, 0, 1) + i * 900_000).toISOString();
    return `${i},${at.slice(0, 10)} ${at.slice(11, 16)},${(25 + (i % 4) / 10).toFixed(1)}`;
  });
  const { days } = readLogger(lines.join('\n'), celsius);
  expect(days).toHaveLength(365);
  expect(days.every(({ readings }) => readings === 96)).toBe(true);
  expect(days[200]?.meanC).toBeCloseTo(25.15, 9);
});

test.each(['', 'Date,Temp', 'just words'])('%j has nothing to read', (text) => {
  expect(() => readLogger(text, celsius)).toThrow(BadValue);
});
