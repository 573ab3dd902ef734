import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { profileOf } from '@/shared/species/library';
import { asNitrogen, asSubstance, METRIC, type UnitChoices, US } from '@/shared/units';
import { ammoniaPka, unionisedAmmonia } from '@/shared/water/ammonia';
import { isDemand, waterDemands } from '@/shared/water/demands';
import { carbonDioxide, oxygenSaturation, oxygenShare } from '@/shared/water/gases';
import { WATER_CHANGE_CAUTION, waterChangesFor, waterChangeTo, waterChangeWords } from '@/shared/water/waterChange';
import { type WaterTest, waterFindings } from '@/shared/water/waterFindings';

const relative = (got: number, expected: number) => Math.abs(got - expected) / Math.abs(expected);

describe('un-ionised ammonia', () => {
  // Emerson et al. 1975, recomputed; printed to four decimals in IFAS FA-16 (Francis-Floyd & Watson), last column.
  test.each([
    [7.0, 20, 0.003942201844671703, 0.0039],
    [7.0, 26, 0.006047784903705073, 0.006],
    [7.6, 24, 0.020595491993183786, 0.0206],
    [8.0, 24, 0.0501713006750931, 0.0502],
    [8.0, 28, 0.06538364802451013, 0.0654],
    [8.4, 26, 0.1325752991289691, 0.1326],
    [8.0, 6, 0.013322734287892397, 0.0133],
    [7.2, 24, 0.0083021285, 0.0083],
  ])('at pH %f and %i °C is a share of %f', (ph, celsius, expected, printed) => {
    const { fraction } = unionisedAmmonia({ totalAmmoniaNMgL: 1, ph, celsius });
    expect(relative(fraction, expected)).toBeLessThan(1e-8);
    expect(fraction).toBeCloseTo(printed, 4);
  });

  // IFAS FA-16 worked example: total 1.0 mg/L as N, 24 °C, pH 8.0 gives 0.0502 mg/L.
  test('of 1 mg/L total at 24 °C and pH 8 is 0.050 mg/L as N, 0.061 as NH3', () => {
    const { mgL } = unionisedAmmonia({ totalAmmoniaNMgL: 1, ph: 8, celsius: 24 });
    expect(relative(mgL, 0.0501713006750931)).toBeLessThan(1e-6);
    expect(relative(asSubstance(mgL, 'NH3'), 0.06100288582833659)).toBeLessThan(1e-6);
  });

  // Emerson et al. 1975.
  test.each([
    [20, 9.402545683097392],
    [25, 9.246376545363074],
  ])('has a pKa at %i °C of %f', (celsius, expected) => {
    expect(ammoniaPka(celsius)).toBeCloseTo(expected, 9);
  });

  test('rises with pH and with temperature and stays a share', () => {
    const ph = fc.double({ min: 4, max: 11, noNaN: true });
    const celsius = fc.double({ min: 1, max: 45, noNaN: true });
    fc.assert(
      fc.property(ph, celsius, (at, t) => {
        const share = (p: number, c: number) => unionisedAmmonia({ totalAmmoniaNMgL: 1, ph: p, celsius: c }).fraction;
        expect(share(at, t)).toBeGreaterThan(0);
        expect(share(at, t)).toBeLessThan(1);
        expect(share(at + 0.1, t)).toBeGreaterThan(share(at, t));
        expect(share(at, t + 1)).toBeGreaterThan(share(at, t));
      }),
    );
  });
});

describe('oxygen', () => {
  // Benson & Krause 1980/84 as in APHA 1985, recomputed; the EN 25814 table prints the last column.
  test.each([
    [0, 14.620833700217203, 14.6],
    [5, 12.77100035676946, 12.8],
    [10, 11.287947373101861, 11.3],
    [15, 10.083858341009252, 10.1],
    [18, 9.467000483482822, 9.47],
    [20, 9.092426042885567, 9.09],
    [24, 8.41823130631155, 8.42],
    [25, 8.263456697819732, 8.26],
    [27, 7.968481770887129, 7.97],
    [30, 7.55879604782573, 7.56],
  ])('at %i °C saturates at %f mg/L', (celsius, expected, printed) => {
    expect(relative(oxygenSaturation(celsius), expected)).toBeLessThan(1e-6);
    expect(Math.abs(oxygenSaturation(celsius) - printed)).toBeLessThan(0.051);
  });

  // APHA 4500-O pressure correction; formula from memory, recomputed.
  test('is less where the air is thin', () => {
    expect(relative(oxygenSaturation(25, 0.85), 6.984628640628691)).toBeLessThan(1e-6);
  });

  test('half of it is half of saturation', () => {
    expect(oxygenShare(oxygenSaturation(25) / 2, 25)).toBeCloseTo(0.5, 12);
  });

  // Common practice, no source: 3 KH 10^(7 - pH).
  test('carbon dioxide at 4 dKH and pH 7 is about 12 mg/L', () => {
    expect(carbonDioxide(4, 7)).toBeCloseTo(12, 9);
  });
});

describe('what a tank’s species ask of the water', () => {
  test('each end of a range is set by the species that is hardest to please', () => {
    const { temperatureC } = waterDemands([profileOf('tropheus-moorii'), profileOf('aulonocara-stuartgranti')]);
    expect(temperatureC).toEqual({ low: 24, high: 27, lowFor: 'Aulonocara stuartgranti', highFor: 'Tropheus moorii' });
  });

  test('no water suits a swamp fish and a rock fish of the rift', () => {
    const { ph } = waterDemands([profileOf('tropheus-moorii'), profileOf('pseudocrenilabrus-multicolor')]);
    expect(ph).toEqual({ none: 'noOverlap' });
  });

  test('an empty tank asks for nothing', () => {
    expect(Object.values(waterDemands([])).some(isDemand)).toBe(false);
  });
});

const clean: WaterTest = { celsius: 25, ph: 8.3, ghCaCo3MgL: 250, totalAmmoniaNMgL: 0, nitriteNMgL: 0, nitrateNMgL: 2 };
const asN: UnitChoices = { ...METRIC, ammoniaAs: 'N' };
const tropheus = [profileOf('tropheus-duboisi')];
const findingsOf = (test: Partial<WaterTest>, profiles = tropheus, choices = asN) =>
  waterFindings({ ...clean, ...test }, profiles, choices).map(({ of, level }) => `${level} ${of}`);

describe('findings of a water test', () => {
  test('nothing is said of good water', () => {
    expect(findingsOf({})).toEqual([]);
    expect(findingsOf({ celsius: null, ph: null, totalAmmoniaNMgL: null, nitrateNMgL: null })).toEqual([]);
  });

  test.each([
    [{ celsius: 23.5 }, 'look temperature'],
    [{ celsius: 22.5 }, 'act temperature'],
    [{ celsius: 27.5 }, 'look temperature'],
    [{ celsius: 29 }, 'act temperature'],
    [{ ph: 7.6 }, 'look ph'],
    [{ ph: 7.2 }, 'act ph'],
    [{ ghCaCo3MgL: 100 }, 'look hardness'], // 5.6 degrees
    [{ nitriteNMgL: asNitrogen(0.3, 'NO2') }, 'look nitrite'],
    [{ nitriteNMgL: asNitrogen(1, 'NO2') }, 'act nitrite'],
    [{ nitrateNMgL: asNitrogen(40, 'NO3') }, 'look nitrate'],
    [{ nitrateNMgL: asNitrogen(80, 'NO3') }, 'act nitrate'],
    [{ totalAmmoniaNMgL: 0.4, ph: 8 }, 'look ammonia'], // 5.4 % of it: 0.0215
    [{ totalAmmoniaNMgL: 0.5, ph: 8.8 }, 'act ammonia'], // 26 % of it: 0.13
  ])('%j: %s', (test, expected) => {
    expect(findingsOf(test)).toContain(expected);
  });

  test('the loudest comes first', () => {
    expect(findingsOf({ celsius: 23.5, nitriteNMgL: asNitrogen(1, 'NO2') })).toEqual([
      'act nitrite',
      'look temperature',
    ]);
  });

  test('the most demanding species speaks, once', () => {
    const both = [profileOf('maylandia-estherae'), profileOf('tropheus-moorii')]; // up to 28 and up to 27 °C
    const [finding] = waterFindings({ ...clean, celsius: 28.5 }, both, METRIC);
    expect(findingsOf({ celsius: 28.5 }, both)).toEqual(['act temperature']);
    expect(finding?.says).toBe('28.5 °C is too warm for Tropheus moorii');
    expect(finding?.because).toContain('23 to 27 °C');
  });

  // Common practice, no source: pH 8.2 to 8.4 suits a large Cyphotilapia, down to 7.0 is tolerated; 75 to 80 °F.
  test.each([
    [{ ph: 8.2 }, []],
    [{ ph: 8.4 }, []],
    [{ ph: 7.0 }, ['look ph']],
    [{ ph: 6.8 }, ['act ph']],
    [{ celsius: ((75 - 32) * 5) / 9 }, []],
    [{ celsius: ((80 - 32) * 5) / 9 }, []],
    [{ celsius: ((84 - 32) * 5) / 9 }, ['act temperature']],
  ])('Cyphotilapia with %j: %j', (test, expected) => {
    expect(findingsOf(test, [profileOf('cyphotilapia-gibberosa')])).toEqual(expected);
  });
});

describe('total ammonia', () => {
  const warm = { ph: 8.8, celsius: 26 };

  test('at the kit’s first colour asks for a second test, not for an alarm', () => {
    const [finding] = waterFindings({ ...clean, ...warm, totalAmmoniaNMgL: 0.25 }, tropheus, asN);
    expect(finding).toMatchObject({ of: 'retest', level: 'look' });
    expect(finding?.says).toBe(
      'Total ammonia at the kit’s first colour: test again before acting on it. Un-ionised ammonia 0.07 mg/L as N. Limit 0.05',
    );
  });

  test('the first colour is the kit’s, in the kit’s unit', () => {
    const quarterAsNh4 = asNitrogen(0.25, 'NH4');
    expect(findingsOf({ ...warm, totalAmmoniaNMgL: quarterAsNh4 }, tropheus, METRIC)).toEqual(['look retest']);
    const kit = { firstColour: 0.1 };
    const [finding] = waterFindings({ ...clean, ...warm, totalAmmoniaNMgL: 0.25 }, tropheus, asN, kit);
    expect(finding).toMatchObject({ of: 'ammonia', level: 'act' });
  });

  test('shows its working in the kit’s unit', () => {
    const [finding] = waterFindings({ ...clean, ...warm, totalAmmoniaNMgL: 0.5 }, tropheus, US);
    expect(finding?.says).toBe('Un-ionised ammonia 0.18 mg/L as NH4. Limit 0.06');
    expect(finding?.because).toContain('total ammonia 0.64 mg/L as NH4, pH 8.8, 78.8 °F (Emerson et al. 1975)');
  });

  test('without pH or temperature says what to measure', () => {
    const [finding] = waterFindings({ ...clean, ph: null, totalAmmoniaNMgL: 1 }, tropheus, asN);
    expect(finding?.says).toBe('Total ammonia 1.00 mg/L as N: measure pH and temperature too');
  });
});

describe('the change that brings it back', () => {
  test.each([
    [20, 40, 0, 50, 1], // half of it
    [25, 40, 10, 50, 1], // (40 - 25) / (40 - 10)
    [20, 30, 5, 40, 1], // 10 / 25
    [20, 60, 0, 45, 2], // two thirds in one: twice 42.3 %
    [5, 80, 0, 50, 4], // 93.75 % in one
  ])('to %f from %f with %f in the tap: %i %% × %i', (target, tank, tap, percent, times) => {
    expect(waterChangeTo(target, { tank, tap })).toMatchObject({ percent, times });
  });

  test('cannot be, when the tap holds as much; need not be, when it is there already', () => {
    expect(waterChangeTo(20, { tank: 40, tap: 20 })).toEqual({ none: 'tapTooHigh' });
    expect(waterChangeTo(20, { tank: 20, tap: 0 })).toEqual({ none: 'notNeeded' });
  });

  test('really brings it to the target, in as many changes as it says', () => {
    const positive = fc.double({ min: 0.01, max: 100, noNaN: true });
    fc.assert(
      fc.property(positive, positive, fc.double({ min: 0, max: 1, noNaN: true }), (target, above, share) => {
        const tap = target * share * 0.9;
        const change = waterChangeTo(target, { tank: target + above, tap });
        if ('none' in change) throw new Error('a change was possible');
        let left = target + above;
        for (let i = 0; i < change.times; i += 1) left += (change.percent / 100) * (tap - left);
        expect(left).toBeLessThanOrEqual(target * (1 + 1e-9));
        expect(change.percent).toBeLessThanOrEqual(50);
      }),
    );
  });

  test('for ammonia follows from pH and temperature', () => {
    const test = { ...clean, celsius: 24, ph: 8, totalAmmoniaNMgL: 1 };
    const { ammonia, nitrite, nitrate } = waterChangesFor(test, {
      totalAmmoniaNMgL: 0,
      nitriteNMgL: null,
      nitrateNMgL: null,
    });
    // 5.017 % un-ionised, so 0.02 mg/L is left at 0.3986 of 1 mg/L: 60.1 % in one change.
    expect(ammonia).toMatchObject({ percent: 40, times: 2 });
    expect(ammonia && 'inOne' in ammonia && ammonia.inOne).toBeCloseTo(60.14, 1);
    expect([nitrite, nitrate]).toEqual([{ none: 'notNeeded' }, { none: 'notNeeded' }]);
  });

  test('reads as it would be said, with its caution', () => {
    expect(waterChangeWords({ percent: 45, times: 1, inOne: 42 })).toBe('Change 45 % of the water');
    expect(waterChangeWords({ percent: 40, times: 2, inOne: 60 })).toBe('Change 40 % twice, a day apart');
    expect(waterChangeWords({ percent: 50, times: 3, inOne: 87 })).toBe('Change 50 % 3 times, a day apart');
    expect(waterChangeWords({ none: 'tapTooHigh' })).toContain('tap water holds as much');
    expect(WATER_CHANGE_CAUTION).toContain('Unplug heater and pump');
  });
});

test.each([
  ['pH 15', () => unionisedAmmonia({ totalAmmoniaNMgL: 1, ph: 15, celsius: 25 }), 'pH'],
  ['less than no ammonia', () => unionisedAmmonia({ totalAmmoniaNMgL: -1, ph: 8, celsius: 25 }), 'Total ammonia'],
  ['boiling water', () => ammoniaPka(100), 'Temperature'],
  ['no temperature', () => oxygenSaturation(Number.NaN), 'Temperature'],
  ['a vacuum', () => oxygenSaturation(25, 0), 'Air pressure'],
  ['a negative tap value', () => waterChangeTo(20, { tank: 40, tap: -1 }), 'tap water'],
])('%s is refused by name', (_, act, what) => {
  expect(act).toThrow(BadValue);
  expect(act).toThrow(what);
});
