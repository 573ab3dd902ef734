import type { Express } from 'express';
import { notFound } from '../../shared/refusal';
import type { House } from '../house';
import { sendWaiting } from '../mail/outbox';
import type { SunkLetter } from '../mail/sink';

const SIGNS: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escaped = (text: string): string => text.replace(/[&<>"']/g, (sign) => SIGNS[sign] ?? sign);

const STYLE = `body{margin:0 auto;max-width:44rem;padding:1.5rem;font:17px/1.5 Verdana,sans-serif;color:#0c1c22;background:#f6f9f9}
h1{border-top:2px solid;padding-top:.75rem;font-size:1.4rem}a{color:inherit}li{border-top:1px solid #b9c6c6;padding:.6rem 0}
ul{list-style:none;padding:0}pre{white-space:pre-wrap;font:inherit;background:#e8efee;padding:1rem}small{color:#3a4d52}
iframe{width:100%;height:70vh;border:1px solid #6b7f83;background:#fff}`;

const page = (title: string, body: string): string =>
  `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">` +
  `<title>${escaped(title)}</title><style>${STYLE}</style></head><body><h1>${escaped(title)}</h1>${body}</body></html>`;

const listItem = (letter: SunkLetter): string =>
  `<li><a href="/dev/letters/${letter.id}">${escaped(letter.subject)}</a><br>` +
  `<small>to ${escaped(letter.to)}, ${escaped(letter.at.slice(0, 16).replace('T', ' '))} UTC</small></li>`;

const linked = (text: string): string =>
  escaped(text).replace(/https?:\/\/[^\s&<]+/g, (url) => `<a href="${url}">${url}</a>`);

const letterPage = (letter: SunkLetter): string =>
  page(
    letter.subject,
    `<p><a href="/dev/letters">All letters</a></p><p><small>to ${escaped(letter.to)}</small></p>` +
      `<pre>${linked(letter.text)}</pre><h1>As a mail program shows it</h1>` +
      `<iframe title="The letter" src="/dev/letters/${letter.id}/html" sandbox="allow-popups"></iframe>`,
  );

/** Letters that the local sink kept, for whoever works on the program. Not there in production, nor with a real mail server. */
export function devLetterPages(app: Express, house: House): void {
  const { sink, config } = house;
  if (!sink || config.production) return;
  const letterOf = (id: string | string[] | undefined): SunkLetter => {
    const letter = sink.letters.find((one) => String(one.id) === id);
    if (!letter) throw notFound('That letter');
    return letter;
  };
  app.get('/dev/letters', async (_req, res) => {
    await sendWaiting(house);
    const items = sink.letters.map(listItem).reverse().join('');
    res.set('Cache-Control', 'no-store').send(page('Letters', items ? `<ul>${items}</ul>` : '<p>No letters yet.</p>'));
  });
  app.get('/dev/letters.json', async (req, res) => {
    await sendWaiting(house);
    const to = typeof req.query['to'] === 'string' ? req.query['to'].toLowerCase() : '';
    const letters = sink.letters
      .filter((letter) => letter.to.toLowerCase().includes(to))
      .map(({ id, at, to: address, subject, text, html }) => ({ id, at, to: address, subject, text, html }));
    res.set('Cache-Control', 'no-store').json({ letters });
  });
  app.get('/dev/letters/:id', (req, res) => {
    res.set('Cache-Control', 'no-store').send(letterPage(letterOf(req.params.id)));
  });
  app.get('/dev/letters/:id/html', (req, res) => {
    res
      .set('Cache-Control', 'no-store')
      .set(
        'Content-Security-Policy',
        "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'self'; sandbox allow-popups",
      )
      .set('X-Frame-Options', 'SAMEORIGIN')
      .send(letterOf(req.params.id).html);
  });
}
