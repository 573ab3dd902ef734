import * as z from 'zod/mini';

/**
 * Source codes of CITES for animals, in words; the letter is never printed, since F is the coefficient and the
 * generation. A and Y are for plants. A vocabulary only: no claim that a species is listed, or that a permit was given.
 *
 * CITES Resolution Conf. 12.3; 50 CFR 23.24 (C, D, F, I, O read there; W, R, U, X from memory).
 */
export const SOURCE_WORDS = {
  W: 'taken from the wild',
  R: 'ranched: reared from wild eggs or young',
  D: 'Appendix I, bred in captivity for trade by a registered breeder',
  C: 'bred in captivity',
  F: 'born in captivity, not meeting the rule for bred in captivity',
  U: 'source not known',
  I: 'confiscated or seized',
  O: 'held since before the convention applied',
  X: 'taken at sea, outside any country’s waters',
} as const;

export const SourceCode = z.enum(['W', 'R', 'D', 'C', 'F', 'U', 'I', 'O', 'X'], 'Choose a source');
export type SourceCode = z.output<typeof SourceCode>;
