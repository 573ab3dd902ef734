/** Why lengths do not give a curve. The words for the screen are in `words.ts`. */
export type CannotFitReason =
  /** Fewer fish than a curve has unknowns, and one. */
  | 'tooFewFish'
  /** Enough fish, but measured at too few ages. */
  | 'tooFewAges'
  /** The lengths do not rise with age. */
  | 'noGrowth'
  /** They rise in a straight line or ever faster: nothing says where growth ends, or how fast it slows. */
  | 'noCurvature'
  /** Length and weight: all fish are of one length. */
  | 'oneLength';

/** The values are good, but they cannot answer. `needed` and `there` count what is too few. */
export class CannotFit extends Error {
  override readonly name = 'CannotFit';
  readonly reason: CannotFitReason;
  readonly needed: number | null;
  readonly there: number | null;

  constructor(reason: CannotFitReason, counts: { needed: number; there: number } | null = null) {
    super(counts ? `${reason}: ${counts.needed} needed, ${counts.there} there` : reason);
    this.reason = reason;
    this.needed = counts?.needed ?? null;
    this.there = counts?.there ?? null;
  }
}
