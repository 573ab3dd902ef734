import { type Candidate, type Parentage, type PedigreeEntry, pairsOf } from './pedigree';
import { PedigreeError, unknownId } from './pedigreeError';

/** Stands for "an animal outside the pedigree" wherever a parent is a number. */
export const OUTSIDE = -1;

/** A possible parent as a number: an entry's row, a draw's number, or `OUTSIDE`. Weights of a list sum to 1. */
export type ParentOption = { parent: number; weight: number };

/** A possible pair of parents; weights of a list sum to 1. */
export type PairOption = { sire: number; dam: number; weight: number };

/** Gives a number to a candidate's id, and to the one shared animal behind a `oneOf` key. */
export type Numbering = { row: (id: string) => number; draw: (key: string, options: ParentOption[]) => number };

/** Every pair of parents that `entry` may come from, with its chance. The same pair listed twice is one with both weights. */
export function pairOptions(entry: PedigreeEntry, numbering: Numbering): PairOption[] {
  const pairs = shares(pairsOf(entry), entry.id).map(({ of, share }) => ({
    share,
    sires: parentOptions(of.sire, entry.id, numbering),
    dams: parentOptions(of.dam, entry.id, numbering),
  }));
  const listed = pairs.flatMap(({ share, sires, dams }) =>
    sires.flatMap((sire) =>
      dams.map((dam) => ({ sire: sire.parent, dam: dam.parent, weight: share * sire.weight * dam.weight })),
    ),
  );
  if (listed.length === 1) return listed;
  return merged(listed, ({ sire, dam }) => `${sire} ${dam}`);
}

function parentOptions(parentage: Parentage, child: string, numbering: Numbering): ParentOption[] {
  switch (parentage.kind) {
    case 'unknown':
      return [{ parent: OUTSIDE, weight: 1 }];
    case 'known':
      return [{ parent: numbering.row(parentage.id), weight: 1 }];
    case 'oneOf': {
      const options = candidateOptions(parentage.candidates, child, numbering);
      return [{ parent: numbering.draw(parentage.key, options), weight: 1 }];
    }
    case 'mixed':
      return candidateOptions(parentage.candidates, child, numbering);
  }
}

function candidateOptions(candidates: Candidate[], child: string, numbering: Numbering): ParentOption[] {
  const listed = shares(candidates, child).map(({ of, share }) => ({
    parent: of.id === null ? OUTSIDE : numbering.row(of.id),
    weight: share,
  }));
  return merged(listed, ({ parent }) => `${parent}`);
}

/** Weights above zero turned into shares that sum to 1. */
function shares<T extends { weight: number }>(listed: T[], child: string): { of: T; share: number }[] {
  if (listed.length === 0) throw new PedigreeError('noCandidates', [child], `Name at least one parent for ${child}`);
  const total = listed.reduce((sum, { weight }) => sum + weight, 0);
  if (!listed.every(({ weight }) => weight > 0) || !Number.isFinite(total)) {
    throw new PedigreeError('badWeight', [child], `Shares of the parents of ${child} must be numbers above zero`);
  }
  return listed.map((of) => ({ of, share: of.weight / total }));
}

function merged<T extends { weight: number }>(listed: T[], keyOf: (option: T) => string): T[] {
  const byKey = new Map<string, T>();
  for (const option of listed) {
    const before = byKey.get(keyOf(option));
    byKey.set(keyOf(option), before ? { ...before, weight: before.weight + option.weight } : option);
  }
  return [...byKey.values()];
}

/** The numbers of all entries, in row order; refuses an id that stands twice. */
export function numberRows(pedigree: PedigreeEntry[]): Map<string, number> {
  const rowOf = new Map<string, number>();
  pedigree.forEach((entry, row) => {
    if (rowOf.has(entry.id)) {
      throw new PedigreeError(
        'duplicateId',
        [entry.id],
        `${entry.id} stands in the pedigree twice. Keep one of the two`,
      );
    }
    rowOf.set(entry.id, row);
  });
  return rowOf;
}

/** Looks an id up, or refuses it by name. */
export function rowFinder(rowOf: Map<string, number>): (id: string) => number {
  return (id) => {
    const row = rowOf.get(id);
    if (row === undefined) throw unknownId(id);
    return row;
  };
}
