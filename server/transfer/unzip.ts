import { createWriteStream } from 'node:fs';
import { mkdir } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import yauzl, { type Entry, type ZipFile } from 'yauzl';
import { Refusal } from '../../shared/refusal';

const ID = '[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}';
/** The names an archive may hold. Everything else is refused: names become paths. */
const NAME = new RegExp(
  `^(?:kinwater\\.json|people\\.json|tables/[a-zA-Z]{1,40}\\.jsonl|pictures/${ID}/(?:1280|320)\\.webp)$`,
);
const MAX_FILES = 200_000;
const MAX_PICTURE = 7_000_000;
/** All rows together, unpacked: some twenty years of a large fishroom. */
const MAX_ROWS = 300_000_000;

export const badArchive = (why: string): Refusal =>
  new Refusal('invalid', `This archive cannot be brought in: ${why}. Nothing was stored.`, { file: why });

/** Unpacks an archive into a new folder; answers the names in it. Sizes are judged before unpacking and held to while it runs. */
export async function unzip(file: string, into: string, maxPictureBytes: number): Promise<string[]> {
  const zip = await opened(file);
  const names = new Set<string>();
  const room = { rows: MAX_ROWS, pictures: maxPictureBytes };
  try {
    for await (const entry of entriesOf(zip)) {
      mustBeHarmless(entry, names, room);
      names.add(entry.fileName);
      const path = join(into, entry.fileName);
      await mkdir(dirname(path), { recursive: true });
      await pipeline(await contentOf(zip, entry), createWriteStream(path, { flags: 'wx' })).catch(() => {
        throw badArchive(`${entry.fileName} is damaged`);
      });
    }
  } finally {
    zip.close();
  }
  return [...names];
}

function mustBeHarmless(entry: Entry, names: Set<string>, room: { rows: number; pictures: number }): void {
  const { fileName, uncompressedSize } = entry;
  if (!NAME.test(fileName)) throw badArchive(`“${fileName.slice(0, 80)}” does not belong in it`);
  if (names.has(fileName)) throw badArchive(`${fileName} is in it twice`);
  if (names.size >= MAX_FILES) throw badArchive('it holds too many files');
  if (entry.isEncrypted()) throw badArchive('it is encrypted');
  if (fileName.startsWith('pictures/')) {
    if (uncompressedSize > MAX_PICTURE) throw badArchive(`${fileName} is too large`);
    room.pictures -= uncompressedSize;
    if (room.pictures < 0) throw badArchive('its pictures take more room than a fishroom has here');
  } else {
    room.rows -= uncompressedSize;
    if (room.rows < 0) throw badArchive('its tables are too large');
  }
}

/** `lazyEntries`: one at a time; `validateEntrySizes`: a stream that gives more than it declared is broken off. */
const opened = (file: string): Promise<ZipFile> =>
  new Promise((done, failed) =>
    yauzl.open(
      file,
      { lazyEntries: true, autoClose: false, strictFileNames: true, validateEntrySizes: true },
      (error, zip) => (error ? failed(badArchive('it is not a zip file, or not whole')) : done(zip)),
    ),
  );

async function* entriesOf(zip: ZipFile): AsyncGenerator<Entry> {
  for (;;) {
    const entry = await new Promise<Entry | null>((done, failed) => {
      zip.removeAllListeners();
      zip.once('entry', done);
      zip.once('end', () => done(null));
      zip.once('error', (error) => failed(badArchive(error instanceof Error ? error.message : 'it is damaged')));
      zip.readEntry();
    });
    if (!entry) return;
    yield entry;
  }
}

const contentOf = (zip: ZipFile, entry: Entry): Promise<NodeJS.ReadableStream> =>
  new Promise((done, failed) =>
    zip.openReadStream(entry, (error, stream) =>
      error ? failed(badArchive(`${entry.fileName} is damaged`)) : done(stream),
    ),
  );
