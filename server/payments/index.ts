import Stripe from 'stripe';
import type { Config } from '../config';
import type { House } from '../house';
import { openStandIn, type StandIn } from './fake/standIn';

export { standInPages } from './fake/pages';
export type { StandIn } from './fake/standIn';

export type Payments = {
  /** Opens a page of the card service on which an amount is paid. The same `key` gives the same page. */
  openCheckout(asked: {
    key: string;
    cents: number;
    currency: string;
    title: string;
    email: string | null;
    returnUrl: string;
    expiresAt: Date;
    metadata: Record<string, string>;
  }): Promise<{ id: string; url: string; expiresAt: Date }>;
  /** Money back of a payment; the same `key` gives it back once. Answers the refund's id at the card service. */
  giveBack(asked: { key: string; payment: string; cents: number; metadata: Record<string, string> }): Promise<string>;
  /** A message of the card service, its signature and age checked; throws when they are not right. */
  readEvent(body: Buffer, signature: string, nowMs: number): Stripe.Event;
};

/** An older signature than this is a message that someone kept. */
const SIGNATURE_SECONDS = 300;

/** The card service, or on this machine its stand-in; neither in production without a key: then there are no card payments. */
export async function openPayments(
  config: Config,
  clock: House['clock'],
): Promise<{ payments: Payments | null; standIn: StandIn | null }> {
  if (config.stripeKey) return { payments: paymentsBy(new Stripe(config.stripeKey, WAITING), config), standIn: null };
  if (config.production) return { payments: null, standIn: null };
  const standIn = await openStandIn(config, clock);
  const stripe = new Stripe('sk_test_stand_in', {
    ...WAITING,
    host: '127.0.0.1',
    port: standIn.port,
    protocol: 'http',
  });
  return { payments: paymentsBy(stripe, config), standIn };
}

const WAITING = { timeout: 10_000, maxNetworkRetries: 1, telemetry: false } as const;

function paymentsBy(stripe: Stripe, { stripeWebhookSecret }: Config): Payments {
  return {
    async openCheckout({ key, cents, currency, title, email, returnUrl, expiresAt, metadata }) {
      const session = await stripe.checkout.sessions.create(
        {
          mode: 'payment',
          line_items: [
            {
              quantity: 1,
              price_data: { currency: currency.toLowerCase(), unit_amount: cents, product_data: { name: title } },
            },
          ],
          ...(email ? { customer_email: email } : {}),
          success_url: returnUrl,
          cancel_url: returnUrl,
          expires_at: Math.floor(expiresAt.getTime() / 1000),
          metadata,
          payment_intent_data: { metadata },
        },
        { idempotencyKey: key },
      );
      if (!session.url) throw new Error('The card service opened no page');
      return { id: session.id, url: session.url, expiresAt: new Date(session.expires_at * 1000) };
    },
    async giveBack({ key, payment, cents, metadata }) {
      const refund = await stripe.refunds.create(
        { payment_intent: payment, amount: cents, metadata },
        { idempotencyKey: key },
      );
      return refund.id;
    },
    readEvent: (body, signature, nowMs) =>
      stripe.webhooks.constructEvent(body, signature, stripeWebhookSecret, SIGNATURE_SECONDS, undefined, nowMs),
  };
}
