import { describe, expect, test } from 'vitest';
import { candidatesOf, usualGroup } from '@/shared/lineage/candidates';
import type { LineageNode } from '@/shared/lineage/contract';
import { kinship } from '@/shared/lineage/kinship';
import type { Parentage, PedigreeEntry } from '@/shared/lineage/pedigree';
import { groupFigures, proposeGroups } from '@/shared/lineage/proposeGroups';
import { profileOf } from '@/shared/species/library';

const unknown: Parentage = { kind: 'unknown' };
const known = (id: string): Parentage => ({ kind: 'known', id });
const founder = (id: string): PedigreeEntry => ({ id, sire: unknown, dam: unknown });
const young = (id: string, sire: string, dam: string): PedigreeEntry => ({ id, sire: known(sire), dam: known(dam) });

/** Two families of strangers: m1 and f1 are brother and sister, so are m2 and f2. */
const pedigree = [
  ...['a', 'b', 'c', 'd'].map(founder),
  young('m1', 'a', 'b'),
  young('f1', 'a', 'b'),
  young('m2', 'c', 'd'),
  young('f2', 'c', 'd'),
];
const matrix = kinship(pedigree);
const asked = { matrix, males: ['m1', 'm2'], females: ['f1', 'f2'] };

describe('the proposal', () => {
  test('pairs strangers where one male and one female are wanted', () => {
    const proposal = proposeGroups({ ...asked, chooseMales: 1, chooseFemales: 1, maxFryInbreeding: 0.125 });
    if (proposal.fits !== 'one') throw new Error(proposal.fits);
    const [{ males, females, pairs }] = proposal.groups;
    expect([...males, ...females].map((id) => id.slice(1)).sort()).toEqual(['1', '2']);
    expect(pairs[0]?.fryInbreeding).toBe(0);
  });

  test('takes two tanks where brother and sister would meet in one: F of full sibs is 1/4 (Falconer & Mackay, from memory)', () => {
    const proposal = proposeGroups({ ...asked, chooseMales: 2, chooseFemales: 2, maxFryInbreeding: 0.125 });
    if (proposal.fits !== 'two') throw new Error(proposal.fits);
    for (const { males, females, pairs } of proposal.groups) {
      expect([males.length, females.length]).toEqual([1, 1]);
      expect(pairs.map(({ fryInbreeding }) => fryInbreeding)).toEqual([0]);
    }
    const used = proposal.groups.flatMap(({ males, females }) => [...males, ...females]);
    expect([...used].sort()).toEqual(['f1', 'f2', 'm1', 'm2']);
  });

  test('says that nothing fits, and the lowest usual limit that would let a group', () => {
    const sibs = { matrix, males: ['m1'], females: ['f1'], chooseMales: 1, chooseFemales: 1 };
    expect(proposeGroups({ ...sibs, maxFryInbreeding: 0.125 })).toMatchObject({ fits: 'none', atLimit: 0.25 });
  });
});

test('the figures of a group: mean F over its pairs, and the diversity its young keep, each sex giving half', () => {
  const figures = groupFigures(matrix, ['m1'], ['f1', 'f2']);
  // m1 × f1 are full sibs (1/4), m1 × f2 strangers (0).
  expect(figures?.highest).toBe(0.25);
  expect(figures?.meanFryInbreeding).toBe(0.125);
  // Selves 1/2: males 1/2; females (1/2 + 0 + 0 + 1/2) / 4 = 1/4; between 1/8. (1/2 + 1/4 + 2/8) / 4 = 1/4.
  expect(figures?.geneDiversity).toBeCloseTo(0.75, 12);
  expect(groupFigures(matrix, [], ['f1'])).toBeNull();
});

describe('who may be chosen', () => {
  const node = (about: Partial<LineageNode>): LineageNode =>
    ({
      id: 'x',
      thing: 'fish',
      code: 'MOKA-01',
      sex: 'male',
      sexCertain: true,
      strainId: null,
      strainCode: null,
      displayName: null,
      bornOn: '2020-05-14',
      living: true,
      keptAs: 'breeder',
      colony: null,
      tank: { id: 't', code: 'T1' },
      lastLengthTenthsMm: 1_000,
      broodId: null,
      founderGeneration: null,
      issuer: null,
      sheet: null,
      parentageId: null,
      sire: unknown,
      dam: unknown,
      ...about,
    }) as LineageNode;
  const profile = profileOf('tropheus-moorii');

  test.each([
    ['an adult', {}, 1],
    ['one that is not sexed', { sex: 'unknown' as const }, 0],
    ['one that is dead', { living: false }, 0],
    ['one kept for nothing', { keptAs: 'other' as const }, 0],
    ['a brood', { thing: 'brood' as const }, 0],
  ])('%s: %o', (_what, about, count) => {
    expect(candidatesOf([node(about)], profile, '2026-05-14', null)).toHaveLength(count);
  });

  test('a small fish and an old one are doubted, one never measured is not', () => {
    const doubtOf = (about: Partial<LineageNode>, years: number | null = null) =>
      candidatesOf([node(about)], profile, '2026-05-14', years)[0]?.doubt;
    expect(doubtOf({ lastLengthTenthsMm: 200 })).toBe('tooSmall');
    expect(doubtOf({ lastLengthTenthsMm: null })).toBeNull();
    expect(doubtOf({}, 5)).toBe('tooOld');
    expect(doubtOf({}, 7)).toBeNull();
  });

  test('the usual group keeps the species’ females per male as far as there are fish', () => {
    const { femalesPerMale, minGroup } = profile;
    const usual = usualGroup(profile, { males: 20, females: 40 });
    expect(usual.females / usual.males).toBeGreaterThanOrEqual(femalesPerMale.value);
    expect(usual.males + usual.females).toBeGreaterThanOrEqual(minGroup.value);
    expect(usualGroup(profile, { males: 1, females: 2 })).toEqual({ males: 1, females: 2 });
  });
});
