import fc from 'fast-check';
import Matrix, { EigenvalueDecomposition } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import { equivalentGenerations } from '@/shared/lineage/completeness';
import { geneDiversity, meanKinship } from '@/shared/lineage/diversity';
import { founderContributions } from '@/shared/lineage/founders';
import { generationNumbers } from '@/shared/lineage/generations';
import { inbreeding } from '@/shared/lineage/inbreeding';
import { kinship } from '@/shared/lineage/kinship';
import { kinshipColumns } from '@/shared/lineage/kinshipColumns';
import type { KinshipMatrix } from '@/shared/lineage/kinshipMatrix';
import { inbreedingOutcomes } from '@/shared/lineage/outcomes';
import { parentShares } from '@/shared/lineage/parentShares';
import type { Parentage, PedigreeEntry } from '@/shared/lineage/pedigree';
import { solveByColumns } from '@/shared/lineage/solveByColumns';
import { solveFamilies } from '@/shared/lineage/solveFamilies';
import { sortPedigree } from '@/shared/lineage/sortedPedigree';
import { certainPedigrees, shuffled, smallPedigrees } from './lineageArbitraries';
import { assignments, settledKinship } from './lineageEnumeration';

const idsOf = (pedigree: PedigreeEntry[]) => pedigree.map(({ id }) => id);
const pairsAmong = (ids: string[]) => ids.flatMap((a) => ids.map((b) => [a, b] as const));

function expectSame(found: number, expected: number, what: string) {
  if (Math.abs(found - expected) > 1e-12) expect(found, what).toBe(expected);
}

/** Expected kinships as plain averages over every assignment. */
function averages(pedigree: PedigreeEntry[]): Map<string, number> {
  const sums = new Map<string, number>();
  for (const { settled, probability } of assignments(pedigree)) {
    const between = settledKinship(settled);
    for (const [a, b] of pairsAmong(idsOf(pedigree))) {
      sums.set(`${a} ${b}`, (sums.get(`${a} ${b}`) ?? 0) + probability * between(a, b));
    }
  }
  return sums;
}

function expectAverages(matrix: KinshipMatrix, pedigree: PedigreeEntry[]) {
  const expected = averages(pedigree);
  for (const [a, b] of pairsAmong(idsOf(pedigree))) {
    expectSame(matrix.between(a, b), expected.get(`${a} ${b}`) ?? Number.NaN, `${a} and ${b}`);
  }
}

describe('Uncertain parents are exact expectations', () => {
  test('kinships equal the average over every assignment of one-of, mixed and from parents, on both sides', () => {
    fc.assert(
      fc.property(smallPedigrees(400), (pedigree) => expectAverages(kinship(pedigree), pedigree)),
      { numRuns: 600 },
    );
  });

  test('F, read without a matrix, equals that average too', () => {
    fc.assert(
      fc.property(smallPedigrees(400), (pedigree) => {
        const expected = averages(pedigree);
        for (const [id, f] of inbreeding(pedigree)) {
          expectSame(f, 2 * (expected.get(`${id} ${id}`) ?? Number.NaN) - 1, `F of ${id}`);
        }
      }),
      { numRuns: 300 },
    );
  });

  test('the outcomes of F are those of the assignments, and their mean is F', () => {
    fc.assert(
      fc.property(smallPedigrees(400), (pedigree) => {
        const id = pedigree.at(-1)?.id ?? '';
        const found = inbreedingOutcomes(pedigree, id) ?? [];
        const listed = new Map<number, number>();
        for (const { settled, probability } of assignments(pedigree)) {
          const f = 2 * settledKinship(settled)(id, id) - 1;
          listed.set(f, (listed.get(f) ?? 0) + probability);
        }
        expect(found.map(({ f }) => f)).toEqual([...listed.keys()].sort((a, b) => a - b));
        for (const { f, probability } of found)
          expectSame(probability, listed.get(f) ?? Number.NaN, `chance of F ${f}`);
        const mean = found.reduce((sum, { f, probability }) => sum + f * probability, 0);
        expectSame(mean, inbreeding(pedigree).get(id) ?? Number.NaN, 'mean of the outcomes');
      }),
      { numRuns: 300 },
    );
  });

  test('founder shares and generations known are averages over the assignments, and every generation lies in its range', () => {
    fc.assert(
      fc.property(smallPedigrees(400), (pedigree) => {
        const id = pedigree.at(-1)?.id ?? '';
        const shares = new Map<string, number>();
        let depth = 0;
        const wild = new Map(pedigree.flatMap((entry) => (isFounder(entry) ? [[entry.id, 0] as const] : [])));
        const range = generationNumbers(pedigree, wild).get(id);
        for (const { settled, probability } of assignments(pedigree)) {
          const traced = traceBack(settled, id, (founder) => wild.has(founder));
          depth += probability * traced.generations;
          for (const [founder, share] of traced.shares) {
            shares.set(founder, (shares.get(founder) ?? 0) + probability * share);
          }
          if (range) expect(traced.number >= range.low && traced.number <= range.high).toBe(true);
        }
        expectSame(equivalentGenerations(pedigree, id), depth, 'generations known');
        const found = founderContributions(pedigree, [id]);
        for (const [founder, share] of shares) expectSame(found.get(founder) ?? 0, share, `share of ${founder}`);
      }),
      { numRuns: 200 },
    );
  });

  test('a single candidate is a known parent, whatever its weight and kind', () => {
    fc.assert(
      fc.property(
        certainPedigrees(25),
        fc.nat(2),
        fc.double({ min: 1e-9, max: 1e9, noNaN: true }),
        (pedigree, way, weight) => {
          const spelled = pedigree.map((entry) => respelled(entry, way, weight));
          const plain = kinship(pedigree);
          const other = kinship(spelled);
          for (const [a, b] of pairsAmong(idsOf(pedigree)))
            expectSame(other.between(a, b), plain.between(a, b), `${a}, ${b}`);
        },
      ),
    );
  });

  test('weights matter by their proportion alone', () => {
    fc.assert(
      fc.property(smallPedigrees(100_000), fc.constantFrom(0.125, 3, 1_000), (pedigree, factor) => {
        const scaled = kinship(pedigree.map((entry) => reweighted(entry, factor)));
        const plain = kinship(pedigree);
        for (const [a, b] of pairsAmong(idsOf(pedigree)))
          expectSame(scaled.between(a, b), plain.between(a, b), `${a}, ${b}`);
      }),
    );
  });
});

const isFounder = (entry: PedigreeEntry): boolean =>
  parentShares(entry).every(({ id }) => id === null) && !JSON.stringify(entry).includes('oneOf');

/** One fish's genes followed back through certain parents; what ends at no founder came from outside. */
function traceBack(
  settled: { id: string; sire: string | null; dam: string | null }[],
  id: string,
  founder: (id: string) => boolean,
) {
  const parentsOf = new Map(settled.map((entry) => [entry.id, entry]));
  const shares = new Map<string, number>();
  let generations = 0;
  const follow = (of: string | null, share: number): number => {
    const entry = of === null ? undefined : parentsOf.get(of);
    const end = of !== null && founder(of) ? of : entry ? null : '?';
    if (end) shares.set(end, (shares.get(end) ?? 0) + share);
    if (!entry) return Number.NaN;
    if (share < 1) generations += share;
    if (end) return 0;
    return 1 + Math.min(follow(entry.sire, share / 2), follow(entry.dam, share / 2));
  };
  const number = follow(id, 1);
  return { shares, generations, number };
}

/** The same certain parents, spelled as a one-of, a mixed clutch, or one pair. */
function respelled(entry: PedigreeEntry, way: number, weight: number): PedigreeEntry {
  if ('from' in entry) return entry;
  const spell = (parentage: Parentage): Parentage => {
    if (parentage.kind !== 'known') return parentage;
    const only = [{ id: parentage.id, weight }];
    return way === 0
      ? { kind: 'oneOf', key: `only ${parentage.id}`, candidates: only }
      : { kind: 'mixed', candidates: [...only, ...only] };
  };
  const { id, sire, dam } = entry;
  return way === 2 ? { id, from: [{ sire, dam, weight }] } : { id, sire: spell(sire), dam: spell(dam) };
}

function reweighted(entry: PedigreeEntry, factor: number): PedigreeEntry {
  const scale = (parentage: Parentage): Parentage =>
    parentage.kind === 'oneOf' || parentage.kind === 'mixed'
      ? { ...parentage, candidates: parentage.candidates.map(({ id, weight }) => ({ id, weight: weight * factor })) }
      : parentage;
  if (!('from' in entry)) return { id: entry.id, sire: scale(entry.sire), dam: scale(entry.dam) };
  const pairs = entry.from.map(({ sire, dam, weight }) => ({
    sire: scale(sire),
    dam: scale(dam),
    weight: weight * factor,
  }));
  return { id: entry.id, from: pairs };
}

describe('Whatever the pedigree', () => {
  const anyPedigree = fc.oneof(certainPedigrees(40), smallPedigrees(100_000));

  test('the order of the rows does not matter', () => {
    fc.assert(
      fc.property(
        anyPedigree.chain((pedigree) => fc.tuple(fc.constant(pedigree), shuffled(pedigree))),
        ([pedigree, other]) => {
          const [plain, mixedUp] = [kinship(pedigree), kinship(other)];
          for (const [a, b] of pairsAmong(idsOf(pedigree)))
            expectSame(mixedUp.between(a, b), plain.between(a, b), `${a}, ${b}`);
          const f = inbreeding(other);
          for (const [id, value] of inbreeding(pedigree)) expectSame(f.get(id) ?? Number.NaN, value, `F of ${id}`);
          const shares = founderContributions(other, idsOf(other));
          for (const [id, share] of founderContributions(pedigree, idsOf(pedigree))) {
            expectSame(shares.get(id) ?? Number.NaN, share, `share of ${id}`);
          }
        },
      ),
    );
  });

  test('kinship is symmetric and from 0 to 1, F too, a fish is nearest to itself at a half or more', () => {
    fc.assert(
      fc.property(anyPedigree, (pedigree) => {
        const matrix = kinship(pedigree);
        for (const [a, b] of pairsAmong(idsOf(pedigree))) {
          const value = matrix.between(a, b);
          expect(value).toBe(matrix.between(b, a));
          expect(value >= (a === b ? 0.5 : 0) && value <= 1, `${a}, ${b}: ${value}`).toBe(true);
        }
        for (const id of matrix.ids) expect(matrix.inbreeding(id) >= 0 && matrix.inbreeding(id) <= 1).toBe(true);
      }),
    );
  });

  test('the kinship matrix has no eigenvalue below zero', () => {
    fc.assert(
      fc.property(anyPedigree, (pedigree) => {
        const matrix = kinship(pedigree);
        const rows = matrix.ids.map((a) => matrix.ids.map((b) => matrix.between(a, b)));
        const { realEigenvalues } = new EigenvalueDecomposition(new Matrix(rows), { assumeSymmetric: true });
        expect(Math.min(...realEigenvalues)).toBeGreaterThan(-1e-10);
      }),
    );
  });

  test('a few fish asked for, one against all, and both ways to F agree with the whole table', () => {
    fc.assert(
      fc.property(
        anyPedigree.chain((pedigree) =>
          fc.tuple(fc.constant(pedigree), fc.shuffledSubarray(idsOf(pedigree), { minLength: 1 })),
        ),
        ([pedigree, some]) => {
          const whole = kinship(pedigree);
          const part = kinship(pedigree, some);
          expect(part.ids).toEqual(some);
          for (const [a, b] of pairsAmong(some)) expectSame(part.between(a, b), whole.between(a, b), `${a}, ${b}`);
          const columns = kinshipColumns(pedigree);
          const means = meanKinship(whole, some);
          const groupMeans = columns.meanWith(some);
          for (const a of some) {
            const column = columns.of(a);
            columns.ids.forEach((b, row) => {
              expectSame(column[row] ?? Number.NaN, whole.between(a, b), `column of ${a} at ${b}`);
            });
            expectSame(groupMeans[columns.ids.indexOf(a)] ?? Number.NaN, means.get(a) ?? Number.NaN, `mean of ${a}`);
          }
          const sorted = sortPedigree(pedigree);
          const [table, byColumns] = [solveFamilies(sorted), solveByColumns(sorted)];
          table.self.forEach((value, family) => {
            expectSame(byColumns.self[family] ?? Number.NaN, value, 'self');
            expectSame(byColumns.within[family] ?? Number.NaN, table.within[family] ?? Number.NaN, 'within');
          });
        },
      ),
    );
  });

  test('means over a table agree with a table that can only be asked pair by pair, founder shares sum to 1', () => {
    fc.assert(
      fc.property(anyPedigree, (pedigree) => {
        const { ids, between, inbreeding: f } = kinship(pedigree);
        const asked: KinshipMatrix = { ids, between, inbreeding: f };
        const plain = meanKinship(asked, ids);
        for (const [id, mean] of meanKinship(kinship(pedigree), ids)) expectSame(mean, plain.get(id) ?? Number.NaN, id);
        expectSame(geneDiversity(asked, ids), geneDiversity(kinship(pedigree), ids), 'gene diversity');
        const shares = [...founderContributions(pedigree, ids.toReversed()).values()];
        expectSame(
          shares.reduce((sum, share) => sum + share, 0),
          1,
          'sum of founder shares',
        );
      }),
    );
  });
});
