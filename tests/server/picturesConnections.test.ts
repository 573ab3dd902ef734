import fs from 'node:fs';
import fsp from 'node:fs/promises';
import { syncBuiltinESMExports } from 'node:module';
import { connect } from 'node:net';
import { afterAll, afterEach, beforeAll, describe, expect, test, vi } from 'vitest';
import { bytesOf, filePartOf, formOf, requestOf, statusOf } from '../support/multipart';
import * as b from '../support/pictureBytes';
import { eventually, MAX_BYTES, type PictureServer, pictureId, pictureServer } from '../support/pictureServer';

let server: PictureServer;
let photo: Buffer;
beforeAll(async () => {
  server = await pictureServer();
  photo = await b.fourFields().jpeg().toBuffer();
});
afterEach(async () => {
  await eventually(() => server.incoming().length === 0, 'nothing is left of the upload');
  await server.empty();
  expect(server.faults.splice(0)).toEqual([]);
});
afterAll(() => server.close());

const filePart = (name = 'fish.jpg', field = 'picture', body: Buffer | string = photo) => filePartOf(body, name, field);

describe('the length a client gives', () => {
  test('is judged before anything is read', async () => {
    const answer = await server.raw(requestOf(Buffer.alloc(0), { length: 10_000_000_000 }));
    expect(statusOf(answer)).toBe(413);
    expect(server.incoming()).toEqual([]);
  });

  test.each([
    ['negative', '-1'],
    ['no number', 'many'],
    ['two numbers', '10, 20'],
    ['hexadecimal', '0x10'],
  ])('that is %s is refused', async (_what, length) => {
    const request = requestOf(formOf(filePart()), { length: null, headers: `Content-Length: ${length}\r\n` });
    expect(statusOf(await server.raw(request))).toBe(400);
  });

  test('beside a chunked body is refused, so that no second request hides in the first', async () => {
    const answer = await server.raw(requestOf(formOf(filePart()), { headers: 'Transfer-Encoding: chunked\r\n' }));
    expect(statusOf(answer)).toBe(400);
  });

  test('may be missing, but too much is too much', async () => {
    const body = formOf(filePart('a.jpg', 'picture', Buffer.alloc(2 * MAX_BYTES)));
    const chunked = bytesOf(`${body.length.toString(16)}\r\n`, body, '\r\n0\r\n\r\n');
    const answer = await server.raw(requestOf(chunked, { length: null, headers: 'Transfer-Encoding: chunked\r\n' }));
    expect(statusOf(answer)).toBe(413);
  });

  test('that is smaller than the form cuts it off', async () => {
    const form = formOf(filePart());
    expect(statusOf(await server.raw(requestOf(form, { length: form.length - 50 })))).toBe(400);
  });

  test('that is larger than the form leaves nothing when the client goes', async () => {
    const form = formOf(filePart());
    const answer = await server.raw(requestOf(form, { length: form.length + 50 }), 'after-sending');
    expect(answer).toBe('');
    await eventually(() => server.incoming().length === 0, 'the file is swept');
  });
});

describe('a client that hangs up', () => {
  /** Sends so much of the form, waits a little, and breaks the connection. */
  const hangUp = (bytes: Buffer, waitMs: number): Promise<void> =>
    new Promise((done) => {
      const socket = connect(server.port, '127.0.0.1', () => {
        socket.write(bytes, () => setTimeout(() => socket.resetAndDestroy(), waitMs));
      });
      socket.on('error', () => {});
      socket.on('close', () => done());
    });

  test.each([0, 0.001, 0.01, 0.1, 0.5, 0.9, 0.999])('after %d of the picture leaves nothing', async (share) => {
    const big = bytesOf(photo, Buffer.alloc(MAX_BYTES / 2));
    const request = requestOf(formOf(filePart('a.jpg', 'picture', big)));
    const headEnd = request.indexOf('\r\n\r\n') + 4;
    for (const waitMs of [0, 3, 30]) {
      await hangUp(request.subarray(0, headEnd + Math.floor((request.length - headEnd) * share)), waitMs);
      await eventually(() => server.incoming().length === 0, 'the file is swept');
    }
    expect(server.stored()).toEqual([]);
  });

  test('forty times at once, at any moment, leaves nothing and does not hold up the next', async () => {
    const request = requestOf(formOf(filePart('a.jpg', 'picture', Buffer.alloc(MAX_BYTES / 2))));
    await Promise.all(
      Array.from({ length: 40 }, (_, i) => hangUp(request.subarray(0, Math.floor((request.length * i) / 41)), i % 7)),
    );
    await eventually(() => server.incoming().length === 0, 'the files are swept');
    expect((await server.send(photo)).status).toBe(200);
  });

  test('when all is sent leaves a whole picture or none', async () => {
    const id = pictureId();
    await hangUp(requestOf(formOf(filePart()), { id }), 0);
    // The work may still go on for a moment after the client has gone.
    await new Promise((later) => setTimeout(later, 400));
    await eventually(() => server.incoming().length === 0, 'the file is swept');
    for (const stored of server.stored()) {
      expect(stored).toBe(id);
      for (const size of ['large', 'small'] as const)
        expect(fs.statSync(server.pictures.fileOf(server.roomId, id, size)).size).toBeGreaterThan(50);
    }
  });
});

test('many pictures at once are stored, or sent away with a time to come back', async () => {
  const large = await b.plain(3000, 2000).jpeg().toBuffer();
  const answers = await Promise.all(Array.from({ length: 80 }, () => server.send(large)));
  const stored = answers.filter(({ status }) => status === 200);
  const away = answers.filter(({ status }) => status === 503);
  expect(stored.length + away.length).toBe(80);
  expect(stored.length).toBeGreaterThanOrEqual(20);
  expect(away.length).toBeGreaterThan(0);
  for (const { headers, body } of away) {
    expect(Number(headers.get('retry-after'))).toBeGreaterThan(0);
    expect(body).toMatchObject({ error: { reason: 'busy' } });
  }
  expect(server.stored().sort()).toEqual(stored.map(({ body }) => body['id']).sort());
  expect((await server.send(photo)).status, 'the line is open again').toBe(200);
});

test('the rest of the server answers while pictures are worked on', async () => {
  const large = await b.plain(5000, 4000).jpeg().toBuffer();
  const uploads = Array.from({ length: 12 }, () => server.send(large));
  const waits: number[] = [];
  let working = true;
  const all = Promise.all(uploads).finally(() => {
    working = false;
  });
  while (working) {
    const asked = performance.now();
    await fetch(`${server.origin}/nothing`);
    waits.push(performance.now() - asked);
    await new Promise((later) => setTimeout(later, 10));
  }
  await all;
  const median = waits.sort((one, two) => one - two)[Math.floor(waits.length / 2)] ?? 0;
  expect(median).toBeLessThan(100);
});

/** The kernel's own ENOSPC, from the device that is always full. */
describe.skipIf(!fs.existsSync('/dev/full'))('a full disk', () => {
  afterEach(() => {
    vi.restoreAllMocks();
    syncBuiltinESMExports();
  });

  test('while the picture arrives is said plainly, leaves nothing, and is got over', async () => {
    const real = fs.createWriteStream;
    vi.spyOn(fs, 'createWriteStream').mockImplementation(() => real('/dev/full', { flags: 'w' }));
    expect(await server.send(photo)).toMatchObject({ status: 507, body: { error: { reason: 'full' } } });
    expect(server.stored()).toEqual([]);
    vi.restoreAllMocks();
    expect((await server.send(photo)).status).toBe(200);
  });

  test.each(['large', 'small'] as const)('while the %s file is written leaves no half picture', async (size) => {
    const real = fsp.open;
    const edge = size === 'large' ? '1280' : '320';
    vi.spyOn(fsp, 'open').mockImplementation((path, flags) =>
      flags === 'wx' && String(path).endsWith(`${edge}.webp`) ? real('/dev/full', 'w') : real(path, flags),
    );
    syncBuiltinESMExports();
    expect(await server.send(photo)).toMatchObject({ status: 507, body: { error: { reason: 'full' } } });
    expect(server.incoming()).toEqual([]);
    expect(server.stored()).toEqual([]);
    vi.restoreAllMocks();
    syncBuiltinESMExports();
    expect((await server.send(photo)).status).toBe(200);
  });
});
