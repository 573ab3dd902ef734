import { readFileSync, writeFileSync } from 'node:fs';
import sharp from 'sharp';
import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { whileDrawing } from '@/server/pictures';
import * as b from '../support/pictureBytes';
import { type PictureServer, pictureServer } from '../support/pictureServer';

let server: PictureServer;
beforeAll(async () => {
  server = await pictureServer();
});
afterEach(() => server.empty());
afterAll(() => server.close());

/** Stores and returns both files with what was answered. */
async function kept(file: Buffer, more: { name?: string } = {}) {
  const { status, body } = await server.send(file, more);
  expect(status, JSON.stringify(body)).toBe(200);
  const path = (size: 'large' | 'small') => server.pictures.fileOf(server.roomId, String(body['id']), size);
  return { body, large: path('large'), small: path('small') };
}

/** Colour in the middle of each quarter, top left to bottom right, as the letter of the field it is nearest to. */
async function quartersOf(path: string, tolerance = 90): Promise<string> {
  const { data, info } = await sharp(path).removeAlpha().raw().toBuffer({ resolveWithObject: true });
  return [
    [0.25, 0.25],
    [0.75, 0.25],
    [0.25, 0.75],
    [0.75, 0.75],
  ]
    .map(([x = 0, y = 0]) => {
      const at = (Math.floor(y * info.height) * info.width + Math.floor(x * info.width)) * info.channels;
      const distance = (colour: readonly number[]) =>
        colour.reduce((sum, value, i) => sum + Math.abs(value - (data[at + i] ?? 0)), 0);
      const nearest = Object.entries(b.CORNERS).sort(([, one], [, two]) => distance(one) - distance(two))[0];
      const [name, colour] = nearest ?? ['?', []];
      return distance(colour) < tolerance ? name : '?';
    })
    .join('');
}

describe('a photo taken with the camera turned', () => {
  // CIPA DC-008 (Exif 2.32), tag 274: where row 0 and column 0 of the stored picture lie in the scene. Worked out by hand.
  test.each([
    [1, 'ABCD', 96, 64],
    [2, 'BADC', 96, 64],
    [3, 'DCBA', 96, 64],
    [4, 'CDAB', 96, 64],
    [5, 'ACBD', 64, 96],
    [6, 'CADB', 64, 96],
    [7, 'DBCA', 64, 96],
    [8, 'BDAC', 64, 96],
  ])('orientation %i is shown upright', async (orientation, corners, width, height) => {
    const file = b.jpegWith(
      await b.fourFields().jpeg().toBuffer(),
      b.app1(b.exifBlock([b.orientationTag(orientation)])),
    );
    const { body, large, small } = await kept(file);
    expect(body).toMatchObject({ width, height });
    expect(await quartersOf(large)).toBe(corners);
    expect(await quartersOf(small)).toBe(corners);
  });

  test('is shown upright from PNG, WebP and AVIF too', async () => {
    for (const make of [
      b.fourFields().withMetadata({ orientation: 6 }).png(),
      b.fourFields().withMetadata({ orientation: 6 }).webp(),
    ]) {
      const { large } = await kept(await make.toBuffer());
      expect(await quartersOf(large)).toBe('CADB');
      await server.empty();
    }
  });
});

describe('both sizes', () => {
  test.each([
    [4000, 3000, [1280, 960], [320, 240]],
    [900, 3000, [384, 1280], [96, 320]],
    [1280, 700, [1280, 700], [320, 175]],
    [300, 200, [300, 200], [300, 200]],
  ])('of %i x %i fit 1280 and 320 without being enlarged', async (width, height, large, small) => {
    const picture = await kept(await b.plain(width, height).jpeg().toBuffer());
    for (const [path, [w, h]] of [
      [picture.large, large],
      [picture.small, small],
    ] as const)
      expect(await sharp(path).metadata()).toMatchObject({ width: w, height: h, format: 'webp' });
    expect(picture.body).toMatchObject({ width: large[0], height: large[1] });
  });

  test.each([
    ['CMYK', () => b.fourFields().toColourspace('cmyk').jpeg().toBuffer()],
    ['a phone with a wide gamut', () => b.fourFields().withIccProfile('p3').jpeg().toBuffer()],
    ['16 bits', () => b.fourFields().toColourspace('rgb16').png().toBuffer()],
    ['a colour table', () => b.fourFields().png({ palette: true }).toBuffer()],
    ['AVIF', () => b.fourFields().avif({ effort: 0 }).toBuffer()],
  ])('keep the colours of %s', async (_what, make) => {
    const { large, small } = await kept(await make());
    // Print inks reach no pure green or blue: enough that each field stays the nearest to its own colour.
    expect(await quartersOf(large, 200)).toBe('ABCD');
    expect(await quartersOf(small, 200)).toBe('ABCD');
  });

  test('keep what is seen through', async () => {
    const { large } = await kept(await b.fourFields().ensureAlpha(0.5).png().toBuffer());
    const { data } = await sharp(large).raw().toBuffer({ resolveWithObject: true });
    expect(data[3]).toBeGreaterThan(120);
    expect(data[3]).toBeLessThan(136);
  });

  test('of an animation show its first frame', async () => {
    const frames = Buffer.concat([Buffer.alloc(40 * 40 * 3, 200), Buffer.alloc(40 * 40 * 3, 10)]);
    const file = await sharp(frames, { raw: { width: 40, height: 80, channels: 3, pageHeight: 40 } })
      .webp()
      .toBuffer();
    const { large } = await kept(file);
    const { data, info } = await sharp(large).raw().toBuffer({ resolveWithObject: true });
    expect([info.width, info.height]).toEqual([40, 40]);
    expect(data[0]).toBeGreaterThan(190);
  });
});

describe('when it was taken', () => {
  test.each([
    ['2026:05:14 09:12:30', '2026-05-14', '2026-05-14T09:12:30'],
    ['2024:02:29 23:59:59', '2024-02-29', '2024-02-29T23:59:59'],
    ['2023:02:29 10:00:00', null, null],
    ['2026:13:01 10:00:00', null, null],
    ['2026:05:14 24:00:00', null, null],
    ['0000:00:00 00:00:00', null, null],
    ['    :  :     :  :  ', null, null],
    ['2026-05-14', null, null],
    ['yesterday', null, null],
    ['٢٠٢٦:٠٥:١٤ ٠٩:١٢:٣٠', null, null],
  ])('is read from the camera: %s', async (written, takenOn, takenAt) => {
    expect((await kept(await b.takenAt(written))).body).toMatchObject({ takenOn, takenAt });
  });

  test('is unknown when the camera wrote 40 kB instead', async () => {
    expect((await kept(await b.takenAt('9'.repeat(40_000)))).body).toMatchObject({ takenOn: null, takenAt: null });
  });

  test('is the time of scanning when there is no other', async () => {
    const file = b.jpegWith(
      await b.fourFields().jpeg().toBuffer(),
      b.app1(b.exifBlock([], [b.digitizedTag('2025:12:31 18:00:00')])),
    );
    expect((await kept(file)).body).toMatchObject({ takenOn: '2025-12-31', takenAt: '2025-12-31T18:00:00' });
  });

  test('is not the time at which a program last changed the file', async () => {
    const changed = { tag: 0x0132, type: b.TYPES.ASCII, value: '2026:01:01 10:00:00' };
    const file = b.jpegWith(await b.fourFields().jpeg().toBuffer(), b.app1(b.exifBlock([changed])));
    expect((await kept(file)).body).toMatchObject({ takenOn: null, takenAt: null });
  });

  test.each(['png', 'webp', 'avif'] as const)('is read from %s', async (format) => {
    const file = await b
      .fourFields()
      .withExif({ IFD2: { DateTimeOriginal: '2026:03:02 07:08:09' } })
      .toFormat(format, { effort: 1 })
      .toBuffer();
    expect((await kept(file)).body).toMatchObject({ takenAt: '2026-03-02T07:08:09' });
  });

  test('does not depend on where the server stands', async () => {
    const zone = process.env['TZ'];
    process.env['TZ'] = 'Pacific/Auckland';
    const { body } = await kept(await b.takenAt('2026:05:14 23:30:00'));
    process.env['TZ'] = zone;
    expect(body).toMatchObject({ takenOn: '2026-05-14', takenAt: '2026-05-14T23:30:00' });
  });
});

test('where a photo was taken is not stored, nor by whom', async () => {
  const file = await b
    .fourFields()
    .withExif({
      IFD0: { Artist: 'KWMARK artist', Make: 'KWMARK camera' },
      IFD3: { GPSLatitudeRef: 'S', GPSLatitude: '8/1 47/1 0/1', GPSLongitudeRef: 'E', GPSLongitude: '31/1 5/1 0/1' },
    })
    .jpeg()
    .toBuffer();
  const sent = file.toString('latin1');
  expect(sent, 'the fixture holds what is to be stripped').toContain('KWMARK artist');
  const { large, small } = await kept(file);
  for (const path of [large, small]) {
    expect((await sharp(path).metadata()).exif).toBeUndefined();
    expect(readFileSync(path).toString('latin1')).not.toContain('KWMARK');
  }
});

describe('a stored picture', () => {
  test('is served as a picture and nothing else', async () => {
    const { body, large } = await kept(await b.fourFields().jpeg().toBuffer());
    const answer = await fetch(`${server.origin}/pictures/${body['id']}/large?name=Brood%2012`);
    expect(answer.status).toBe(200);
    expect(Object.fromEntries(answer.headers)).toMatchObject({
      'content-type': 'image/webp',
      'x-content-type-options': 'nosniff',
      'content-security-policy': "default-src 'none'; sandbox",
      'cache-control': 'private, max-age=3600',
      'content-disposition': `inline; filename="picture.webp"; filename*=UTF-8''Brood%2012.webp`,
    });
    expect(Buffer.from(await answer.arrayBuffer()).equals(readFileSync(large))).toBe(true);
  });

  test('is not sent again to a browser that has it', async () => {
    const { body } = await kept(await b.fourFields().jpeg().toBuffer());
    const address = `${server.origin}/pictures/${body['id']}/small`;
    const tag = (await fetch(address)).headers.get('etag') ?? '';
    expect((await fetch(address, { headers: { 'If-None-Match': tag, 'Cache-Control': 'max-age=0' } })).status).toBe(
      304,
    );
  });

  // RFC 8187 section 3.2.1: what is not an attr-char is percent-encoded.
  test.each([
    ["männchen's (1)*.jpg", 'm%C3%A4nnchen%27s%20%281%29%2A.jpg'],
    ['../../etc/passwd', '....etcpasswd'],
    ['a\r\nSet-Cookie: x=1', 'aSet-Cookie%3A%20x%3D1'],
    ['"; filename="x.html', '%22%3B%20filename%3D%22x.html'],
    ['\u202Egpj.exe', 'gpj.exe'],
    ['🐟', '%F0%9F%90%9F'],
    ['\u0000\u0007', 'picture'],
  ])('named %j is saved under a harmless name', async (name, encoded) => {
    const { body } = await kept(await b.fourFields().jpeg().toBuffer());
    const answer = await fetch(`${server.origin}/pictures/${body['id']}/small?name=${encodeURIComponent(name)}`);
    expect(answer.headers.get('content-disposition')).toBe(
      `inline; filename="picture.webp"; filename*=UTF-8''${encoded}.webp`,
    );
  });

  test('of an endless name is saved under its beginning', async () => {
    const { body } = await kept(await b.fourFields().jpeg().toBuffer());
    const answer = await fetch(`${server.origin}/pictures/${body['id']}/small?name=${'x'.repeat(10_000)}`);
    expect(answer.headers.get('content-disposition')).toContain(`''${'x'.repeat(100)}.webp`);
  });

  test('that does not exist is not found, whatever its address looks like', async () => {
    for (const id of ['01976f3e-1111-7abc-8abc-0123456789ab', '..%2f..%2fetc', '.incoming', '%00', 'x'.repeat(5000)]) {
      const answer = await fetch(`${server.origin}/pictures/${id}/large`);
      expect(answer.status, id.slice(0, 40)).toBe(404);
      expect(answer.headers.get('content-disposition')).toBeNull();
      expect(await answer.json()).toEqual({
        error: { reason: 'not-found', message: 'That picture was not found', fields: {} },
      });
    }
  });

  test('is gone once it is removed, and removing it again does nothing', async () => {
    const { body } = await kept(await b.fourFields().jpeg().toBuffer());
    const id = String(body['id']);
    await server.pictures.remove(server.roomId, id);
    expect(server.stored()).toEqual([]);
    expect((await fetch(`${server.origin}/pictures/${id}/small`)).status).toBe(404);
    await server.pictures.remove(server.roomId, id);
  });
});

test('a picture that was renamed is judged by what it is', async () => {
  const { large } = await kept(await b.fourFields().png().toBuffer(), { name: 'notes.txt' });
  expect(await quartersOf(large)).toBe('ABCD');
});

test('once pictures are open, no other decoder answers anywhere in the server', async () => {
  const svg = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"/>');
  await expect(sharp(svg).metadata()).rejects.toThrow();
  const path = server.pictures.tempPath();
  writeFileSync(path, await b.fourFields().gif().toBuffer());
  await expect(sharp(path).metadata()).rejects.toThrow();
});

test('while the server draws pictures of its own, an uploaded drawing is refused all the same', async () => {
  const svg = Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"/>');
  await whileDrawing(async () => {
    const png = await sharp(svg).png().toBuffer();
    expect(await sharp(png).metadata()).toMatchObject({ format: 'png', width: 9 });
    expect((await server.send(svg)).body).toMatchObject({ error: { reason: 'unsupported' } });
  });
  await expect(sharp(svg).metadata()).rejects.toThrow();
});
