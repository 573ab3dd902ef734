import { createHash, type Hash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import { codeOf } from './refusals';
import { type PictureFiles, type PictureKey, type Shelf, SIZE_NAMES } from './shelf';

/** What the database knows of a picture. */
export type PictureRow = PictureKey & { sha256: string };

export type PictureReport = {
  checked: number;
  /** A row without its files. */
  missing: PictureKey[];
  /** Files that are not those that were stored. */
  damaged: PictureKey[];
  /** Files without a row. */
  unclaimed: PictureKey[];
};

/** SHA-256 of the large file followed by the small one, in hex. */
export function hashOf(files: PictureFiles): string {
  const hash = createHash('sha256');
  for (const size of SIZE_NAMES) hash.update(files[size]);
  return hash.digest('hex');
}

/** Compares rows with files; with a `roomId`, the rows must be that fishroom's and no other is looked at. */
export async function reportOn(
  shelf: Shelf,
  rows: Iterable<PictureRow> | AsyncIterable<PictureRow>,
  roomId?: string,
): Promise<PictureReport> {
  const report: PictureReport = { checked: 0, missing: [], damaged: [], unclaimed: [] };
  const seen = new Set<string>();
  for await (const { roomId: room, id, sha256 } of rows) {
    const key = { roomId: room, id };
    seen.add(nameOf(key));
    report.checked += 1;
    const found = await hashOnDisk(shelf, key);
    if (found === null) report.missing.push(key);
    else if (found !== sha256) report.damaged.push(key);
  }
  report.unclaimed = (await shelf.keys(roomId)).filter((key) => !seen.has(nameOf(key)));
  return report;
}

export const nameOf = ({ roomId, id }: PictureKey): string => `${roomId}/${id}`;

async function hashOnDisk(shelf: Shelf, key: PictureKey): Promise<string | null> {
  const hash = createHash('sha256');
  try {
    for (const size of SIZE_NAMES) await addFile(hash, shelf.fileOf(key, size));
  } catch (error) {
    if (codeOf(error) === 'ENOENT') return null;
    throw error;
  }
  return hash.digest('hex');
}

const addFile = (hash: Hash, file: string): Promise<void> =>
  pipeline(createReadStream(file), async (chunks: AsyncIterable<Buffer>) => {
    for await (const chunk of chunks) hash.update(chunk);
  });
