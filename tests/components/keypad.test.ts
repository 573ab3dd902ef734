import { expect, test } from 'vitest';
import { withKey } from '@/components/form/withKey';

const typed = (keys: string[], extra: '.5' | '.', digits = 3) =>
  keys.reduce((value, key) => withKey(value, key, digits, extra), '');

test.each([
  ['46 mm', ['4', '6'], '46'],
  ['46.5 mm by the half key', ['4', '6', '.'], '46.5'],
  ['nothing more after the half', ['4', '6', '.', '7'], '46.5'],
  ['one half only', ['4', '.', '.'], '4.5'],
  ['a leading nought gives way', ['0', '7'], '7'],
  ['no fourth digit of millimetres', ['1', '2', '3', '4'], '123'],
  ['no half of nothing', ['.'], ''],
])('lengths: %s', (_, keys, value) => expect(typed(keys, '.5')).toBe(value));

test.each([
  ['pH 8.8', ['8', '.', '8'], '8.8'],
  ['ammonia 0.25', ['0', '.', '2', '5'], '0.25'],
  ['no third decimal', ['0', '.', '2', '5', '7'], '0.25'],
  ['one point only', ['7', '.', '.', '5'], '7.5'],
])('readings: %s', (_, keys, value) => expect(typed(keys, '.')).toBe(value));
