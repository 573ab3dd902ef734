import { finite } from '../badValue';

/**
 * Fulton's condition factor 100 W / L^3, grams and centimetres, from grams and mm. About 1 to 2 for deep-bodied fish;
 * total and standard length give different factors, so say which. Throws `BadValue` unless both are above zero. (Froese
 * 2006, J Appl Ichthyol 22:241.)
 */
export function fultonK(weightG: number, lengthMm: number): number {
  return (100 * finite('Weight', weightG, { above: 0 })) / (finite('Length', lengthMm, { above: 0 }) / 10) ** 3;
}

type LengthWeightRelation = { a: number; b: number };

/**
 * Relative condition W / (a L^b): 1 is the weight usual for the length (Le Cren 1951, J Anim Ecol 20:201). Grams and
 * mm; the relation's a and b are in grams and centimetres. Throws `BadValue`.
 */
export function relativeCondition(weightG: number, lengthMm: number, { a, b }: LengthWeightRelation): number {
  const lengthCm = finite('Length', lengthMm, { above: 0 }) / 10;
  const usual = finite('Length-weight factor', a, { above: 0 }) * lengthCm ** finite('Length-weight exponent', b);
  return finite('Weight', weightG, { above: 0 }) / usual;
}

/** Mean Fulton factor at a length that a relation implies: 100 a L^(b - 3), L in cm, given in mm (Froese 2006). */
export function meanCondition(lengthMm: number, { a, b }: LengthWeightRelation): number {
  const lengthCm = finite('Length', lengthMm, { above: 0 }) / 10;
  return 100 * finite('Length-weight factor', a, { above: 0 }) * lengthCm ** (finite('Length-weight exponent', b) - 3);
}
