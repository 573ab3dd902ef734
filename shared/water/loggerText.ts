import { BadValue } from '../badValue';
import { type Day, dayOf, isDay } from '../days';
import { celsiusOf } from '../units';

/** How a logger writes its dates when the year does not come first. */
export type DateOrder = 'dayFirst' | 'monthFirst';

/** One day of a logger's readings in °C. */
type LoggedDay = { on: Day; meanC: number; lowestC: number; highestC: number; readings: number };

export type LoggerResult = {
  days: LoggedDay[];
  /** Lines that had a date but no usable temperature, with their number in the file. Headings are not among them. */
  skipped: { line: number; why: 'noTemperature' | 'notATemperature' | 'noSuchDay' }[];
  /** Dates such as 3/4/2026 read either way: ask, and read again with the answer. */
  isDateUnclear: boolean;
};

const YEAR_FIRST = /(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})/;
const YEAR_LAST = /(\d{1,2})[-/.](\d{1,2})[-/.](\d{4})/;
const INSTANT = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}(?::\d{2}(?:\.\d+)?)?(?:Z|[+-]\d{2}:?\d{2})$/;
const TIME = /^\d{1,2}:\d{2}(?::\d{2})?(?:\.\d+)?(?:\s?[AP]M)?$/i;
const NUMBER = /^-?\d{1,3}(?:[.,]\d{1,4})?\s?(?:°?[CF])?$/i;
const [COLDEST, WARMEST] = [0, 45];

/**
 * Reads a temperature logger's text, pasted or from a file, into daily means: any separator (semicolon, tab or comma), a
 * date with or without time, and the first number after them as the temperature, in the unit given. Dates count as written;
 * an instant with a zone falls on the room's day. Decimal commas are read where the comma is not the separator. Lines without
 * a date are taken for headings. Throws `BadValue` for a text without any dated line, or an unknown time zone.
 */
export function readLogger(
  text: string,
  how: { unit: 'C' | 'F'; timeZone: string; dateOrder?: DateOrder },
): LoggerResult {
  const rows = splitRows(text).filter(({ cells }) => cells.some(isDated));
  if (rows.length === 0)
    throw new BadValue('Logger text', text.slice(0, 40), 'needs lines with a date and a temperature');
  const order = how.dateOrder ?? orderOf(rows);
  const skipped: LoggerResult['skipped'] = [];
  const byDay = new Map<Day, LoggedDay>();
  for (const { line, cells } of rows) {
    const at = cells.findIndex(isDated);
    const on = dayIn(cells[at] ?? '', order ?? 'dayFirst', how.timeZone);
    const celsius = temperatureIn(cells.slice(at + 1), how.unit);
    if (on === null) skipped.push({ line, why: 'noSuchDay' });
    else if (celsius === null) skipped.push({ line, why: 'noTemperature' });
    else if (celsius < COLDEST || celsius > WARMEST) skipped.push({ line, why: 'notATemperature' });
    else byDay.set(on, withReading(byDay.get(on), on, celsius));
  }
  const days = [...byDay.values()].sort((a, b) => (a.on < b.on ? -1 : 1));
  return { days, skipped, isDateUnclear: order === null };
}

type Row = { line: number; cells: string[] };

/** A line with a dotted date and commas throughout: what ends it in ",25,4" is a decimal comma. */
const DOTTED = /\d{1,2}\.\d{1,2}\.\d{4}/;
const LAST_DECIMAL = /(,\s*-?\d{1,2}),(\d{1,2})\s*$/;

function splitRows(text: string): Row[] {
  const separator = [';', '\t'].find((mark) => text.includes(mark)) ?? ',';
  return text.split(/\r\n|\r|\n/).map((row, i) => ({
    line: i + 1,
    cells: (separator === ',' && DOTTED.test(row) ? row.replace(LAST_DECIMAL, '$1.$2') : row)
      .split(separator)
      .map((cell) => cell.replace(/^[\s"\uFEFF]+|[\s"]+$/g, '')),
  }));
}

const isDated = (cell: string) => YEAR_FIRST.test(cell) || YEAR_LAST.test(cell);

/** A day over 12 settles it for the whole file; null when none is, or when the file contradicts itself. */
function orderOf(rows: Row[]): DateOrder | null {
  const dates = rows.flatMap(({ cells }) => {
    const cell = cells.find(isDated) ?? '';
    const match = YEAR_FIRST.test(cell) ? null : YEAR_LAST.exec(cell);
    return match ? [{ first: Number(match[1]), second: Number(match[2]) }] : [];
  });
  if (dates.length === 0) return 'dayFirst';
  const dayFirst = dates.some(({ first }) => first > 12);
  const monthFirst = dates.some(({ second }) => second > 12);
  if (dayFirst === monthFirst) return null;
  return dayFirst ? 'dayFirst' : 'monthFirst';
}

function dayIn(cell: string, order: DateOrder, timeZone: string): Day | null {
  if (INSTANT.test(cell)) return dayOf(Date.parse(cell), timeZone);
  const [, year = '', month = '', day = ''] = YEAR_FIRST.exec(cell) ?? turned(YEAR_LAST.exec(cell), order);
  const text = `${year}-${month.padStart(2, '0')}-${day.padStart(2, '0')}`;
  return isDay(text) ? text : null;
}

function turned(match: RegExpExecArray | null, order: DateOrder): (string | undefined)[] {
  const [all, first, second, year] = match ?? [];
  return order === 'dayFirst' ? [all, year, second, first] : [all, year, first, second];
}

function temperatureIn(cells: string[], unit: 'C' | 'F'): number | null {
  const cell = cells.find((text) => text !== '' && !TIME.test(text));
  if (cell === undefined || !NUMBER.test(cell)) return null;
  const value = Number(cell.replace(',', '.').replace(/\s?°?[CF]$/i, ''));
  return unit === 'C' ? value : celsiusOf(value);
}

function withReading(so: LoggedDay | undefined, on: Day, celsius: number): LoggedDay {
  if (!so) return { on, meanC: celsius, lowestC: celsius, highestC: celsius, readings: 1 };
  const readings = so.readings + 1;
  return {
    on,
    meanC: so.meanC + (celsius - so.meanC) / readings,
    lowestC: Math.min(so.lowestC, celsius),
    highestC: Math.max(so.highestC, celsius),
    readings,
  };
}
