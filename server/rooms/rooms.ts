import { randomBytes } from 'node:crypto';
import { sql } from 'kysely';
import type * as z from 'zod/mini';
import { Refusal } from '../../shared/refusal';
import type { RoomChange, RoomDraft, RoomPage } from '../../shared/rooms/contract';
import { METRIC, UnitChoices } from '../../shared/units';
import { audit } from '../db/audit';
import { isUniqueViolation } from '../db/constraint';
import { newId } from '../db/newId';
import type { Scope, SignedIn } from '../scope';

/** One account's fishrooms: enough for anyone who breeds fish, few enough to stop a script. */
const ROOMS_MAX = 30;

/** The fishroom's units, out of its settings; a person's own choice comes before them. */
export function unitsOf(settings: string): UnitChoices {
  const known = UnitChoices.safeParse(JSON.parse(settings)['units']);
  return known.success ? known.data : METRIC;
}

/** "Underhill Fishroom" is `underhill-fishroom`: letters without their accents, digits, hyphens. */
const slugOf = (name: string): string =>
  name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 40)
    .replace(/-+$/, '');

/** Makes a fishroom; whoever makes it owns it. */
export async function makeRoom(asked: SignedIn, draft: RoomDraft): Promise<{ id: string; slug: string }> {
  const { name, place, timeZone, currency, units } = draft;
  const { now, accountId } = asked;
  return asked.db.transaction().execute(async (db) => {
    const owned = await db
      .selectFrom('member')
      .where('accountId', '=', accountId)
      .where('role', '=', 'owner')
      .select(({ fn }) => fn.countAll<number>().as('count'))
      .executeTakeFirstOrThrow();
    if (owned.count >= ROOMS_MAX) throw new Refusal('conflict', `One account runs ${ROOMS_MAX} fishrooms at most`);
    const id = newId(now);
    const slug = await freeSlug({ ...asked, db }, slugOf(name));
    const settings = JSON.stringify({ units });
    await db
      .insertInto('room')
      .values({ id, name, slug, place, timeZone, currency, settings, deleteAfter: null, createdAt: now })
      .execute();
    await db.insertInto('member').values({ roomId: id, accountId, role: 'owner', joinedAt: now }).execute();
    await audit({ ...asked, db }, { action: 'made', about: 'fishroom', aboutId: id, roomId: id });
    return { id, slug };
  });
}

/** The word itself if it is free; else with a few letters behind it. */
async function freeSlug({ db }: Pick<SignedIn, 'db'>, wanted: string): Promise<string> {
  const base = wanted.length >= 3 ? wanted : `room-${randomBytes(3).toString('hex')}`;
  const taken = await db.selectFrom('room').where('slug', '=', base).select('id').executeTakeFirst();
  return taken ? `${base}-${randomBytes(2).toString('hex')}` : base;
}

export async function roomPage({ db, roomId, role, today }: Scope): Promise<RoomPage> {
  const { settings, ...room } = await db
    .selectFrom('room')
    .where('id', '=', roomId)
    .select(['id', 'name', 'slug', 'place', 'timeZone', 'currency', 'createdAt', 'version', 'settings'])
    .executeTakeFirstOrThrow();
  return { ...room, units: unitsOf(settings), role, today };
}

export async function changeTheRoom(scope: Scope, change: z.output<typeof RoomChange>): Promise<RoomPage> {
  const { db, roomId } = scope;
  const { version, units, ...facts } = change;
  const before = await roomPage(scope);
  if (before.version !== version)
    throw new Refusal('conflict', 'The fishroom was changed elsewhere in the meantime', {}, { current: before });
  if (change.currency !== before.currency) await mustHaveNoMoney(scope);
  try {
    await db
      .updateTable('room')
      .set({
        ...facts,
        settings: sql<string>`json_set(settings, '$.units', json(${JSON.stringify(units)}))`,
        version: version + 1,
      })
      .where('id', '=', roomId)
      .execute();
  } catch (error) {
    if (!isUniqueViolation(error, 'room.slug')) throw error;
    throw new Refusal('conflict', 'Another fishroom has that word', { slug: 'Another fishroom has that word' });
  }
  const after = await roomPage(scope);
  await audit(scope, { action: 'changed', about: 'fishroom', aboutId: roomId, change: differences(before, after) });
  return after;
}

/** Amounts are stored in the currency's own minor unit: once there are any, another currency would turn them into others. */
async function mustHaveNoMoney({ db, roomId }: Scope): Promise<void> {
  const sale = await db.selectFrom('purchase').where('roomId', '=', roomId).select('id').executeTakeFirst();
  const price = await db
    .selectFrom('listing')
    .where('roomId', '=', roomId)
    .where(({ or, eb }) => or([eb('classes', '!=', '[]'), eb('lots', '!=', '[]')]))
    .select('id')
    .executeTakeFirst();
  if (sale ?? price)
    throw new Refusal('conflict', 'The currency stays: there are prices or orders in it', {
      currency: 'There are prices or orders in the present currency',
    });
}

const AUDITED = ['slug', 'timeZone', 'currency'] as const;

/** Names and places are left out: the trail holds nothing that may have to be erased. */
function differences(before: RoomPage, after: RoomPage): Record<string, [unknown, unknown]> {
  const change: Record<string, [unknown, unknown]> = {};
  for (const key of AUDITED) if (before[key] !== after[key]) change[key] = [before[key], after[key]];
  if (JSON.stringify(before.units) !== JSON.stringify(after.units)) change['units'] = [before.units, after.units];
  if (before.name !== after.name) change['name'] = [null, null];
  return change;
}
