import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp, { type Sharp } from 'sharp';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { openPictures, type Pictures } from '@/server/pictures';
import * as b from '../support/pictureBytes';
import { pictureId } from '../support/pictureServer';

let folder: string;
let pictures: Pictures;
const roomId = pictureId();
const otherRoom = pictureId();
beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'kinwater-adopt-'));
  pictures = await openPictures({ folder, maxBytes: 1_000_000 });
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const store = async (make: Sharp) => {
  const path = pictures.tempPath();
  writeFileSync(path, await make.png().toBuffer());
  return pictures.store(path, roomId, pictureId());
};
/** Pictures of the fishroom that the archive is read into. */
const lying = (): string[] => (readdirSync(folder).includes(otherRoom) ? readdirSync(join(folder, otherRoom)) : []);

describe('a picture from an archive', () => {
  const copies = async (change: (bytes: Buffer) => Buffer | Promise<Buffer> = (bytes) => bytes) => {
    const made = await store(b.likePhoto(700, 500));
    const paths = { large: pictures.tempPath(), small: pictures.tempPath() };
    writeFileSync(paths.large, readFileSync(made.files.large));
    writeFileSync(paths.small, await change(readFileSync(made.files.small)));
    return { made, paths };
  };

  test('is put in place byte for byte', async () => {
    const { made, paths } = await copies();
    const id = pictureId();
    const adopted = await pictures.adopt(paths, otherRoom, id);
    expect(adopted).toMatchObject({ sha256: made.sha256, bytes: made.bytes, width: made.width, height: made.height });
    expect(readFileSync(adopted.files.small).equals(readFileSync(made.files.small))).toBe(true);
    expect(await pictures.report([{ roomId: otherRoom, id, sha256: made.sha256 }], otherRoom)).toMatchObject({
      missing: [],
      damaged: [],
    });
  });

  test('with transparency is put in place as well', async () => {
    const made = await store(b.fourFields().ensureAlpha(0.5));
    await pictures.adopt(made.files, otherRoom, pictureId());
    expect(lying()).toHaveLength(1);
  });

  test.each<[string, (bytes: Buffer) => Buffer | Promise<Buffer>]>([
    ['has something behind it', (bytes) => Buffer.concat([bytes, Buffer.from('<script>')])],
    ['is cut off', (bytes) => bytes.subarray(0, bytes.length - 100)],
    [
      'is cut off and says so',
      (bytes) => {
        const cut = Buffer.from(bytes.subarray(0, bytes.length / 2));
        cut.writeUInt32LE(cut.length - 8, 4);
        return cut;
      },
    ],
    [
      'holds camera data',
      () =>
        b
          .plain(99, 99)
          .withExif({ IFD0: { Artist: 'x' } })
          .webp()
          .toBuffer(),
    ],
    ['holds XMP', () => b.plain(99, 99).withXmp('<x:xmpmeta xmlns:x="adobe:ns:meta/"/>').webp().toBuffer()],
    [
      'is animated',
      () =>
        sharp(Buffer.alloc(40 * 80 * 3, 9).fill(200, 0, 4800), {
          raw: { width: 40, height: 80, channels: 3, pageHeight: 40 },
        })
          .webp()
          .toBuffer(),
    ],
    ['is larger than ours', () => b.plain(321, 200).webp().toBuffer()],
    ['is a JPEG', () => b.plain(99, 99).jpeg().toBuffer()],
    ['is empty', () => Buffer.alloc(0)],
    ['is a page', () => Buffer.from('<html>'.repeat(20))],
  ])('that %s is refused', async (_what, change) => {
    const { paths } = await copies(change);
    await expect(pictures.adopt(paths, otherRoom, pictureId())).rejects.toMatchObject({ reason: 'invalid' });
    expect(lying()).toEqual([]);
  });
});
