import * as z from 'zod/mini';
import {
  asNitrogen,
  asSubstance,
  CaCo3MgL,
  Celsius,
  caCo3Of,
  celsiusOf,
  degreesOf,
  fahrenheitOf,
  Grams,
  LITRES_PER,
  Litres,
  MicroSiemens,
  NitrogenMgL,
  Percent,
  Ph,
  SideTenthsMm,
  TENTHS_MM_PER,
  TenthsMm,
  type UnitChoices,
} from './units';

/*
 * What a keeper types, as text, and what it is stored as. "32,5" and "32.5" are the same number; signs, exponents,
 * grouped thousands and anything else are refused in words. Encoding spells a stored value back without trailing zeros.
 */

type Spelling = {
  /** Said when the field is empty: "Type a length". */
  empty: string;
  example: string;
  decimals: number;
  store?: (typed: number) => number;
  show?: (stored: number) => number;
};

const MAX_DECIMALS = 4;
const plain = (value: number, decimals: number) => String(Number(value.toFixed(decimals)));
const same = (value: number) => value;

function pattern(decimals: number): RegExp {
  return decimals === 0 ? /^\d{1,7}$/ : new RegExp(`^\\d{1,7}(?:[.,]\\d{1,${Math.min(decimals, MAX_DECIMALS)}})?$`);
}

function spelled<S extends z.core.$ZodType<unknown, number>>(shape: S, spelling: Spelling) {
  const { empty, example, decimals, store = same, show = same } = spelling;
  const typed = z
    .string(empty)
    .check(
      z.trim(),
      z.minLength(1, { error: empty, abort: true }),
      z.regex(pattern(decimals), `${empty} such as ${example}`),
    );
  return z.codec(typed, shape, {
    decode: (text) => store(Number(text.replace(',', '.'))) as z.input<S>, // a number: S takes numbers
    encode: (stored) => plain(show(stored as number), decimals), // the same the other way
  });
}

/** Body length on the keypad, always millimetres: "32.5" is 325. */
export const spelledMm = spelled(TenthsMm, {
  empty: 'Type a length',
  example: '32.5',
  decimals: 1,
  store: (mm) => Math.round(mm * 10),
  show: (tenths) => tenths / 10,
});

/** A length in the person's own unit: "3.25" cm or "1.28" in is 325. */
export const spelledLength = ({ length }: UnitChoices) => spelled(TenthsMm, lengthIn(length, 'Type a length'));

/** A side of a tank in the person's own unit. */
export const spelledSide = ({ length }: UnitChoices) => spelled(SideTenthsMm, lengthIn(length, 'Type a length'));

// A tenth of a millimetre needs two decimals in centimetres and three in inches to come back unchanged.
const lengthIn = (length: UnitChoices['length'], empty: string): Spelling => ({
  empty,
  example: length === 'cm' ? '12.5' : '4.75',
  decimals: length === 'cm' ? 2 : 3,
  store: (typed) => Math.round(typed * TENTHS_MM_PER[length]),
  show: (tenths) => tenths / TENTHS_MM_PER[length],
});

export const spelledTemperature = ({ temperature }: UnitChoices) =>
  spelled(
    Celsius,
    temperature === 'C'
      ? { empty: 'Type a temperature', example: '26.0', decimals: 1 }
      : { empty: 'Type a temperature', example: '78.5', decimals: 1, store: celsiusOf, show: fahrenheitOf },
  );

export const spelledVolume = ({ volume }: UnitChoices) =>
  spelled(Litres, {
    empty: 'Type a volume',
    example: '120',
    decimals: 1,
    store: (typed) => typed * LITRES_PER[volume],
    show: (litres) => litres / LITRES_PER[volume],
  });

/** General or carbonate hardness, in degrees or in ppm of calcium carbonate. */
export const spelledHardness = ({ hardness }: UnitChoices) =>
  spelled(
    CaCo3MgL,
    hardness === 'ppm'
      ? { empty: 'Type a hardness', example: '180', decimals: 1 }
      : { empty: 'Type a hardness', example: '12', decimals: 1, store: caCo3Of, show: degreesOf },
  );

const reading = (as: 'N' | 'NH3' | 'NH4' | 'NO2' | 'NO3', example: string) =>
  spelled(NitrogenMgL, {
    empty: 'Type a reading',
    example,
    decimals: 3,
    store: (typed) => asNitrogen(typed, as),
    show: (nitrogen) => asSubstance(nitrogen, as),
  });

/** Kit readings in what the kit is printed in; stored as nitrogen. */
export const spelledAmmonia = ({ ammoniaAs }: UnitChoices) => reading(ammoniaAs, '0.25');
export const spelledNitrite = ({ nitriteAs }: UnitChoices) => reading(nitriteAs, '0.1');
export const spelledNitrate = ({ nitrateAs }: UnitChoices) => reading(nitrateAs, '20');

export const spelledPh = spelled(Ph, { empty: 'Type a pH', example: '8.2', decimals: 2 });
export const spelledConductivity = spelled(MicroSiemens, { empty: 'Type a conductivity', example: '620', decimals: 0 });
export const spelledGrams = spelled(Grams, { empty: 'Type a weight', example: '14.2', decimals: 2 });
export const spelledPercent = spelled(Percent, { empty: 'Type a percentage', example: '50', decimals: 1 });

/** Whole fish: digits only. */
export const spelledHeads = (shape: z.core.$ZodType<number, number>) =>
  spelled(shape, { empty: 'Type how many', example: '12', decimals: 0 });

/** The same field when it may stay empty: an empty one is null. */
export function orBlank<S extends z.core.$ZodType<unknown, number>>(
  field: z.ZodMiniCodec<z.core.$ZodType<string, string>, S>,
) {
  return z.codec(z.optional(z.string()), z.nullable(field._zod.def.out), {
    decode: (text, payload) => {
      if (text === undefined || text.trim() === '') return null;
      const result = z.safeDecode(field, text);
      if (result.success) return result.data as z.input<S>; // decoded and checked above
      payload.issues.push(
        ...result.error.issues.map((issue) => ({ code: 'custom' as const, message: issue.message, input: text })),
      );
      return z.NEVER;
    },
    encode: (stored) => (stored === null ? '' : z.encode(field, stored as z.output<S>)),
  });
}
