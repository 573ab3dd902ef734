import { finite } from './badValue';
import {
  asSubstance,
  degreesOf,
  fahrenheitOf,
  KG_PER_POUND,
  LITRES_PER,
  MM_PER_INCH,
  TENTHS_MM_PER,
  type UnitChoices,
} from './units';

/*
 * Stored values in the words and units of the person reading. Numbers keep a point and are never grouped.
 */

const UNIT_NAMES = {
  cm: 'cm',
  in: 'in',
  C: '°C',
  F: '°F',
  L: 'L',
  usGal: 'US gal',
  impGal: 'imp gal',
} as const;

function fixed(what: string, value: number, decimals: number): string {
  const text = finite(what, value).toFixed(decimals);
  return Number(text) === 0 ? text.replace('-', '') : text;
}

/** Without trailing zeros: "32.5", "32". */
function short(what: string, value: number, decimals: number): string {
  return String(Number(fixed(what, value, decimals)));
}

/** "32.5 mm": keypads and samples, whatever the person's unit. */
export const formatMm = (tenthsMm: number): string => `${short('Length', tenthsMm / 10, 1)} mm`;

/** "3.3 cm" or "1.28 in". */
export function formatLength(tenthsMm: number, { length }: UnitChoices): string {
  return `${fixed('Length', tenthsMm / TENTHS_MM_PER[length], length === 'cm' ? 1 : 2)} ${UNIT_NAMES[length]}`;
}

/** "120 cm" or "47.2 in". */
export function formatSide(tenthsMm: number, { length }: UnitChoices): string {
  return `${short('Length', tenthsMm / TENTHS_MM_PER[length], 1)} ${UNIT_NAMES[length]}`;
}

/** "26.0 °C" or "78.8 °F". */
export function formatTemperature(celsius: number, { temperature }: UnitChoices): string {
  return `${fixed('Temperature', temperature === 'C' ? celsius : fahrenheitOf(celsius), 1)} ${UNIT_NAMES[temperature]}`;
}

/** A difference: "2 °C" is "3.6 °F". */
export function formatDegrees(celsiusApart: number, { temperature }: UnitChoices): string {
  const apart = temperature === 'C' ? celsiusApart : (celsiusApart * 9) / 5;
  return `${short('Temperature difference', apart, 1)} ${UNIT_NAMES[temperature]}`;
}

/** "24 to 27 °C" or "75 to 81 °F". */
export function formatTemperatures([low, high]: readonly [number, number], { temperature }: UnitChoices): string {
  const [shown, decimals] = temperature === 'C' ? [(c: number) => c, 1] : [fahrenheitOf, 0];
  const [from, to] = [short('Temperature', shown(low), decimals), short('Temperature', shown(high), decimals)];
  return `${from} to ${to} ${UNIT_NAMES[temperature]}`;
}

/** "450 L", "119 US gal", "7.5 L". */
export function formatVolume(litres: number, { volume }: UnitChoices): string {
  const value = litres / LITRES_PER[volume];
  return `${short('Volume', value, value < 10 ? 1 : 0)} ${UNIT_NAMES[volume]}`;
}

/** "12 dGH" or "214 ppm GH"; the same for KH. */
export function formatHardness(caCo3MgL: number, of: 'GH' | 'KH', { hardness }: UnitChoices): string {
  if (hardness === 'ppm') return `${short('Hardness', caCo3MgL, 0)} ppm ${of}`;
  return `${short('Hardness', degreesOf(caCo3MgL), 1)} d${of}`;
}

export const formatPh = (ph: number): string => `pH ${fixed('pH', ph, 1)}`;
export const formatConductivity = (microSiemens: number): string => `${short('Conductivity', microSiemens, 0)} µS/cm`;

/** "0.25 mg/L as NH4": what the kit measures as is always said. */
export function formatAmmonia(nitrogenMgL: number, { ammoniaAs }: UnitChoices): string {
  return `${fixed('Ammonia', asSubstance(nitrogenMgL, ammoniaAs), 2)} mg/L as ${ammoniaAs}`;
}

export function formatNitrite(nitrogenMgL: number, { nitriteAs }: UnitChoices): string {
  return `${fixed('Nitrite', asSubstance(nitrogenMgL, nitriteAs), 2)} mg/L as ${nitriteAs}`;
}

export function formatNitrate(nitrogenMgL: number, { nitrateAs }: UnitChoices): string {
  return `${short('Nitrate', asSubstance(nitrogenMgL, nitrateAs), 1)} mg/L as ${nitrateAs}`;
}

/** "14.2 g", "0.35 g". */
export function formatWeight(grams: number): string {
  return `${short('Weight', grams, grams < 1 ? 2 : 1)} g`;
}

/** "319 kg", or "704 lb" for a person who reads inches. */
export function formatMass(kg: number, { length }: UnitChoices): string {
  return length === 'cm' ? `${short('Weight', kg, 0)} kg` : `${short('Weight', kg / KG_PER_POUND, 0)} lb`;
}

const METRES_PER_FOOT = (12 * MM_PER_INCH) / 1000;

/** "532 kg/m²", or "109 lb/ft²" for a person who reads inches. */
export function formatFloorLoad(kgPerM2: number, { length }: UnitChoices): string {
  if (length === 'cm') return `${short('Floor load', kgPerM2, 0)} kg/m²`;
  return `${short('Floor load', (kgPerM2 * METRES_PER_FOOT ** 2) / KG_PER_POUND, 0)} lb/ft²`;
}

/** "50 %", "12.5 %". */
export const formatPercent = (percent: number): string => `${short('Percentage', percent, 1)} %`;
