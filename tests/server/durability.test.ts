import { spawnSync } from 'node:child_process';
import { cpSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, truncateSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { sql } from 'kysely';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { buildHouse } from '@/server/buildHouse';
import { backUp, examine, isWhole, restore } from '@/server/transfer';
import { addPhoto } from '@/shared/photos/contract';
import { checkIntegrity } from '@/shared/transfer/contract';
import { type Known, ownerWithRoom } from '../support/accounts';
import * as b from '../support/pictureBytes';
import { broodIn, colonyIn, TODAY, tankIn } from '../support/stock';
import { makeId, START, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;
let photoId: string;
let home: string;

beforeEach(async () => {
  home = mkdtempSync(join(tmpdir(), 'kinwater-durable-'));
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  photoId = await photoOf(await tankIn(owner, roomId, 'T-1'));
});
afterEach(async () => {
  await app.close();
  rmSync(home, { recursive: true, force: true });
});

async function photoOf(tankId: string): Promise<string> {
  const id = makeId();
  const content = {
    kind: 'photoTaken',
    photoId: id,
    of: { thing: 'tank', id: tankId },
    takenOn: TODAY,
    caption: null,
  };
  const form = new FormData();
  form.set('entry', JSON.stringify({ id: makeId(), madeAt: START, dependsOn: [], content }));
  form.set('picture', new Blob([new Uint8Array(await b.likePhoto(640, 480).jpeg().toBuffer())]), 'fish.jpg');
  const answer = await owner.raw('POST', addPhoto.path.replace(':roomId', roomId), { body: form });
  expect(answer.status).toBe(200);
  return id;
}

const folders = () => app.house.config;
const elsewhere = (name: string) => ({ dataFolder: join(home, name, 'data'), uploadsFolder: join(home, name, 'up') });
const pictureFile = (uploads: string) => join(uploads, roomId, photoId, '1280.webp');

describe('a backup', () => {
  test('of a running server comes back as an equal installation', async () => {
    await broodIn(owner, roomId, await colonyIn(owner, roomId));
    const target = join(home, 'backup');
    expect(await backUp(folders(), target, new Date(START))).toMatchObject({ pictures: 1, gone: 0, madeAt: START });
    const to = elsewhere('second');
    await restore(to, target);
    expect(isWhole(await examine(to))).toBe(true);
    expect(readFileSync(pictureFile(to.uploadsFolder))).toEqual(readFileSync(pictureFile(folders().uploadsFolder)));
    const { house, close } = await buildHouse({ ...app.house.config, ...to });
    for (const table of ['tank', 'headEntry', 'entry', 'photo', 'account', 'audit'] as const) {
      const rows = (db: TestApp['house']['db']) => db.selectFrom(table).selectAll().orderBy('id').execute();
      expect(await rows(house.db), table).toEqual(await rows(app.house.db));
    }
    await close();
  });

  test('is refused where something is, and leaves nothing half-made', async () => {
    mkdirSync(join(home, 'there'));
    await expect(backUp(folders(), join(home, 'there'), new Date())).rejects.toThrow(/there already/);
    await expect(backUp(elsewhere('nothing'), join(home, 'new'), new Date())).rejects.toThrow(/no database/);
    expect(existsSync(join(home, 'new'))).toBe(false);
    expect(existsSync(join(home, 'new.part'))).toBe(false);
  });

  test('is not brought back over a running or a filled installation', async () => {
    const target = join(home, 'backup');
    await backUp(folders(), target, new Date());
    // The lock is this process's own, which does not count as another; a child asks as another would.
    const asked = spawnSync(process.execPath, ['--import', 'tsx', 'server/command.ts', 'restore', target], {
      env: { ...process.env, DATA_FOLDER: folders().dataFolder, UPLOADS_FOLDER: folders().uploadsFolder },
      encoding: 'utf8',
    });
    expect(asked.status).toBe(1);
    expect(asked.stderr).toMatch(/is running \(process \d+\)\. Stop it first/);
    const to = elsewhere('second');
    await restore(to, target);
    await expect(restore(to, target)).rejects.toThrow(/There is a database in/);
    rmSync(to.dataFolder, { recursive: true });
    await expect(restore(to, target)).rejects.toThrow(/There are pictures in/);
  });

  test('that is damaged, incomplete or newer than the program is refused in words', async () => {
    const good = join(home, 'backup');
    await backUp(folders(), good, new Date());
    const spoilt = (name: string, spoil: (folder: string) => void) => {
      const folder = join(home, name);
      cpSync(good, folder, { recursive: true });
      spoil(folder);
      return restore(elsewhere(`to-${name}`), folder);
    };
    await expect(restore(elsewhere('x'), join(home, 'nowhere'))).rejects.toThrow(/not a backup/);
    await expect(spoilt('cut', (folder) => truncateSync(join(folder, 'kinwater.db'), 8192))).rejects.toThrow(/hash/);
    await expect(spoilt('lost', (folder) => rmSync(pictureFile(join(folder, 'uploads'))))).rejects.toThrow(/missing/);
    await expect(
      spoilt('bent', (folder) => writeFileSync(pictureFile(join(folder, 'uploads')), 'RIFF')),
    ).rejects.toThrow(/damaged/);
    await expect(
      spoilt('newer', (folder) => {
        const note = JSON.parse(readFileSync(join(folder, 'backup.json'), 'utf8'));
        writeFileSync(
          join(folder, 'backup.json'),
          JSON.stringify({ ...note, migrations: [...note.migrations, '900-later'] }),
        );
      }),
    ).rejects.toThrow(/newer version of Kinwater \(900-later\)/);
    expect(existsSync(elsewhere('to-cut').dataFolder)).toBe(false);
  });
});

describe('the integrity report', () => {
  const ask = () => owner.get(checkIntegrity, { params: { roomId } });

  test('says that all is well', async () => {
    expect(await ask()).toEqual({
      database: 'ok',
      references: [],
      pictures: 1,
      missing: [],
      damaged: [],
      unclaimed: [],
      belowZero: [],
    });
  });

  test('names a picture that is gone, one that was changed and one that nobody knows', async () => {
    const second = await photoOf(await tankIn(owner, roomId, 'T-2'));
    const stranger = makeId();
    const { uploadsFolder } = folders();
    cpSync(join(uploadsFolder, roomId, second), join(uploadsFolder, roomId, stranger), { recursive: true });
    rmSync(join(uploadsFolder, roomId, second), { recursive: true });
    writeFileSync(pictureFile(uploadsFolder), 'not what was stored');
    expect(await ask()).toMatchObject({ pictures: 2, missing: [second], damaged: [photoId], unclaimed: [stranger] });
    expect(isWhole(await examine(folders()))).toBe(false);
  });

  test('names rows that refer to nothing, and a batch with more fish gone than came', async () => {
    const { batchId } = await broodIn(owner, roomId, await colonyIn(owner, roomId), { opening: 5 });
    const { db } = app.house;
    const opened = await db
      .selectFrom('headEntry')
      .selectAll()
      .where('batchId', '=', batchId)
      .executeTakeFirstOrThrow();
    await db
      .insertInto('headEntry')
      .values({ ...opened, id: makeId(), kind: 'sold', heads: 40, at: START, onDay: TODAY })
      .execute();
    await sql`pragma foreign_keys = off`.execute(db);
    await sql`update photo set tankId = ${makeId()}`.execute(db);
    await sql`pragma foreign_keys = on`.execute(db);
    expect(await ask()).toMatchObject({
      database: 'ok',
      references: [{ table: 'photo', to: 'tank', count: 1 }],
      belowZero: [batchId],
    });
  });
});

describe('after a run that did not end by itself', () => {
  test('the next start checks the file, and sweeps what no row knows', async () => {
    const to = elsewhere('crashed');
    await backUp(folders(), join(home, 'backup'), new Date());
    await restore(to, join(home, 'backup'));
    // A process number that no process can have (Linux stops at 2^22).
    writeFileSync(join(to.dataFolder, 'lock'), '99999999 1');
    const { house, close } = await buildHouse({ ...app.house.config, ...to });
    expect((await house.db.selectFrom('photo').select('id').execute()).length).toBe(1);
    await close();
  });

  test('a damaged file is not written to: the server says so and stays down', async () => {
    const to = elsewhere('damaged');
    await backUp(folders(), join(home, 'backup'), new Date());
    await restore(to, join(home, 'backup'));
    const file = join(to.dataFolder, 'kinwater.db');
    const bytes = readFileSync(file);
    // The third page and those after it, overwritten as a failing disk would.
    bytes.fill(0x5a, 8192, 200_000);
    writeFileSync(file, bytes);
    writeFileSync(join(to.dataFolder, 'lock'), '99999999 1');
    await expect(buildHouse({ ...app.house.config, ...to })).rejects.toThrow(/damaged|malformed|corrupt/);
  });
});
