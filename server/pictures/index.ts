import type { Request, Response } from 'express';
import { adopted } from './adopt';
import type { Capture } from './captureDate';
import { type Claim, openClaims } from './claims';
import { crashPoint } from './crashPoint';
import { limitDecoders } from './decoders';
import { type Developed, develop, type PictureSize } from './develop';
import { hashOf, type PictureReport, type PictureRow, reportOn } from './integrity';
import { openLane } from './lane';
import { receiver, type Upload } from './receive';
import { anotherPicture } from './refusals';
import { sendPicture } from './serving';
import { keyOf, openShelf, type PictureKey } from './shelf';
import { type Swept, sweepShelf } from './sweep';

export { whileDrawing } from './decoders';
export type { PictureReport } from './integrity';
export { mustFitQuota } from './refusals';

const AT_ONCE = 2;
const WAITING = 20;
const ARRIVING = 40;

/**
 * A picture on disk whose row is still to be written: `keep()` once the row is committed, `discard()` if it was not.
 * `width` and `height` are those of the large size; `bytes` and `sha256` are of both files, large first.
 */
export type StoredPicture = Capture &
  Claim & { width: number; height: number; bytes: number; sha256: string; files: Record<PictureSize, string> };

export type Pictures = {
  /** Takes in one uploaded picture; its temporary file lives as long as `use` runs. */
  receive<T>(req: Request, res: Response, use: (upload: Upload) => Promise<T>): Promise<T>;
  /** Re-encodes a picture file into both sizes and puts them where they stay. The same picture may be stored twice. */
  store(file: string, roomId: string, id: string): Promise<StoredPicture>;
  /** Puts both files of a picture from another installation's archive in place, byte for byte, once they prove harmless. */
  adopt(files: Record<PictureSize, string>, roomId: string, id: string): Promise<StoredPicture>;
  fileOf(roomId: string, id: string, size: PictureSize): string;
  send(res: Response, picture: PictureKey & { size: PictureSize; name: string }): Promise<void>;
  /** After the row is gone. Nothing happens when there is no such picture. */
  remove(roomId: string, id: string): Promise<void>;
  removeRoom(roomId: string): Promise<void>;
  bytesOf(roomId: string): Promise<number>;
  sweep(known: Iterable<PictureKey>): Promise<Swept>;
  report(rows: Iterable<PictureRow> | AsyncIterable<PictureRow>, roomId?: string): Promise<PictureReport>;
  /** A path for a file that is to be stored; whatever still lies there at the next start is swept. */
  tempPath(): string;
};

/** Built once: one process owns the folder. `crashAt` names a point of the crash test. */
export async function openPictures(options: {
  folder: string;
  maxBytes: number;
  crashAt?: string | null;
}): Promise<Pictures> {
  limitDecoders();
  const lane = openLane({ places: AT_ONCE, waiting: WAITING });
  const shelf = openShelf(options.folder, crashPoint(options.crashAt));
  shelf.empty();
  const claim = openClaims(shelf);
  const { incoming, tempPath, removeRoom, bytesOf } = shelf;

  async function putAway(key: PictureKey, { large, small, ...about }: Developed & Capture): Promise<StoredPicture> {
    const claimed = claim(key);
    try {
      const placed = await shelf.place(key, { large, small });
      if (!placed && !(await shelf.holdsSame(key, { large, small }))) throw anotherPicture();
    } catch (error) {
      await claimed.discard();
      throw error;
    }
    const files = { large: shelf.fileOf(key, 'large'), small: shelf.fileOf(key, 'small') };
    return { ...about, ...claimed, bytes: large.length + small.length, sha256: hashOf({ large, small }), files };
  }

  return {
    receive: receiver({ incoming, maxBytes: options.maxBytes, maxAtOnce: ARRIVING, isFull: lane.isFull }),
    store: async (file, roomId, id) => putAway(keyOf(roomId, id), await develop(file, lane)),
    adopt: async (files, roomId, id) => {
      const known = await lane.run(1, () => adopted(files));
      return putAway(keyOf(roomId, id), { ...known, takenOn: null, takenAt: null });
    },
    fileOf: (roomId, id, size) => shelf.fileOf({ roomId, id }, size),
    send: (res, picture) => sendPicture(shelf, res, picture),
    remove: (roomId, id) => shelf.remove({ roomId, id }),
    removeRoom,
    bytesOf,
    sweep: (known) => sweepShelf(shelf, known),
    report: (rows, roomId) => reportOn(shelf, rows, roomId),
    tempPath,
  };
}

/** Compares rows with a folder of pictures that another process may be using; touches nothing. */
export function pictureReport(folder: string, rows: Iterable<PictureRow>, roomId?: string): Promise<PictureReport> {
  return reportOn(
    openShelf(folder, () => {}),
    rows,
    roomId,
  );
}
