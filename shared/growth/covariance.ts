/** Symmetric three by three: final length, K a day, origin in days. A fixed origin has zeros. */
export type Covariance = [Row, Row, Row];
export type Row = [number, number, number];

const GONE = 1e-13;

/**
 * Inverse of a symmetric positive 3 x 3 matrix, scaled to a unit diagonal first, since the parameters' units differ by
 * many powers of ten. The third row and column are left out, and come back as zeros, when `third` is false. Null when
 * singular.
 */
export function inverseOf(m: Covariance, third = true): Covariance | null {
  const [s0, s1] = [Math.sqrt(m[0][0]), Math.sqrt(m[1][1])];
  const s2 = third ? Math.sqrt(m[2][2]) : 1;
  if (!(s0 > 0 && s1 > 0 && s2 > 0)) return null;
  const a = m[0][1] / (s0 * s1);
  const [b, c] = third ? [m[0][2] / (s0 * s2), m[1][2] / (s1 * s2)] : [0, 0];
  const determinant = 1 + 2 * a * b * c - a * a - b * b - c * c;
  if (!(determinant > GONE)) return null;
  const at = (cofactor: number, p: number, q: number) => cofactor / (determinant * p * q);
  const [v01, v02, v12] = [at(b * c - a, s0, s1), at(a * c - b, s0, s2), at(a * b - c, s1, s2)];
  return [
    [at(1 - c * c, s0, s0), v01, v02],
    [v01, at(1 - b * b, s1, s1), v12],
    [v02, v12, third ? at(1 - a * a, s2, s2) : 0],
  ];
}

/** Variance of a figure with this gradient. Rounding may leave it a hair below zero. */
export function varianceAlong([g0, g1, g2]: Row, v: Covariance): number {
  const own = g0 * g0 * v[0][0] + g1 * g1 * v[1][1] + g2 * g2 * v[2][2];
  return Math.max(0, own + 2 * (g0 * g1 * v[0][1] + g0 * g2 * v[0][2] + g1 * g2 * v[1][2]));
}
