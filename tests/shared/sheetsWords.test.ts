import { expect, test } from 'vitest';
import {
  ageAtIssue,
  completenessWords,
  daysWords,
  generationWords,
  headsWords,
  inbreedingWords,
  partialDayWords,
  shareWords,
} from '../../shared/sheets/sayings';
import { nameParts } from '../../shared/sheets/speciesName';
import { verdictWords } from '../../shared/sheets/verdictWords';
import { duboisi } from '../support/sheetContent';

/** Breaking spaces for no-break ones: where a line may end is not what these tests are about. */
const said = (text: string | null): string | undefined => text?.replaceAll('\u00a0', ' ');

test.each([
  [{ low: 0, high: 0, oneParentWild: false }, 'F0'],
  [{ low: 2, high: 2, oneParentWild: false }, 'F2'],
  [{ low: 1, high: 2, oneParentWild: false }, 'F1 or F2'],
  [{ low: 1, high: 4, oneParentWild: false }, 'F1 to F4'],
  [{ low: 1, high: 1, oneParentWild: true }, 'F1, one parent wild'],
  [null, 'F?'],
])('the generation %j is written %s', (generation, words) => {
  expect(generationWords(generation)).toBe(words);
});

test('an expected F lists the outcomes behind it, lowest first', () => {
  expect(said(inbreedingWords(duboisi.inbreeding))).toBe('expected F = 0.037: 0 at 79 %, 0.125 at 13 %, 0.250 at 8 %');
});

test('a certain F is a figure with three decimals', () => {
  const outcomes = [{ f: 0.0625, probability: 1 }];
  expect(said(inbreedingWords({ f: 0.0625, outcomes, generationsKnown: 3 }))).toBe('F = 0.063');
});

test('of many outcomes the likeliest four are listed, with the range of all', () => {
  const outcomes = [0.4, 0.2, 0.15, 0.1, 0.1, 0.05].map((probability, i) => ({ f: i / 16, probability }));
  expect(said(inbreedingWords({ f: 0.09, outcomes, generationsKnown: 3 }))).toBe(
    'expected F = 0.090: 0 at 40 %, 0.063 at 20 %, 0.125 at 15 %, 0.188 at 10 %, others at 15 %; all from 0 to 0.313',
  );
});

test('F from no known parents is not called low', () => {
  const outcomes = [{ f: 0, probability: 1 }];
  expect(inbreedingWords({ f: 0, outcomes, generationsKnown: 0 })).toBe('not known: no parents are recorded');
  expect(inbreedingWords(null)).toBe('not worked out');
  expect(completenessWords({ f: 0, outcomes, generationsKnown: 0 })).toBe('no ancestors');
  expect(completenessWords(duboisi.inbreeding)).toBe('equal to 2.0 full generations');
});

test.each([
  [0.79, '79 %'],
  [0.004, 'under 1 %'],
  [0.999, 'over 99 %'],
  [1, '100 %'],
  [0, '0 %'],
])('a share of %d is said as %s', (share, words) => {
  expect(said(shareWords(share))).toBe(words);
});

test.each([
  ['2018', '2018'],
  ['2018-06', 'Jun 2018'],
  ['2018-06-05', '5 Jun 2018'],
])('the date %s is said no more exactly than it is known', (day, words) => {
  expect(said(partialDayWords(day))).toBe(words);
});

test.each([
  ['2025-10-16', '2025-10-16', '16 Oct 2025'],
  ['2025-10-16', '2025-10-18', '16 to 18 Oct 2025'],
  ['2025-09-29', '2025-10-02', '29 Sep to 2 Oct 2025'],
  ['2025-12-30', '2026-01-02', '30 Dec 2025 to 2 Jan 2026'],
])('the days from %s to %s are said in short', (from, to, words) => {
  expect(said(daysWords(from, to))).toBe(words);
});

test('age on the day of issue counts from the spawn, and is a range where the spawn is', () => {
  expect(ageAtIssue({ from: '2026-06-10', to: '2026-06-10' }, '2026-06-20')).toBe('10 days');
  expect(ageAtIssue({ from: '2026-06-08', to: '2026-06-10' }, '2026-06-20')).toBe('10 to 12 days');
  expect(ageAtIssue({ from: '2026-07-01', to: '2026-07-01' }, '2026-06-20')).toBeNull();
});

test.each([
  [{ male: 0, female: 0, unsexed: 6 }, '6, not sexed'],
  [{ male: 1, female: 3, unsexed: 0 }, '4: 1 male and 3 females'],
  [{ male: 2, female: 3, unsexed: 1 }, '6: 2 males, 3 females and 1 not sexed'],
  [{ male: 0, female: 4, unsexed: 0 }, '4, all females'],
  [{ male: 0, female: 1, unsexed: 0 }, 'female'],
])('the heads %j are said as %s', (heads, words) => {
  expect(headsWords({ ...duboisi.subject, heads })).toBe(words);
});

// Genus and epithet in italics; what stands for a missing epithet and names in quotes upright (ICZN, from memory).
test.each([
  ['Tropheus duboisi', '<Tropheus duboisi>'],
  ['Tropheus sp. "Red Rainbow"', '<Tropheus >sp. "Red Rainbow"'],
  ['Petrochromis cf. macrognathus', '<Petrochromis >cf. <macrognathus>'],
  ['Tropheus sp. aff. moorii', '<Tropheus >sp. aff. <moorii>'],
  ['Cyprichromis sp. (Kitumba)', '<Cyprichromis >sp. (Kitumba)'],
])('the name %s is set as %s', (name, set) => {
  const parts = nameParts(name).map(({ text, italic }) => (italic ? `<${text}>` : text));
  expect(parts.join('')).toBe(set);
});

test('every verdict tells the reader what was found and what to do', () => {
  expect(verdictWords({ state: 'valid', keyId: 'k', content: duboisi }).text).toBe(
    'Signed by Larkmoor Fishroom, larkmoor.example, and not changed since.',
  );
  expect(verdictWords({ state: 'altered', keyId: 'k' }).title).toBe('Altered');
  expect(verdictWords({ state: 'badSignature', because: 'otherAddress' }).text).toContain('another address');
});
