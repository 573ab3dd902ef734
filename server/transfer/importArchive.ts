import { randomBytes } from 'node:crypto';
import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { sql } from 'kysely';
import { Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { constraintRefusal } from '../db/constraint';
import { newId } from '../db/newId';
import type { Db } from '../db/open';
import type { StoredPicture } from '../pictures';
import type { SignedIn } from '../scope';
import { type Archive, readArchive } from './readArchive';
import { type StoredRow, type TableShape, tableShapes } from './tables';
import { badArchive, unzip } from './unzip';

/** Makes a fishroom of an archive; whoever brings it in owns it. All of it is stored, or nothing. */
export async function importArchive(asked: SignedIn, file: string): Promise<{ id: string }> {
  const { db, house } = asked;
  const folder = house.pictures.tempPath();
  await mkdir(folder);
  const adopted: StoredPicture[] = [];
  try {
    const names = await unzip(file, folder, house.config.roomQuotaBytes);
    const archive = await readArchive(folder, names, await tableShapes(db));
    const taken = await db.selectFrom('room').select('id').where('id', '=', archive.note.roomId).executeTakeFirst();
    const roomId = taken ? newId(asked.now) : archive.note.roomId;
    await adoptPictures(asked, archive, { folder, names, roomId, adopted });
    await db.transaction().execute((inside) => storeArchive({ ...asked, db: inside }, archive, roomId));
    for (const picture of adopted) picture.keep();
    return { id: roomId };
  } catch (error) {
    for (const picture of adopted) await picture.discard();
    throw inWords(error);
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

function inWords(error: unknown): unknown {
  if (!(error instanceof Error) || error instanceof Refusal) return error;
  const refusal = constraintRefusal(error);
  if (!refusal) return error;
  if (!['conflict', 'invalid'].includes(refusal.reason)) return refusal;
  const said = error.message.includes('FOREIGN KEY') ? 'a row refers to something that is not in it' : error.message;
  return badArchive(said.replace(/^.*constraint failed: /, 'a row breaks a rule of '));
}

type Files = { folder: string; names: string[]; roomId: string; adopted: StoredPicture[] };

/** Each picture is decoded and must be the one that its row tells of; the files stay byte for byte. */
async function adoptPictures({ house }: SignedIn, archive: Archive, { folder, names, roomId, adopted }: Files) {
  const rows = [...archive.tables].find(([{ name }]) => name === 'photo')?.[1] ?? [];
  const ids = new Set(rows.map(({ id }) => String(id)));
  const stranger = names.find((name) => name.startsWith('pictures/') && !ids.has(name.split('/')[1] ?? ''));
  if (stranger) throw badArchive(`${stranger} belongs to no photo`);
  for (const { id, sha256, bytes, width, height } of rows) {
    const at = (name: string) => join(folder, 'pictures', String(id), name);
    if (!names.includes(`pictures/${id}/1280.webp`) || !names.includes(`pictures/${id}/320.webp`))
      throw badArchive(`the files of photo ${id} are missing`);
    const picture = await house.pictures.adopt({ large: at('1280.webp'), small: at('320.webp') }, roomId, String(id));
    adopted.push(picture);
    const same = picture.sha256 === sha256 && picture.bytes === bytes && picture.width === width;
    if (!same || picture.height !== height) throw badArchive(`photo ${id} is not the one that its row tells of`);
  }
}

async function storeArchive(asked: SignedIn, { people, tables }: Archive, roomId: string): Promise<void> {
  const { db, accountId, now } = asked;
  // Fish, batches and broods refer to one another: the whole must hold at the end, not each row at its turn.
  await sql`pragma defer_foreign_keys = on`.execute(db);
  const persons = await personsFor(asked, people);
  for (const [shape, rows] of [...tables].sort(([a], [b]) => Number(b.name === 'room') - Number(a.name === 'room'))) {
    const ready: StoredRow[] = [];
    for (const row of rows) ready.push(await readyRow(db, shape, row, { roomId, persons, now }));
    for (let from = 0; from < ready.length; from += 50) await insert(db, shape.name, ready.slice(from, from + 50));
  }
  await db.insertInto('member').values({ roomId, accountId, role: 'owner', joinedAt: now }).execute();
  // Outside the fishroom's own trail, which stays as it was.
  await audit({ ...asked }, { action: 'brought in', about: 'fishroom', aboutId: roomId });
}

async function insert(db: Db, table: string, rows: StoredRow[]): Promise<void> {
  const columns = Object.keys(rows[0] ?? {});
  const values = rows.map((row) => sql`(${sql.join(columns.map((name) => row[name] ?? null))})`);
  await sql`insert into ${sql.table(table)} (${sql.join(columns.map((name) => sql.ref(name)))}) values ${sql.join(values)}`.execute(
    db,
  );
}

type Place = { roomId: string; persons: Map<string, string>; now: string };

async function readyRow(
  db: Db,
  shape: TableShape,
  row: StoredRow,
  { roomId, persons, now }: Place,
): Promise<StoredRow> {
  const ready: StoredRow = { ...row, [shape.name === 'room' ? 'id' : 'roomId']: roomId };
  for (const { name, refersTo } of shape.columns)
    if (refersTo === 'account' && row[name] !== null) ready[name] = persons.get(String(row[name])) ?? null;
  for (const { name, mayBeEmpty } of shape.omitted)
    if (!mayBeEmpty && name !== 'changeNumber') ready[name] = randomBytes(32).toString('hex');
  if (shape.name === 'room' && (await isTaken(db, 'room', 'slug', row['slug'])))
    ready['slug'] = `${String(row['slug']).slice(0, 40)}-${randomBytes(2).toString('hex')}`;
  if (shape.name === 'sheet' && (await isTaken(db, 'sheet', 'token', row['token'])))
    ready['token'] = randomBytes(16).toString('base64url');
  if (shape.name === 'audit' && (await isTaken(db, 'audit', 'id', row['id']))) ready['id'] = newId(now);
  return ready;
}

/** Some words are one of a kind in the whole installation, and not only in a fishroom. */
async function isTaken(db: Db, table: string, column: string, value: unknown): Promise<boolean> {
  const { rows } = await sql`select 1 from ${sql.table(table)} where ${sql.ref(column)} = ${value} limit 1`.execute(db);
  return rows.length > 0;
}

/**
 * Who the people of the archive are here. The one who brings it in, and those who share a fishroom with them, are themselves;
 * everybody else becomes a name without an account, so that nobody's name can be put to what they did not do.
 */
async function personsFor({ db, accountId, now }: SignedIn, people: Archive['people']): Promise<Map<string, string>> {
  const persons = new Map<string, string>();
  for (const { id, name } of people) {
    const known = await db.selectFrom('account').select('id').where('id', '=', id).executeTakeFirst();
    if (known && (id === accountId || (await knowEachOther(db, id, accountId)))) persons.set(id, id);
    else {
      const here = known ? newId(now) : id;
      persons.set(id, here);
      const email = `${here}@former.invalid`;
      await db
        .insertInto('account')
        .values({
          id: here,
          email,
          emailFolded: email,
          name,
          passwordHash: null,
          emailVerifiedAt: null,
          disabledAt: now,
          totpSecret: null,
          totpEnabledAt: null,
          totpLastStep: null,
          createdAt: now,
        })
        .execute();
    }
  }
  return persons;
}

async function knowEachOther(db: Db, one: string, other: string): Promise<boolean> {
  const shared = await db
    .selectFrom('member as a')
    .innerJoin('member as b', 'b.roomId', 'a.roomId')
    .where('a.accountId', '=', one)
    .where('b.accountId', '=', other)
    .select('a.roomId')
    .executeTakeFirst();
  return shared !== undefined;
}
