import { describe, expect, test } from 'vitest';
import { MOST_FOUND, type Thing } from '@/shared/search/contract';
import { bestOf, fitOf, type Named } from '@/shared/search/rank';

const named = (thing: Thing, code: string, more: Partial<Named> = {}): Named => ({
  thing,
  id: `${thing} ${code}`,
  code,
  name: null,
  gone: false,
  ...more,
});

describe('how well a code fits what was typed', () => {
  test.each([
    ['DUMA-A04', 'duma-a04', 0],
    ['DUMA-A04', 'DUMA', 1],
    ['DUMA-A04', 'a04', 2],
    ['DUMA-A04', '04', 2],
    ['DUMA-26C', '26c', 2],
    ['DUMA-26C', 'duma 26', 3],
    ['ŁÓDŹ-1', 'lodz', 1],
    ['DUMA-A04', 'uma', null],
    ['DUMA-A04', '4', null],
    ['T.07', '%', null],
  ])('%s for "%s": %s', (code, typed, fit) => {
    expect(fitOf(named('fish', code), typed)).toBe(fit);
  });

  test('names, places and marks are found by the beginning of their words', () => {
    const fish = named('fish', 'DUMA-A04', { name: 'Tropheus duboisi', also: ['Perlmutt Brabant'] });
    for (const typed of ['dub', 'trop dub', 'brab', 'duma brab']) expect(fitOf(fish, typed), typed).toBe(3);
    expect(fitOf(fish, 'trop moorii')).toBeNull();
  });
});

test('the code itself comes first, then what begins with it, and what is here before what is gone', () => {
  const all = [
    named('fish', 'DUMA-A10', { gone: true }),
    named('fish', 'DUMA-A9'),
    named('fish', 'DUMA-A10x'),
    named('brood', 'DUMA-26C'),
    named('colony', 'DUMA-A'),
    named('strain', 'DUMA'),
    named('tank', 'T1', { name: 'Duma wall' }),
    named('tank', 'T2'),
  ];
  expect(bestOf(all, 'duma').map(({ code }) => code)).toEqual([
    'DUMA',
    'DUMA-A',
    'DUMA-26C',
    'DUMA-A9',
    'DUMA-A10x',
    'DUMA-A10',
    'T1',
  ]);
});

test('nothing is found for nothing, and never more than can be looked through', () => {
  const many = Array.from({ length: 300 }, (_, i) => named('fish', `DUMA-A${i}`));
  expect(bestOf(many, 'duma')).toHaveLength(MOST_FOUND);
  for (const typed of ['', '  ', '-', '%', '_']) expect(bestOf(many, typed), typed).toEqual([]);
});
