import { afterAll, beforeAll, expect, test } from 'vitest';
import { examine, isWhole } from '@/server/transfer';
import { dayOf } from '@/shared/days';
import { addPhoto, listPhotos } from '@/shared/photos/contract';
import { listEntries, recordEntry } from '@/shared/record/contract';
import * as b from '../support/pictureBytes';
import { type RealServer, realServer } from '../support/realServer';
import { tankIn } from '../support/stock';
import { makeId } from '../support/testApp';

/*
 * The real server as a process, killed with SIGKILL while it answers. What it acknowledged must be there once after the
 * next start, and sending everything again must add only what was missing.
 */

type Entry = { id: string; photoId: string | null };

let server: RealServer;
let tankId: string;
let picture: Buffer;
const today = dayOf(Date.now(), 'UTC');
const acknowledged: Entry[] = [];
const inDoubt: Entry[] = [];

beforeAll(async () => {
  picture = await b.likePhoto(1600, 1200).jpeg().toBuffer();
  server = await realServer();
  tankId = await tankIn(server.owner, server.roomId, 'T-1');
}, 60_000);
afterAll(() => server.cleanUp());

const draftOf = ({ id, photoId }: Entry) => ({
  id,
  madeAt: '2026-01-02T03:04:05.000Z',
  dependsOn: [],
  content: photoId
    ? { kind: 'photoTaken', photoId, of: { thing: 'tank', id: tankId }, takenOn: today, caption: null }
    : { kind: 'seenWell', tankId, onDay: today, note: null },
});

/** True when the server said that it is stored. A server that dies says nothing. */
async function send(entry: Entry): Promise<boolean> {
  const { owner, roomId } = server;
  try {
    if (!entry.photoId) {
      const { status } = await owner.ask(recordEntry, { params: { roomId }, body: draftOf(entry) });
      return status === 200;
    }
    const form = new FormData();
    form.set('entry', JSON.stringify(draftOf(entry)));
    form.set('picture', new Blob([new Uint8Array(picture)], { type: 'image/jpeg' }), 'fish.jpg');
    const answer = await owner.raw('POST', addPhoto.path.replace(':roomId', roomId), { body: form });
    await answer.text();
    return answer.status === 200;
  } catch {
    return false;
  }
}

async function write(entry: Entry): Promise<boolean> {
  const stored = await send(entry);
  (stored ? acknowledged : inDoubt).push(entry);
  return stored;
}

const aRecord = (): Entry => ({ id: makeId(), photoId: null });
const aPhoto = (): Entry => ({ id: makeId(), photoId: makeId() });

const stored = async () => {
  const params = { roomId: server.roomId };
  const { entries } = await server.owner.get(listEntries, { params, query: { limit: '500' } });
  const { photos } = await server.owner.get(listPhotos, { params });
  return { entries: entries.map(({ id }) => id).sort(), photos: photos.map(({ id }) => id).sort() };
};

const idsOf = (entries: Entry[]) => ({
  entries: entries.map(({ id }) => id).sort(),
  photos: entries.flatMap(({ photoId }) => photoId ?? []).sort(),
});

async function mustHaveLostNothing(): Promise<void> {
  const there = await stored();
  const sure = idsOf(acknowledged);
  expect(there.entries).toEqual(expect.arrayContaining(sure.entries));
  expect(there.photos).toEqual(expect.arrayContaining(sure.photos));
  const report = await examine(server.folders);
  expect(isWhole(report), JSON.stringify(report)).toBe(true);

  // The phone sends again whatever it had no answer to, and to be sure all the rest.
  for (const entry of inDoubt.splice(0)) expect(await write(entry)).toBe(true);
  for (const entry of acknowledged.slice(-5)) expect(await send(entry)).toBe(true);
  expect(await stored()).toEqual(idsOf(acknowledged));
}

test.each(['before-file', 'mid-file', 'after-file', 'after-commit'])(
  'a server that dies %s has kept what it acknowledged, once',
  async (point) => {
    await server.kill();
    await server.start(point);
    if (point !== 'after-commit') for (let i = 0; i < 3; i += 1) expect(await write(aRecord())).toBe(true);
    expect(await write(aPhoto())).toBe(false);
    expect(await server.ended()).toBe('SIGKILL');
    await server.start();
    await mustHaveLostNothing();
  },
  60_000,
);

test.each([60, 350, 900])(
  'a server killed %i ms into a burst of records and photos has kept what it acknowledged, once',
  async (ms) => {
    const burst = Array.from({ length: 40 }, (_, i) => (i % 4 === 3 ? aPhoto() : aRecord()));
    const killed = new Promise<void>((done) => setTimeout(() => void server.kill().then(done), ms));
    const writers = [0, 1, 2].map(async (n) => {
      for (const [i, entry] of burst.entries()) if (i % 3 === n) await write(entry);
    });
    await Promise.all([killed, ...writers]);
    await server.start();
    await mustHaveLostNothing();
  },
  60_000,
);

test('CRASH_AT is heeded by a server under test alone', async () => {
  const { readConfig } = await import('@/server/config');
  expect(readConfig({ NODE_ENV: 'development', CRASH_AT: 'mid-file' }).crashAt).toBeNull();
  expect(readConfig({ NODE_ENV: 'test', CRASH_AT: 'mid-file' }).crashAt).toBe('mid-file');
});
