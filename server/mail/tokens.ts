import { createHash, createHmac } from 'node:crypto';
import { Refusal } from '../../shared/refusal';
import type { Config } from '../config';
import { newId } from '../db/newId';
import type { Database } from '../db/schema';
import type { Asked } from '../scope';

type Purpose = Database['mailToken']['purpose'];

/**
 * The secret word of a one-time link, 256 bits. It is worked out from the row's id and the installation's secret, so that a
 * letter can wait in the outbox without the word in it; the row itself holds only its hash.
 */
export const tokenOf = ({ secret }: Pick<Config, 'secret'>, id: string): string =>
  createHmac('sha256', secret).update(`one-time link ${id}`).digest('base64url');

export const hashOfToken = (token: string): string => createHash('sha256').update(token).digest('hex');

/**
 * Makes a one-time link's row; earlier ones of the same purpose and address are dead from now on, unless they stand `alongside`
 * each other. Inside a transaction.
 */
export async function newMailToken(
  { db, now, house }: Pick<Asked, 'db' | 'now' | 'house'>,
  token: {
    purpose: Purpose;
    email: string;
    accountId: string | null;
    minutes: number;
    payload?: unknown;
    alongside?: boolean;
  },
): Promise<string> {
  const { purpose, email, accountId, minutes, payload, alongside = false } = token;
  if (!alongside)
    await db
      .updateTable('mailToken')
      .set({ usedAt: now })
      .where('email', '=', email)
      .where('purpose', '=', purpose)
      .where('usedAt', 'is', null)
      .execute();
  const id = newId(now);
  await db
    .insertInto('mailToken')
    .values({
      id,
      purpose,
      accountId,
      email,
      tokenHash: hashOfToken(tokenOf(house.config, id)),
      payload: payload === undefined ? null : JSON.stringify(payload),
      createdAt: now,
      expiresAt: new Date(Date.parse(now) + minutes * 60_000).toISOString(),
      usedAt: null,
    })
    .execute();
  return id;
}

export const deadLink = () => new Refusal('invalid', 'This link has been used, or is too old. Ask for a new one.');

/** Uses a one-time link up: of two at the same time one wins. Inside a transaction. */
export async function spendMailToken({ db, now }: Pick<Asked, 'db' | 'now'>, purposes: Purpose[], token: string) {
  const row = await db
    .updateTable('mailToken')
    .set({ usedAt: now })
    .where('tokenHash', '=', hashOfToken(token))
    .where('purpose', 'in', purposes)
    .where('usedAt', 'is', null)
    .where('expiresAt', '>', now)
    .returningAll()
    .executeTakeFirst();
  if (!row) throw deadLink();
  return row;
}
