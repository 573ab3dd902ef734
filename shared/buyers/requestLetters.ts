/** The letters of a request, in the order in which a visitor may get them. */
export const REQUEST_LETTERS = ['confirmRequest', 'fishFree', 'sizeReached'] as const;
export type RequestLetter = (typeof REQUEST_LETTERS)[number];

export const REQUEST_LETTER_WORDS: Record<RequestLetter, string> = {
  confirmRequest: 'Confirm the address',
  fishFree: 'Fish have come free',
  sizeReached: 'The size is reached',
};
