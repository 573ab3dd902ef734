import fc from 'fast-check';
import type { Candidate, Parentage, PedigreeEntry } from '@/shared/lineage/pedigree';
import { countAssignments } from './lineageEnumeration';

type Kind = 'unknown' | 'known' | 'oneOf' | 'mixed';

/** Small random pedigrees, parents first, with every kind of parentage on both sides; keys are shared now and then. */
export function smallPedigrees(mostAssignments: number): fc.Arbitrary<PedigreeEntry[]> {
  return fc
    .integer({ min: 3, max: 8 })
    .chain((size) =>
      fc.tuple(fc.constant(size), fc.array(fc.nat(1_000_000), { minLength: size * 30, maxLength: size * 30 })),
    )
    .map(([size, numbers]) => build(size, numbers))
    .filter((pedigree) => countAssignments(pedigree) <= mostAssignments);
}

/** Random pedigrees without doubt, of any shape, some fish without young, some broods. */
export const certainPedigrees = (largest: number): fc.Arbitrary<PedigreeEntry[]> =>
  fc
    .integer({ min: 2, max: largest })
    .chain((size) => fc.array(fc.tuple(fc.nat(1_000_000), fc.nat(1_000_000)), { minLength: size, maxLength: size }))
    .map((numbers) =>
      numbers.map(([a, b], place) => ({ id: `x${place}`, sire: certain(a, place), dam: certain(b, place) })),
    );

/** The same rows in another order. */
export const shuffled = <T>(rows: T[]): fc.Arbitrary<T[]> => fc.shuffledSubarray(rows, { minLength: rows.length });

function certain(number: number, place: number): Parentage {
  return place < 2 || number % 5 === 0 ? { kind: 'unknown' } : { kind: 'known', id: `x${number % place}` };
}

function build(size: number, numbers: number[]): PedigreeEntry[] {
  let next = 0;
  const draw = (below: number) => {
    next += 1;
    return (numbers[next % numbers.length] ?? 0) % below;
  };
  const keys: Parentage[] = [];
  const pedigree: PedigreeEntry[] = [];
  for (let place = 0; place < size; place += 1) {
    const id = `x${place}`;
    const parentage = (): Parentage => anyParentage(draw, place, keys);
    if (place < 2) pedigree.push({ id, sire: { kind: 'unknown' }, dam: { kind: 'unknown' } });
    else if (draw(5) === 0) {
      const pairs = 1 + draw(3);
      const pair = () => ({ sire: parentage(), dam: parentage(), weight: 1 + draw(4) });
      pedigree.push({ id, from: Array.from({ length: pairs }, pair) });
    } else pedigree.push({ id, sire: parentage(), dam: parentage() });
  }
  return pedigree;
}

const KINDS: Kind[] = ['unknown', 'known', 'known', 'known', 'oneOf', 'oneOf', 'mixed'];

function anyParentage(draw: (below: number) => number, place: number, keys: Parentage[]): Parentage {
  const kind = KINDS[draw(KINDS.length)] ?? 'unknown';
  const candidates = (): Candidate[] =>
    Array.from({ length: 1 + draw(3) }, () => ({ id: draw(5) === 0 ? null : `x${draw(place)}`, weight: 1 + draw(6) }));
  switch (kind) {
    case 'unknown':
      return { kind };
    case 'known':
      return { kind, id: `x${draw(place)}` };
    case 'mixed':
      return { kind, candidates: candidates() };
    case 'oneOf': {
      const shared = keys[draw(2 * keys.length + 1)];
      if (shared) return shared;
      const made: Parentage = { kind, key: `k${keys.length}`, candidates: candidates() };
      keys.push(made);
      return made;
    }
  }
}
