import * as z from 'zod/mini';
import { Done, endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';

const ofBuyer = inRoom({ buyerId: Id });

/** Everything the fishroom holds about one buyer, as a file for that buyer. */
export const exportBuyer = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/buyers/:buyerId/data',
  needs: 'buyer:see',
  kind: 'file',
  params: ofBuyer,
  output: z.unknown(),
});

/** Name, addresses and messages go; orders, money and sheets keep their numbers. Not while an order is open. */
export const eraseBuyer = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/buyers/:buyerId/erasure',
  needs: 'sale:write',
  params: ofBuyer,
  output: Done,
});
