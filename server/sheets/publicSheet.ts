import type * as z from 'zod/mini';
import { notFound } from '../../shared/refusal';
import { SheetContent } from '../../shared/sheets/content';
import type { checkSheetPage } from '../../shared/sheets/contract';
import { keysAddress } from '../../shared/sheets/sheetFile';
import type { Db } from '../db/open';
import type { Asked } from '../scope';
import { publishedKeys } from './keys';
import { checkAddress, numberWords, oneSheet } from './sheets';

/** By the address on the paper, for anyone; without a fishroom in the query, since the token names one row of all. */
export async function publicSheet({ db, house }: Asked, token: string): Promise<z.input<typeof checkSheetPage.output>> {
  const found = await byToken(db, token);
  const row = await oneSheet({ db, roomId: found.roomId }, found.id);
  const later = await db
    .selectFrom('sheet')
    .where('roomId', '=', found.roomId)
    .where('replaces', '=', found.id)
    .select(['token', 'number', 'issuedOn', 'linkRevokedAt', 'content'])
    .executeTakeFirst();
  const { origin } = house.config;
  return {
    jws: found.jws,
    keysAt: keysAddress(origin, found.roomId),
    keys: (await publishedKeys({ db, roomId: found.roomId })).keys,
    state: row.state,
    at: found.withdrawnAt ?? found.replacedAt,
    because: row.withdrawnBecause ?? (later ? becauseOf(later.content) : null),
    replacedBy:
      later && !later.linkRevokedAt ? { number: numberWords(later.number, later.issuedOn), token: later.token } : null,
    checkUrl: checkAddress(origin, token),
  };
}

/** Why a sheet was replaced is said on the one that takes its place. */
const becauseOf = (content: string): string | null =>
  SheetContent.parse(JSON.parse(content)).issue.replaces?.because ?? null;

/** A revoked link is as if it had never been; a withdrawn sheet still answers, and says so. */
export async function byToken(db: Db, token: string) {
  const found = await db
    .selectFrom('sheet')
    .where('token', '=', token)
    .select(['roomId', 'id', 'jws', 'content', 'withdrawnAt', 'replacedAt', 'linkRevokedAt'])
    .executeTakeFirst();
  if (!found || found.linkRevokedAt) throw notFound('That sheet');
  return found;
}
