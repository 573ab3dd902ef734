import express, { type Express, type Request, type Response } from 'express';
import { Refusal } from '../../shared/refusal';
import type { House } from '../house';
import { askedOf } from '../http/whoAsks';
import type { Asked } from '../scope';
import { Session } from './session';
import { settle } from './settle';

const KNOWN = new Set([
  'checkout.session.completed',
  'checkout.session.async_payment_succeeded',
  'checkout.session.async_payment_failed',
  'checkout.session.expired',
]);

/**
 * Messages of the card service, on bytes as they came: the signature is of those. It stands before the JSON parser and
 * outside /api, where another site's request would be refused.
 */
export function stripeWebhook(app: Express, house: House): void {
  app
    .route('/webhooks/stripe')
    .post(express.raw({ type: () => true, limit: '300kb' }), (req, res) => take(house, req, res))
    .all((_req, res) => {
      res.setHeader('Allow', 'POST');
      throw new Refusal('wrong-method', 'The card service sends its messages here');
    });
}

async function take(house: House, req: Request, res: Response): Promise<void> {
  const asked = askedOf(req);
  const event = eventOf(house, req, asked);
  const session = KNOWN.has(event.type) ? Session.safeParse(event.data.object) : null;
  const outcome = session?.success ? await once(asked, event, session.data) : 'ignored';
  asked.log.info({ event: 'webhook', outcome, type: event.type, eventId: event.id }, 'message of the card service');
  res.json({ received: true, outcome });
}

function eventOf({ payments, clock }: House, req: Request, asked: Asked) {
  try {
    if (!payments || !Buffer.isBuffer(req.body)) throw new Error('no card service');
    return payments.readEvent(req.body, req.get('stripe-signature') ?? '', clock.now().getTime());
  } catch {
    asked.log.warn(
      { event: 'webhook', outcome: 'refused', address: asked.address },
      'a message that the card service did not sign',
    );
    throw new Refusal('malformed', 'This message is not signed by the card service, or is too old');
  }
}

/** The message and what it changes are one transaction: the same message again finds its own row and does nothing. */
async function once(asked: Asked, event: { id: string; type: string }, session: Session): Promise<string> {
  return asked.db.transaction().execute(async (db) => {
    const { now } = asked;
    const fresh = await db
      .insertInto('stripeEvent')
      .values({ id: event.id, type: event.type, receivedAt: now, outcome: 'taken' })
      .onConflict((clash) => clash.column('id').doNothing())
      .executeTakeFirst();
    if (Number(fresh.numInsertedOrUpdatedRows ?? 0) === 0) return 'known already';
    const outcome = await settle({ ...asked, db }, event.type, session);
    await db.updateTable('stripeEvent').set({ outcome }).where('id', '=', event.id).execute();
    return outcome;
  });
}
