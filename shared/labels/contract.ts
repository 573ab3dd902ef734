import * as z from 'zod/mini';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { queryNumber } from '../shapes';
import { LABELS_A_SHEET } from './layout';

/** So many labels at once: a long print is made in two goes. */
export const MOST_LABELS = 200;

/** Ids with commas between them, as an address carries them. */
const Ids = z.optional(
  z.string().check(
    z.refine((text) => text.split(',').every((id) => Id.safeParse(id).success), 'Send ids with commas between them'),
    z.refine((text) => text.split(',').length <= MOST_LABELS, `At most ${MOST_LABELS} labels at once`),
  ),
);

/** Labels of tanks, then of colonies, in the order given. `skip`: places at the head of a sheet that are used up. */
export const printLabels = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/labels/:paper',
  needs: 'stock:see',
  kind: 'file',
  params: inRoom({ paper: z.enum(['single', 'a4', 'letter']) }),
  query: z.strictObject({
    tanks: Ids,
    colonies: Ids,
    skip: z.optional(queryNumber(LABELS_A_SHEET - 1)),
  }),
  output: z.unknown(),
});
