import { randomBytes } from 'node:crypto';
import BetterSqlite3 from 'better-sqlite3';
import express from 'express';
import { jwtVerify, SignJWT } from 'jose';
import { Kysely, SqliteDialect } from 'kysely';
import type { Database } from '../../server/db/schema';

/*
 * The anchor of the server's figures: what a signed-in GET costs with the same packages used plainly, as their own
 * documentation shows them.
 */

const db = new Kysely<Database>({
  dialect: new SqliteDialect({ database: new BetterSqlite3(process.env['DB_FILE'] ?? '') }),
});
const secret = randomBytes(48);
const app = express();

app.get('/healthz', (_req, res) => void res.send('ok'));
app.get('/token', async (_req, res) => {
  const { id: sessionId } = await db.selectFrom('session').select('id').executeTakeFirstOrThrow();
  res.send(
    await new SignJWT({})
      .setProtectedHeader({ alg: 'HS256' })
      .setSubject(sessionId)
      .setExpirationTime('1h')
      .sign(secret),
  );
});
app.get('/row', async (req, res) => {
  const token = /session=([^;]+)/.exec(req.headers.cookie ?? '')?.[1] ?? '';
  const { payload } = await jwtVerify(token, secret, { algorithms: ['HS256'] });
  const session = await db
    .selectFrom('session')
    .where('id', '=', String(payload.sub))
    .select('accountId')
    .executeTakeFirstOrThrow();
  const member = await db
    .selectFrom('member')
    .innerJoin('room', 'room.id', 'member.roomId')
    .where('member.accountId', '=', session.accountId)
    .select(['member.role', 'room.id', 'room.timeZone', 'room.currency', 'room.changeNumber'])
    .executeTakeFirstOrThrow();
  const { settings } = await db
    .selectFrom('room')
    .where('id', '=', member.id)
    .select('settings')
    .executeTakeFirstOrThrow();
  res.json(JSON.parse(settings));
});
app.listen(Number(process.env['PORT']));
