import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as z from 'zod/mini';
import { BadValue } from '@/shared/badValue';
import { Currency, formatMoney, isCurrency, MinorUnits, minorDigits, spelledMoney } from '@/shared/money';

// Decimals of a currency: ISO 4217.
test.each([
  [7400, 'EUR', '€74.00'],
  [5, 'EUR', '€0.05'],
  [-500, 'GBP', '-£5.00'],
  [300, 'JPY', '¥300'],
  [1_234_567, 'USD', '$12345.67'],
  [1500, 'KWD', 'KWD 1.500'],
])('%i minor units of %s read %s', (minor, currency, text) => {
  expect(formatMoney(minor, currency).replace(/\u00a0/g, ' ')).toBe(text);
});

test.each([
  ['12.50', 'EUR', 1250],
  ['12,5', 'EUR', 1250],
  ['12', 'EUR', 1200],
  ['0.07', 'EUR', 7],
  ['1.15', 'USD', 115],
  ['300', 'JPY', 300],
  ['1,5', 'KWD', 1500],
])('%s in %s is stored as %i', (text, currency, minor) => {
  expect(z.decode(spelledMoney(currency), text)).toBe(minor);
});

describe('an amount that could be misread is refused', () => {
  test.each([
    ['1,000', 'EUR', 'Type an amount such as 12.50'],
    ['1.000,00', 'EUR', 'Type an amount such as 12.50'],
    ['-5', 'EUR', 'Type an amount such as 12.50'],
    ['1e3', 'EUR', 'Type an amount such as 12.50'],
    ['0x10', 'EUR', 'Type an amount such as 12.50'],
    ['€5', 'EUR', 'Type an amount such as 12.50'],
    ['5.50', 'JPY', 'Type an amount such as 1250'],
    ['', 'EUR', 'Type an amount'],
  ])('%s in %s', (text, currency, message) => {
    expect(z.safeDecode(spelledMoney(currency), text).error?.issues[0]?.message).toBe(message);
  });
});

test('every amount comes back from its spelling', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 999_999_999 }), fc.constantFrom('EUR', 'JPY', 'KWD'), (minor, currency) => {
      const field = spelledMoney(currency);
      fc.pre(minor < 10 ** (8 + minorDigits(currency)));
      expect(z.decode(field, z.encode(field, z.parse(MinorUnits, minor)))).toBe(minor);
    }),
  );
});

test('only currencies that exist are taken', () => {
  expect(isCurrency('NOK')).toBe(true);
  expect(isCurrency('eur')).toBe(false);
  expect(Currency.safeParse('ABC').success).toBe(false);
  expect(() => formatMoney(5, 'ABC')).toThrow(BadValue);
  expect(() => formatMoney(5.5, 'EUR')).toThrow('Amount');
});
