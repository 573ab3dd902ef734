import { EntryContent } from '../../shared/record/kinds';
import type { Role } from '../../shared/roles';
import { METRIC } from '../../shared/units';
import { hashPassword } from '../accounts';
import type { Db } from '../db/open';
import { addFounders, startStay } from '../fish';
import type { House } from '../house';
import { keepEntry } from '../record';
import type { Scope } from '../scope';
import { idsOf, instantOf, withIds } from './ids';
import { loadSales } from './sales';
import { COVER, PUBLIC_PAGE } from './scenario/orders';
import type { Happening, Scenario } from './scenario/shape';

/** Everyone of the demo signs in with this; it is printed at the start, and the demo is never made in production. */
export const DEMO_PASSWORD = 'two racks and a heater';

export type Loading = {
  house: House;
  db: Db;
  scenario: Scenario;
  roomId: string;
  idOf: (key: string) => string;
  nowMs: number;
};

/**
 * Writes the demo's story through the app's own rules, each happening at its own day and hour, in one transaction. Photos
 * are left out: they are painted afterwards, one by one.
 */
export async function loadDemo(house: House, scenario: Scenario): Promise<Loading> {
  const nowMs = house.clock.now().getTime();
  const idOf = idsOf(nowMs - 730 * 86_400_000);
  const roomId = idOf('room');
  const passwordHash = await hashPassword(DEMO_PASSWORD, house.config.passwordCost);
  await house.db.transaction().execute(async (db) => {
    const loading = { house, db, scenario, roomId, idOf, nowMs };
    await people(loading, passwordHash);
    await stock(loading);
    for (const happening of scenario.happenings) await tell(loading, happening);
    await tasks(loading);
    await loadSales(loading);
    await db.updateTable('room').set({ changeNumber: 1 }).where('id', '=', roomId).execute();
  });
  return { house, db: house.db, scenario, roomId, idOf, nowMs };
}

async function people({ db, scenario, roomId, idOf, nowMs }: Loading, passwordHash: string): Promise<void> {
  const createdAt = new Date(nowMs - 730 * 86_400_000).toISOString();
  const { room, members } = scenario;
  await db
    .insertInto('room')
    .values({
      id: roomId,
      ...room,
      settings: JSON.stringify({
        units: METRIC,
        sheetsShowPeople: true,
        availability: { ...PUBLIC_PAGE, photoId: idOf(COVER) },
      }),
      deleteAfter: null,
      createdAt,
    })
    .execute();
  for (const { key, name, email, role } of members) {
    const id = idOf(key);
    await db
      .insertInto('account')
      .values({
        id,
        email,
        emailFolded: email.toLowerCase(),
        name,
        passwordHash,
        emailVerifiedAt: createdAt,
        disabledAt: null,
        totpSecret: null,
        totpEnabledAt: null,
        totpLastStep: null,
        createdAt,
      })
      .execute();
    await db.insertInto('member').values({ roomId, accountId: id, role, joinedAt: createdAt }).execute();
  }
}

async function stock({ db, scenario, roomId, idOf, nowMs }: Loading): Promise<void> {
  const createdAt = new Date(nowMs - 730 * 86_400_000).toISOString();
  for (const { key, ...facts } of scenario.strains) {
    await db
      .insertInto('strain')
      .values({ roomId, id: idOf(key), ...facts, retiredOn: null, createdAt })
      .execute();
  }
  for (const { key, strain, mayBeSibs, ...facts } of scenario.lots) {
    await db
      .insertInto('lot')
      .values({ roomId, id: idOf(key), strainId: idOf(strain), ...facts, mayBeSibs: mayBeSibs ? 1 : 0 })
      .execute();
  }
  for (const { key, ...facts } of scenario.tanks) {
    await db
      .insertInto('tank')
      .values({ roomId, id: idOf(key), ...facts, retiredOn: null, createdAt })
      .execute();
  }
}

/** Who writes, when: the rules judge days and roles as they would have been. */
export function scopeOf(
  { house, db, scenario, roomId, idOf, nowMs }: Loading,
  by: string,
  on: string,
  time: string,
): Scope {
  const role: Role = scenario.members.find(({ key }) => key === by)?.role ?? 'owner';
  const ms = Math.min(instantOf(on, time, scenario.room.timeZone), nowMs);
  const accountId = idOf(by);
  return {
    db,
    house,
    roomId,
    role,
    accountId,
    actorId: accountId,
    sessionId: '',
    requestId: 'demo',
    address: '',
    device: 'demo',
    log: house.log,
    now: new Date(ms).toISOString(),
    timeZone: scenario.room.timeZone,
    currency: scenario.room.currency,
    today: on,
  };
}

async function tell(loading: Loading, happening: Happening): Promise<void> {
  const { db, roomId, idOf } = loading;
  const scope = scopeOf(loading, happening.by, happening.on, happening.time);
  switch (happening.what) {
    case 'colony': {
      const { key, code, strain, tank, note, on } = happening;
      await db
        .insertInto('colony')
        .values({
          roomId,
          id: idOf(key),
          code,
          strainId: idOf(strain),
          startedOn: on,
          endedOn: null,
          planId: null,
          note,
          entryId: null,
          createdAt: scope.now,
        })
        .execute();
      return startStay(scope, { column: 'colonyId', id: idOf(key), tankId: idOf(tank), onDay: on, entryId: null });
    }
    case 'founders': {
      const { strain, lot, colony, tank, fish, on } = happening;
      for (const { key, code, sex, mark } of fish) {
        await addFounders(scope, {
          ids: [idOf(key)],
          codes: [code],
          strainId: idOf(strain),
          sex,
          keptAs: 'breeder',
          bornOn: null,
          arrivedOn: on,
          lotId: idOf(lot),
          colonyId: colony && idOf(colony),
          tankId: tank && idOf(tank),
          mark,
          note: null,
        });
      }
      return;
    }
    case 'entry': {
      if (happening.entry.kind === 'photoTaken') return;
      await keepEntry(scope, {
        id: idOf(`entry ${happening.on} ${happening.time} ${JSON.stringify(happening.entry)}`),
        madeAt: scope.now,
        dependsOn: [],
        content: EntryContent.parse(withIds(happening.entry, idOf)),
      });
    }
  }
}

async function tasks({ db, scenario, roomId, idOf, nowMs }: Loading): Promise<void> {
  for (const { key, title, dueOn, everyDays, assignedTo, about } of scenario.tasks) {
    await db
      .insertInto('task')
      .values({
        roomId,
        id: idOf(key),
        taskKey: 'own',
        title,
        dueOn,
        everyDays,
        assignedTo: assignedTo && idOf(assignedTo),
        about: about && JSON.stringify({ thing: about.split(':')[0], id: idOf(about) }),
        snoozedUntil: null,
        doneAt: null,
        doneBy: null,
        skippedBecause: null,
        createdAt: new Date(nowMs).toISOString(),
      })
      .execute();
  }
}
