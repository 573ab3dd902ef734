import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { LIBRARY, librarySpecies, profileOf } from '@/shared/species/library';
import { FLOOR_CAUTION, floorLoad } from '@/shared/tanks/floorLoad';
import { ration, rationGuide } from '@/shared/tanks/ration';
import type { TankResident } from '@/shared/tanks/resident';
import { stockingCheck } from '@/shared/tanks/stockingCheck';
import { METRIC, US } from '@/shared/units';

const profiles = LIBRARY.map(({ id }) => profileOf(id));

function group(
  speciesId: string,
  sexes: { m?: number; f?: number; u?: number },
  more: Partial<TankResident> = {},
): TankResident {
  const { m = 0, f = 0, u = 0 } = sexes;
  const name = librarySpecies(speciesId)?.name ?? speciesId;
  return {
    name,
    speciesId,
    locality: 'Ndole',
    males: m,
    females: f,
    unsexed: u,
    smallestMm: null,
    largestMm: null,
    ...more,
  };
}
const check = (litres: number, residents: TankResident[], heaterC: number | null = 25) =>
  stockingCheck({ litres, heaterC }, residents, profiles);
const said = (litres: number, residents: TankResident[], heaterC: number | null = 25) =>
  check(litres, residents, heaterC).findings.map(({ of, level }) => `${level} ${of}`);

describe('a colony of large Cyphotilapia (common practice, no source)', () => {
  const frontosa = (m: number, f: number) => [group('cyphotilapia-frontosa', { m, f })];

  test('one male with five females is right in 473 L, the smallest that serves', () => {
    expect(said(473, frontosa(1, 5))).toEqual([]);
    expect(said(470, frontosa(1, 5))).toEqual([]); // a nominal 125 US gal
  });

  test('681 L is better and holds eight', () => {
    expect(said(681, frontosa(2, 6))).toEqual([]);
  });

  test('1060 L holds fifteen', () => {
    expect(said(1060, frontosa(3, 12))).toEqual([]);
    expect(said(1060, frontosa(4, 16))).toEqual(['look crowding']);
  });

  test('a smaller tank, a smaller group and more males are each said', () => {
    expect(said(400, frontosa(1, 5))).toEqual(['look volume']);
    expect(said(200, frontosa(1, 5))).toEqual(['act volume']);
    expect(said(473, frontosa(1, 4))).toEqual(['look group']);
    expect(said(681, frontosa(3, 4))).toEqual(['look sexRatio']);
    expect(said(681, frontosa(5, 2))).toEqual(['act sexRatio']);
  });

  test('fish that fit in a mouth do not mix with them', () => {
    const { findings } = check(1000, [...frontosa(1, 5), group('cyprichromis-leptosoma', { m: 3, f: 7 })]);
    expect(findings[0]).toMatchObject({ of: 'mouths', level: 'act' });
    expect(findings[0]?.says).toBe(
      'Cyprichromis leptosoma of 100 mm fit in the mouth of Cyphotilapia frontosa of 330 mm',
    );
  });

  test('75 to 80 °F is right', () => {
    for (const fahrenheit of [75, 78, 80]) expect(said(681, frontosa(2, 6), ((fahrenheit - 32) * 5) / 9)).toEqual([]);
    expect(said(681, frontosa(2, 6), 29)).toEqual(['look temperature']);
  });

  test('is told in the reader’s units', () => {
    const { findings } = stockingCheck({ litres: 400, heaterC: null }, frontosa(1, 5), profiles, US);
    expect(findings[0]?.says).toBe('106 US gal is small for Cyphotilapia frontosa: 125 US gal at least');
  });
});

describe('the sex ratio', () => {
  const colony = (sexes: { m?: number; f?: number; u?: number }) => said(600, [group('simochromis-diagramma', sexes)]); // four females a male

  test('is not judged while unsexed fish may be the females', () => {
    expect(colony({ m: 1, f: 2, u: 5 })).toEqual([]);
    expect(colony({ m: 2, f: 2, u: 5 })).toEqual(['look sexRatio']);
  });

  test('is nobody’s business without a male, or in a group of young', () => {
    expect(colony({ f: 8 })).toEqual([]);
    const young = group('simochromis-diagramma', { m: 3, f: 1 }, { smallestMm: 40, largestMm: 50 });
    expect(said(600, [young])).toEqual([]);
  });

  test('counts two colonies of one species together', () => {
    const [one, two] = [
      group('simochromis-diagramma', { m: 1, f: 1 }),
      group('simochromis-diagramma', { f: 6 }, { name: 'second group' }),
    ];
    expect(said(600, [one, two])).toEqual([]);
  });

  test('a pair is enough for a species that lives in pairs', () => {
    expect(said(150, [group('julidochromis-marlieri', { m: 1, f: 1 })])).toEqual([]);
  });
});

describe('company', () => {
  test('a third of the length fits in a mouth, half for a fish-eater', () => {
    const big = group('simochromis-diagramma', { f: 8 }, { smallestMm: 150, largestMm: 180 });
    const fry = (mm: number) => group('tropheus-duboisi', { u: 20 }, { smallestMm: mm, largestMm: mm + 5 });
    expect(said(600, [big, fry(60)])).toEqual(['act mouths']);
    expect(said(600, [big, fry(61)])).toEqual([]);
  });

  test('young in with their own parents are a meal too', () => {
    const parents = group('maylandia-estherae', { m: 1, f: 6 });
    expect(said(300, [parents, group('maylandia-estherae', { u: 20 }, { smallestMm: 15, largestMm: 18 })])).toEqual([
      'act mouths',
    ]);
  });

  test('species of one genus, and two localities of one species, may cross', () => {
    const moorii = (locality: string | null) => group('tropheus-moorii', { m: 5, f: 10 }, { locality });
    expect(said(3000, [moorii('Ndole'), moorii('Mtosi')])).toEqual(['look hybrids']);
    expect(said(3000, [moorii('Ndole'), moorii('Ndole')])).toEqual([]);
    expect(said(3000, [moorii('Ndole'), group('tropheus-duboisi', { m: 4, f: 12 })])).toEqual(['look hybrids']);
    expect(said(3000, [moorii('Ndole'), group('simochromis-diagramma', { m: 2, f: 8 })])).toEqual([]);
  });

  test('fish whose waters do not overlap are told apart', () => {
    const { findings } = check(1000, [
      group('tropheus-moorii', { m: 5, f: 10 }),
      group('pseudocrenilabrus-multicolor', { m: 1, f: 6 }),
    ]);
    const ph = findings.find(({ of }) => of === 'ph');
    expect(ph).toMatchObject({
      level: 'act',
      says: 'No pH suits all of Tropheus moorii, Pseudocrenilabrus multicolor',
    });
  });
});

test('fry do not need the grown fish’s tank', () => {
  const fry = group('tropheus-duboisi', { u: 30 }, { smallestMm: 20, largestMm: 25 });
  expect(said(80, [fry])).toEqual([]);
});

test('an empty tank has no findings', () => {
  expect(check(100, [])).toMatchObject({ findings: [], heads: 0, biomassG: 0, gramsPer100L: 0 });
  expect(said(100, [group('tropheus-moorii', {})])).toEqual([]);
});

test('fish are weighed by their length', () => {
  // 0.018 * 10^3 g each: deep-bodied at 10 cm.
  const fish = group('tropheus-duboisi', { f: 15 }, { smallestMm: 100, largestMm: 100 });
  expect(check(500, [fish]).biomassG).toBeCloseTo(15 * 18, 9);
  expect(check(500, [fish]).gramsPer100L).toBeCloseTo(54, 9);
});

test('the order of the residents does not change what is found', () => {
  const residents = fc.shuffledSubarray(
    [
      group('tropheus-moorii', { m: 5, f: 5 }),
      group('cyprichromis-leptosoma', { m: 3, f: 7 }),
      group('cyphotilapia-frontosa', { m: 2, f: 3 }),
      group('tropheus-duboisi', { u: 20 }, { smallestMm: 25, largestMm: 40 }),
    ],
    { minLength: 4 },
  );
  const sorted = (all: string[]) => all.toSorted();
  fc.assert(
    fc.property(residents, residents, (one, other) => {
      expect(sorted(said(700, one))).toEqual(sorted(said(700, other)));
    }),
  );
});

describe('the floor', () => {
  // Geometry with glass 2500 kg/m³ (EN 572-1) and water 998.2 kg/m³: 120 x 50 x 50 cm, 10 mm glass, filled to 95 %.
  const tank = { lengthMm: 1200, widthMm: 500, heightMm: 500, fillMm: 465.5, glassMm: 10 };

  test('bears 319 kg, 532 kg/m², under a tank of 264 L', () => {
    const load = floorLoad(tank);
    for (const [got, expected] of [
      [load.waterLitres, 263.6592],
      [load.waterKg, 263.18461344],
      [load.glassKg, 56.16],
      [load.totalKg, 319.34461344],
      [load.kgPerM2, 532.2410224],
      [load.kilopascals, 5.21950142231896],
    ] as const) {
      expect(Math.abs(got - expected) / expected).toBeLessThan(1e-9);
    }
  });

  test('bears the stand and the stones too', () => {
    const more = floorLoad({ ...tank, standKg: 60, decorKg: 40 });
    expect(more.totalKg - floorLoad(tank).totalKg).toBeCloseTo(100, 9);
    expect(FLOOR_CAUTION).toContain('checked by someone qualified');
  });

  test.each([
    ['glass as thick as the tank', { glassMm: 250 }, 'Glass'],
    ['water over the rim', { fillMm: 491 }, 'Depth of the water'],
    ['a side of nothing', { lengthMm: 0 }, 'Length'],
    ['a stand that lifts', { standKg: -5 }, 'Stand'],
  ])('%s is refused by name', (_, change, what) => {
    expect(() => floorLoad({ ...tank, ...change })).toThrow(BadValue);
    expect(() => floorLoad({ ...tank, ...change })).toThrow(what);
  });
});

describe('the ration', () => {
  // Biomass times percent: 40 fish of 0.5 g at 8 % are 1.6 g a day.
  test('of 40 fish of half a gram at 8 % is 1.6 g', () => {
    const day = ration({ headCount: 40, meanLengthMm: 10 }, { a: 0.5, b: 3, percentBodyWeight: 8 });
    expect(day).toMatchObject({ meanWeightG: 0.5, biomassG: 20 });
    expect(day.gramsPerDay).toBeCloseTo(1.6, 12);
  });

  test('of uneven fish is more, since the large ones weigh so much', () => {
    // Two fish of 8 and 12 cm with b = 3: (512 + 1728) / 2 = 1120, against 1000 for two of 10 cm. cv = 0.2.
    const day = ration({ headCount: 2, meanLengthMm: 100, cv: 0.2 }, { a: 1, b: 3, percentBodyWeight: 1 });
    expect(day.meanWeightG).toBeCloseTo(1120, 9);
  });

  test('has a starting point only where one was measured', () => {
    expect(rationGuide(2, 'omnivore')).toMatchObject({ percent: [8, 9] });
    expect(rationGuide(20, 'invertebrate')).toMatchObject({ percent: [6, 7] });
    expect(rationGuide(2, 'aufwuchs')).toHaveProperty('none');
    expect(rationGuide(80, 'omnivore')).toHaveProperty('none');
  });

  test.each([
    ['half a fish', { headCount: 1.5 }, 'Head count'],
    ['fish without length', { meanLengthMm: 0 }, 'Mean length'],
  ])('for %s is refused by name', (_, change, what) => {
    expect(() => ration({ headCount: 1, meanLengthMm: 10, ...change }, { a: 1, b: 3, percentBodyWeight: 1 })).toThrow(
      what,
    );
  });
});

test.each([
  [
    'a species without a profile',
    () => stockingCheck({ litres: 100, heaterC: null }, [group('no-such-fish', { m: 1 })], []),
    'Species',
  ],
  ['a tank of nothing', () => stockingCheck({ litres: 0, heaterC: null }, [], []), 'Volume'],
  [
    'half a male',
    () => stockingCheck({ litres: 100, heaterC: null }, [group('tropheus-moorii', { m: 0.5 })], profiles, METRIC),
    'Males',
  ],
])('%s is refused by name', (_, act, what) => {
  expect(act).toThrow(BadValue);
  expect(act).toThrow(what);
});
