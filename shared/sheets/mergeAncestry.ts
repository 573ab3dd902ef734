import type { Parentage } from '../lineage/pedigree';
import { type AncestryEntry, type AnimalId, splitAnimalId } from './ancestry';
import type { Fate } from './importContract';

/** How much the word of a sheet counts: not checked; another fishroom's; the fishroom's that named the animal. */
export type Rank = 0 | 1 | 2;

/** What is known of an animal that another fishroom named, and whose word it is. */
export type Told = { entry: AncestryEntry; rank: Rank; issuedOn: string };

/** An animal that is known already: a fish of this fishroom, or one told of by an earlier sheet. */
export type KnownAnimal = { fishId: string; told: Told | null };

export function rankOf(id: AnimalId, sheet: { issuer: string; checked: boolean }): Rank {
  if (!sheet.checked) return 0;
  return splitAnimalId(id)?.roomId === sheet.issuer ? 2 : 1;
}

/** Whose word stands where two sheets differ: the one that counts more, else the later. */
export const outranks = (a: Pick<Told, 'rank' | 'issuedOn'>, b: Pick<Told, 'rank' | 'issuedOn'>): boolean =>
  a.rank > b.rank || (a.rank === b.rank && a.issuedOn > b.issuedOn);

/** What becomes of each animal of a sheet that is taken in. An animal is the same when its first issuer's name for it is. */
export function fateOf(told: Told, known: KnownAnimal | undefined): Fate {
  if (!known) return 'new';
  if (!known.told) return 'ours';
  if (factsOf(told.entry) === factsOf(known.told.entry)) return 'same';
  return outranks(told, known.told) ? 'corrected' : 'kept';
}

/** What an entry claims, as text that is alike for alike claims: shares, not weights, and candidates in one order. */
function factsOf(entry: AncestryEntry): string {
  const pairs = 'from' in entry ? entry.from : [{ sire: entry.sire, dam: entry.dam, weight: 1 }];
  const all = pairs.reduce((sum, { weight }) => sum + weight, 0);
  const told = pairs.map(({ sire, dam, weight }) => [parentFacts(sire), parentFacts(dam), share(weight, all)]);
  return JSON.stringify([entry.code, entry.sex, entry.born, entry.origin, told.map((pair) => pair.join(' ')).sort()]);
}

function parentFacts(parent: Parentage): string {
  if (parent.kind === 'known') return parent.id;
  if (parent.kind === 'unknown') return 'unknown';
  const all = parent.candidates.reduce((sum, { weight }) => sum + weight, 0);
  const list = parent.candidates.map(({ id, weight }) => `${id ?? 'outside'}=${share(weight, all)}`).sort();
  return `${parent.kind === 'oneOf' ? parent.key : 'mixed'}:${list.join(',')}`;
}

const share = (weight: number, all: number): string => (weight / all).toFixed(9);

/** Changes every name in a parent: of candidates that are not found, an animal outside the pedigree is left. */
export function renamed(
  parent: Parentage,
  nameOf: (id: string) => string | null,
  keyOf: (key: string) => string,
): Parentage {
  if (parent.kind === 'unknown') return parent;
  if (parent.kind === 'known') {
    const id = nameOf(parent.id);
    return id === null ? { kind: 'unknown' } : { kind: 'known', id };
  }
  const candidates = parent.candidates.map(({ id, weight }) => ({ id: id === null ? null : nameOf(id), weight }));
  return parent.kind === 'mixed'
    ? { kind: 'mixed', candidates }
    : { kind: 'oneOf', key: keyOf(parent.key), candidates };
}
