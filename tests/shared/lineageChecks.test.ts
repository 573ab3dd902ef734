import Matrix, { inverse } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import * as z from 'zod/mini';
import { equivalentGenerations, pedigreeCompleteness } from '@/shared/lineage/completeness';
import { founderGenomeEquivalents, geneDiversity, meanKinship } from '@/shared/lineage/diversity';
import {
  chanceAlleleKept,
  foundersForAllele,
  inbreedingAfter,
  inbreedingRate,
  predictedGeneDiversity,
  requiredEffectiveSize,
} from '@/shared/lineage/drift';
import { effectiveAncestors } from '@/shared/lineage/effectiveAncestors';
import { effectiveSize, effectiveSizeFromFamilies, harmonicEffectiveSize } from '@/shared/lineage/effectiveSize';
import { founderContributions, founderEquivalents } from '@/shared/lineage/founders';
import { generationNumbers } from '@/shared/lineage/generations';
import { inbreeding } from '@/shared/lineage/inbreeding';
import { kinship } from '@/shared/lineage/kinship';
import type { Parentage, PedigreeEntry } from '@/shared/lineage/pedigree';
import { solveFamilies } from '@/shared/lineage/solveFamilies';
import { sortPedigree } from '@/shared/lineage/sortedPedigree';
// Each row carries its own source and how the value was obtained.
import checks from './lineageChecks.json';
import { child, mixed, oneOf, rowsOf, unknown, wild } from './lineagePedigrees';

const Rows = z.array(z.tuple([z.string(), z.nullable(z.string()), z.nullable(z.string())]));
const List = z.array(z.tuple([z.string(), z.union([z.number(), z.string()])]));
const UncertainRows = z.array(z.tuple([z.string(), List, List, z.nullable(z.string())]));
const Square = z.array(z.array(z.number()));
const Named = z.record(z.string(), z.number());

/** Rows of one kind as `[id, inputs, expected]`, shapes checked. */
function table<I, E>(kind: string, inputs: z.ZodMiniType<I>, expected: z.ZodMiniType<E>): [string, I, E][] {
  const found = checks.filter((row) => row.kind === kind);
  if (found.length === 0) throw new Error(`No check of kind ${kind}`);
  return found.map((row) => [row.id, z.parse(inputs, row.inputs), z.parse(expected, row.expected)]);
}

/** A check's lists of possible parents; chances that sum to less than 1 leave the rest to an animal outside. */
function uncertain(rows: z.output<typeof UncertainRows>, model: string): PedigreeEntry[] {
  return rows.map(([id, sires, dams, brood]) => {
    const side = (name: string, list: z.output<typeof List>): Parentage => {
      const listed = list.map(([of, chance]): [string | null, number] => [of, fraction(chance)]);
      const rest = 1 - listed.reduce((sum, [, chance]) => sum + chance, 0);
      if (rest > 1e-9) listed.push([null, rest]);
      if (brood === null && list.length === 0) return unknown;
      return model === 'shared' && brood !== null ? oneOf(`${brood} ${name}`, ...listed) : mixed(...listed);
    };
    return { id, sire: side('sire', sires), dam: side('dam', dams) };
  });
}

function fraction(chance: number | string): number {
  const [top = 0, bottom = 1] = String(chance).split('/').map(Number);
  return top / bottom;
}

function relationships(pedigree: PedigreeEntry[]): number[][] {
  const matrix = kinship(pedigree);
  return matrix.ids.map((a) => matrix.ids.map((b) => 2 * matrix.between(a, b)));
}

function expectSquare(found: number[][], expected: number[][], digits = 12) {
  expect(found).toHaveLength(expected.length);
  found.flat().forEach((value, index) => {
    expect(value).toBeCloseTo(expected.flat()[index] ?? Number.NaN, digits);
  });
}

/** Mother's and father's shares of each animal's genes (T) and its share of chance (D = diag), as the pedigree is solved. */
function decomposed(pedigree: PedigreeEntry[]) {
  const sorted = sortPedigree(pedigree);
  const { self, within } = solveFamilies(sorted);
  const family = (id: string) => sorted.familyOf[sorted.nodeOf[sorted.rowOf.get(id) ?? 0] ?? 0] ?? 0;
  const chance = (id: string) => 2 * ((self[family(id)] ?? 0) - (within[family(id)] ?? 0));
  const parentsOf = (id: string) => {
    const [from, end] = [sorted.parents.start[family(id)], sorted.parents.start[family(id) + 1]];
    const nodes = [...sorted.parents.node.subarray(from, end)];
    const shares = [...sorted.parents.share.subarray(from, end)];
    return nodes.map((node, at) => ({ row: sorted.nodeOf.indexOf(node), share: shares[at] ?? 0 }));
  };
  const t = new Matrix(sorted.ids.length, sorted.ids.length);
  sorted.ids.forEach((id, row) => {
    t.set(row, row, 1);
    for (const { row: parent, share } of parentsOf(id)) {
      sorted.ids.forEach((_, column) => {
        t.set(row, column, t.get(row, column) + share * t.get(parent, column));
      });
    }
  });
  return { t, d: sorted.ids.map(chance) };
}

describe('Kinship and inbreeding, published and recomputed', () => {
  test.each(table('ped.A', z.object({ ped: Rows }), Square))('relationships of %s', (_, { ped }, expected) => {
    expectSquare(relationships(rowsOf(ped)), expected);
  });

  test.each(table('ped.F', z.object({ ped: Rows }), Named))('F of %s', (_, { ped }, expected) => {
    const f = inbreeding(rowsOf(ped));
    const matrix = kinship(rowsOf(ped));
    for (const [id, value] of Object.entries(expected)) {
      expect(f.get(id)).toBeCloseTo(value, 12);
      expect(matrix.inbreeding(id)).toBeCloseTo(value, 12);
    }
  });

  test.each(table('ped.T', z.object({ ped: Rows }), Square))('shares of genes in %s', (_, { ped }, expected) => {
    expectSquare(decomposed(rowsOf(ped)).t.to2DArray(), expected);
  });

  test.each(table('ped.D', z.object({ ped: Rows }), z.array(z.number())))('shares of chance in %s', (_, { ped }, d) => {
    expectSquare([decomposed(rowsOf(ped)).d], [d]);
  });

  test.each(table('ped.Ainv', z.object({ ped: Rows }), Square))('the inverse in %s', (_, { ped }, expected) => {
    expectSquare(inverse(new Matrix(relationships(rowsOf(ped)))).to2DArray(), expected, 9);
    const { t, d } = decomposed(rowsOf(ped));
    const backwards = inverse(t);
    const byRules = backwards
      .transpose()
      .mmul(Matrix.diag(d.map((each) => 1 / each)))
      .mmul(backwards);
    expectSquare(byRules.to2DArray(), expected, 9);
  });

  const SYSTEMS: Record<string, (generations: number) => PedigreeEntry[][]> = {
    selfing: (generations) => [
      wild('0'),
      ...Array.from({ length: generations }, (_, t) => [child(`${t + 1}`, `${t}`, `${t}`)]),
    ],
    'full-sib': (generations) =>
      Array.from({ length: generations + 1 }, (_, t) =>
        t === 0
          ? [...wild('m', 'f'), child('0a', 'm', 'f'), child('0b', 'm', 'f')]
          : [child(`${t}a`, `${t - 1}a`, `${t - 1}b`), child(`${t}b`, `${t - 1}a`, `${t - 1}b`)],
      ),
    'half-sib': halfSibs,
  };

  test.each(table('ped.mating_series', z.object({ system: z.string() }), z.array(z.number())))(
    '%s over the generations',
    (_, { system }, expected) => {
      const name = system.split(' ')[0] ?? '';
      const generations = SYSTEMS[name]?.(expected.length - 1) ?? [];
      const f = inbreeding(generations.flat());
      expect(generations).toHaveLength(expected.length);
      for (const [t, born] of generations.entries()) {
        expect(f.get(born.at(-1)?.id ?? '')).toBeCloseTo(expected[t] ?? Number.NaN, 12);
      }
    },
  );

  test.each(table('ped.A.uncertain', z.object({ ped: UncertainRows, model: z.string() }), Square))(
    'relationships under uncertain sires: %s',
    (_, { ped, model }, expected) => {
      expectSquare(relationships(uncertain(ped, model)), expected);
    },
  );

  const Pairs = z.array(z.tuple([z.string(), z.string()]));
  test.each(
    table(
      'ped.kinship.uncertain',
      z.object({ ped: UncertainRows, model: z.string(), pairs: Pairs }),
      z.array(z.number()),
    ),
  )('kinships under uncertain parents: %s', (_, { ped, model, pairs }, expected) => {
    const matrix = kinship(uncertain(ped, model));
    for (const [index, [a, b]] of pairs.entries())
      expect(matrix.between(a, b)).toBeCloseTo(expected[index] ?? Number.NaN, 12);
  });

  test.each(table('ped.F.uncertain', z.object({ ped: UncertainRows, model: z.string() }), Named))(
    'F under uncertain parents: %s',
    (_, { ped, model }, expected) => {
      const f = inbreeding(uncertain(ped, model));
      for (const [id, value] of Object.entries(expected)) expect(f.get(id), id).toBeCloseTo(value, 12);
    },
  );

  const Random = z.object({ F: Named, kinship: z.array(z.number()), mean_kinship_all: z.number(), mean_F: z.number() });
  test.each(table('ped.random', z.object({ ped: UncertainRows, model: z.string(), pairs: Pairs }), Random))(
    'forty fish in twelve broods: %s',
    (_, { ped, model, pairs }, expected) => {
      const pedigree = uncertain(ped, model);
      const matrix = kinship(pedigree);
      const f = inbreeding(pedigree);
      for (const [id, value] of Object.entries(expected.F)) expect(f.get(id), id).toBeCloseTo(value, 12);
      for (const [at, [a, b]] of pairs.entries())
        expect(matrix.between(a, b)).toBeCloseTo(expected.kinship[at] ?? Number.NaN, 12);
      expect(1 - geneDiversity(matrix, matrix.ids)).toBeCloseTo(expected.mean_kinship_all, 12);
      expect([...f.values()].reduce((sum, each) => sum + each, 0) / f.size).toBeCloseTo(expected.mean_F, 12);
    },
  );
});

/** One male to many of his paternal half-sisters, who are half-sisters of each other: enough females for every generation. */
function halfSibs(generations: number): PedigreeEntry[][] {
  const born: PedigreeEntry[][] = [];
  let males = ['m'];
  let females = Array.from({ length: generations + 3 }, (_, index) => `d${index}`);
  const founders = wild('m', ...females);
  for (let t = 0; t <= generations; t += 1) {
    const sire = males[0] ?? 'm';
    const young = females.map((dam, index) => child(`${t}.${index}`, sire, dam));
    born.push(t === 0 ? [...founders, ...young] : young);
    const ids = young.map(({ id }) => id);
    males = ids.slice(0, 1);
    females = ids.slice(1);
  }
  return born;
}

describe('Diversity, completeness and generations', () => {
  const Expected = z.object({
    founder_contributions: Named,
    fe: z.number(),
    mean_kinship_of: Named,
    MK: z.number(),
    GD: z.number(),
    FGE: z.number(),
    mean_F: z.number(),
    fa: z.number(),
    fa_contributions: z.array(z.number()),
  });
  test.each(table('ped.diversity', z.object({ ped: Rows, reference: z.array(z.string()) }), Expected))(
    'diversity of %s',
    (_, { ped, reference }, expected) => {
      const pedigree = rowsOf(ped);
      const matrix = kinship(pedigree);
      const founders = founderContributions(pedigree, reference);
      expect([...founders.keys()].sort()).toEqual(Object.keys(expected.founder_contributions).sort());
      for (const [id, share] of founders)
        expect(share).toBeCloseTo(expected.founder_contributions[id] ?? Number.NaN, 12);
      expect(founderEquivalents(founders)).toBeCloseTo(expected.fe, 12);
      for (const [id, mean] of meanKinship(matrix, reference)) {
        expect(mean).toBeCloseTo(expected.mean_kinship_of[id] ?? Number.NaN, 12);
      }
      expect(geneDiversity(matrix, reference)).toBeCloseTo(expected.GD, 12);
      expect(1 - geneDiversity(matrix, reference)).toBeCloseTo(expected.MK, 12);
      expect(founderGenomeEquivalents(matrix, reference)).toBeCloseTo(expected.FGE, 12);
      expect(reference.reduce((sum, id) => sum + matrix.inbreeding(id), 0) / 3).toBeCloseTo(expected.mean_F, 12);
      const ancestors = effectiveAncestors(pedigree, reference);
      expect(ancestors.number).toBeCloseTo(expected.fa, 12);
      expectSquare([ancestors.contributions.map(({ share }) => share)], [expected.fa_contributions]);
    },
  );

  test.each(table('ped.cge', z.object({ ped: Rows }), Named))('generations known behind %s', (_, { ped }, expected) => {
    for (const [id, value] of Object.entries(expected)) {
      expect(equivalentGenerations(rowsOf(ped), id), id).toBeCloseTo(value, 12);
    }
  });

  const Completeness = z.object({ PCI: z.number(), C_sire: z.number(), C_dam: z.number() });
  test.each(table('ped.pci', z.object({ ped: Rows, id: z.string(), depth: z.number() }), Completeness))(
    'completeness of both sides: %s',
    (_, { ped, id, depth }, expected) => {
      const found = pedigreeCompleteness(rowsOf(ped), id, depth);
      expect(found.index).toBeCloseTo(expected.PCI, 12);
      expect(found.sire).toBeCloseTo(expected.C_sire, 12);
      expect(found.dam).toBeCloseTo(expected.C_dam, 12);
    },
  );

  const Labelled = z.object({
    rows: z.array(z.tuple([z.string(), z.nullable(z.string()), z.nullable(z.string()), z.string()])),
  });
  test.each(table('ped.generation', Labelled, z.record(z.string(), z.nullable(z.string()))))(
    'filial generations: %s',
    (_, { rows }, expected) => {
      const founders = new Map(rows.flatMap(([id, , , origin]) => (origin === 'wild' ? [[id, 0] as const] : [])));
      const found = generationNumbers(rowsOf(rows.map(([id, sire, dam]) => [id, sire, dam])), founders);
      const labels = [...found].map(([id, range]) => [id, range && range.low === range.high ? `F${range.low}` : range]);
      expect(Object.fromEntries(labels)).toEqual(expected);
    },
  );
});

describe('Effective size and drift', () => {
  test.each(
    table(
      'ne.sex_ratio',
      z.object({ Nm: z.number(), Nf: z.number() }),
      z.object({ Ne: z.number(), deltaF: z.nullable(z.number()) }),
    ),
  )('sex ratio: %s', (_, { Nm, Nf }, expected) => {
    const size = effectiveSize({ males: Nm, females: Nf });
    expect(size).toBeCloseTo(expected.Ne, 12);
    if (expected.deltaF === null) expect(inbreedingRate(size)).toBeNull();
    else expect(inbreedingRate(size)).toBeCloseTo(expected.deltaF, 12);
  });

  test.each(table('ne.harmonic', z.object({ Ne: z.array(z.number()) }), z.number()))(
    'over time: %s',
    (_, { Ne }, expected) => {
      expect(harmonicEffectiveSize(Ne)).toBeCloseTo(expected, 9);
    },
  );

  test.each(table('ne.family_variance', z.object({ N: z.number(), Vkm: z.number(), Vkf: z.number() }), z.number()))(
    'family variance: %s',
    (_, { N, Vkm, Vkf }, expected) => {
      expect(effectiveSizeFromFamilies({ breeders: N, maleVariance: Vkm, femaleVariance: Vkf })).toBeCloseTo(
        expected,
        12,
      );
    },
  );

  test.each(
    table(
      'ne.F_after_t',
      z.object({ Ne: z.number(), t: z.number(), F0: z.number() }),
      z.object({ F: z.number(), Het_retained: z.number() }),
    ),
  )('after some generations: %s', (_, { Ne, t, F0 }, expected) => {
    expect(inbreedingAfter({ effectiveSize: Ne, generations: t, f: F0 })).toBeCloseTo(expected.F, 12);
    const kept = predictedGeneDiversity({ effectiveSize: Ne, generations: t, geneDiversity: 1 - F0 });
    expect(kept).toBeCloseTo(expected.Het_retained, 12);
  });

  test.each(table('ne.required', z.object({ F_max: z.number(), t: z.number() }), z.number()))(
    'required: %s',
    (_, { F_max, t }, expected) => {
      expect(requiredEffectiveSize({ f: F_max, generations: t })).toBeCloseTo(expected, 10);
    },
  );

  test.each(table('ne.allele_kept', z.object({ p: z.number(), Ne: z.number() }), z.number()))(
    'a rare allele: %s',
    (_, { p, Ne }, expected) => {
      expect(chanceAlleleKept({ frequency: p, effectiveSize: Ne })).toBeCloseTo(expected, 12);
    },
  );

  test.each(
    table(
      'ne.for_allele',
      z.object({ p: z.number(), P: z.number() }),
      z.object({ Ne_exact: z.number(), Ne_ceil: z.number() }),
    ),
  )('founders for a rare allele: %s', (_, { p, P }, expected) => {
    const found = foundersForAllele({ frequency: p, chance: P });
    expect(found.exact).toBeCloseTo(expected.Ne_exact, 10);
    expect(found.whole).toBe(expected.Ne_ceil);
  });
});
