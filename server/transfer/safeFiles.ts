import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { copyFile, mkdir, open, readdir } from 'node:fs/promises';
import { dirname } from 'node:path';
import { pipeline } from 'node:stream/promises';

/** On the disk, and not only in the machine's memory. Works for files and folders. */
export async function flush(path: string): Promise<void> {
  const handle = await open(path, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

export async function copySafely(from: string, to: string): Promise<void> {
  await mkdir(dirname(to), { recursive: true });
  await copyFile(from, to);
  await flush(to);
}

export async function sha256Of(file: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(file), async (chunks: AsyncIterable<Buffer>) => {
    for await (const chunk of chunks) hash.update(chunk);
  });
  return hash.digest('hex');
}

/** True for a folder that is not there, or holds nothing but hidden files such as `.gitkeep`. */
export async function isEmpty(folder: string): Promise<boolean> {
  const names = await readdir(folder).catch(() => []);
  return names.every((name) => name.startsWith('.'));
}
