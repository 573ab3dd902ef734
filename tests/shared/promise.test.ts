import { describe, expect, test } from 'vitest';
import { promiseOf } from '@/shared/buyers/promise';
import { lessPercent, priceLines, promiseWords, reachedWords, sizeRests } from '@/shared/buyers/words';
import type { SizeToday } from '@/shared/growth/sizeToday';
import { METRIC } from '@/shared/units';

const sized = (meanTenthsMm: number, more: Partial<SizeToday> = {}): SizeToday => ({
  meanTenthsMm,
  seMm: 0,
  cv: 0.1,
  cvSd: 0,
  measure: 'total',
  measuredOn: null,
  lastOn: '2026-05-11',
  samples: 4,
  fish: 20,
  ...more,
});

describe('six at 5 cm now', () => {
  // With the mean at the length each of ten fish is there with one half. Binomial (10, 1/2): P(X <= 1) = 11/1024 = 0.011,
  // P(X <= 2) = 56/1024 = 0.055; P(X <= 7) = 0.945, P(X <= 8) = 1013/1024 = 0.989: from 2 to 8.
  test.each([
    [2, 'sure'],
    [5, 'likely'],
    [6, 'short'],
  ] as const)('%i of ten, the mean being at the length: %s', (heads, verdict) => {
    expect(promiseOf(sized(500), 10, { heads, lengthTenthsMm: 500 })).toEqual({
      expected: 5,
      low: 2,
      high: 8,
      verdict,
    });
  });

  test('fish all alike are all there, or none', () => {
    expect(promiseOf(sized(500, { cv: 0 }), 10, { heads: 10, lengthTenthsMm: 500 }).verdict).toBe('sure');
    expect(promiseOf(sized(499, { cv: 0 }), 10, { heads: 1, lengthTenthsMm: 500 }).verdict).toBe('short');
  });

  test('says what can be promised, and warns of what cannot', () => {
    const promised = promiseOf(sized(500), 10, { heads: 6, lengthTenthsMm: 500 });
    expect(reachedWords(promised, 10, '5 cm')).toBe('About 5 of 10 have reached 5 cm (2 to 8).');
    expect(promiseWords(promised, 6)).toBe('6 can’t be promised: only about 5 are there.');
    expect(promiseWords({ ...promised, verdict: 'likely' }, 5)).toMatch(
      /^5 are likely there, but not sure: only 2 are/,
    );
  });
});

test('says what the size rests on', () => {
  expect(sizeRests(sized(500), '2026-05-14')).toBe(
    'By the growth curve of 4 samples, the last on Mon 11 May with 20 fish.',
  );
  expect(sizeRests(sized(500, { measuredOn: '2026-05-11', samples: 1 }), '2026-05-14')).toBe(
    'As measured on Mon 11 May, 20 fish; they have grown since.',
  );
});

test('prices are listed by length class and by lot', () => {
  const classes = [
    { fromTenthsMm: 400, cents: 1500 },
    { fromTenthsMm: 600, cents: 2000 },
  ];
  const lots = [
    { lot: 'pair', heads: 2, cents: 4500 },
    { lot: 'group', heads: 6, cents: 8000 },
  ] as const;
  expect(priceLines({ classes, lots }, 'EUR', METRIC)).toEqual([
    { what: '4 cm to 6 cm', price: '€15.00 each' },
    { what: 'from 6 cm', price: '€20.00 each' },
    { what: 'pair', price: '€45.00' },
    { what: 'group of 6', price: '€80.00' },
  ]);
});

test('a shop’s discount is taken off every price, to the nearest cent', () => {
  // 15 % off 12.50 is 10.625.
  const prices = {
    classes: [{ fromTenthsMm: 400, cents: 1250 }],
    lots: [{ lot: 'pair', heads: 2, cents: 3000 }],
  } as const;
  expect(lessPercent(prices, 15)).toEqual({
    classes: [{ fromTenthsMm: 400, cents: 1063 }],
    lots: [{ lot: 'pair', heads: 2, cents: 2550 }],
  });
});
