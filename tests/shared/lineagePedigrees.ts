import type { Candidate, Parentage, PedigreeEntry } from '@/shared/lineage/pedigree';

/** Short spellings for pedigrees in tests. */
export const unknown: Parentage = { kind: 'unknown' };
export const known = (id: string | null): Parentage => (id === null ? unknown : { kind: 'known', id });
export const wild = (...ids: string[]): PedigreeEntry[] => ids.map((id) => ({ id, sire: unknown, dam: unknown }));
export const child = (id: string, sire: string | null, dam: string | null): PedigreeEntry => ({
  id,
  sire: known(sire),
  dam: known(dam),
});
const candidates = (...listed: [string | null, number][]): Candidate[] =>
  listed.map(([id, weight]) => ({ id, weight }));
export const oneOf = (key: string, ...listed: [string | null, number][]): Parentage => ({
  kind: 'oneOf',
  key,
  candidates: candidates(...listed),
});
export const mixed = (...listed: [string | null, number][]): Parentage => ({
  kind: 'mixed',
  candidates: candidates(...listed),
});
export const rowsOf = (rows: [string, string | null, string | null][]): PedigreeEntry[] =>
  rows.map(([id, sire, dam]) => child(id, sire, dam));

/** A long pedigree with parents from anywhere before, the same every time (a linear congruential sequence). */
export function longPedigree(size: number): PedigreeEntry[] {
  let state = 12_345;
  const below = (limit: number) => {
    state = (state * 1_664_525 + 1_013_904_223) % 4_294_967_296;
    return Math.floor((state / 4_294_967_296) * limit);
  };
  return Array.from({ length: size }, (_, place) =>
    place < 8 ? child(`x${place}`, null, null) : child(`x${place}`, `x${below(place)}`, `x${below(place)}`),
  );
}
