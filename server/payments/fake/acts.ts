import type { FakeEvent, FakeSession, StandIn } from './standIn';

export const ACTS = {
  pay: 'Pay',
  payTwice: 'Pay; the message comes five times',
  payReordered: 'Pay; the messages come in the wrong order',
  payLate: 'Pay; the message is held back',
  decline: 'Decline for good',
  expire: 'Let the page expire',
} as const;
export type Act = keyof typeof ACTS;

export const isAct = (text: string): text is Act => text in ACTS;

/** What happens on the stand-in's page, and the messages that it brings. Declined cards can be tried again until it is final. */
export async function act(standIn: StandIn, session: FakeSession, what: Act): Promise<void> {
  if (session.status !== 'open') return;
  const unpaid = { payment_status: 'unpaid', status: 'complete' };
  switch (what) {
    case 'expire':
      session.status = 'expired';
      return inOrder(standIn, [standIn.make('checkout.session.expired', session)]);
    case 'decline':
      session.status = 'complete';
      return inOrder(standIn, [
        standIn.make('checkout.session.completed', session),
        standIn.make('checkout.session.async_payment_failed', session),
      ]);
    case 'payReordered': {
      session.status = 'complete';
      const first = standIn.make('checkout.session.completed', session, unpaid);
      session.paid = true;
      return inOrder(standIn, [standIn.make('checkout.session.async_payment_succeeded', session), first]);
    }
    default: {
      session.status = 'complete';
      session.paid = true;
      const event = standIn.make('checkout.session.completed', session);
      if (what === 'payLate') return;
      return inOrder(standIn, Array<FakeEvent>(what === 'payTwice' ? 5 : 1).fill(event));
    }
  }
}

async function inOrder(standIn: StandIn, events: FakeEvent[]): Promise<void> {
  for (const event of events) await standIn.deliver(event);
}
