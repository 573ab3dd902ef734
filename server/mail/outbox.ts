import * as z from 'zod/mini';
import type { Database } from '../db/schema';
import { touchRooms } from '../db/touchRooms';
import type { House } from '../house';
import type { Letter } from '.';
import { tokenOf } from './tokens';
import { TOKEN_HERE } from './writeLetter';

const EVERY_MS = 1000;
const AT_ONCE = 20;
/** Half a minute, then twice as long each time, six hours at most: after ten tries about a day has passed. */
const FIRST_WAIT_MS = 30_000;
const LONGEST_WAIT_MS = 6 * 3_600_000;
const TRIES = 10;

const Attachments = z.array(z.object({ filename: z.string(), contentType: z.string(), base64: z.string() }));

type Row = Pick<
  Database['letter'],
  'toAddress' | 'toName' | 'subject' | 'bodyText' | 'bodyHtml' | 'tokenId' | 'stopUrl'
> & { id: string; attachments: string; attempts: number; kind: string; roomId: string | null };

/** Sends what is due, oldest first; answers how many were taken by the mail server. */
export async function sendWaiting(house: House): Promise<number> {
  const now = house.clock.now().toISOString();
  const rows = await house.db
    .selectFrom('letter')
    .where('state', '=', 'waiting')
    .where('nextTryAt', '<=', now)
    .orderBy('nextTryAt')
    .orderBy('id')
    .limit(AT_ONCE)
    .selectAll()
    .execute();
  let sent = 0;
  for (const row of rows) if (await sendOne(house, row)) sent += 1;
  return sent;
}

async function sendOne(house: House, row: Row): Promise<boolean> {
  const { db, mailer, clock, log } = house;
  const about = { letterId: row.id, kind: row.kind, roomId: row.roomId };
  try {
    await mailer.send(letterOf(house, row));
  } catch (error) {
    await keepForLater(house, row, error);
    return false;
  }
  const at = clock.now().toISOString();
  await db.updateTable('letter').set({ state: 'sent', sentAt: at, lastError: null }).where('id', '=', row.id).execute();
  log.info({ event: 'letterSent', outcome: 'ok', ...about }, 'letter sent');
  return true;
}

function letterOf({ config }: House, row: Row): Letter {
  const token = row.tokenId ? tokenOf(config, row.tokenId) : '';
  const filled = (body: string) => (row.tokenId ? body.replaceAll(TOKEN_HERE, token) : body);
  return {
    to: row.toName ? { name: row.toName, address: row.toAddress } : row.toAddress,
    subject: row.subject,
    text: filled(row.bodyText),
    html: filled(row.bodyHtml),
    attachments: Attachments.parse(JSON.parse(row.attachments)).map(({ base64, ...rest }) => ({
      ...rest,
      content: Buffer.from(base64, 'base64'),
    })),
    headers: {
      // The same at every try, so that a mail server that took it twice can tell.
      'Message-ID': `<${row.id}@kinwater>`,
      ...(row.stopUrl ? { 'List-Unsubscribe': `<${filled(row.stopUrl)}>` } : {}),
    },
  };
}

/** A refusal for good (SMTP 5xx) fails at once; anything else is tried again, later each time. */
async function keepForLater({ db, clock, log }: House, row: Row, error: unknown): Promise<void> {
  const attempts = row.attempts + 1;
  const code = error instanceof Error && 'responseCode' in error ? Number(error.responseCode) : 0;
  const failed = attempts >= TRIES || (code >= 500 && code < 600);
  const wait = Math.min(LONGEST_WAIT_MS, FIRST_WAIT_MS * 2 ** row.attempts);
  const lastError = (error instanceof Error ? error.message : String(error)).slice(0, 300);
  await db
    .updateTable('letter')
    .set({
      state: failed ? 'failed' : 'waiting',
      attempts,
      lastError,
      nextTryAt: new Date(clock.now().getTime() + wait).toISOString(),
    })
    .where('id', '=', row.id)
    .execute();
  // A letter that failed shows in its fishroom.
  if (failed && row.roomId) await touchRooms(db, [row.roomId]);
  const about = { letterId: row.id, kind: row.kind, roomId: row.roomId, attempts };
  log.warn({ event: 'letterSent', outcome: failed ? 'failed' : 'later', ...about }, 'letter not taken');
}

/** The worker: looks every second, never twice at once, and finishes the letter in hand when stopped. */
export function startOutbox(house: House): { stop(): Promise<void> } {
  let running: Promise<unknown> = Promise.resolve();
  let busy = false;
  const timer = setInterval(() => {
    if (busy) return;
    busy = true;
    running = sendWaiting(house)
      .catch((error: unknown) => house.log.error({ err: error, event: 'outbox' }, 'outbox stopped short'))
      .finally(() => {
        busy = false;
      });
  }, EVERY_MS);
  return {
    stop: async () => {
      clearInterval(timer);
      await running;
    },
  };
}
