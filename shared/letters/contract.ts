import * as z from 'zod/mini';
import { Done, endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';

export const LetterRow = z.strictObject({
  id: Id,
  kind: z.string(),
  to: z.string(),
  subject: z.string(),
  state: z.enum(['waiting', 'sent', 'failed']),
  attempts: z.number(),
  lastError: z.nullable(z.string()),
  at: z.string(),
  sentAt: z.nullable(z.string()),
});
export type LetterRow = z.output<typeof LetterRow>;

/** The fishroom's letters, newest first: what was sent, what waits, what was not taken. */
export const listLetters = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/letters',
  needs: 'buyer:see',
  params: inRoom({}),
  output: z.strictObject({ letters: z.array(LetterRow) }),
});

/** A letter that was not taken, once more from the beginning. */
export const sendLetterAgain = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/letters/:letterId/again',
  needs: 'sale:write',
  params: inRoom({ letterId: Id }),
  output: Done,
});
