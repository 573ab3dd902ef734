import * as z from 'zod/mini';

/** Letters I and O are skipped: painted on glass they read as 1 and 0. */
const LETTERS = 'ABCDEFGHJKLMNPQRSTUVWXYZ';

const code = (pattern: RegExp, example: string) =>
  z
    .string('Type a code')
    .check(
      z.trim(),
      z.minLength(1, { error: 'Type a code', abort: true }),
      z.maxLength(24, 'Keep it under 24 letters'),
      z.regex(pattern, `Letters, digits and dashes, such as ${example}`),
    );

const CODE = /^[\p{L}\p{N}][\p{L}\p{N}./_-]*$/u;

export const StrainCode = code(/^[A-Z0-9]{2,12}$/, 'DUMA');
export const ColonyCode = code(CODE, 'DUMA-A');
export const FishCode = code(CODE, 'DUMA-A04');
export const BroodCode = code(CODE, 'DUMA-26C');
/** Whatever the keeper paints on the tank. */
export const TankCode = code(/^[\p{L}\p{N}][\p{L}\p{N} ./_-]*$/u, 'T07');

/** A, B, … H, J, … N, P, … Z, AA, AB, … for 0, 1, 2, … */
export function letterOf(index: number): string {
  const base = LETTERS.length;
  const last = LETTERS[index % base] ?? '';
  return index < base ? last : letterOf(Math.floor(index / base) - 1) + last;
}

const firstFree = (taken: ReadonlySet<string>, codeAt: (index: number) => string): string => {
  let index = 0;
  while (taken.has(codeAt(index))) index += 1;
  return codeAt(index);
};

/** Two letters of the species' epithet and two of the locality: Tropheus duboisi, Maswa gives DUMA. A digit follows where that is taken. */
export function proposeStrainCode(scientificName: string, locality: string | null, taken: ReadonlySet<string>): string {
  const words = plainLetters(scientificName)
    .split(/\s+/)
    .filter((word) => !/^(SP|CF|AFF)$/.test(word));
  const epithet = (words[1] ?? words[0] ?? 'XX').slice(0, 2);
  const place = plainLetters(locality ?? '')
    .replace(/\s/g, '')
    .slice(0, 2);
  const stem = `${epithet}${place || 'XX'}`.padEnd(4, 'X');
  return firstFree(taken, (index) => (index === 0 ? stem : `${stem}${index + 1}`));
}

/** `DUMA-A`, then `DUMA-B`: a letter, so that it never looks like a generation. */
export const proposeColonyCode = (strainCode: string, taken: ReadonlySet<string>): string =>
  firstFree(taken, (index) => `${strainCode}-${letterOf(index)}`);

/** `DUMA-A04` in a colony; `DUMA-04` for a fish in none. */
export const proposeFishCode = (stem: string, taken: ReadonlySet<string>): string =>
  firstFree(taken, (index) => `${stem}${/-[A-Z]+$/.test(stem) ? '' : '-'}${String(index + 1).padStart(2, '0')}`);

/** `DUMA-26C`: the year of the start, then letters in order. */
export const proposeBroodCode = (strainCode: string, startedOn: string, taken: ReadonlySet<string>): string =>
  firstFree(taken, (index) => `${strainCode}-${startedOn.slice(2, 4)}${letterOf(index)}`);

/** `T01`, `T02`, … or the next after a scheme of the keeper's own, such as G3 after G2. */
export function proposeTankCode(taken: ReadonlySet<string>): string {
  const last = [...taken].sort(byNumber).at(-1);
  const [, stem = 'T', digits = '00'] = /^(.*?)(\d+)$/.exec(last ?? '') ?? [];
  const from = Number(digits);
  return firstFree(taken, (index) => `${stem}${String(from + index + 1).padStart(digits.length, '0')}`);
}

const plainLetters = (text: string): string =>
  text
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .toUpperCase()
    .replace(/[^A-Z\s]/g, '');

/** Made once: `localeCompare` with choices makes one for every comparison, which thousands of codes feel. */
const numbered = new Intl.Collator('en', { numeric: true });

/** Codes in the order a person expects: T2 before T10. */
export const byNumber = (a: string, b: string): number => numbered.compare(a, b);
