import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { mustFitQuota, openPictures, type Pictures, type StoredPicture } from '@/server/pictures';
import * as b from '../support/pictureBytes';
import { pictureId } from '../support/pictureServer';

let folder: string;
let pictures: Pictures;
const roomId = pictureId();
const otherRoom = pictureId();
const open = async () => {
  pictures = await openPictures({ folder, maxBytes: 1_000_000 });
};
beforeEach(async () => {
  folder = mkdtempSync(join(tmpdir(), 'kinwater-kept-'));
  await open();
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const file = async (make = b.fourFields()): Promise<string> => {
  const path = pictures.tempPath();
  writeFileSync(path, await make.png().toBuffer());
  return path;
};
const store = async (id = pictureId(), make = b.fourFields(), room = roomId): Promise<StoredPicture> => {
  const path = await file(make);
  return pictures.store(path, room, id).finally(() => rmSync(path));
};
const lying = (room = roomId): string[] => {
  try {
    return readdirSync(join(folder, room));
  } catch {
    return [];
  }
};
const rowOf = (id: string, { sha256 }: StoredPicture, room = roomId) => ({ roomId: room, id, sha256 });

describe('sending the same picture twice', () => {
  test('stores it once', async () => {
    const id = pictureId();
    const [one, two] = await Promise.all([store(id), store(id)]);
    expect(one.sha256).toBe(two.sha256);
    expect(lying()).toEqual([id]);
    expect(await pictures.bytesOf(roomId)).toBe(one.bytes);
  });

  test('keeps it when the row of only one of the two could be written, whichever it was', async () => {
    for (const lucky of [0, 1]) {
      const id = pictureId();
      const both = await Promise.all([store(id), store(id)]);
      both[lucky]?.keep();
      await both[1 - lucky]?.discard();
      expect(lying()).toContain(id);
    }
  });

  test('keeps it when the second gives up first and the first is kept later', async () => {
    const id = pictureId();
    const first = await store(id);
    const second = await store(id);
    await second.discard();
    expect(lying()).toEqual([id]);
    first.keep();
    await first.discard();
    expect(lying()).toEqual([id]);
  });

  test('leaves nothing when neither row could be written', async () => {
    const id = pictureId();
    const first = await store(id);
    const second = await store(id);
    await first.discard();
    await first.discard();
    expect(lying(), 'the second still counts on it').toEqual([id]);
    await second.discard();
    expect(lying()).toEqual([]);
  });

  test('keeps what was there before a restart', async () => {
    const id = pictureId();
    (await store(id)).keep();
    await open();
    await (await store(id)).discard();
    expect(lying()).toEqual([id]);
  });

  test('with another picture under the same id is a conflict, and the first stays as it is', async () => {
    const id = pictureId();
    const first = await store(id);
    first.keep();
    await expect(store(id, b.plain(50, 50))).rejects.toMatchObject({ reason: 'conflict' });
    expect(await pictures.report([rowOf(id, first)])).toMatchObject({ missing: [], damaged: [], unclaimed: [] });
  });

  test('after it was given up stores it anew', async () => {
    const id = pictureId();
    await (await store(id)).discard();
    await store(id);
    expect(lying()).toEqual([id]);
  });
});

describe('ids', () => {
  test.each(['../x', '', '.incoming', 'A'.repeat(36), '%2e%2e', 'x\0y', '01976f3e-1111-4abc-8abc-0123456789ab'])(
    '%j is no id and becomes no path',
    async (bad) => {
      const path = await file();
      await expect(pictures.store(path, roomId, bad)).rejects.toMatchObject({ reason: 'not-found' });
      await expect(pictures.store(path, bad, pictureId())).rejects.toMatchObject({ reason: 'not-found' });
      expect(() => pictures.fileOf(bad, pictureId(), 'large')).toThrow('not found');
      expect(() => pictures.fileOf(roomId, bad, 'small')).toThrow('not found');
      rmSync(path);
      expect(readdirSync(folder)).toEqual(['.incoming']);
    },
  );
});

describe('the space of a fishroom', () => {
  test('is counted as what lies on the disk', async () => {
    const some = [await store(), await store(pictureId(), b.likePhoto(1500, 900)), await store()];
    await store(pictureId(), b.fourFields(), otherRoom);
    await some[2]?.discard();
    await expect(pictures.store(join(folder, '.incoming'), roomId, pictureId())).rejects.toThrow();
    const sum = (some[0]?.bytes ?? 0) + (some[1]?.bytes ?? 0);
    expect(await pictures.bytesOf(roomId)).toBe(sum);
    const onDisk = readdirSync(join(folder, roomId), { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .reduce((total, entry) => total + statSync(join(entry.parentPath, entry.name)).size, 0);
    expect(onDisk).toBe(sum);
    expect(await pictures.bytesOf(pictureId())).toBe(0);
  });

  test('may be filled to the last byte and no further', () => {
    expect(() => mustFitQuota({ used: 900, added: 100, quota: 1000 })).not.toThrow();
    expect(() => mustFitQuota({ used: 901, added: 100, quota: 1000 })).toThrow(
      expect.objectContaining({ reason: 'full' }),
    );
  });
});

describe('the integrity report', () => {
  test('finds nothing wrong where nothing is wrong', async () => {
    const [one, two] = [pictureId(), pictureId()];
    const rows = [rowOf(one, await store(one)), rowOf(two, await store(two, b.plain(9, 9)))];
    expect(await pictures.report(rows)).toEqual({ checked: 2, missing: [], damaged: [], unclaimed: [] });
  });

  test('names a row without files, files without a row, and files that have changed by one bit', async () => {
    const ids = Array.from({ length: 5 }, pictureId);
    const [good = '', noFiles = '', oneFile = '', changed = '', noRow = ''] = ids;
    const rows = [];
    for (const id of ids) rows.push(rowOf(id, await store(id)));
    rmSync(join(folder, roomId, noFiles), { recursive: true });
    rmSync(pictures.fileOf(roomId, oneFile, 'small'));
    const path = pictures.fileOf(roomId, changed, 'small');
    const bytes = readFileSync(path);
    bytes[bytes.length - 3] = (bytes[bytes.length - 3] ?? 0) ^ 1;
    writeFileSync(path, bytes);
    const report = await pictures.report(rows.filter(({ id }) => id !== noRow));
    expect(report).toEqual({
      checked: 4,
      missing: [noFiles, oneFile].map((id) => ({ roomId, id })),
      damaged: [{ roomId, id: changed }],
      unclaimed: [{ roomId, id: noRow }],
    });
    expect(JSON.stringify(report)).not.toContain(good);
  });

  test('of one fishroom says nothing of another', async () => {
    const id = pictureId();
    const mine = await store(id);
    await store(pictureId(), b.fourFields(), otherRoom);
    expect(await pictures.report([rowOf(id, mine)], roomId)).toMatchObject({ checked: 1, unclaimed: [] });
    expect((await pictures.report([rowOf(id, mine)])).unclaimed).toHaveLength(1);
  });
});

describe('the sweep at the start', () => {
  test('takes away what no row knows, and leaves the rest', async () => {
    const known = pictureId();
    await store(known);
    await store(pictureId());
    await store(pictureId(), b.fourFields(), otherRoom);
    expect(await pictures.sweep([{ roomId, id: known }])).toEqual({ removed: 2, heldBack: 0 });
    expect(lying()).toEqual([known]);
    expect(lying(otherRoom)).toEqual([]);
  });

  test('does not trust a database that knows hardly any of the pictures', async () => {
    for (let i = 0; i < 101; i++) mkdirSync(join(folder, roomId, pictureId()), { recursive: true });
    expect(await pictures.sweep([])).toEqual({ removed: 0, heldBack: 101 });
    expect(lying()).toHaveLength(101);
  });

  test('leaves files that are none of ours alone', async () => {
    writeFileSync(join(folder, '.gitkeep'), '');
    mkdirSync(join(folder, 'lost+found'));
    await pictures.sweep([]);
    expect(readdirSync(folder).sort()).toEqual(['.gitkeep', '.incoming', 'lost+found']);
  });

  test('empties what was on its way when the server stopped', async () => {
    writeFileSync(pictures.tempPath(), 'half a picture');
    mkdirSync(pictures.tempPath());
    await open();
    expect(readdirSync(join(folder, '.incoming'))).toEqual([]);
  });
});

test('a deleted fishroom takes its pictures along, and no others', async () => {
  await store();
  await store(pictureId(), b.fourFields(), otherRoom);
  await pictures.removeRoom(roomId);
  await pictures.removeRoom(roomId);
  expect(lying()).toEqual([]);
  expect(lying(otherRoom)).toHaveLength(1);
});
