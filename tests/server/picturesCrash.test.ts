import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { openPictures } from '@/server/pictures';
import * as b from '../support/pictureBytes';
import { pictureId } from '../support/pictureServer';

let home: string;
let folder: string;
let photo: string;
beforeEach(async () => {
  home = mkdtempSync(join(tmpdir(), 'kinwater-crash-'));
  folder = join(home, 'uploads');
  photo = join(home, 'photo.jpg');
  writeFileSync(photo, await b.likePhoto(1600, 1200).jpeg().toBuffer());
});
afterEach(() => rmSync(home, { recursive: true, force: true }));

/** `killAfterMs`: counted from the moment at which storing begins. */
function storeIn(
  roomId: string,
  id: string,
  { crashAt = '', killAfterMs }: { crashAt?: string; killAfterMs?: number },
) {
  const script = fileURLToPath(new URL('../support/storeAndDie.ts', import.meta.url));
  const child = spawn(process.execPath, ['--import', 'tsx', script, folder, photo, roomId, id, crashAt]);
  let said = '';
  let errors = '';
  child.stdout.on('data', (chunk) => {
    said += chunk;
    if (killAfterMs !== undefined && said === 'storing\n') setTimeout(() => child.kill('SIGKILL'), killAfterMs);
  });
  child.stderr.on('data', (chunk) => {
    errors += chunk;
  });
  return new Promise<{ signal: string | null; sha256: string; errors: string }>((done) =>
    child.on('close', (_code, signal) => done({ signal, sha256: said.split('\n')[1] ?? '', errors })),
  );
}

const files = () => readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.webp'));

describe('a server that dies', () => {
  test.each([
    ['before-file', { whole: false }],
    ['mid-file', { whole: false }],
    ['after-file', { whole: true }],
  ])('%s leaves no half picture in its place, and starts again clean', async (crashAt, { whole }) => {
    const key = { roomId: pictureId(), id: pictureId() };
    const died = await storeIn(key.roomId, key.id, { crashAt });
    expect(died, died.errors).toMatchObject({ signal: 'SIGKILL', sha256: '' });
    expect(existsSync(join(folder, key.roomId, key.id))).toBe(whole);

    const pictures = await openPictures({ folder, maxBytes: 1_000_000 });
    expect(await pictures.sweep([])).toEqual({ removed: whole ? 1 : 0, heldBack: 0 });
    expect(files()).toEqual([]);

    const again = await pictures.store(photo, key.roomId, key.id);
    again.keep();
    expect(await pictures.report([{ ...key, sha256: again.sha256 }])).toEqual({
      checked: 1,
      missing: [],
      damaged: [],
      unclaimed: [],
    });
  });

  test('in the middle of a file has written only a part of it, out of sight', async () => {
    await storeIn(pictureId(), pictureId(), { crashAt: 'mid-file' });
    expect(files().length).toBeGreaterThan(0);
    for (const name of files()) expect(name).toMatch(/^\.incoming/);
  });

  test('after the picture was put in place has it whole, so that sending again finds it', async () => {
    const key = { roomId: pictureId(), id: pictureId() };
    await storeIn(key.roomId, key.id, { crashAt: 'after-file' });
    const pictures = await openPictures({ folder, maxBytes: 1_000_000 });
    const again = await pictures.store(photo, key.roomId, key.id);
    expect(await pictures.report([{ ...key, sha256: again.sha256 }])).toMatchObject({ missing: [], damaged: [] });
    expect(files()).toHaveLength(2);
  });

  test.each([0, 90, 180, 270])('%i ms into the work leaves all or nothing', async (killAfterMs) => {
    const key = { roomId: pictureId(), id: pictureId() };
    const { sha256, signal, errors } = await storeIn(key.roomId, key.id, { killAfterMs });
    expect(errors).toBe('');
    const pictures = await openPictures({ folder, maxBytes: 1_000_000 });
    if (signal === null) expect(sha256).toMatch(/^[0-9a-f]{64}$/);
    if (sha256 !== '')
      expect(await pictures.report([{ ...key, sha256 }])).toMatchObject({ missing: [], damaged: [], unclaimed: [] });
    expect([0, 2]).toContain(files().length);
  });
});
