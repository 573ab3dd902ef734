/** What can be brought in from a spreadsheet, and the columns each kind reads. */
export const IMPORT_KINDS = ['tanks', 'fish', 'colonies', 'holds', 'broods', 'counts', 'samples'] as const;
export type ImportKind = (typeof IMPORT_KINDS)[number];

export type ImportField = {
  name: string;
  word: string;
  needed?: boolean;
  /** Header words that mean it, in small letters without marks; common practice, no source. */
  headers: string[];
};

const code = (word: string, ...headers: string[]): ImportField => ({
  name: 'code',
  word,
  needed: true,
  headers: ['code', 'name', 'number', 'no', 'id', ...headers],
});
const strain: ImportField = {
  name: 'strain',
  word: 'Strain',
  needed: true,
  headers: ['strain', 'line', 'species', 'variety', 'stamm'],
};
const tank: ImportField = { name: 'tank', word: 'Tank', headers: ['tank', 'aquarium', 'becken', 'box', 'vat'] };
const note: ImportField = {
  name: 'note',
  word: 'Note',
  headers: ['note', 'notes', 'remark', 'remarks', 'comment', 'bemerkung'],
};
const day = (word: string): ImportField => ({
  name: 'day',
  word,
  needed: true,
  headers: ['date', 'day', 'on', 'datum', 'counted', 'measured'],
});

export const IMPORT_FIELDS: Record<ImportKind, ImportField[]> = {
  tanks: [
    code('Code', 'tank', 'aquarium'),
    {
      name: 'litres',
      word: 'Volume',
      needed: true,
      headers: ['volume', 'litres', 'liters', 'l', 'gal', 'gallons', 'size'],
    },
    { name: 'place', word: 'Place', headers: ['place', 'rack', 'room', 'position', 'where'] },
    { name: 'heater', word: 'Heater', headers: ['heater', 'temperature', 'temp', 'degrees'] },
    note,
  ],
  fish: [
    code('Code', 'fish', 'tag'),
    strain,
    { name: 'sex', word: 'Sex', headers: ['sex', 'gender', 'm/f'] },
    { name: 'born', word: 'Born', headers: ['born', 'birth', 'hatched', 'dob'] },
    { name: 'arrived', word: 'Arrived', headers: ['arrived', 'acquired', 'bought', 'received', 'since'] },
    { name: 'colony', word: 'Colony', headers: ['colony', 'group'] },
    tank,
    { name: 'mark', word: 'Mark', headers: ['mark', 'marks', 'looks'] },
    note,
  ],
  colonies: [
    code('Code', 'colony', 'group'),
    strain,
    { ...tank, needed: true },
    { name: 'day', word: 'Started', needed: true, headers: ['started', 'start', 'since', 'date'] },
    note,
  ],
  holds: [
    { ...tank, needed: true },
    { name: 'colony', word: 'Colony', headers: ['colony', 'group'] },
    { name: 'female', word: 'Female', headers: ['female', 'holder', 'mother', 'dam', 'fish'] },
    {
      name: 'day',
      word: 'First seen',
      needed: true,
      headers: ['seen', 'first seen', 'holding', 'date', 'spawned', 'spawn'],
    },
    { name: 'ended', word: 'Ended', headers: ['ended', 'end', 'until'] },
    { name: 'outcome', word: 'Outcome', headers: ['outcome', 'result', 'how'] },
    note,
  ],
  broods: [
    code('Code', 'brood', 'spawn'),
    strain,
    { ...tank, needed: true },
    {
      name: 'day',
      word: 'Fry since',
      needed: true,
      headers: ['date', 'born', 'hatched', 'released', 'stripped', 'start', 'started', 'since'],
    },
    { name: 'spawned', word: 'Spawned', headers: ['spawned', 'spawn date', 'spawning'] },
    { name: 'female', word: 'Mother', headers: ['mother', 'female', 'dam'] },
    { name: 'male', word: 'Father', headers: ['father', 'male', 'sire'] },
    {
      name: 'heads',
      word: 'Fry at the start',
      headers: ['fry', 'count', 'heads', 'number of fry', 'opening', 'young', 'total'],
    },
    note,
  ],
  counts: [
    { name: 'brood', word: 'Brood', needed: true, headers: ['brood', 'code', 'batch', 'spawn'] },
    day('Counted on'),
    { name: 'heads', word: 'Heads', needed: true, headers: ['heads', 'count', 'fry', 'number', 'alive'] },
    note,
  ],
  samples: [
    { name: 'brood', word: 'Brood or fish', needed: true, headers: ['brood', 'fish', 'code', 'batch'] },
    day('Measured on'),
    {
      name: 'lengths',
      word: 'Lengths',
      needed: true,
      headers: ['lengths', 'length', 'size', 'sizes', 'tl', 'sl', 'cm', 'mm'],
    },
    note,
  ],
};

/** Which column each field is read from: the header's own words, or null. */
export type Columns = Record<string, string | null>;

const plain = (header: string): string =>
  header
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/\(.*?\)|\[.*?\]/g, ' ')
    .replace(/[^a-z0-9/ ]+/g, ' ')
    .replace(/\s+/g, ' ')
    .trim();

/** Whole headers before words inside them, so that "spawn date" is not taken for the brood's code; no column twice. */
export function guessColumns(kind: ImportKind, headers: string[], remembered: Columns = {}): Columns {
  const free = new Set(headers);
  const columns: Columns = {};
  const take = (field: ImportField, fits: (header: string) => boolean) => {
    if (columns[field.name]) return;
    const found = [...free].find((header) => header !== '' && monthOf(header) === null && fits(header));
    columns[field.name] = found ?? null;
    if (found) free.delete(found);
  };
  const fields = IMPORT_FIELDS[kind];
  for (const field of fields) take(field, (header) => header === remembered[field.name]);
  for (const field of fields) take(field, (header) => field.headers.includes(plain(header)));
  for (const field of fields)
    take(field, (header) =>
      plain(header)
        .split(' ')
        .some((word) => field.headers.includes(word)),
    );
  return columns;
}

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

/** A header that is a month or a day holds counts: "2025-03" and "Mar 2025" are the month's last day, "2025-03-15" is itself. */
export function monthOf(header: string): string | null {
  const text = header.trim().toLowerCase();
  if (/^\d{4}-\d{2}-\d{2}$/.test(text)) return text;
  const [, year, month] = /^(\d{4})[-/](\d{1,2})$/.exec(text) ?? [];
  if (year && month) return lastDay(Number(year), Number(month));
  const [, m, y] = /^(\d{1,2})[-/.](\d{4})$/.exec(text) ?? [];
  if (m && y) return lastDay(Number(y), Number(m));
  const [, word = '', full] = /^([a-z]{3,9})\.?[\s-]+(\d{4}|\d{2})$/.exec(text) ?? [];
  const index = MONTHS.indexOf(word.slice(0, 3));
  return index < 0 || !full ? null : lastDay(full.length === 2 ? 2000 + Number(full) : Number(full), index + 1);
}

function lastDay(year: number, month: number): string | null {
  if (month < 1 || month > 12) return null;
  return new Date(Date.UTC(year, month, 0)).toISOString().slice(0, 10);
}
