import { randomBytes } from 'node:crypto';
import { sql } from 'kysely';
import type * as z from 'zod/mini';
import { notFound, Refusal } from '../../shared/refusal';
import { SheetContent } from '../../shared/sheets/content';
import type { readSheet, SheetDraft, SheetRow, withdrawSheet } from '../../shared/sheets/contract';
import { keysAddress } from '../../shared/sheets/sheetFile';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { inTransaction } from '../http/serve';
import type { Scope } from '../scope';
import { composeSheet } from './compose';
import { currentKeyId, openKey } from './keys';
import { type SheetKey, sheetBytes, signSheet } from './signing';

export const checkAddress = (origin: string, token: string): string => `${origin}/sheet/${token}`;

/** "2026-0031": the year of issue, and the fishroom's running number. */
export const numberWords = (number: number, issuedOn: string): string =>
  `${issuedOn.slice(0, 4)}-${String(number).padStart(4, '0')}`;

type Which = { id?: string; thing?: 'fish' | 'brood' | undefined; thingId?: string | undefined };

export async function sheetRows({ db, roomId }: Pick<Scope, 'db' | 'roomId'>, which: Which = {}): Promise<SheetRow[]> {
  let query = db
    .selectFrom('sheet')
    .innerJoin('account', 'account.id', 'sheet.issuedBy')
    .leftJoin('fish', (join) => join.onRef('fish.roomId', '=', 'sheet.roomId').onRef('fish.id', '=', 'sheet.fishId'))
    .leftJoin('brood', (join) =>
      join.onRef('brood.roomId', '=', 'sheet.roomId').onRef('brood.id', '=', 'sheet.broodId'),
    )
    .leftJoin('sheet as later', (join) =>
      join.onRef('later.roomId', '=', 'sheet.roomId').onRef('later.replaces', '=', 'sheet.id'),
    )
    .where('sheet.roomId', '=', roomId)
    .select([
      'sheet.id',
      'sheet.number',
      'sheet.token',
      'sheet.fishId',
      'sheet.broodId',
      'sheet.issuedOn',
      'sheet.replacedAt',
      'sheet.withdrawnAt',
      'sheet.withdrawnBecause',
      'sheet.linkRevokedAt',
      'account.name as by',
      'fish.code as fishCode',
      'brood.code as broodCode',
      'later.number as laterNumber',
      'later.issuedOn as laterOn',
      sql<number>`json_extract(sheet.content, '$.subject.heads.male') + json_extract(sheet.content, '$.subject.heads.female')
        + json_extract(sheet.content, '$.subject.heads.unsexed')`.as('heads'),
    ]);
  if (which.id) query = query.where('sheet.id', '=', which.id);
  if (which.thing && which.thingId)
    query = query.where(which.thing === 'fish' ? 'sheet.fishId' : 'sheet.broodId', '=', which.thingId);
  const rows = await query.orderBy('sheet.number', 'desc').execute();
  return rows.map((row) => {
    return {
      id: row.id,
      number: numberWords(row.number, row.issuedOn),
      token: row.token,
      subject: {
        thing: row.fishId ? 'fish' : 'brood',
        id: row.fishId ?? row.broodId ?? '',
        code: row.fishCode ?? row.broodCode ?? 'not told apart',
      },
      heads: row.heads,
      issuedOn: row.issuedOn,
      by: row.by,
      state: row.withdrawnAt ? 'withdrawn' : row.replacedAt ? 'replaced' : 'valid',
      replacedBy: row.laterNumber && row.laterOn ? numberWords(row.laterNumber, row.laterOn) : null,
      withdrawnBecause: row.withdrawnBecause,
      linkRevoked: row.linkRevokedAt !== null,
    };
  });
}

export async function oneSheet(scope: Pick<Scope, 'db' | 'roomId'>, id: string): Promise<SheetRow> {
  const [sheet] = await sheetRows(scope, { id });
  if (!sheet) throw notFound('That sheet');
  return sheet;
}

/** What a sheet would say now, with a number that is not given yet. */
export async function preview(
  scope: Scope,
  { thing, id }: { thing: 'fish' | 'brood'; id: string },
): Promise<SheetContent> {
  const issued = { number: 'not issued', on: scope.today, by: await nameOf(scope), order: null, replaces: null };
  return composeSheet(scope, { thing, id, heads: 1 }, issued, await currentKeyId(scope));
}

async function nameOf({ db, actorId }: Scope): Promise<string> {
  return (await db.selectFrom('account').where('id', '=', actorId).select('name').executeTakeFirstOrThrow()).name;
}

/** Freezes, numbers and signs a sheet by hand. The key is made and opened before the transaction. */
export async function issue(scope: Scope, draft: SheetDraft): Promise<SheetRow> {
  const key = await openKey(scope, await currentKeyId(scope));
  const id = newId(scope.now);
  await inTransaction(scope, (inside) => issueInside(inside, { ...draft, id, order: null, purchaseLineId: null }, key));
  return oneSheet(scope, id);
}

type Issuing = SheetDraft & { id: string; order: string | null; purchaseLineId: string | null };

/** Within a transaction that is open already: a collection issues its sheets together with everything else. */
export async function issueInside(scope: Scope, issuing: Issuing, key: SheetKey): Promise<void> {
  const { db, roomId, now, today, actorId } = scope;
  const { id, thing, subjectId, heads, replaces, because, order, purchaseLineId } = issuing;
  const before = replaces ? await replaceable(scope, replaces) : null;
  const last = await db
    .selectFrom('sheet')
    .where('roomId', '=', roomId)
    .select(({ fn }) => fn.max('number').as('number'))
    .executeTakeFirst();
  const number = Number(last?.number ?? 0) + 1;
  const issued = {
    number: numberWords(number, today),
    on: today,
    by: await nameOf(scope),
    order,
    replaces: before && { number: before.number, because },
  };
  const content = await composeSheet(
    scope,
    { thing, id: subjectId, heads: thing === 'fish' ? 1 : heads },
    issued,
    key.keyId,
  );
  const jws = await signSheet(sheetBytes(content), key);
  await db
    .insertInto('sheet')
    .values({
      roomId,
      id,
      number,
      token: randomBytes(16).toString('base64url'),
      fishId: thing === 'fish' ? subjectId : null,
      broodId: thing === 'brood' ? subjectId : null,
      purchaseLineId,
      content: JSON.stringify(content),
      jws,
      keyId: key.keyId,
      issuedOn: today,
      issuedBy: actorId,
      createdAt: now,
      replaces,
      replacedAt: null,
      withdrawnAt: null,
      withdrawnBecause: null,
      linkRevokedAt: null,
    })
    .execute();
  if (replaces)
    await db
      .updateTable('sheet')
      .set({ replacedAt: now })
      .where('roomId', '=', roomId)
      .where('id', '=', replaces)
      .execute();
  await audit(scope, { action: replaces ? 'sheet replaced' : 'sheet issued', about: thing, aboutId: subjectId });
}

/** A sheet is replaced once, and a withdrawn one not at all: the old page must say one thing. */
async function replaceable(scope: Scope, sheetId: string): Promise<SheetRow> {
  const sheet = await oneSheet(scope, sheetId).catch(() => {
    throw new Refusal('invalid', 'The sheet to replace was not found', { replaces: 'Choose a sheet' });
  });
  if (sheet.state !== 'valid')
    throw new Refusal('conflict', `Sheet ${sheet.number} is ${sheet.state} already`, {
      replaces: 'Choose a valid sheet',
    });
  return sheet;
}

type Stored = { content: SheetContent; jws: string; token: string; linkRevokedAt: string | null };

export async function storedSheet({ db, roomId }: Pick<Scope, 'db' | 'roomId'>, sheetId: string): Promise<Stored> {
  const row = await db
    .selectFrom('sheet')
    .where('roomId', '=', roomId)
    .where('id', '=', sheetId)
    .select(['content', 'jws', 'token', 'linkRevokedAt'])
    .executeTakeFirst();
  if (!row) throw notFound('That sheet');
  return { ...row, content: SheetContent.parse(JSON.parse(row.content)) };
}

export async function sheetPage(scope: Scope, sheetId: string): Promise<z.input<typeof readSheet.output>> {
  const row = await oneSheet(scope, sheetId);
  const { content, jws, token } = await storedSheet(scope, sheetId);
  const { origin } = scope.house.config;
  return { row, content, jws, keysAt: keysAddress(origin, scope.roomId), checkUrl: checkAddress(origin, token) };
}

export async function withdraw(
  scope: Scope,
  sheetId: string,
  { because, revokeLink }: z.output<typeof withdrawSheet.body>,
): Promise<SheetRow> {
  const sheet = await oneSheet(scope, sheetId);
  if (sheet.state === 'withdrawn') throw new Refusal('conflict', 'This sheet is withdrawn already');
  await scope.db
    .updateTable('sheet')
    .set({ withdrawnAt: scope.now, withdrawnBecause: because, linkRevokedAt: revokeLink ? scope.now : null })
    .where('roomId', '=', scope.roomId)
    .where('id', '=', sheetId)
    .execute();
  await audit(scope, { action: 'sheet withdrawn', about: 'sheet', aboutId: sheetId });
  return oneSheet(scope, sheetId);
}
