import { type Covariance, type Row, varianceAlong } from './covariance';
import { type GrowthModel, SHAPES } from './shapes';

/** A fitted curve as plain data, to be stored, sent and drawn. Days count from the spawn. */
export type GrowthCurve = {
  model: GrowthModel;
  linfMm: number;
  kPerDay: number;
  /** Von Bertalanffy's age at length zero, or the age at the bend of the other two. */
  originDays: number;
  /** Of final length, K a day and origin, in that order. */
  covariance: Covariance;
  /** Spread of single fish about the curve: everywhere, or where the mean is `typicalMm` if it grows with the mean. */
  residualSdMm: number;
  typicalMm: number | null;
  /** Degrees of freedom of the residual. */
  freedom: number;
};

const uAt = ({ kPerDay, originDays }: GrowthCurve, ageDays: number) => -kPerDay * (ageDays - originDays);

export function meanLength(curve: GrowthCurve, ageDays: number): number {
  return curve.linfMm * SHAPES[curve.model].g(uAt(curve, ageDays));
}

/** How the mean length at an age moves with final length, K and origin. */
function gradientAt(curve: GrowthCurve, ageDays: number): Row {
  const shape = SHAPES[curve.model];
  const u = uAt(curve, ageDays);
  const g = shape.g(u);
  const slope = curve.linfMm * shape.slope(u, g);
  return [g, -slope * (ageDays - curve.originDays), slope * curve.kPerDay];
}

/** Standard error of the mean length at an age, mm: the delta method (Seber & Wild 1989, Nonlinear Regression, 5.1). */
export const standardErrorAt = (curve: GrowthCurve, ageDays: number): number =>
  Math.sqrt(varianceAlong(gradientAt(curve, ageDays), curve.covariance));

/** Standard deviation of single fish about the curve at an age, mm. */
export function residualSdAt(curve: GrowthCurve, ageDays: number): number {
  const { residualSdMm, typicalMm } = curve;
  return typicalMm === null ? residualSdMm : (residualSdMm * Math.max(0, meanLength(curve, ageDays))) / typicalMm;
}

/** Gain in mm a day at an age. */
export const gainAt = (curve: GrowthCurve, ageDays: number): number => -gradientAt(curve, ageDays)[2];

/** Age at which the mean reaches a length; null at or beyond the final length, or at none. */
export function ageWhen(curve: GrowthCurve, lengthMm: number): number | null {
  const share = lengthMm / curve.linfMm;
  if (!(share > 0 && share < 1)) return null;
  return curve.originDays - SHAPES[curve.model].inverse(share) / curve.kPerDay;
}
