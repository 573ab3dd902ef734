/** Why a curve can't be fitted: too few lengths, too few different ages, or data that no curve of the model describes. */
export type GrowthReason = 'tooFewPoints' | 'tooFewAges' | 'notIdentifiable' | 'noModel';

export class GrowthError extends Error {
  override readonly name = 'GrowthError';
  readonly reason: GrowthReason;

  constructor(reason: GrowthReason, message: string) {
    super(message);
    this.reason = reason;
  }
}
