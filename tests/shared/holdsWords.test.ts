import { describe, expect, test } from 'vitest';
import { clockOf } from '@/shared/holds/clockOf';
import { dayRangeWords, daysHeld, releaseDoubtDays } from '@/shared/holds/clockWords';
import type { ClockFacts } from '@/shared/holds/contract';

const facts = (more: Partial<ClockFacts> = {}): ClockFacts => ({
  speciesId: 'tropheus-duboisi',
  overrides: { holdDays: 30, holdDaysRange: [28, 34], holdAtC: 26, stripDays: [22, 28] },
  about: null,
  finished: [],
  temperatures: [{ on: '2026-05-01', celsius: 26 }],
  ...more,
});
const seen = (day: string) => ({ spawnEarliest: day, spawnLatest: day });

describe('the clock out of the facts that travel', () => {
  test('runs on what the fishroom set for the species', () => {
    const run = clockOf(facts(), seen('2026-05-01'), '2026-05-14');
    // 30 days at 26 °C from 1 May; the spread is half of 28 to 34; window days 22 and 28 with the spawn on day 1.
    expect(run?.clock).toMatchObject({
      day: 14,
      releaseOn: '2026-05-31',
      stripFrom: '2026-05-22',
      stripTo: '2026-05-28',
    });
    expect(run && releaseDoubtDays(run.clock)).toBe(3);
    expect(run?.basedOn).toBe(0);
  });

  test('is none for a species that nothing is known of, or before the spawn', () => {
    expect(clockOf(facts({ speciesId: null }), seen('2026-05-01'), '2026-05-14')).toBeNull();
    expect(clockOf(facts({ speciesId: 'own-species' }), seen('2026-05-01'), '2026-05-14')).toBeNull();
    expect(clockOf(facts(), seen('2026-05-20'), '2026-05-14')).toBeNull();
  });

  test('counts the days of a hold as the bars do, from the middle of the interval', () => {
    const spawn = { spawnEarliest: '2026-05-01', spawnLatest: '2026-05-06' };
    for (const on of ['2026-05-06', '2026-05-07', '2026-05-20'])
      expect(daysHeld(spawn, on)).toBe(clockOf(facts(), spawn, on)?.clock.day);
  });
});

test.each([
  ['2026-06-01', '2026-06-08', '1–8 Jun'],
  ['2026-05-28', '2026-06-03', '28 May–3 Jun'],
  ['2026-06-16', '2026-06-16', '16 Jun'],
  ['2025-06-28', '2026-06-03', '28 Jun–3 Jun'],
])('from %s to %s is said %s', (from, to, words) => {
  expect(dayRangeWords(from, to)).toBe(words);
});
