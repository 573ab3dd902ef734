import type { Express } from 'express';
import { formatMoney } from '../../../shared/money';
import { notFound } from '../../../shared/refusal';
import type { House } from '../../house';
import { ACTS, act, isAct } from './acts';
import type { FakeSession, StandIn } from './standIn';

const SIGNS: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escaped = (text: string): string => text.replace(/[&<>"']/g, (sign) => SIGNS[sign] ?? sign);

const STYLE = `body{margin:0 auto;max-width:28rem;padding:1.5rem;font:17px/1.5 Verdana,sans-serif;color:#0c1c22;background:#f6f9f9}
h1{border-top:2px solid;padding-top:.75rem;font-size:1.4rem}strong{font-size:2rem;display:block}a{color:inherit}
button{display:block;width:100%;min-height:48px;margin:.5rem 0;font:inherit;text-align:left;padding:0 1rem;background:#fff;color:inherit;border:1px solid #6b7f83;border-radius:2px}
form:first-of-type button{background:#0c1c22;color:#fff;font-weight:bold}li{border-top:1px solid #b9c6c6;padding:.6rem 0}ul{list-style:none;padding:0}`;

const page = (title: string, body: string): string =>
  `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">` +
  `<title>${escaped(title)}</title><style>${STYLE}</style></head><body><h1>${escaped(title)}</h1>${body}</body></html>`;

const button = (path: string, label: string) =>
  `<form method="post" action="${path}"><button>${escaped(label)}</button></form>`;

const payPage = (session: FakeSession): string =>
  page(
    'Pay by card',
    `<p>No money moves here: this stands in for the card service.</p><p>${escaped(session.title)}` +
      `<strong>${escaped(formatMoney(session.cents, session.currency.toUpperCase()))}</strong></p>` +
      (session.status === 'open'
        ? Object.entries(ACTS)
            .map(([name, label]) => button(`/dev/pay/${session.id}/${name}`, label))
            .join('')
        : `<p>This page is ${session.status}.</p>`) +
      `<p><a href="${escaped(session.returnUrl)}">Back to the order</a></p>`,
  );

const messagesPage = ({ events, sessions }: StandIn): string =>
  page(
    'Messages of the card service',
    `<ul>${events
      .map(
        ({ id, type, sent }) =>
          `<li>${escaped(type)}, sent ${sent} times${button(`/dev/pay/messages/${id}`, sent === 0 ? 'Send it now' : 'Send it again')}</li>`,
      )
      .join('')}</ul><h1>Pages</h1><ul>${[...sessions.values()]
      .map(({ id, title, status }) => `<li><a href="/dev/pay/${id}">${escaped(title)}</a>, ${status}</li>`)
      .join('')}</ul>`,
  );

/** Where a buyer pays, declines or waits, and where messages are sent late or again. Not there with the real card service. */
export function standInPages(app: Express, { standIn }: House): void {
  if (!standIn) return;
  const sessionOf = (id: string): FakeSession => {
    const session = standIn.sessions.get(id);
    if (!session) throw notFound('That page');
    return session;
  };
  app.get('/dev/pay', (_req, res) => void res.set('Cache-Control', 'no-store').send(messagesPage(standIn)));
  app.post('/dev/pay/messages/:id', async (req, res) => {
    const event = standIn.events.find(({ id }) => id === req.params.id);
    if (!event) throw notFound('That message');
    await standIn.deliver(event);
    res.redirect(303, '/dev/pay');
  });
  app.get('/dev/pay/:id', (req, res) => {
    res.set('Cache-Control', 'no-store').send(payPage(sessionOf(req.params.id)));
  });
  app.post('/dev/pay/:id/:act', async (req, res) => {
    const session = sessionOf(req.params.id);
    if (!isAct(req.params.act)) throw notFound('That button');
    await act(standIn, session, req.params.act);
    res.redirect(303, session.returnUrl);
  });
}
