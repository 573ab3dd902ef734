import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, renameSync, rmSync } from 'node:fs';
import { mkdir, open, readdir, readFile, rename, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { isId } from '../../shared/ids';
import { notFound } from '../../shared/refusal';
import type { CrashPoint } from './crashPoint';
import { type PictureSize, SIZES } from './develop';
import { codeOf, diskRefusal } from './refusals';

/** The two files of one picture, by size. */
export type PictureFiles = Record<PictureSize, Buffer>;
export type PictureKey = { roomId: string; id: string };
export type Shelf = ReturnType<typeof openShelf>;

export const SIZE_NAMES = ['large', 'small'] as const satisfies readonly PictureSize[];

/**
 * Where pictures lie: `<folder>/<room>/<picture>/1280.webp` and `320.webp`. A picture is a folder of its own, so that one
 * rename makes both files appear; `.incoming` holds what is not whole yet and is emptied at every start.
 */
export function openShelf(folder: string, crash: (point: CrashPoint) => void) {
  const incoming = join(folder, '.incoming');

  /** For the one process that owns the folder, before anything is stored. */
  function empty(): void {
    rmSync(incoming, { recursive: true, force: true });
    mkdirSync(incoming, { recursive: true });
  }

  const tempPath = (): string => join(incoming, randomBytes(16).toString('hex'));
  const roomOf = (roomId: string): string => join(folder, mustBeId(roomId));
  const homeOf = ({ roomId, id }: PictureKey): string => join(roomOf(roomId), mustBeId(id));
  const fileOf = (key: PictureKey, size: PictureSize): string => join(homeOf(key), fileName(size));

  /** False when a picture lies there already; it is not touched. */
  async function place(key: PictureKey, files: PictureFiles): Promise<boolean> {
    crash('before-file');
    const draft = tempPath();
    try {
      await mkdir(draft);
      await whenAllEnded(SIZE_NAMES.map((size) => writeSafely(join(draft, fileName(size)), files[size], crash)));
      await flushFolder(draft);
      if (await mkdir(roomOf(key.roomId), { recursive: true })) await flushFolder(folder);
      await rename(draft, homeOf(key));
      await flushFolder(roomOf(key.roomId));
      crash('after-file');
      return true;
    } catch (error) {
      if (['ENOTEMPTY', 'EEXIST'].includes(codeOf(error))) return false;
      throw diskRefusal(error);
    } finally {
      await rm(draft, { recursive: true, force: true });
    }
  }

  /** Out of sight in one step, so that no reader and no crash finds half a picture. */
  async function takeAway(path: string): Promise<void> {
    if (!existsSync(path)) return;
    const bin = tempPath();
    renameSync(path, bin);
    await flushFolder(join(path, '..'));
    await rm(bin, { recursive: true, force: true });
  }

  return {
    folder,
    empty,
    tempPath,
    incoming,
    fileOf,
    place,
    holds: (key: PictureKey): boolean => existsSync(homeOf(key)),
    holdsSame: async (key: PictureKey, files: PictureFiles): Promise<boolean> => {
      for (const size of SIZE_NAMES) {
        const there = await readFile(fileOf(key, size)).catch(() => null);
        if (!there?.equals(files[size])) return false;
      }
      return true;
    },
    remove: (key: PictureKey): Promise<void> => takeAway(homeOf(key)),
    removeRoom: (roomId: string): Promise<void> => takeAway(roomOf(roomId)),
    keys: (roomId?: string): Promise<PictureKey[]> => keysIn(folder, roomId),
    /** What a fishroom's pictures take on the disk. */
    bytesOf: async (roomId: string): Promise<number> => {
      let sum = 0;
      for (const key of await keysIn(folder, roomId))
        for (const size of SIZE_NAMES) sum += await sizeOf(fileOf(key, size));
      return sum;
    },
  };
}

const fileName = (size: PictureSize): string => `${SIZES[size]}.webp`;

export const keyOf = (roomId: string, id: string): PictureKey => ({ roomId: mustBeId(roomId), id: mustBeId(id) });

/** Ids come from requests and become paths: nothing but an id may. */
function mustBeId(id: string): string {
  if (!isId(id)) throw notFound('That picture');
  return id;
}

async function keysIn(folder: string, roomId?: string): Promise<PictureKey[]> {
  const rooms = roomId === undefined ? (await readdir(folder)).filter(isId) : [mustBeId(roomId)];
  const keys = await Promise.all(
    rooms.map(async (room) => {
      const names = await readdir(join(folder, room)).catch(() => []);
      return names.filter(isId).map((id) => ({ roomId: room, id }));
    }),
  );
  return keys.flat();
}

const sizeOf = async (file: string): Promise<number> => (await stat(file).catch(() => null))?.size ?? 0;

async function writeSafely(file: string, bytes: Buffer, crash: (point: CrashPoint) => void): Promise<void> {
  const handle = await open(file, 'wx');
  try {
    const half = Math.floor(bytes.length / 2);
    await handle.writeFile(bytes.subarray(0, half));
    crash('mid-file');
    await handle.writeFile(bytes.subarray(half));
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** The draft may only be cleared away once nobody writes to it any more, so one failure waits for the other files. */
async function whenAllEnded(work: Promise<void>[]): Promise<void> {
  for (const result of await Promise.allSettled(work)) if (result.status === 'rejected') throw result.reason;
}

async function flushFolder(path: string): Promise<void> {
  const handle = await open(path, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}
