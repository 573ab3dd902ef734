import { type Candidate, type Parentage, type PedigreeEntry, pairsOf } from '@/shared/lineage/pedigree';

/** One settled pedigree: certain parents, an invented id for each animal outside that several entries share. */
type Settled = { id: string; sire: string | null; dam: string | null }[];

/** A choice to be made, and what it may be. */
type Draw = { name: string; chances: number[] };

/**
 * Every assignment of a pedigree's draws with its probability, by plain listing: shares nothing with the code under test.
 * Entries must come parents first.
 */
export function* assignments(pedigree: PedigreeEntry[]): Generator<{ settled: Settled; probability: number }> {
  const draws = drawsOf(pedigree);
  const choice = new Map(draws.map(({ name }) => [name, 0]));
  for (;;) {
    const probability = draws.reduce(
      (product, { name, chances }) => product * (chances[choice.get(name) ?? 0] ?? 0),
      1,
    );
    yield { settled: pedigree.map((entry) => settle(entry, choice)), probability };
    const next = draws.findLast(({ name, chances }) => (choice.get(name) ?? 0) + 1 < chances.length);
    if (!next) return;
    choice.set(next.name, (choice.get(next.name) ?? 0) + 1);
    for (const { name } of draws.slice(draws.indexOf(next) + 1)) choice.set(name, 0);
  }
}

export const countAssignments = (pedigree: PedigreeEntry[]): number =>
  drawsOf(pedigree).reduce((count, { chances }) => count * chances.length, 1);

function drawsOf(pedigree: PedigreeEntry[]): Draw[] {
  const draws = new Map<string, Draw>();
  const add = (name: string, listed: { weight: number }[]) => {
    const total = listed.reduce((sum, { weight }) => sum + weight, 0);
    draws.set(name, { name, chances: listed.map(({ weight }) => weight / total) });
  };
  for (const entry of pedigree) {
    const pairs = pairsOf(entry);
    add(`${entry.id} pair`, pairs);
    pairs.forEach((pair, index) => {
      for (const side of ['sire', 'dam'] as const) {
        const parentage = pair[side];
        if (parentage.kind === 'oneOf') add(`key ${parentage.key}`, parentage.candidates);
        if (parentage.kind === 'mixed') add(`${entry.id} ${index} ${side}`, parentage.candidates);
      }
    });
  }
  return [...draws.values()];
}

function settle(entry: PedigreeEntry, choice: Map<string, number>): Settled[number] {
  const index = choice.get(`${entry.id} pair`) ?? 0;
  const pair = pairsOf(entry)[index];
  const parent = (side: 'sire' | 'dam'): string | null => {
    const parentage: Parentage = pair?.[side] ?? { kind: 'unknown' };
    switch (parentage.kind) {
      case 'unknown':
        return null;
      case 'known':
        return parentage.id;
      case 'mixed':
        return pick(parentage.candidates, choice.get(`${entry.id} ${index} ${side}`))?.id ?? null;
      case 'oneOf':
        return pick(parentage.candidates, choice.get(`key ${parentage.key}`))?.id ?? `outside ${parentage.key}`;
    }
  };
  return { id: entry.id, sire: parent('sire'), dam: parent('dam') };
}

const pick = (listed: Candidate[], index = 0): Candidate | undefined => listed[index];

/** Kinship in a settled pedigree by Wright's and Malécot's recursion, as in any textbook. */
export function settledKinship(settled: Settled): (a: string, b: string) => number {
  const placeOf = new Map(settled.map(({ id }, place) => [id, place]));
  const between = (a: string | null, b: string | null): number => {
    if (a === null || b === null) return 0;
    const placeA = placeOf.get(a) ?? -1;
    const placeB = placeOf.get(b) ?? -1;
    const younger = settled[Math.max(placeA, placeB)];
    if (a === b) return younger ? (1 + between(younger.sire, younger.dam)) / 2 : 0.5;
    const other = placeA > placeB ? b : a;
    return younger ? (between(younger.sire, other) + between(younger.dam, other)) / 2 : 0;
  };
  return between;
}
