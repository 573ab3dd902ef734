import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { sql } from 'kysely';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { deleteDue } from '@/server/transfer';
import { getMe } from '@/shared/accounts/contract';
import { listEntries } from '@/shared/record/contract';
import { askDeletion, cancelDeletion, deleteAccount, readDeletion, WAITING_DAYS } from '@/shared/transfer/contract';
import { type Known, memberOf, ownerWithRoom, personWithAccount, seenAs } from '../support/accounts';
import { broodIn, colonyIn, record, TODAY, tankIn } from '../support/stock';
import { type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;
beforeEach(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
});
afterEach(() => app.close());

const rowsOfRoom = async (room: string) => {
  const { rows: tables } = await sql<{ name: string }>`
    select m.name from sqlite_master m where m.type = 'table' and exists (select 1 from pragma_table_info(m.name) where name = 'roomId')
  `.execute(app.house.db);
  let count = 0;
  for (const { name } of tables) {
    const { rows } = await sql`select 1 from ${sql.table(name)} where roomId = ${room}`.execute(app.house.db);
    count += rows.length;
  }
  return count;
};

describe('deleting a fishroom', () => {
  test('waits, can be called off, and asks for the name', async () => {
    const params = { roomId };
    expect((await owner.ask(askDeletion, { params, body: { name: 'Front Room' } })).body.error?.fields).toEqual({
      name: 'Type Back Room to confirm',
    });
    // 14 days after 14 May 2026, 09:12.
    const { deleteAfter } = await owner.get(askDeletion, { params, body: { name: 'Back Room' } });
    expect(deleteAfter).toBe('2026-05-28T09:12:00.000Z');
    app.later({ days: WAITING_DAYS - 1 });
    expect(await deleteDue(app.house)).toBe(0);
    await owner.get(cancelDeletion, { params });
    expect(await owner.get(readDeletion, { params })).toEqual({ deleteAfter: null });
    app.later({ days: 30 });
    expect(await deleteDue(app.house)).toBe(0);
    expect(await rowsOfRoom(roomId)).toBeGreaterThan(0);
  });

  test('takes every row and picture of it, nothing of others, and leaves a last archive for a month', async () => {
    await broodIn(owner, roomId, await colonyIn(owner, roomId));
    const other = await ownerWithRoom(app);
    await broodIn(other.owner, other.roomId, await colonyIn(other.owner, other.roomId));
    const before = await rowsOfRoom(other.roomId);
    await owner.get(askDeletion, { params: { roomId }, body: { name: 'Back Room' } });
    app.later({ days: WAITING_DAYS, minutes: 1 });
    expect(await deleteDue(app.house)).toBe(1);
    expect(await rowsOfRoom(roomId)).toBe(0);
    expect(await rowsOfRoom(other.roomId)).toBe(before);
    expect((await owner.ask(readDeletion, { params: { roomId } })).status).toBe(404);
    const archive = join(app.house.config.dataFolder, 'last-archives', `${roomId}.zip`);
    expect(readFileSync(archive).subarray(0, 2).toString()).toBe('PK');
    // The file's own time is the machine's; ten years on, it is older than a month in any case.
    app.later({ days: 3650 });
    await deleteDue(app.house);
    expect(existsSync(archive)).toBe(false);
  });

  test('is for owners alone', async () => {
    const keeper = await memberOf(app, roomId, 'keeper');
    const asked = await keeper.ask(askDeletion, { params: { roomId }, body: { name: 'Back Room' } });
    expect(asked.status).toBe(403);
  });
});

describe('deleting an account', () => {
  test('is refused to the last owner of a fishroom, by its name', async () => {
    const { status, body } = await owner.ask(deleteAccount, { body: { current: null } });
    expect(status).toBe(409);
    expect(body.error?.message).toMatch(/^You are the last owner of Back Room\./);
    await memberOf(app, roomId, 'owner');
    expect((await owner.ask(deleteAccount, { body: { current: null } })).status).toBe(200);
  });

  test('takes the person away; what they recorded stays, under a former member', async () => {
    const keeper = await memberOf(app, roomId, 'keeper');
    const tankId = await tankIn(owner, roomId, 'T-1');
    await record(keeper, roomId, { kind: 'seenWell', tankId, onDay: TODAY, note: null });
    const elsewhere = app.person();
    elsewhere.cookie = keeper.cookie;
    await keeper.get(deleteAccount, { body: { current: null } });
    expect(await seenAs(elsewhere)).toBeNull();
    const { entries } = await owner.get(listEntries, { params: { roomId }, query: {} });
    expect(entries.map(({ by }) => by.name)).toEqual(['a former member']);
    const { rows } = await sql<{ all: string }>`select group_concat(email || name) as "all" from account`.execute(
      app.house.db,
    );
    expect(rows[0]?.all).not.toContain(keeper.email);
    expect(rows[0]?.all).not.toContain(keeper.name);
    // The address is free for a new beginning.
    const again = await personWithAccount(app, { email: keeper.email });
    expect((await again.get(getMe)).rooms).toEqual([]);
  });
});
