import { createWriteStream, readFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { ZipArchive } from 'archiver';
import { sql } from 'kysely';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import yauzl from 'yauzl';
import { getMe } from '@/shared/accounts/contract';
import { listBroods } from '@/shared/broods/contract';
import { addPhoto } from '@/shared/photos/contract';
import { safeCell } from '@/shared/transfer/archive';
import { exportArchive, exportTables, importArchive } from '@/shared/transfer/contract';
import { type Known, memberOf, ownerWithRoom, personWithAccount } from '../support/accounts';
import * as b from '../support/pictureBytes';
import { broodIn, colonyIn, record, TODAY, tankIn } from '../support/stock';
import { makeId, START, type TestApp, testApp } from '../support/testApp';

let here: TestApp;
let there: TestApp;
let owner: Known;
let roomId: string;
let photoId: string;

beforeEach(async () => {
  here = await testApp();
  there = await testApp();
  ({ owner, roomId } = await ownerWithRoom(here));
  const keeper = await memberOf(here, roomId, 'keeper');
  const tankId = await tankIn(owner, roomId, 'T-1');
  await broodIn(owner, roomId, await colonyIn(owner, roomId));
  await record(keeper, roomId, { kind: 'seenWell', tankId, onDay: TODAY, note: '=HYPERLINK("x")' });
  photoId = makeId();
  const form = new FormData();
  const content = {
    kind: 'photoTaken',
    photoId,
    of: { thing: 'tank', id: tankId },
    takenOn: TODAY,
    caption: 'Zoë, 3 cm',
  };
  form.set('entry', JSON.stringify({ id: makeId(), madeAt: START, dependsOn: [], content }));
  form.set('picture', new Blob([new Uint8Array(await b.likePhoto(640, 480).jpeg().toBuffer())]), 'fish.jpg');
  expect((await owner.raw('POST', addPhoto.path.replace(':roomId', roomId), { body: form })).status).toBe(200);
});
afterEach(async () => {
  await here.close();
  await there.close();
});

async function fetched(person: Known, room: string, line = exportArchive): Promise<Buffer> {
  const answer = await person.raw('GET', line.path.replace(':roomId', room));
  expect(answer.status).toBe(200);
  return Buffer.from(await answer.arrayBuffer());
}

async function sent(person: Known, zip: Buffer) {
  const form = new FormData();
  form.set('file', new Blob([new Uint8Array(zip)]), 'archive.zip');
  const answer = await person.raw('POST', importArchive.path, { body: form });
  return { status: answer.status, body: await answer.json() };
}

/** The files of a zip, by name. */
function unpacked(zip: Buffer): Promise<Map<string, Buffer>> {
  return new Promise((done, failed) =>
    yauzl.fromBuffer(zip, { lazyEntries: true }, (error, file) => {
      if (error) return failed(error);
      const files = new Map<string, Buffer>();
      file.on('entry', (entry) =>
        file.openReadStream(entry, (_error, stream) => {
          const parts: Buffer[] = [];
          stream.on('data', (part: Buffer) => parts.push(part));
          stream.on('end', () => {
            files.set(entry.fileName, Buffer.concat(parts));
            file.readEntry();
          });
        }),
      );
      file.on('end', () => done(files));
      file.readEntry();
    }),
  );
}

async function packed(files: Map<string, Buffer | string>): Promise<Buffer> {
  const path = join(tmpdir(), `${makeId()}.zip`);
  const zip = new ZipArchive({});
  for (const [name, content] of files) zip.append(content, { name });
  const written = pipeline(zip, createWriteStream(path));
  await zip.finalize();
  await written;
  return readFileSync(path);
}

describe('a fishroom’s archive', () => {
  test('makes an equal fishroom in another installation, whose archive is the same to the byte', async () => {
    const archive = await fetched(owner, roomId);
    const newcomer = await personWithAccount(there);
    const { status, body } = await sent(newcomer, archive);
    expect(status, JSON.stringify(body)).toBe(200);
    expect(body).toEqual({ id: roomId });
    expect((await fetched(newcomer, roomId)).equals(archive)).toBe(true);
    const broods = (app: Known) => app.get(listBroods, { params: { roomId } });
    expect(await broods(newcomer)).toEqual(await broods(owner));
    expect((await newcomer.get(getMe)).rooms).toMatchObject([{ id: roomId, role: 'owner' }]);
  });

  test('comes in beside its original as a fishroom of its own, under another address', async () => {
    const { status, body } = await sent(owner, await fetched(owner, roomId));
    expect(status, JSON.stringify(body)).toBe(200);
    expect(body.id).not.toBe(roomId);
    const rooms = (await owner.get(getMe)).rooms;
    expect(new Set(rooms.map(({ slug }) => slug)).size).toBe(2);
    const [one, two] = await Promise.all([fetched(owner, roomId), fetched(owner, body.id)]).then((zips) =>
      Promise.all(zips.map(unpacked)),
    );
    expect(two?.get('tables/fish.jsonl')).toEqual(one?.get('tables/fish.jsonl'));
    expect(two?.get('tables/headEntry.jsonl')).toEqual(one?.get('tables/headEntry.jsonl'));
    expect(two?.get(`pictures/${photoId}/1280.webp`)).toEqual(one?.get(`pictures/${photoId}/1280.webp`));
  });

  test('holds no address, hash, token or key of anybody', async () => {
    const files = await unpacked(await fetched(owner, roomId));
    const all = [...files].filter(([name]) => !name.startsWith('pictures/')).map(([, content]) => content.toString());
    expect(all.join('\n')).not.toMatch(/passwordHash|emailFolded|tokenHash|sealedPrivateJwk|totpSecret|@mail\.example/);
    expect([...files.keys()].slice(0, 2)).toEqual(['kinwater.json', 'people.json']);
    expect(JSON.parse(files.get('people.json')?.toString() ?? '')).toHaveLength(2);
  });

  test('is for owners alone', async () => {
    const keeper = await memberOf(here, roomId, 'keeper');
    expect((await keeper.ask(exportArchive, { params: { roomId } })).status).toBe(403);
    expect((await keeper.ask(exportTables, { params: { roomId } })).status).toBe(403);
  });
});

describe('what is no good archive is refused in words, and leaves nothing', () => {
  const cases: [string, (files: Map<string, Buffer | string>) => void, RegExp][] = [
    ['a file that belongs nowhere', (files) => files.set('notes.txt', 'x'), /“notes.txt” does not belong/],
    ['a picture that no row knows', (files) => files.set(`pictures/${makeId()}/320.webp`, 'x'), /belongs to no photo/],
    ['a picture that is none', (files) => files.set(`pictures/${photoId}/320.webp`, 'GIF89a'), /damaged/],
    ['a photo without its files', (files) => files.delete(`pictures/${photoId}/320.webp`), /files of photo .* missing/],
    ['no description', (files) => files.delete('kinwater.json'), /kinwater.json is missing/],
    ['a later version', (files) => edit(files, 'kinwater.json', '"version":1', '"version":2'), /format is version 2/],
    [
      'a later schema',
      (files) => edit(files, 'kinwater.json', /"schema":"[^"]*"/, '"schema":"900-x"'),
      /newer version/,
    ],
    [
      'a dangling reference',
      (files) => edit(files, 'tables/colonyMember.jsonl', /"fishId":"[^"]*"/, `"fishId":"${makeId()}"`),
      /refers to something that is not in it/,
    ],
    ['somebody who is not named', (files) => files.set('people.json', '[]'), /names nobody in people.json/],
    [
      'a column that is none',
      (files) => edit(files, 'tables/tank.jsonl', '{', '{"roomId":"x",'),
      /roomId is no column/,
    ],
    [
      'a number where text belongs',
      (files) => edit(files, 'tables/tank.jsonl', '"code":"T-MOKA"', '"code":7'),
      /tank row \d+: code/,
    ],
    [
      'an id that is a path',
      (files) => edit(files, 'tables/photo.jsonl', /"id":"[^"]*"/, '"id":"../../x"'),
      /photo row 1: id/,
    ],
    [
      'a value that the rules forbid',
      (files) => edit(files, 'tables/tank.jsonl', /"litres":\d+/, '"litres":-1'),
      /breaks a rule/,
    ],
    [
      'an entry that cannot be read',
      (files) => edit(files, 'tables/entry.jsonl', /seenWell/g, 'seenBad'),
      /cannot be read/,
    ],
    ['a table that is none', (files) => files.set('tables/account.jsonl', '{}'), /no table/],
    [
      'two fishrooms',
      (files) => files.set('tables/room.jsonl', `${files.get('tables/room.jsonl')}`.repeat(2)),
      /no fishroom/,
    ],
  ];
  function edit(files: Map<string, Buffer | string>, name: string, from: string | RegExp, to: string): void {
    const before = String(files.get(name));
    const after = before.replace(from, to);
    expect(after).not.toBe(before);
    files.set(name, after);
  }

  test.each(cases)('%s', async (_name, spoil, words) => {
    const newcomer = await personWithAccount(there);
    const files: Map<string, Buffer | string> = await unpacked(await fetched(owner, roomId));
    spoil(files);
    const { status, body } = await sent(newcomer, await packed(files));
    expect(`${status} ${body.error?.message}`).toMatch(/^422/);
    expect(body.error.message).toMatch(words);
    const { rows } = await sql`select id from room`.execute(there.house.db);
    expect(rows).toEqual([]);
    expect(await there.house.pictures.bytesOf(roomId)).toBe(0);
  });

  test('a path that climbs out, a bomb, half a file and no zip at all', async () => {
    const newcomer = await personWithAccount(there);
    const good = await fetched(owner, roomId);
    const renamed = Buffer.from(good.toString('latin1').replaceAll('people.json', '../ple.json'), 'latin1');
    // One declared size larger than all tables may be, in the central directory.
    const bomb = Buffer.from(good);
    const entry = bomb.lastIndexOf(Buffer.from('504b0102', 'hex'), bomb.lastIndexOf('tables/audit.jsonl'));
    bomb.writeUInt32LE(0x7fffffff, entry + 24);
    for (const [zip, words] of [
      [renamed, /invalid relative path|does not belong/],
      [bomb, /too large/],
      [good.subarray(0, good.length / 2), /not a zip file, or not whole/],
      [Buffer.from('hello'), /not a zip file/],
    ] as const) {
      const { status, body } = await sent(newcomer, zip);
      expect(status).toBe(422);
      expect(body.error.message).toMatch(words);
    }
  });
});

describe('the tables as CSV', () => {
  test('hold every table, with cells that no spreadsheet runs and columns explained', async () => {
    const files = await unpacked(await fetched(owner, roomId, exportTables));
    expect(files.get('tankCare.csv')?.toString()).toContain(`"'=HYPERLINK(""x"")"`);
    expect(files.get('columns.csv')?.toString()).toMatch(
      /tank,a tank,lengthTenthsMm,"whole number, tenths of a millimetre",yes,/,
    );
    // Header, and one line for each of the eight fish of the colony.
    expect(files.get('fish.csv')?.toString().trimEnd().split('\r\n')).toHaveLength(9);
    const explained = new Set(
      files
        .get('columns.csv')
        ?.toString()
        .split('\r\n')
        .map((line) => line.split(',')[0]),
    );
    for (const name of files.keys()) if (name !== 'columns.csv') expect(explained).toContain(name.replace('.csv', ''));
  });

  test('a formula is text, a number stays a number', () => {
    expect(['=1+1', '+1', '-1', '@x', '\tx', 'MOKA-7', ''].map(safeCell)).toEqual([
      "'=1+1",
      "'+1",
      "'-1",
      "'@x",
      "'\tx",
      'MOKA-7',
      '',
    ]);
  });
});
