import * as z from 'zod/mini';

/** Of a page of the card service what its messages tell and we need (Stripe API reference, "The Checkout Session object"). */
export const Session = z.object({
  id: z.string(),
  amount_total: z.nullable(z.number()),
  currency: z.nullable(z.string()),
  payment_status: z.string(),
  payment_intent: z.nullable(z.string()),
  metadata: z.nullable(z.record(z.string(), z.string())),
});
export type Session = z.output<typeof Session>;
