import type { Request, Response } from 'express';
import { jwtVerify, SignJWT } from 'jose';
import type { Config } from '../config';
import { newId } from '../db/newId';
import type { Asked } from '../scope';

/** The `__Host-` prefix makes the browser insist on Secure, path `/` and no Domain. */
const COOKIE = '__Host-kinwater';
const AUDIENCE = 'kinwater-session';
const DAYS = 86_400_000;
/** A device that is used stays signed in for a season; one that lies in a drawer for a month does not. */
export const ABSOLUTE_MS = 120 * DAYS;
export const IDLE_MS = 30 * DAYS;
/** How stale `lastSeenAt` may be: a write at every request would cost more than it tells. */
const SEEN_STEP_MS = 10 * 60_000;

export type Session = { accountId: string; sessionId: string };

const keyOf = (secret: string) => new TextEncoder().encode(secret);

/** Verified tokens, so that a signature is checked once and not at every request; the session row is still read each time. */
const verified = new Map<string, { sessionId: string; expiresMs: number }>();
const VERIFIED_KEPT = 5000;

export async function startSession(
  asked: Asked,
  res: Response,
  account: { id: string; secondStep: 'notNeeded' | 'waiting' },
): Promise<string> {
  const id = newId(asked.now);
  const expiresAt = new Date(Date.parse(asked.now) + ABSOLUTE_MS).toISOString();
  await asked.db
    .insertInto('session')
    .values({
      id,
      accountId: account.id,
      createdAt: asked.now,
      lastSeenAt: asked.now,
      expiresAt,
      endedAt: null,
      device: asked.device,
      address: asked.address,
      secondStep: account.secondStep,
    })
    .execute();
  const token = await new SignJWT({})
    .setProtectedHeader({ alg: 'HS256', typ: 'kinwater-session' })
    .setSubject(id)
    .setAudience(AUDIENCE)
    .setIssuedAt(Math.floor(Date.parse(asked.now) / 1000))
    .setExpirationTime(Math.floor(Date.parse(expiresAt) / 1000))
    .sign(keyOf(asked.house.config.secret));
  res.cookie(COOKIE, token, { httpOnly: true, secure: true, sameSite: 'lax', path: '/', maxAge: ABSOLUTE_MS });
  return id;
}

/** Ends the session that the request carries, if any, and takes the cookie away. */
export async function endSession(asked: Asked, req: Request, res: Response): Promise<void> {
  const sessionId = await sessionIdOf(asked, req);
  if (sessionId) {
    await asked.db
      .updateTable('session')
      .set({ endedAt: asked.now })
      .where('id', '=', sessionId)
      .where('endedAt', 'is', null)
      .execute();
  }
  res.clearCookie(COOKIE, { httpOnly: true, secure: true, sameSite: 'lax', path: '/' });
}

/** Who the cookie says is asking; null when there is no session, or it ended, or waits for its second step. */
export async function sessionOf(asked: Asked, req: Request): Promise<Session | null> {
  const session = await liveSession(asked, req);
  return session && session.secondStep !== 'waiting' ? { accountId: session.accountId, sessionId: session.id } : null;
}

/** For the second step of a sign-in only: a session that still waits for its code. */
export async function waitingSession(asked: Asked, req: Request): Promise<Session | null> {
  const session = await liveSession(asked, req);
  return session?.secondStep === 'waiting' ? { accountId: session.accountId, sessionId: session.id } : null;
}

async function liveSession(asked: Asked, req: Request) {
  const sessionId = await sessionIdOf(asked, req);
  if (!sessionId) return null;
  const session = await asked.db
    .selectFrom('session')
    .innerJoin('account', 'account.id', 'session.accountId')
    .where('session.id', '=', sessionId)
    .select([
      'session.id',
      'session.accountId',
      'session.lastSeenAt',
      'session.expiresAt',
      'session.endedAt',
      'session.secondStep',
      'account.disabledAt',
    ])
    .executeTakeFirst();
  const nowMs = Date.parse(asked.now);
  if (!session || session.endedAt || session.disabledAt) return null;
  if (Date.parse(session.expiresAt) <= nowMs || Date.parse(session.lastSeenAt) + IDLE_MS <= nowMs) return null;
  if (Date.parse(session.lastSeenAt) + SEEN_STEP_MS < nowMs) {
    await asked.db.updateTable('session').set({ lastSeenAt: asked.now }).where('id', '=', sessionId).execute();
  }
  return session;
}

async function sessionIdOf(asked: Asked, req: Request): Promise<string | null> {
  const token = cookieOf(req);
  if (!token) return null;
  const nowMs = Date.parse(asked.now);
  const known = verified.get(token);
  if (known) return known.expiresMs > nowMs ? known.sessionId : null;
  const payload = await verify(token, asked.house.config, new Date(nowMs));
  if (!payload) return null;
  if (verified.size >= VERIFIED_KEPT) verified.delete(verified.keys().next().value ?? '');
  verified.set(token, payload);
  return payload.sessionId;
}

async function verify(token: string, config: Config, currentDate: Date) {
  for (const secret of [config.secret, config.previousSecret]) {
    if (!secret) continue;
    try {
      const { payload } = await jwtVerify(token, keyOf(secret), {
        algorithms: ['HS256'],
        typ: 'kinwater-session',
        audience: AUDIENCE,
        requiredClaims: ['exp', 'sub', 'aud', 'iat'],
        currentDate,
      });
      return { sessionId: String(payload.sub), expiresMs: Number(payload.exp) * 1000 };
    } catch {
      // Another secret may have signed it; a token that none signed is no session.
    }
  }
  return null;
}

function cookieOf(req: Request): string | null {
  const header = req.get('cookie') ?? '';
  for (const part of header.split(';')) {
    const at = part.indexOf('=');
    if (part.slice(0, at).trim() === COOKIE) return part.slice(at + 1).trim();
  }
  return null;
}
