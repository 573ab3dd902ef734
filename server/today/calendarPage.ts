import type { Express } from 'express';
import { notFound } from '../../shared/refusal';
import type { House } from '../house';
import { limitOf } from '../http/limitOf';
import { askedOf } from '../http/whoAsks';
import { hashOfToken } from '../mail/tokens';
import { asMember } from './asMember';
import { calendarOf } from './calendar';

/** Wrong addresses from one network, in a quarter of an hour. */
const GUESSES = 30;

/** The calendar that a member subscribed to, by its secret address; without a session, since calendars have none. */
export function calendarPage(app: Express, { db }: House): void {
  const limit = limitOf(GUESSES, 15, { failuresOnly: true });
  app.get('/calendar/:file', async (req, res) => {
    await limit({ req, res });
    const secret = /^([\w-]{43})\.ics$/.exec(req.params.file)?.[1];
    const owner = secret
      ? await db
          .selectFrom('member')
          // Of any fishroom: the secret names one member of all.
          .where('calendarHash', '=', hashOfToken(secret))
          .select(['roomId', 'accountId'])
          .executeTakeFirst()
      : undefined;
    const member = owner && (await asMember(askedOf(req), owner.roomId, owner.accountId));
    if (!member) throw notFound('That calendar');
    res
      .set({
        'Content-Type': 'text/calendar; charset=utf-8',
        'Cache-Control': 'private, no-cache',
        'X-Robots-Tag': 'noindex',
        'Content-Disposition': 'inline; filename="fishroom.ics"',
      })
      .send(await calendarOf(member));
  });
}
