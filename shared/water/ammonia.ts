import { finite } from '../badValue';

/** Acid constant of ammonium in fresh water at `celsius`: Emerson, Russo, Lund & Thurston 1975, J Fish Res Board Can 32. */
export function ammoniaPka(celsius: number): number {
  return 0.09018 + 2729.92 / (273.15 + finite('Temperature', celsius, { min: 0, max: 50 }));
}

/**
 * The un-ionised, poisonous part of total ammonia in fresh water: as a fraction, and in mg/L as nitrogen like the total.
 * f = 1 / (10^(pKa - pH) + 1), Emerson et al. 1975, valid from 0 to 50 °C; not for brackish water, where it is lower.
 * Throws `BadValue` for a reading outside its scale.
 */
export function unionisedAmmonia(water: { totalAmmoniaNMgL: number; ph: number; celsius: number }): {
  fraction: number;
  mgL: number;
} {
  const total = finite('Total ammonia', water.totalAmmoniaNMgL, { min: 0 });
  const ph = finite('pH', water.ph, { min: 0, max: 14 });
  const fraction = 1 / (10 ** (ammoniaPka(water.celsius) - ph) + 1);
  return { fraction, mgL: total * fraction };
}

/**
 * Limits for un-ionised ammonia in mg/L as N. From 0.02 it may be toxic (rule of thumb in aquaculture); above 0.05 it harms
 * gills (Francis-Floyd & Watson, University of Florida IFAS FA-16).
 */
export const UNIONISED_LIMITS = { look: 0.02, act: 0.05 } as const;
