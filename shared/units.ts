import * as z from 'zod/mini';

/*
 * What is stored, in the unit it is stored in. Screens convert from these to each person's choice; nothing else is ever
 * written to the database. Lengths and money are whole numbers, so that sums never drift.
 */

/** Body length in tenths of a millimetre: 32.5 mm is 325. */
export const TenthsMm = z
  .number('Type a length such as 32.5')
  .check(
    z.int('One decimal of a millimetre is enough'),
    z.minimum(1, 'Must be above zero'),
    z.maximum(20_000, 'That is over two metres'),
  )
  .brand<'TenthsMm'>();
export type TenthsMm = z.output<typeof TenthsMm>;

/** A side of a tank, in tenths of a millimetre. */
export const SideTenthsMm = z
  .number('Type a length such as 120')
  .check(
    z.int('One decimal of a millimetre is enough'),
    z.minimum(1, 'Must be above zero'),
    z.maximum(200_000, 'That is over 20 metres'),
  )
  .brand<'SideTenthsMm'>();
export type SideTenthsMm = z.output<typeof SideTenthsMm>;

export const Litres = z
  .number('Type a volume such as 450')
  .check(z.gt(0, 'Must be above zero'), z.maximum(1_000_000, 'That is over a million litres'))
  .brand<'Litres'>();
export type Litres = z.output<typeof Litres>;

export const Celsius = z
  .number('Type a temperature such as 26.0')
  .check(z.minimum(0, 'That is below freezing'), z.maximum(45, 'That is over 45 °C (113 °F)'))
  .brand<'Celsius'>();
export type Celsius = z.output<typeof Celsius>;

export const Ph = z
  .number('Type a pH such as 8.2')
  .check(z.minimum(0, 'pH runs from 0 to 14'), z.maximum(14, 'pH runs from 0 to 14'))
  .brand<'Ph'>();
export type Ph = z.output<typeof Ph>;

/** Mass of nitrogen in mg/L: total ammonia, nitrite and nitrate are all stored as N, whatever the kit prints. */
export const NitrogenMgL = z
  .number('Type a reading such as 0.25')
  .check(z.minimum(0, 'Zero or more'), z.maximum(1000, 'That is off any kit’s scale'))
  .brand<'NitrogenMgL'>();
export type NitrogenMgL = z.output<typeof NitrogenMgL>;

/** General or carbonate hardness as mg/L of calcium carbonate. */
export const CaCo3MgL = z
  .number('Type a hardness such as 12')
  .check(z.minimum(0, 'Zero or more'), z.maximum(10_000, 'That is off any kit’s scale'))
  .brand<'CaCo3MgL'>();
export type CaCo3MgL = z.output<typeof CaCo3MgL>;

/** Electrical conductivity in µS/cm. */
export const MicroSiemens = z
  .number('Type a conductivity such as 620')
  .check(z.minimum(0, 'Zero or more'), z.maximum(100_000, 'That is saltier than the sea'))
  .brand<'MicroSiemens'>();
export type MicroSiemens = z.output<typeof MicroSiemens>;

export const Grams = z
  .number('Type a weight such as 14.2')
  .check(z.gt(0, 'Must be above zero'), z.maximum(50_000, 'That is over 50 kg'))
  .brand<'Grams'>();
export type Grams = z.output<typeof Grams>;

/** A percentage, 0 to 100: water changed, rations. */
export const Percent = z
  .number('Type a percentage such as 50')
  .check(z.minimum(0, 'Zero or more'), z.maximum(100, 'At most 100'))
  .brand<'Percent'>();
export type Percent = z.output<typeof Percent>;

/** What one person reads and types. Kept with the account; the kit's units are what is printed on the kit. */
export const UnitChoices = z.object({
  length: z.enum(['cm', 'in'], 'Choose cm or in'),
  temperature: z.enum(['C', 'F'], 'Choose °C or °F'),
  volume: z.enum(['L', 'usGal', 'impGal'], 'Choose litres or gallons'),
  hardness: z.enum(['dGH', 'ppm'], 'Choose degrees or ppm'),
  ammoniaAs: z.enum(['N', 'NH3', 'NH4'], 'Choose what the kit measures as'),
  nitriteAs: z.enum(['N', 'NO2'], 'Choose what the kit measures as'),
  nitrateAs: z.enum(['N', 'NO3'], 'Choose what the kit measures as'),
});
export type UnitChoices = z.output<typeof UnitChoices>;

export const METRIC: UnitChoices = {
  length: 'cm',
  temperature: 'C',
  volume: 'L',
  hardness: 'dGH',
  ammoniaAs: 'NH4',
  nitriteAs: 'NO2',
  nitrateAs: 'NO3',
};

export const US: UnitChoices = { ...METRIC, length: 'in', temperature: 'F', volume: 'usGal', hardness: 'ppm' };

/** Exact by definition: international inch and pound (1959), US gallon of 231 cubic inches, imperial gallon (1985). */
export const MM_PER_INCH = 25.4;
export const LITRES_PER_US_GALLON = 3.785411784;
export const LITRES_PER_IMPERIAL_GALLON = 4.54609;
export const KG_PER_POUND = 0.45359237;

/** mg/L of calcium carbonate in one German degree: 10 mg/L of CaO, times M(CaCO3) / M(CaO) = 100.0869 / 56.0774. */
const CACO3_PER_DEGREE = (10 * 100.0869) / 56.0774;

/** Molar masses (IUPAC): N 14.007, H 1.008, O 15.999. Mass of the named substance that holds one gram of nitrogen. */
const PER_N = { N: 1, NH3: 17.031 / 14.007, NH4: 18.039 / 14.007, NO2: 46.005 / 14.007, NO3: 62.004 / 14.007 };

/** What a kit or a screen measures nitrogen as. */
export type NitrogenAs = keyof typeof PER_N;

export const fahrenheitOf = (celsius: number): number => (celsius * 9) / 5 + 32;
export const celsiusOf = (fahrenheit: number): number => ((fahrenheit - 32) * 5) / 9;

/** mg/L as the named substance, from mg/L as N; and back. */
export const asSubstance = (nitrogenMgL: number, as: NitrogenAs): number => nitrogenMgL * PER_N[as];
export const asNitrogen = (mgL: number, as: NitrogenAs): number => mgL / PER_N[as];

/** German degrees (dGH, dKH) from mg/L of calcium carbonate; and back. */
export const degreesOf = (caCo3MgL: number): number => caCo3MgL / CACO3_PER_DEGREE;
export const caCo3Of = (degrees: number): number => degrees * CACO3_PER_DEGREE;

/** mg/L of calcium carbonate from mmol/L of alkaline earths, as European water suppliers print it: M(CaCO3) = 100.0869. */
export const caCo3FromMillimoles = (millimolesPerL: number): number => millimolesPerL * 100.0869;

/** Litres in one unit of the person's choice. */
export const LITRES_PER = { L: 1, usGal: LITRES_PER_US_GALLON, impGal: LITRES_PER_IMPERIAL_GALLON } as const;

/** Tenths of a millimetre in one unit of the person's choice. */
export const TENTHS_MM_PER = { cm: 100, in: MM_PER_INCH * 10 } as const;
