import { effectiveSize, effectiveSizeFromFamilies, harmonicEffectiveSize } from './effectiveSize';
import { parentShares, type Side } from './parentShares';
import type { PedigreeEntry } from './pedigree';

/** An effective size, or why there is none, in a keeper's words. */
export type GroupSize = { size: number; because: null } | { size: null; because: string };

export type Breeder = { id: string; sex: 'male' | 'female' | 'unknown' };

const none = (because: string): GroupSize => ({ size: null, because });
const measured = (size: number): GroupSize => ({ size, because: null });

const ofSex = (group: readonly Breeder[], sex: Breeder['sex']) => group.filter((fish) => fish.sex === sex);

/** By heads alone, 4 Nm Nf / (Nm + Nf) (Wright 1931): as if every male and every female bred alike. */
export function sizeBySexes(group: readonly Breeder[]): GroupSize {
  const [males, females] = [ofSex(group, 'male').length, ofSex(group, 'female').length];
  if (males === 0) return none('No male in it is sexed.');
  if (females === 0) return none('No female in it is sexed.');
  return measured(effectiveSize({ males, females }));
}

/** By who sired and who mothered `broods`, each counted alike; fish that are no longer in the group don't count. */
export function sizeByShares(group: readonly Breeder[], broods: readonly PedigreeEntry[]): GroupSize {
  if (broods.length === 0) return none('No brood of theirs is recorded.');
  const given = { sire: sharesOn('sire', broods, group), dam: sharesOn('dam', broods, group) };
  if (sum(given.sire) === 0) return none('None of their broods has a sire out of this group.');
  if (sum(given.dam) === 0) return none('None of their broods has a dam out of this group.');
  return measured(effectiveSize({ maleShares: given.sire, femaleShares: given.dam }));
}

/**
 * By how many kept young each breeder left: of each sex (N k - 1) / (k - 1 + V / k), then both together as 4 Nm Nf / (Nm + Nf)
 * (Crow & Kimura 1970, from memory). Possible parents count by their share, which makes the variance a little too small.
 */
export function sizeByFamilies(group: readonly Breeder[], kept: readonly PedigreeEntry[]): GroupSize {
  if (kept.length === 0) return none('None of their young has been kept to breed yet.');
  const [males, females] = [sexSize(ofSex(group, 'male'), 'sire', kept), sexSize(ofSex(group, 'female'), 'dam', kept)];
  if (!males || !females) return none('Too few of their young have been kept to tell families apart.');
  return measured((4 * males * females) / (males + females));
}

function sexSize(breeders: readonly Breeder[], side: Side, kept: readonly PedigreeEntry[]): number | null {
  if (breeders.length === 0) return null;
  const young = sharesOn(side, kept, breeders);
  const meanYoung = sum(young) / breeders.length;
  const variance = sum(young.map((count) => (count - meanYoung) ** 2)) / breeders.length;
  const pair = { breeders: breeders.length, maleVariance: variance, femaleVariance: variance, meanYoung };
  return effectiveSizeFromFamilies(pair);
}

/** One group of parents behind another; `back` 1 are the parents of the fish asked for. */
export type ParentGeneration = { back: number; size: number };

/**
 * The groups of parents that led to a group, as far back as all their parents are named, and the harmonic mean of their sizes
 * with that of today, for the smallest decides (Wright 1938). Every fish of a generation counts alike.
 */
export function sizeOverTime(
  pedigree: readonly PedigreeEntry[],
  ids: readonly string[],
  now: GroupSize,
): GroupSize & { generations: ParentGeneration[] } {
  const byId = new Map(pedigree.map((entry) => [entry.id, entry]));
  const generations: ParentGeneration[] = [];
  let young = ids.flatMap((id) => byId.get(id) ?? []);
  while (young.length > 0 && generations.length < MOST_BACK) {
    const given = { sire: namedShares('sire', young), dam: namedShares('dam', young) };
    if (!given.sire || !given.dam) break;
    const [maleShares, femaleShares] = [[...given.sire.values()], [...given.dam.values()]];
    generations.push({ back: generations.length + 1, size: effectiveSize({ maleShares, femaleShares }) });
    young = [...given.sire.keys(), ...given.dam.keys()].flatMap((id) => byId.get(id) ?? []);
  }
  if (generations.length === 0)
    return {
      ...none('Its fish are founders, or the parents of some are not known: no earlier group is recorded.'),
      generations,
    };
  if (now.size === null) return { ...none(now.because), generations };
  return { ...measured(harmonicEffectiveSize([now.size, ...generations.map(({ size }) => size)])), generations };
}

const MOST_BACK = 20;

/** How much of `young` each of the fish gave as that parent, in their order. */
function sharesOn(side: Side, young: readonly PedigreeEntry[], fish: readonly Breeder[]): number[] {
  const shares = new Map<string, number>(fish.map(({ id }) => [id, 0]));
  for (const entry of young)
    for (const one of parentShares(entry)) {
      const known = one.side === side && one.id !== null ? shares.get(one.id) : undefined;
      if (known !== undefined && one.id !== null) shares.set(one.id, known + one.share);
    }
  return [...shares.values()];
}

/** The same for whoever is named; null where a part of that parent is not known. */
function namedShares(side: Side, young: readonly PedigreeEntry[]): Map<string, number> | null {
  const shares = new Map<string, number>();
  for (const one of young.flatMap(parentShares)) {
    if (one.side !== side) continue;
    if (one.id === null) return null;
    shares.set(one.id, (shares.get(one.id) ?? 0) + one.share);
  }
  return shares;
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);
