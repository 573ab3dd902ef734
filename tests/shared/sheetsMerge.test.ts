import { expect, test } from 'vitest';
import type { AncestryEntry } from '@/shared/sheets/ancestry';
import { fateOf, outranks, rankOf, renamed, type Told } from '@/shared/sheets/mergeAncestry';

const LARKMOOR = '01900000-0000-7000-8000-000000000001';
const FENNEL = '01900000-0000-7000-8000-000000000002';
const FISH = '01900000-0000-7000-8000-00000000000f';
const SIRE = '01900000-0000-7000-8000-00000000000a';
const OTHER = '01900000-0000-7000-8000-00000000000b';
const KEY = `${LARKMOOR}/01900000-0000-7000-8000-00000000000c`;

const sires = (one: number, two: number): AncestryEntry => ({
  id: `${LARKMOOR}/${FISH}`,
  kind: 'fish',
  code: 'MOKA-A01',
  sex: 'male',
  born: '2025-03-01',
  origin: 'bred',
  generation: null,
  strain: 'MOKA',
  room: null,
  sire: {
    kind: 'oneOf',
    key: KEY,
    candidates: [
      { id: `${LARKMOOR}/${SIRE}`, weight: one },
      { id: `${LARKMOOR}/${OTHER}`, weight: two },
    ],
  },
  dam: { kind: 'unknown' },
});

const told = (entry: AncestryEntry, rank: Told['rank'], issuedOn = '2026-05-01'): Told => ({ entry, rank, issuedOn });

test.each([
  ['not checked', LARKMOOR, false, 0],
  ['another fishroom’s', FENNEL, true, 1],
  ['the fishroom’s that named it', LARKMOOR, true, 2],
] as const)('the word of a sheet counts by whose it is: %s', (_whose, issuer, checked, rank) => {
  expect(rankOf(`${LARKMOOR}/${FISH}`, { issuer, checked })).toBe(rank);
});

test('a sheet that counts more stands against a later one; of two that count alike, the later', () => {
  expect(outranks({ rank: 2, issuedOn: '2025-01-01' }, { rank: 1, issuedOn: '2026-01-01' })).toBe(true);
  expect(outranks({ rank: 1, issuedOn: '2026-01-02' }, { rank: 1, issuedOn: '2026-01-01' })).toBe(true);
  expect(outranks({ rank: 1, issuedOn: '2026-01-01' }, { rank: 1, issuedOn: '2026-01-01' })).toBe(false);
});

test('an animal is new, ours, the same, kept as it was known, or corrected', () => {
  const entry = sires(3, 1);
  expect(fateOf(told(entry, 2), undefined)).toBe('new');
  expect(fateOf(told(entry, 2), { fishId: FISH, told: null })).toBe('ours');
  // Three to one is 0.75 to 0.25: the same claim.
  expect(fateOf(told(entry, 1), { fishId: FISH, told: told(sires(0.75, 0.25), 2) })).toBe('same');
  expect(fateOf(told(sires(1, 1), 1), { fishId: FISH, told: told(entry, 2) })).toBe('kept');
  expect(fateOf(told(sires(1, 1), 2, '2026-05-02'), { fishId: FISH, told: told(entry, 2) })).toBe('corrected');
});

test('names that are not known here become an animal outside the pedigree', () => {
  const entry = sires(3, 1);
  if (!('sire' in entry)) throw new Error('It has one pair');
  const here = renamed(
    entry.sire,
    (name) => (name.endsWith(SIRE) ? 'fish 7' : null),
    (key) => key,
  );
  expect(here).toEqual({
    kind: 'oneOf',
    key: KEY,
    candidates: [
      { id: 'fish 7', weight: 3 },
      { id: null, weight: 1 },
    ],
  });
  expect(
    renamed(
      { kind: 'known', id: `${FENNEL}/${FISH}` },
      () => null,
      (key) => key,
    ),
  ).toEqual({ kind: 'unknown' });
});
