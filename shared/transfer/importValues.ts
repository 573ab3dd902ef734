import { isDay } from '../days';
import { celsiusOf, LITRES_PER_IMPERIAL_GALLON, LITRES_PER_US_GALLON } from '../units';

/** A value that cannot be read, in words for the keeper. */
export class Unreadable extends Error {
  override readonly name = 'Unreadable';
}

export type ImportUnits = { length: 'mm' | 'cm' | 'in'; temperature: 'C' | 'F'; volume: 'L' | 'usGal' | 'impGal' };

/** "12", "12.5", "12,5" and "1,234.5" are numbers. "1,234" may be either, and is asked about rather than guessed. */
export function numberIn(text: string): number {
  const bare = text.trim().replace(/[\s' ]/g, '');
  if (/^\d{1,3},\d{3}$/.test(bare)) throw new Unreadable('Is that comma for thousands or decimals? Write it without');
  const thousands = /^\d{1,3}(,\d{3})+(\.\d+)?$/.test(bare);
  const plain = thousands ? bare.replaceAll(',', '') : bare.replace(',', '.');
  if (!/^-?\d{1,12}(\.\d+)?$/.test(plain)) throw new Unreadable('That is not a number');
  return Number(plain);
}

export function headsIn(text: string): number {
  const heads = numberIn(text);
  if (!Number.isInteger(heads) || heads < 0 || heads > 100_000) throw new Unreadable('Whole fish only, zero or more');
  return heads;
}

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

/** "2025-03-14", "14.3.2025", "14 Mar 2025"; "3/14/2025" or "14/3/2025" only where one of the two cannot be a month. */
export function dayIn(text: string): string {
  const bare = text.trim();
  const found = isoDay(bare) ?? dottedDay(bare) ?? slashedDay(bare) ?? wordDay(bare);
  if (!found || !isDay(found)) throw new Unreadable('Type a date such as 2025-03-14');
  return found;
}

const padded = (year: string, month: number | string, date: number | string): string =>
  `${year}-${String(month).padStart(2, '0')}-${String(date).padStart(2, '0')}`;

const isoDay = (text: string): string | null => (/^\d{4}-\d{2}-\d{2}$/.test(text) ? text : null);

function dottedDay(text: string): string | null {
  const [, date, month, year] = /^(\d{1,2})\.\s?(\d{1,2})\.\s?(\d{4})$/.exec(text) ?? [];
  return date && month && year ? padded(year, month, date) : null;
}

function slashedDay(text: string): string | null {
  const [, one, two, year] = /^(\d{1,2})[/-](\d{1,2})[/-](\d{4})$/.exec(text) ?? [];
  if (!one || !two || !year) return null;
  if (one === two) return padded(year, one, two);
  if (Number(one) <= 12 && Number(two) <= 12) throw new Unreadable('Day or month first? Write 2025-03-14');
  return Number(one) > 12 ? padded(year, two, one) : padded(year, one, two);
}

function wordDay(text: string): string | null {
  const [, date, word = '', year] = /^(\d{1,2})\.?\s+([A-Za-z]{3,9})\.?,?\s+(\d{4})$/.exec(text) ?? [];
  const month = MONTHS.indexOf(word.slice(0, 3).toLowerCase()) + 1;
  return date && year && month > 0 ? padded(year, month, date) : null;
}

const TENTHS = { mm: 10, cm: 100, in: 254 } as const;

export function tenthsMmIn(text: string, { length }: ImportUnits): number {
  const tenths = Math.round(numberIn(text) * TENTHS[length]);
  if (tenths <= 0 || tenths > 20_000) throw new Unreadable('That is no length of a fish: is the unit right?');
  return tenths;
}

const LITRES = { L: 1, usGal: LITRES_PER_US_GALLON, impGal: LITRES_PER_IMPERIAL_GALLON } as const;

export function litresIn(text: string, { volume }: ImportUnits): number {
  const litres = Math.round(numberIn(text) * LITRES[volume] * 10) / 10;
  if (litres <= 0 || litres > 100_000) throw new Unreadable('That is no volume of a tank: is the unit right?');
  return litres;
}

export function celsiusIn(text: string, { temperature }: ImportUnits): number {
  const typed = numberIn(text);
  const celsius = Math.round((temperature === 'F' ? celsiusOf(typed) : typed) * 10) / 10;
  if (celsius < 0 || celsius > 45) throw new Unreadable('That is no temperature of a tank: is the unit right?');
  return celsius;
}

export function sexIn(text: string): 'male' | 'female' | 'unknown' {
  const word = text.trim().toLowerCase();
  if (['', '?', 'u', 'unknown', 'unsexed', 'juvenile'].includes(word)) return 'unknown';
  if (['m', 'male', '♂', '1.0', '1,0'].includes(word)) return 'male';
  if (['f', 'w', 'female', '♀', '0.1', '0,1'].includes(word)) return 'female';
  throw new Unreadable('Write male, female, or nothing');
}
