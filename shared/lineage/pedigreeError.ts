export type PedigreeFault =
  | 'cycle'
  | 'duplicateId'
  | 'unknownId'
  | 'badWeight'
  | 'noCandidates'
  | 'keyConflict'
  | 'bornAfter'
  | 'noAnimals'
  | 'badGeneration'
  | 'bothSexes'
  | 'noGroupFits'
  | 'noGroupFound'
  | 'tooLarge';

/** A pedigree, or a question about one, that has no answer. `ids` names the animals (or the keys) it is about. */
export class PedigreeError extends Error {
  override readonly name = 'PedigreeError';
  readonly reason: PedigreeFault;
  readonly ids: string[];

  constructor(reason: PedigreeFault, ids: string[], message: string) {
    super(message);
    this.reason = reason;
    this.ids = ids;
  }
}

export const unknownId = (id: string, where = 'the pedigree'): PedigreeError =>
  new PedigreeError('unknownId', [id], `${id} is not in ${where}. Add it, or record that parent as unknown`);

export const noAnimals = (what: string): PedigreeError =>
  new PedigreeError('noAnimals', [], `Choose at least one fish: ${what} of no fish cannot be worked out`);

/** `ring` in order: each is a parent of the one before it, and the first of the last. */
export const cycle = (ring: string[]): PedigreeError =>
  new PedigreeError(
    'cycle',
    ring,
    `${ring[0]} would be its own ancestor: ${[...ring, ring[0]].join(', child of ')}. Correct one of these parents`,
  );
