import { describe, expect, test } from 'vitest';
import { carriersOf, withAncestorIds } from '@/shared/lineage/descendants';
import { type Breeder, sizeByFamilies, sizeBySexes, sizeByShares, sizeOverTime } from '@/shared/lineage/groupSize';
import type { Parentage, PedigreeEntry } from '@/shared/lineage/pedigree';
import { sharedAncestry } from '@/shared/lineage/sharedAncestors';

const known = (id: string): Parentage => ({ kind: 'known', id });
const founder = (id: string): PedigreeEntry => ({ id, sire: { kind: 'unknown' }, dam: { kind: 'unknown' } });
const young = (id: string, sire: string, dam: string): PedigreeEntry => ({ id, sire: known(sire), dam: known(dam) });
const doubtful = (id: string, sires: [string, number][], dam: string): PedigreeEntry => ({
  id,
  sire: { kind: 'oneOf', key: `${id}:sire`, candidates: sires.map(([one, weight]) => ({ id: one, weight })) },
  dam: known(dam),
});
const males = (...ids: string[]): Breeder[] => ids.map((id) => ({ id, sex: 'male' }));
const females = (...ids: string[]): Breeder[] => ids.map((id) => ({ id, sex: 'female' }));

describe('what two fish share', () => {
  const family = [
    ...['S', 'D', 'E', 'T'].map(founder),
    young('sib1', 'S', 'D'),
    young('sib2', 'S', 'D'),
    young('half', 'S', 'E'),
    doubtful(
      'maybe',
      [
        ['S', 3],
        ['T', 1],
      ],
      'E',
    ),
    young('cousin', 'sib2', 'E'),
  ];
  test('full sibs share both parents, and nothing behind them', () => {
    expect(sharedAncestry(family, 'sib1', 'sib2').ancestors).toEqual([
      { id: 'S', back: [1, 1], certain: true },
      { id: 'D', back: [1, 1], certain: true },
    ]);
  });
  test('a parent and its young share the parent, not its ancestors', () => {
    expect(sharedAncestry(family, 'sib2', 'cousin').ancestors).toEqual([{ id: 'sib2', back: [0, 1], certain: true }]);
  });
  test('a possible sire is shared in doubt', () => {
    const { ancestors, between } = sharedAncestry(family, 'sib1', 'maybe');
    expect(ancestors).toEqual([{ id: 'S', back: [1, 1], certain: false }]);
    expect(between).toEqual(['S', 'sib1', 'maybe']);
  });
  test('a way over another fish belongs to it', () => {
    expect(sharedAncestry(family, 'sib1', 'cousin').between).toEqual(['S', 'D', 'sib1', 'sib2', 'cousin']);
  });
  test('founders share nothing; a fish that is not there is refused', () => {
    expect(sharedAncestry(family, 'S', 'T')).toEqual({ ancestors: [], between: ['S', 'T'] });
    expect(() => sharedAncestry(family, 'S', 'nobody')).toThrow(/nobody/);
  });
  test('carriers of a founder are its possible descendants and itself', () => {
    expect(carriersOf(family, ['T', 'D'], ['D', 'sib1', 'half', 'maybe', 'cousin'])).toEqual(
      new Map([
        ['T', ['maybe']],
        ['D', ['D', 'sib1', 'cousin']],
      ]),
    );
  });
  test('ancestors are taken so many generations back', () => {
    expect(withAncestorIds(family, ['cousin'], 1)).toEqual(new Set(['cousin', 'sib2', 'E']));
    expect(withAncestorIds(family, ['cousin'], 2)).toEqual(new Set(['cousin', 'sib2', 'E', 'S', 'D']));
  });
});

describe('the effective size of a colony', () => {
  const group = [...males('m1', 'm2'), ...females('f1', 'f2', 'f3', 'f4')];

  test('two males and four females by heads: 4 x 2 x 4 / 6', () => {
    expect(sizeBySexes(group).size).toBeCloseTo(16 / 3, 12);
  });
  test('without a male there is none, and it says why', () => {
    expect(sizeBySexes(females('f1', 'f2'))).toEqual({ size: null, because: 'No male in it is sexed.' });
  });
  test('a male who sired three of four broods counts as 1 / (0.75² + 0.25²) = 1.6 males', () => {
    const broods = [young('a', 'm1', 'f1'), young('b', 'm1', 'f2'), young('c', 'm1', 'f3'), young('d', 'm2', 'f4')];
    // 4 x 1.6 x 4 / 5.6, by hand.
    expect(sizeByShares(group, broods).size).toBeCloseTo(25.6 / 5.6, 12);
  });
  test('possible sires count by their shares: three broods of 0.5 and 0.5 are two males', () => {
    const broods = ['f1', 'f2', 'f3', 'f4'].map((dam, i) =>
      doubtful(
        `b${i}`,
        [
          ['m1', 1],
          ['m2', 1],
        ],
        dam,
      ),
    );
    expect(sizeByShares(group, broods).size).toBeCloseTo(16 / 3, 12);
  });
  test('broods of males that are gone give none', () => {
    expect(sizeByShares(group, [young('a', 'gone', 'f1')])).toMatchObject({
      size: null,
      because: expect.stringMatching(/sire/),
    });
    expect(sizeByShares(group, [])).toMatchObject({ size: null, because: expect.stringMatching(/No brood/) });
  });
  test('two young from each parent of two pairs: no variance, k = 2, so 8 x 2 / 4 = 4 of each sex and 8 in all', () => {
    const pairs = [...males('m1', 'm2'), ...females('f1', 'f2')];
    const kept = [young('a', 'm1', 'f1'), young('b', 'm1', 'f1'), young('c', 'm2', 'f2'), young('d', 'm2', 'f2')];
    expect(sizeByFamilies(pairs, kept).size).toBeCloseTo(8, 12);
    expect(sizeByFamilies(pairs, [])).toMatchObject({ size: null, because: expect.stringMatching(/kept to breed/) });
  });
  test('over time the smallest group decides: 16/3 now after a single pair is 2 / (3/16 + 1/2)', () => {
    const colony = ['m1', 'm2', 'f1', 'f2', 'f3', 'f4'];
    const pedigree = [founder('S'), founder('D'), ...colony.map((id) => young(id, 'S', 'D'))];
    const { size, generations } = sizeOverTime(pedigree, colony, sizeBySexes(group));
    expect(generations).toEqual([{ back: 1, size: 2 }]);
    expect(size).toBeCloseTo(2 / (3 / 16 + 1 / 2), 12);
  });
  test('of founders there is no earlier group, and it says so', () => {
    expect(
      sizeOverTime(
        group.map(({ id }) => founder(id)),
        ['m1', 'f1'],
        sizeBySexes(group),
      ),
    ).toMatchObject({
      size: null,
      because: expect.stringMatching(/founders/),
    });
  });
});
