import { readFile, stat } from 'node:fs/promises';
import sharp from 'sharp';
import { type PictureSize, SIZES } from './develop';
import { damaged } from './refusals';

/** What our own files consist of; anything else (EXIF, XMP, colour profile, frames) could carry what was stripped. */
const CHUNKS = new Set(['VP8 ', 'VP8L', 'VP8X', 'ALPH']);
/** An uncompressed picture of 1280 px square takes 6.6 MB. */
const MAX_BYTES = 7_000_000;

export type Adopted = { large: Buffer; small: Buffer; width: number; height: number };

/** Reads both files of a picture that another installation made, and refuses what this one would not have written. */
export async function adopted(paths: Record<PictureSize, string>): Promise<Adopted> {
  const large = await proven(paths.large, SIZES.large);
  const small = await proven(paths.small, SIZES.small);
  return { large: large.bytes, small: small.bytes, width: large.width, height: large.height };
}

async function proven(path: string, edge: number) {
  if ((await stat(path)).size > MAX_BYTES) throw damaged();
  const bytes = await readFile(path);
  if (!chunksOf(bytes)?.every((chunk) => CHUNKS.has(chunk))) throw damaged();
  const { info } = await sharp(path, { limitInputPixels: edge * edge, failOn: 'error' })
    .raw()
    .toBuffer({ resolveWithObject: true })
    .catch(() => Promise.reject(damaged()));
  if (Math.max(info.width, info.height) > edge) throw damaged();
  return { bytes, width: info.width, height: info.height };
}

/** Names of the chunks of a WebP file (RIFF: name, length, bytes padded to even); null when it is not exactly such a file. */
function chunksOf(bytes: Buffer): string[] | null {
  const text = (from: number) => bytes.toString('latin1', from, from + 4);
  if (bytes.length < 20 || text(0) !== 'RIFF' || text(8) !== 'WEBP') return null;
  if (bytes.readUInt32LE(4) + 8 !== bytes.length) return null;
  const names: string[] = [];
  let at = 12;
  while (at + 8 <= bytes.length) {
    names.push(text(at));
    const length = bytes.readUInt32LE(at + 4);
    at += 8 + length + (length % 2);
  }
  return at === bytes.length ? names : null;
}
