import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import * as z from 'zod/mini';
import { BadValue } from '@/shared/badValue';
import { Heads } from '@/shared/shapes';
import {
  orBlank,
  spelledAmmonia,
  spelledGrams,
  spelledHardness,
  spelledHeads,
  spelledLength,
  spelledMm,
  spelledNitrate,
  spelledNitrite,
  spelledPercent,
  spelledPh,
  spelledSide,
  spelledTemperature,
  spelledVolume,
} from '@/shared/spelled';
import * as units from '@/shared/units';
import * as words from '@/shared/unitWords';

const { METRIC, US } = units;
const messageOf = (schema: z.ZodMiniType, value: unknown) => z.safeParse(schema, value).error?.issues[0]?.message;

describe('conversions', () => {
  // Exact definitions: 231 cubic inches, the imperial gallon, the international inch and pound (SI / NIST SP 811).
  test.each([
    ['1 US gallon in litres', units.LITRES_PER_US_GALLON, 3.785411784],
    ['1 imperial gallon in litres', units.LITRES_PER_IMPERIAL_GALLON, 4.54609],
    ['450 L in US gallons', 450 / units.LITRES_PER_US_GALLON, 118.8774235611668],
    ['78 °F in °C', units.celsiusOf(78), 25.555555555555554],
    ['-40 °C in °F', units.fahrenheitOf(-40), -40],
    ['2.5 in in cm', (2.5 * units.MM_PER_INCH) / 10, 6.35],
    ['1 lb in kg', units.KG_PER_POUND, 0.45359237],
  ])('%s', (_, got, expected) => {
    expect(Math.abs(got - expected)).toBeLessThanOrEqual(Math.abs(expected) * 1e-12);
  });

  // 1 degree = 10 mg/L CaO = 17.848 mg/L CaCO3 (molar masses 100.0869 and 56.0774); 250 mg/L is the inverse. Tolerance 1e-4.
  test('hardness in degrees and as calcium carbonate', () => {
    expect(units.caCo3Of(1)).toBeCloseTo(17.848, 3);
    expect(units.degreesOf(250)).toBeCloseTo(14.007171671896012, 3);
    expect(units.caCo3FromMillimoles(0.1783249580044724)).toBeCloseTo(17.848, 3);
    expect(units.caCo3FromMillimoles(2.497829386263337)).toBeCloseTo(250, 3);
  });

  // Kits differ by these factors: N to NH3 1.216, N to NH4 1.288, NO2 3.28, NO3 4.43 (molar masses).
  test.each([
    ['NH3', 1.216],
    ['NH4', 1.288],
    ['NO2', 3.284],
    ['NO3', 4.427],
  ] as const)('1 mg/L of nitrogen as %s is %f', (as, expected) => {
    expect(units.asSubstance(1, as)).toBeCloseTo(expected, 3);
  });

  test('come back unchanged', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 5000, noNaN: true }), (value) => {
        const near = (got: number) => expect(Math.abs(got - value)).toBeLessThanOrEqual(1e-9 * Math.max(1, value));
        near(units.celsiusOf(units.fahrenheitOf(value)));
        near(units.caCo3Of(units.degreesOf(value)));
        for (const as of ['N', 'NH3', 'NH4', 'NO2', 'NO3'] as const)
          near(units.asNitrogen(units.asSubstance(value, as), as));
      }),
    );
  });
});

describe('typed numbers', () => {
  test.each([
    ['32.5', 325],
    ['32,5', 325],
    [' 32 ', 320],
    ['0.1', 1],
    ['2000', 20_000],
  ])('%s mm is stored as %i tenths', (text, tenths) => {
    expect(z.decode(spelledMm, text)).toBe(tenths);
  });

  test.each(['0x10', '1e3', '-3', '+3', '1,234.5', '1.2.3', '3 2', '32.55', 'abc', '٣٢', 'Infinity', '½'])(
    '%s is refused with an example',
    (text) => {
      expect(messageOf(spelledMm, text)).toBe('Type a length such as 32.5');
    },
  );

  test.each([
    ['', 'Type a length'],
    ['   ', 'Type a length'],
    [undefined, 'Type a length'],
    [null, 'Type a length'],
    ['0', 'Must be above zero'],
    ['2001', 'That is over two metres'],
  ])('%j is answered with "%s"', (text, message) => {
    expect(messageOf(spelledMm, text)).toBe(message);
  });

  test.each([
    ['centimetres', spelledLength(METRIC), '3,25', 325],
    ['inches', spelledLength(US), '1.28', 325],
    ['tank side in inches', spelledSide(US), '48', 12_192],
    ['degrees Celsius', spelledTemperature(METRIC), '26,5', 26.5],
    ['degrees Fahrenheit', spelledTemperature(US), '78', 25.555555555555554],
    ['US gallons', spelledVolume(US), '125', 473.176473],
    ['imperial gallons', spelledVolume({ ...US, volume: 'impGal' }), '100', 454.609],
    ['ppm', spelledHardness(US), '250', 250],
    ['ammonia as N', spelledAmmonia({ ...METRIC, ammoniaAs: 'N' }), '0.25', 0.25],
    ['pH', spelledPh, '8.25', 8.25],
    ['grams', spelledGrams, '0,35', 0.35],
    ['percent', spelledPercent, '50', 50],
    ['heads', spelledHeads(Heads), '12', 12],
  ])('%s', (_, schema, text, stored) => {
    expect(z.decode(schema, text)).toBeCloseTo(stored, 9);
  });

  test('a kit reading as an ion is stored as nitrogen', () => {
    expect(z.decode(spelledAmmonia(METRIC), '1.288')).toBeCloseTo(1, 3);
    expect(z.decode(spelledNitrite(METRIC), '3.284')).toBeCloseTo(1, 3);
    expect(z.decode(spelledNitrate(METRIC), '44.27')).toBeCloseTo(10, 2);
  });

  test('half a fish is refused', () => {
    expect(messageOf(spelledHeads(Heads), '1.5')).toBe('Type how many such as 12');
  });

  test('every stored length comes back from what is shown, in cm and in inches', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 20_000 }), (tenths) => {
        for (const field of [spelledMm, spelledLength(METRIC), spelledLength(US)]) {
          expect(z.decode(field, z.encode(field, z.parse(units.TenthsMm, tenths)))).toBe(tenths);
        }
      }),
    );
  });

  test('what was typed is shown again, whatever the unit', () => {
    const fields = [
      spelledTemperature(METRIC),
      spelledTemperature(US),
      spelledVolume(US),
      spelledHardness(METRIC),
      spelledHardness(US),
      spelledAmmonia(METRIC),
      spelledNitrate(METRIC),
    ];
    fc.assert(
      fc.property(fc.integer({ min: 321, max: 1130 }), (tenths) => {
        for (const field of fields) {
          if (field === fields[0] && tenths > 450) continue; // over 45 °C is refused
          const typed = String(tenths / 10);
          expect(z.encode(field, z.decode(field, typed))).toBe(typed);
        }
      }),
    );
  });

  test('an optional field may stay empty, and says what is wrong when it is not', () => {
    const field = orBlank(spelledPh);
    expect(z.decode(field, '')).toBeNull();
    expect(z.decode(field, undefined)).toBeNull();
    expect(z.decode(field, '8,2')).toBe(8.2);
    expect(z.encode(field, null)).toBe('');
    expect(messageOf(field, '82')).toBe('pH runs from 0 to 14');
    expect(messageOf(field, 'hard')).toBe('Type a pH such as 8.2');
  });
});

test.each([
  ['32.5 mm', words.formatMm(325)],
  ['32 mm', words.formatMm(320)],
  ['3.3 cm', words.formatLength(325, METRIC)],
  ['1.28 in', words.formatLength(325, US)],
  ['120 cm', words.formatSide(12_000, METRIC)],
  ['47.2 in', words.formatSide(12_000, US)],
  ['26.0 °C', words.formatTemperature(26, METRIC)],
  ['78.8 °F', words.formatTemperature(26, US)],
  ['0.0 °C', words.formatTemperature(-0.01, METRIC)],
  ['3.6 °F', words.formatDegrees(2, US)],
  ['24 to 26.5 °C', words.formatTemperatures([24, 26.5], METRIC)],
  ['75 to 80 °F', words.formatTemperatures([24, 26.5], US)],
  ['450 L', words.formatVolume(450, METRIC)],
  ['125 US gal', words.formatVolume(473.176473, US)],
  ['7.5 L', words.formatVolume(7.5, METRIC)],
  ['12 dGH', words.formatHardness(units.caCo3Of(12), 'GH', METRIC)],
  ['250 ppm KH', words.formatHardness(250, 'KH', US)],
  ['pH 8.2', words.formatPh(8.2)],
  ['0.25 mg/L as N', words.formatAmmonia(0.25, { ...METRIC, ammoniaAs: 'N' })],
  ['0.32 mg/L as NH4', words.formatAmmonia(0.25, METRIC)],
  ['20 mg/L as NO3', words.formatNitrate(units.asNitrogen(20, 'NO3'), METRIC)],
  ['0.10 mg/L as NO2', words.formatNitrite(units.asNitrogen(0.1, 'NO2'), METRIC)],
  ['0.35 g', words.formatWeight(0.35)],
  ['14.2 g', words.formatWeight(14.2)],
  ['319 kg', words.formatMass(319.3, METRIC)],
  ['704 lb', words.formatMass(319.3, US)],
  ['532 kg/m²', words.formatFloorLoad(532.24, METRIC)],
  ['109 lb/ft²', words.formatFloorLoad(532.24, US)],
  ['620 µS/cm', words.formatConductivity(620)],
  ['50 %', words.formatPercent(50)],
])('reads %s', (expected, got) => {
  expect(got).toBe(expected);
});

test('what is not a number is never shown', () => {
  expect(() => words.formatTemperature(Number.NaN, METRIC)).toThrow(BadValue);
  expect(() => words.formatVolume(Number.POSITIVE_INFINITY, US)).toThrow('Volume');
});
