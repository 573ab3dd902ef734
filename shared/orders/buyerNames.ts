import * as z from 'zod/mini';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { line } from '../shapes';

export const BuyerName = z.strictObject({ id: Id, name: z.string(), email: z.nullable(z.string()) });
export type BuyerName = z.output<typeof BuyerName>;

/** Whom an order can be for. */
export const listBuyerNames = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/buyer-names',
  needs: 'buyer:see',
  params: inRoom({}),
  output: z.strictObject({ buyers: z.array(BuyerName) }),
});

const Email = z
  .string('Type an e-mail address')
  .check(
    z.trim(),
    z.toLowerCase(),
    z.maxLength(254, 'That is too long'),
    z.email('Type an address such as name@mail.example'),
  );

/** Someone who asks at the door or by telephone; without an address no letter goes out. */
export const addBuyerName = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/buyer-names',
  needs: 'sale:write',
  params: inRoom({}),
  body: z.strictObject({ id: Id, name: line(120, 'Type a name'), email: z.nullable(Email) }),
  output: BuyerName,
});
