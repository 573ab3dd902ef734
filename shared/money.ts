import * as z from 'zod/mini';
import { BadValue, whole } from './badValue';

/** An amount in the currency's minor unit: €12.50 is 1250, ¥300 is 300. */
export const MinorUnits = z
  .number('Type an amount')
  .check(z.int('Whole minor units only'), z.minimum(0, 'Zero or more'), z.maximum(9_999_999_999, 'That is too much'))
  .brand<'MinorUnits'>();
export type MinorUnits = z.output<typeof MinorUnits>;

const CODE = /^[A-Z]{3}$/;

/** Whether the runtime knows the ISO 4217 code. */
export const isCurrency = (code: string): boolean =>
  CODE.test(code) && Intl.supportedValuesOf('currency').includes(code);

export const Currency = z.string('Choose a currency').check(z.refine(isCurrency, 'Choose a currency such as EUR'));

const formats = new Map<string, { format: Intl.NumberFormat; digits: number }>();

function formatOf(currency: string) {
  const known = formats.get(currency);
  if (known) return known;
  if (!isCurrency(currency)) throw new BadValue('Currency', currency, 'a code such as EUR is needed');
  const format = new Intl.NumberFormat('en', { style: 'currency', currency, useGrouping: false });
  const made = { format, digits: format.resolvedOptions().maximumFractionDigits ?? 2 };
  formats.set(currency, made);
  return made;
}

/** Decimals of the currency: 2 for EUR, 0 for JPY, 3 for KWD. */
export const minorDigits = (currency: string): number => formatOf(currency).digits;

/** "€74.00", "-€5.00", "¥300". Thousands are never grouped, so that no comma can be taken for a decimal. */
export function formatMoney(minor: number, currency: string): string {
  const { format, digits } = formatOf(currency);
  return format.format(whole('Amount', minor, Number.MIN_SAFE_INTEGER) / 10 ** digits);
}

/** "12,5" or "12.50" as 1250 in a currency of two decimals. No sign, no grouping, no more decimals than the currency has. */
export const spelledMoney = (currency: string) => {
  const digits = minorDigits(currency);
  const example = digits === 0 ? '1250' : `12.${'5'.padEnd(digits, '0')}`;
  const pattern = digits === 0 ? /^\d{1,8}$/ : new RegExp(`^\\d{1,8}(?:[.,]\\d{1,${digits}})?$`);
  const typed = z
    .string('Type an amount')
    .check(
      z.trim(),
      z.minLength(1, { error: 'Type an amount', abort: true }),
      z.regex(pattern, `Type an amount such as ${example}`),
    );
  return z.codec(typed, MinorUnits, {
    // Digits are moved as text: 1.005 * 100 is not 100.5.
    decode: (text) => {
      const [units = '', cents = ''] = text.replace(',', '.').split('.');
      return Number(units + cents.padEnd(digits, '0'));
    },
    encode: (minor) => (digits === 0 ? String(minor) : spellMinor(minor, digits)),
  });
};

function spellMinor(minor: number, digits: number): string {
  const text = String(minor).padStart(digits + 1, '0');
  return `${text.slice(0, -digits)}.${text.slice(-digits)}`;
}
