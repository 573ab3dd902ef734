import { finite } from '../badValue';

/** Natural logarithm of oxygen in saturated fresh water at 1 atm, by absolute temperature. */
const lnSaturation = (kelvin: number) =>
  -139.34411 + 1.575701e5 / kelvin - 6.642308e7 / kelvin ** 2 + 1.2438e10 / kelvin ** 3 - 8.621949e11 / kelvin ** 4;

/**
 * Oxygen in mg/L that fresh water holds in balance with moist air at `celsius` and `atmospheres`: Benson & Krause 1980 and
 * 1984 as in APHA Standard Methods 4500-O. Throws `BadValue` outside 0 to 40 °C or 0.5 to 1.1 atm.
 */
export function oxygenSaturation(celsius: number, atmospheres = 1): number {
  const t = finite('Temperature', celsius, { min: 0, max: 40 });
  const p = finite('Air pressure', atmospheres, { min: 0.5, max: 1.1 });
  const kelvin = t + 273.15;
  const vapour = Math.exp(11.8571 - 3840.7 / kelvin - 216961 / kelvin ** 2);
  const theta = 0.000975 - 1.426e-5 * t + 6.436e-8 * t ** 2;
  const pressed = (p * (1 - vapour / p) * (1 - theta * p)) / ((1 - vapour) * (1 - theta));
  return Math.exp(lnSaturation(kelvin)) * pressed;
}

/** Oxygen as a share of saturation: 1 is full. */
export function oxygenShare(oxygenMgL: number, celsius: number, atmospheres = 1): number {
  return finite('Oxygen', oxygenMgL, { min: 0 }) / oxygenSaturation(celsius, atmospheres);
}

/**
 * Carbon dioxide in mg/L from carbonate hardness in degrees and pH: 3 KH 10^(7 - pH). Approximate: it takes all alkalinity
 * to be carbonate. Common practice, no source.
 */
export function carbonDioxide(carbonateDegrees: number, ph: number): number {
  return (
    3 * finite('Carbonate hardness', carbonateDegrees, { min: 0 }) * 10 ** (7 - finite('pH', ph, { min: 0, max: 14 }))
  );
}
