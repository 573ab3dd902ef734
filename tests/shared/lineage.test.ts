import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { broodKinship } from '@/shared/lineage/broodKinship';
import { allEquivalentGenerations, equivalentGenerations, pedigreeCompleteness } from '@/shared/lineage/completeness';
import { founderGenomeEquivalents, geneDiversity, meanKinship } from '@/shared/lineage/diversity';
import { inbreedingAfter, inbreedingRate, predictedGeneDiversity } from '@/shared/lineage/drift';
import { effectiveAncestors } from '@/shared/lineage/effectiveAncestors';
import { effectiveSize, effectiveSizeFromFamilies, harmonicEffectiveSize } from '@/shared/lineage/effectiveSize';
import { founderContributions, founderEquivalents } from '@/shared/lineage/founders';
import { frontierOf } from '@/shared/lineage/frontier';
import { generationNumbers } from '@/shared/lineage/generations';
import { inbreeding } from '@/shared/lineage/inbreeding';
import { kinship, packedKinship } from '@/shared/lineage/kinship';
import { kinshipColumns } from '@/shared/lineage/kinshipColumns';
import { matrixOf } from '@/shared/lineage/kinshipMatrix';
import { inbreedingOutcomes } from '@/shared/lineage/outcomes';
import { checkBirths, doubtsOf } from '@/shared/lineage/parentChecks';
import type { Parentage, PedigreeEntry } from '@/shared/lineage/pedigree';
import { PedigreeError } from '@/shared/lineage/pedigreeError';
import { sortPedigree } from '@/shared/lineage/sortedPedigree';
import { child, known, longPedigree, mixed, oneOf, unknown, wild } from './lineagePedigrees';

/** A brood 25H whose sire was one of two males, one of them himself of uncertain sire; worked out by hand. */
const colony: PedigreeEntry[] = [
  ...wild('W1', 'W2', 'W3', 'W4', 'W5'),
  child('M1', 'W1', 'W2'),
  { id: 'M2', sire: oneOf('M2 sire', ['W1', 60], ['W3', 40]), dam: known('W4') },
  child('D4', 'W3', 'W4'),
  { id: '25H', sire: oneOf('25H sire', ['M1', 0.79], ['M2', 0.21]), dam: known('D4') },
];

describe('Kinship of fish with certain parents (Wright 1922, Malécot 1948)', () => {
  const family = [
    ...wild('s', 'd', 'x'),
    child('a', 's', 'd'),
    child('b', 's', 'd'),
    child('h', 's', 'x'),
    child('lone', 's', null),
  ];
  const { between } = kinship(family);

  test.each([
    ['a fish with itself', 'a', 'a', 0.5],
    ['full sibs', 'a', 'b', 0.25],
    ['half sibs', 'a', 'h', 0.125],
    ['parent and young', 's', 'a', 0.25],
    ['a fish of unknown dam and its half sib', 'lone', 'a', 0.125],
    ['strangers', 's', 'd', 0],
  ])('%s', (_, a, b, expected) => {
    expect(between(a, b)).toBe(expected);
  });

  test('a pedigree without fish, and one of a single fish', () => {
    expect(kinship([]).ids).toEqual([]);
    expect(inbreeding([]).size).toBe(0);
    const alone = kinship(wild('only'));
    expect(alone.between('only', 'only')).toBe(0.5);
    expect(alone.inbreeding('only')).toBe(0);
  });

  test('only the fish asked for are in the table, in the order asked, each once', () => {
    const matrix = kinship(family, ['h', 'a', 'h']);
    expect(matrix.ids).toEqual(['h', 'a']);
    expect(matrix.between('a', 'h')).toBe(0.125);
    expect(() => matrix.between('a', 'b')).toThrow('b is not in the kinship table');
  });

  test('a table sent from a worker as plain data reads the same', () => {
    const sent = matrixOf(structuredClone(packedKinship(family)));
    expect(sent.between('a', 'b')).toBe(0.25);
    expect(sent.between('a', 'a')).toBe(0.5);
    expect(sent.inbreeding('a')).toBe(0);
  });

  test('five hundred generations of sib mating approach 1 and never pass it', () => {
    const line: PedigreeEntry[] = [...wild('0a', '0b')];
    for (let t = 1; t <= 500; t += 1) {
      line.push(child(`${t}a`, `${t - 1}a`, `${t - 1}b`), child(`${t}b`, `${t - 1}a`, `${t - 1}b`));
    }
    const f = inbreeding(line.toReversed()).get('500a') ?? 0;
    expect(f).toBeGreaterThan(1 - 1e-12);
    expect(f).toBeLessThanOrEqual(1);
    // However long the line, two fish, their parents and no more are held at once.
    expect(frontierOf(sortPedigree(line)).size).toBeLessThanOrEqual(4);
    expect(kinship(line, ['500a', '500b']).between('500a', '500b')).toBeLessThanOrEqual(1);
  });

  test('twenty thousand generations in one line do not overflow anything', () => {
    const line = Array.from({ length: 20_000 }, (_, t) =>
      t === 0 ? child('0', null, null) : child(`${t}`, `${t - 1}`, null),
    );
    expect(inbreeding(line.toReversed()).get('19999')).toBe(0);
    expect(equivalentGenerations(line, '19999')).toBeCloseTo(1, 12);
    expect(kinship(line, ['19998', '19999']).between('19998', '19999')).toBe(0.25);
  });

  test('a few fish of a long pedigree, read by column, are as in the whole table', () => {
    const pedigree = longPedigree(2_600);
    const some = ['x2599', 'x2598', 'x2000', 'x1', 'x1300'];
    const [whole, few] = [kinship(pedigree), kinship(pedigree, some)];
    const columns = kinshipColumns(pedigree);
    for (const a of some) {
      const column = columns.of(a);
      for (const b of some) {
        expect(few.between(a, b)).toBeCloseTo(whole.between(a, b), 12);
        expect(column[columns.ids.indexOf(b)]).toBeCloseTo(whole.between(a, b), 12);
      }
      expect(few.inbreeding(a)).toBeCloseTo(whole.inbreeding(a), 12);
    }
    expect(some.reduce((sum, id) => sum + few.inbreeding(id), 0)).toBeGreaterThan(0);
  });
});

describe('Uncertain parents', () => {
  const brood = (sire: Parentage): PedigreeEntry[] => [
    ...wild('m1', 'm2', 'd'),
    { id: 'a', sire, dam: known('d') },
    { id: 'b', sire, dam: known('d') },
  ];

  test('two sibs of one unknown father are full sibs; each with its own draw, less (computed for the two models)', () => {
    const shared = kinship(brood(oneOf('k', ['m1', 1], ['m2', 1])));
    const independent = kinship(brood(mixed(['m1', 1], ['m2', 1])));
    expect(shared.between('a', 'b')).toBe(0.25);
    expect(independent.between('a', 'b')).toBe(0.1875);
  });

  test('an unknown father is one animal for a brood, another for each fish of a mixed clutch', () => {
    expect(kinship(brood(oneOf('k', [null, 1]))).between('a', 'b')).toBe(0.25);
    expect(kinship(brood(mixed([null, 1]))).between('a', 'b')).toBe(0.125);
    expect(kinship(brood(unknown)).between('a', 'b')).toBe(0.125);
  });

  test('one shared animal may be sire of some and dam of others', () => {
    const parent = oneOf('the same fish', ['m1', 1], ['m2', 1]);
    const pedigree = [
      ...wild('m1', 'm2'),
      { id: 'a', sire: parent, dam: unknown },
      { id: 'b', sire: unknown, dam: parent },
    ];
    expect(kinship(pedigree).between('a', 'b')).toBe(0.125);
  });

  test('pairs stay together: fry of two unrelated broods in one tank are not inbred', () => {
    const pedigree: PedigreeEntry[] = [
      ...wild('w', 'd1', 's2'),
      child('s1', 'w', null),
      child('d2', 'w', null),
      {
        id: 'fry',
        from: [
          { sire: known('s1'), dam: known('d1'), weight: 30 },
          { sire: known('s2'), dam: known('d2'), weight: 10 },
        ],
      },
      { id: 'asLists', sire: mixed(['s1', 30], ['s2', 10]), dam: mixed(['d1', 30], ['d2', 10]) },
    ];
    const f = inbreeding(pedigree);
    expect(f.get('fry')).toBe(0);
    expect(f.get('asLists')).toBeCloseTo(0.75 * 0.25 * 0.125, 15);
  });

  test('the outcomes behind an expected F of 0.037: 0 at 79 %, 0.125 at 13 %, 0.250 at 8 %', () => {
    const outcomes = inbreedingOutcomes(colony, '25H') ?? [];
    expect(outcomes.map(({ f }) => f)).toEqual([0, 0.125, 0.25]);
    const chances = outcomes.map(({ probability }) => probability);
    expect(chances[0]).toBeCloseTo(0.79, 12);
    expect(chances[1]).toBeCloseTo(0.126, 12);
    expect(chances[2]).toBeCloseTo(0.084, 12);
    expect(inbreeding(colony).get('25H')).toBeCloseTo(0.03675, 12);
  });

  test('says nothing about outcomes when there are more than asked for', () => {
    expect(inbreedingOutcomes(colony, '25H', 4)).toHaveLength(3);
    expect(inbreedingOutcomes(colony, '25H', 3)).toBeNull();
    expect(inbreedingOutcomes(colony, 'M1', 1)).toEqual([{ f: 0, probability: 1 }]);
    expect(() => inbreedingOutcomes(colony, '25H', 0)).toThrow(BadValue);
    expect(() => inbreedingOutcomes(colony, 'nobody')).toThrow('nobody is not in the pedigree');
  });
});

describe('Broods', () => {
  const pedigree = [...colony, { id: '25K', sire: oneOf('25H sire', ['M1', 0.79], ['M2', 0.21]), dam: known('W5') }];
  const broods = broodKinship(pedigree, ['25H', '25K'], ['W4']);

  test('two fry of a brood are sibs, not one fish', () => {
    const alone = broodKinship([...wild('s', 'd'), child('B', 's', 'd')], ['B']);
    expect(alone.between('B', 'B')).toBe(0.25);
    expect(alone.inbreeding('B')).toBe(0);
  });

  test('broods of one unknown male are half sibs at least, and F of the fry is the expected one', () => {
    expect(broods.inbreeding('25H')).toBeCloseTo(0.03675, 12);
    // Half from the shared sire (1/8), half of f(sire, D4) / 2 through 25H's dam.
    expect(broods.between('25H', '25K')).toBeCloseTo(0.125 + 0.03675 / 4, 12);
    expect(broods.between('25K', '25H')).toBe(broods.between('25H', '25K'));
    expect(broods.withFish('25H', 'W4')).toBeCloseTo(0.125 + 0.21 * 0.125, 12);
  });

  test('refuses a brood that was not asked for', () => {
    expect(() => broods.between('25H', 'M1')).toThrow('M1 is not in the broods asked for');
  });
});

describe('Diversity and founders', () => {
  test('as many unrelated wild fish as there are count as so many founder genomes (Lacy 1989)', () => {
    const matrix = kinship(wild('a', 'b', 'c', 'd'));
    expect(founderGenomeEquivalents(matrix, matrix.ids)).toBe(4);
    expect(geneDiversity(matrix, matrix.ids)).toBe(0.875);
    expect(meanKinship(matrix, ['a', 'b', 'a']).get('a')).toBe(0.25);
  });

  test('unknown parents beside known ones are counted apart, so that the shares still sum to 1', () => {
    const pedigree = [
      ...wild('w'),
      child('half', 'w', null),
      { id: 'b', sire: oneOf('k', ['w', 3], [null, 1]), dam: known('half') },
    ];
    const shares = founderContributions(pedigree, ['b', 'half', 'w']);
    expect(Object.fromEntries(shares)).toEqual({
      w: expect.closeTo((1 + 0.5 + 0.625) / 3, 12),
      '?': expect.closeTo(0.875 / 3, 12),
    });
    expect(
      founderEquivalents(
        new Map([
          ['a', 0.5],
          ['b', 0.5],
        ]),
      ),
    ).toBe(2);
  });

  test('a bottleneck shows in the ancestors, not in the founders (Boichard et al. 1997)', () => {
    const pedigree = [
      ...wild('a', 'b', 'c', 'd'),
      child('m', 'a', 'b'),
      child('f', 'c', 'd'),
      child('x', 'm', 'f'),
      child('y', 'm', 'f'),
    ];
    expect(founderEquivalents(founderContributions(pedigree, ['x', 'y']))).toBe(4);
    expect(effectiveAncestors(pedigree, ['x', 'y'])).toEqual({
      number: 2,
      contributions: [
        { id: 'f', share: 0.5 },
        { id: 'm', share: 0.5 },
      ],
    });
    expect(effectiveAncestors(pedigree, ['a', 'b', 'c', 'd']).number).toBe(4);
  });

  test('has no figure for no fish', () => {
    const matrix = kinship(wild('a'));
    expect(meanKinship(matrix, [])).toEqual(new Map());
    for (const ask of [
      () => geneDiversity(matrix, []),
      () => founderGenomeEquivalents(matrix, []),
      () => founderEquivalents(founderContributions(wild('a'), [])),
      () => effectiveAncestors(wild('a'), []),
      () => kinshipColumns(wild('a')).meanWith([]),
    ]) {
      expect(ask).toThrow(expect.objectContaining({ reason: 'noAnimals' }));
    }
    expect(() => founderEquivalents(new Map([['a', Number.NaN]]))).toThrow(BadValue);
    expect(() => founderEquivalents(new Map([['a', 0]]))).toThrow(BadValue);
  });
});

describe('What the pedigree knows', () => {
  test('a possible parent counts by its share', () => {
    const pedigree = [
      ...wild('w'),
      { id: 'a', sire: oneOf('k', ['w', 3], [null, 1]), dam: unknown },
      child('b', 'a', 'w'),
    ];
    expect(equivalentGenerations(pedigree, 'a')).toBeCloseTo(0.375, 12);
    expect(equivalentGenerations(pedigree, 'b')).toBeCloseTo(1 + 0.375 / 2, 12);
    expect([...allEquivalentGenerations(pedigree).values()]).toEqual([0, 0.375, 1.1875]);
    expect(pedigreeCompleteness(pedigree, 'b', 2)).toEqual({
      sire: (1 + 0.375) / 2,
      dam: 0.5,
      index: expect.any(Number),
    });
    expect(() => pedigreeCompleteness(pedigree, 'b', 0)).toThrow(BadValue);
    expect(() => equivalentGenerations(pedigree, 'z')).toThrow('z is not in the pedigree');
  });

  test('generations: with one wild parent F1; "F1 or F2" when it depends on the sire; F? when a parent may be of unknown origin', () => {
    const pedigree = [
      ...wild('w', 'v', 'shop'),
      child('one', 'w', 'v'),
      child('wildParent', 'w', 'one'),
      { id: 'either', sire: oneOf('k', ['w', 1], ['one', 1]), dam: known('one') },
      { id: 'maybe', sire: mixed(['w', 9], [null, 1]), dam: known('v') },
      child('fromShop', 'shop', 'one'),
      child('next', 'either', 'one'),
    ];
    const found = generationNumbers(
      pedigree,
      new Map([
        ['w', 0],
        ['v', 0],
      ]),
    );
    expect(Object.fromEntries(found)).toEqual({
      w: { low: 0, high: 0 },
      v: { low: 0, high: 0 },
      shop: null,
      one: { low: 1, high: 1 },
      wildParent: { low: 1, high: 1 },
      either: { low: 1, high: 2 },
      maybe: null,
      fromShop: null,
      next: { low: 2, high: 2 },
    });
    expect(
      generationNumbers(
        pedigree,
        new Map([
          ['w', 0],
          ['v', 0],
          ['shop', 3],
        ]),
      ).get('fromShop'),
    ).toEqual({ low: 2, high: 2 });
    expect(() => generationNumbers(pedigree, new Map([['w', 0.5]]))).toThrow(
      expect.objectContaining({ reason: 'badGeneration' }),
    );
  });
});

describe('Effective size', () => {
  test('a male who sires four fifths leaves less than two (4 Nm Nf / (Nm + Nf), each sex as 1 / sum of squared shares)', () => {
    const shares = { maleShares: [0.8, 0.2], femaleShares: [1, 1, 1, 1] };
    const males = 1 / (0.64 + 0.04);
    expect(effectiveSize(shares)).toBeCloseTo((4 * males * 4) / (males + 4), 12);
    expect(effectiveSize({ maleShares: [1, 1], femaleShares: [5, 5] })).toBeCloseTo(
      effectiveSize({ males: 2, females: 2 }),
      12,
    );
    expect(effectiveSize({ maleShares: [1e308, 1e308], femaleShares: [1e-300] })).toBeCloseTo(8 / 3, 12);
    expect(effectiveSize({ maleShares: [], femaleShares: [1] })).toBe(0);
    expect(effectiveSize({ maleShares: [0, 0], femaleShares: [1] })).toBe(0);
  });

  test.each([
    [() => effectiveSize({ males: -1, females: 2 })],
    [() => effectiveSize({ males: 1.5, females: 2 })],
    [() => effectiveSize({ maleShares: [Number.NaN], femaleShares: [1] })],
    [() => effectiveSize({ maleShares: [-1], femaleShares: [1] })],
    [() => harmonicEffectiveSize([])],
    [() => harmonicEffectiveSize([Number.POSITIVE_INFINITY])],
    [() => effectiveSizeFromFamilies({ breeders: 4, maleVariance: -1, femaleVariance: 2 })],
    [() => inbreedingAfter({ effectiveSize: 0.2, generations: 1 })],
    [() => predictedGeneDiversity({ effectiveSize: 4, generations: 1, geneDiversity: 1.2 })],
  ])('refuses what is no size %#', (ask) => {
    expect(ask).toThrow(BadValue);
  });

  test('other family sizes than two (Crow & Kimura 1970, from memory): Poisson families give about N', () => {
    const four = effectiveSizeFromFamilies({ breeders: 10, maleVariance: 4, femaleVariance: 4, meanYoung: 4 });
    expect(four).toBeCloseTo(39 / 4, 12);
    expect(effectiveSizeFromFamilies({ breeders: 10, maleVariance: 4, femaleVariance: 4, meanYoung: 0 })).toBeNull();
    expect(effectiveSizeFromFamilies({ breeders: 1, maleVariance: 0, femaleVariance: 0, meanYoung: 0.5 })).toBeNull();
  });

  test('a group that cannot breed has no future to predict', () => {
    expect(inbreedingRate(0)).toBeNull();
    expect(inbreedingAfter({ effectiveSize: 0, generations: 3 })).toBeNull();
    expect(predictedGeneDiversity({ effectiveSize: 0, generations: 3 })).toBeNull();
  });
});

describe('What cannot be a pedigree is refused by name', () => {
  const caught = (pedigree: PedigreeEntry[]): PedigreeError => {
    try {
      kinship(pedigree);
    } catch (error) {
      if (error instanceof PedigreeError) return error;
    }
    throw new Error('Nothing was refused');
  };

  test('a fish that is its own ancestor, through a possible sire as well', () => {
    const ring = caught([child('a', 'c', null), child('b', 'a', null), child('c', 'b', null), child('d', 'c', null)]);
    expect(ring.reason).toBe('cycle');
    expect([...ring.ids].sort()).toEqual(['a', 'b', 'c']);
    expect(ring.message).toContain('would be its own ancestor');
    const through = caught([
      child('a', null, 'b'),
      { id: 'b', sire: oneOf('k', ['a', 1], [null, 1]), dam: unknown },
      child('c', 'a', 'b'),
    ]);
    expect(through.reason).toBe('cycle');
    expect([...through.ids].sort()).toEqual(['a', 'b']);
    expect(caught([child('a', 'a', null)]).ids).toEqual(['a']);
  });

  test('a brood that may descend from its own fry', () => {
    const sire = oneOf('brood', ['fry1', 1], ['m', 1]);
    const error = caught([...wild('m'), { id: 'fry1', sire, dam: unknown }, { id: 'fry2', sire, dam: unknown }]);
    expect([error.reason, error.ids]).toEqual(['cycle', ['fry1']]);
  });

  test.each<[string, PedigreeEntry[], string, string[]]>([
    ['an id that stands twice', wild('a', 'b', 'a'), 'duplicateId', ['a']],
    ['a parent that is not there', [child('a', 'ghost', null)], 'unknownId', ['ghost']],
    ['a candidate that is not there', [{ id: 'a', sire: mixed(['ghost', 1]), dam: unknown }], 'unknownId', ['ghost']],
    ['a weight of zero', [...wild('m'), { id: 'a', sire: mixed(['m', 0]), dam: unknown }], 'badWeight', ['a']],
    [
      'a weight below zero',
      [...wild('m'), { id: 'a', sire: oneOf('k', ['m', -1], [null, 3]), dam: unknown }],
      'badWeight',
      ['a'],
    ],
    [
      'a weight that is no number',
      [...wild('m'), { id: 'a', sire: unknown, dam: mixed(['m', Number.NaN]) }],
      'badWeight',
      ['a'],
    ],
    [
      'an endless weight',
      [...wild('m'), { id: 'a', sire: mixed(['m', Number.POSITIVE_INFINITY]), dam: unknown }],
      'badWeight',
      ['a'],
    ],
    ['a pair of no weight', [{ id: 'a', from: [{ sire: unknown, dam: unknown, weight: 0 }] }], 'badWeight', ['a']],
    ['no candidates', [{ id: 'a', sire: mixed(), dam: unknown }], 'noCandidates', ['a']],
    ['no pairs', [{ id: 'a', from: [] }], 'noCandidates', ['a']],
    [
      'one key for two sets of fish',
      [
        ...wild('m', 'n'),
        { id: 'a', sire: oneOf('k', ['m', 1]), dam: unknown },
        { id: 'b', sire: oneOf('k', ['n', 1]), dam: unknown },
      ],
      'keyConflict',
      ['k'],
    ],
    [
      'one key with other shares',
      [
        ...wild('m', 'n'),
        { id: 'a', sire: oneOf('k', ['m', 1], ['n', 1]), dam: unknown },
        { id: 'b', sire: oneOf('k', ['m', 2], ['n', 1]), dam: unknown },
      ],
      'keyConflict',
      ['k'],
    ],
  ])('%s', (_, pedigree, reason, ids) => {
    const error = caught(pedigree);
    expect([error.reason, error.ids]).toEqual([reason, ids]);
    expect(error.message).toContain(ids[0]);
  });

  test('the same key with the same shares, otherwise spelled, is one animal', () => {
    const pedigree: PedigreeEntry[] = [
      ...wild('m', 'n'),
      { id: 'a', sire: oneOf('k', ['m', 1], ['n', 3]), dam: unknown },
      { id: 'b', sire: oneOf('k', ['n', 0.5], ['m', 0.25], ['n', 0.25]), dam: unknown },
    ];
    expect(kinship(pedigree).between('a', 'b')).toBe(0.125);
  });

  test('a table or a list of outcomes beyond what memory holds, before it is begun', () => {
    const line: PedigreeEntry[] = [
      ...wild('0', 'x'),
      { id: '1', sire: oneOf('k', ['0', 1], ['x', 1]), dam: unknown },
      ...Array.from({ length: 16_500 }, (_, t) => child(`${t + 2}`, `${t + 1}`, null)),
    ];
    expect(caught(line).reason).toBe('tooLarge');
    expect(() => inbreedingOutcomes(line, '16501')).toThrow(
      expect.objectContaining({ reason: 'tooLarge', ids: ['16501'] }),
    );
    expect(kinship(line, ['16501', '16500']).between('16501', '16500')).toBe(0.25);
  });

  test('a possible parent born on the day of its young, or later', () => {
    const pedigree = [...wild('m', 'n', 'd'), { id: 'brood', sire: oneOf('k', ['m', 1], ['n', 1]), dam: known('d') }];
    const born = (m: string, n: string) =>
      new Map([
        ['m', { bornOn: m }],
        ['n', { bornOn: n }],
        ['d', {}],
        ['brood', { bornOn: '2026-03-02' }],
      ]);
    expect(() => checkBirths(pedigree, born('2024-01-01', '2026-03-01'))).not.toThrow();
    expect(() => checkBirths(pedigree, born('2024-01-01', '2026-03-02'))).toThrow(
      expect.objectContaining({ reason: 'bornAfter', ids: ['brood', 'n'] }),
    );
  });

  test('selfing and a parent of the other sex are questions, not errors', () => {
    const pedigree = [
      ...wild('m', 'd'),
      child('a', 'm', 'm'),
      { id: 'b', sire: oneOf('k', ['d', 1], ['m', 1]), dam: known('m') },
    ];
    const sexes = new Map([
      ['m', { sex: 'male' as const }],
      ['d', { sex: 'female' as const }],
    ]);
    expect(inbreeding(pedigree).get('a')).toBe(0.5);
    expect(doubtsOf(pedigree, sexes)).toEqual([
      { doubt: 'selfing', child: 'a', parent: 'm' },
      { doubt: 'sex', child: 'a', parent: 'm' },
      { doubt: 'sex', child: 'b', parent: 'd' },
      { doubt: 'sex', child: 'b', parent: 'm' },
    ]);
  });
});
