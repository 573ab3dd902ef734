import { open } from 'node:fs/promises';
import sharp, { type Metadata, type Sharp } from 'sharp';
import { type Capture, captureOf } from './captureDate';
import type { Lane } from './lane';
import { damaged, notAPicture, phoneFormat, tooHeavy, tooLong, tooManyPixels } from './refusals';

/** Longest edge in pixels, and the file's name. */
export const SIZES = { large: 1280, small: 320 } as const;
export type PictureSize = keyof typeof SIZES;

export type Developed = { large: Buffer; small: Buffer; width: number; height: number };

const MEGAPIXELS = 60;
/** Longest edge taken. A single line of many millions would be held whole, however few its pixels. */
const MAX_EDGE = 30_000;
/** What decoding one picture may hold in memory. */
const MAX_HELD_BYTES = 260_000_000;
/** Above this a picture is worked on alone, so that two large ones never share the memory. */
const ALONE_BYTES = 100_000_000;
const TIMEOUT_SECONDS = 30;
const READ = { limitInputPixels: MEGAPIXELS * 1_000_000, pages: 1, failOn: 'error' } as const;
const WEBP = { effort: 2, quality: 80 } as const;

/** Makes both sizes of a picture file, in sRGB and without any metadata, and reads when it was taken. */
export async function develop(file: string, lane: Lane): Promise<Developed & Capture> {
  const about = await headerOf(file);
  const capture = await captureOf(about.exif);
  const developed = await lane.run(heldBytes(about) > ALONE_BYTES ? 2 : 1, () => bothSizes(file));
  return { ...developed, ...capture };
}

async function headerOf(file: string): Promise<Metadata> {
  const about = await sharp(file, READ)
    .metadata()
    .catch(async (error: unknown) => Promise.reject(await whyNot(file, error)));
  const isAvif = about.format === 'heif' && about.compression === 'av1';
  if (!isAvif && !['jpeg', 'png', 'webp'].includes(about.format)) throw await whyNot(file, new Error('unsupported'));
  if (about.width * about.height > MEGAPIXELS * 1_000_000) throw tooManyPixels(MEGAPIXELS);
  if (Math.max(about.width, about.height) > MAX_EDGE) throw tooLong(MAX_EDGE);
  if (heldBytes(about) > MAX_HELD_BYTES) throw tooHeavy();
  return about;
}

/** What a decoder holds at once, measured: most read in strips, some need the picture whole. */
function heldBytes({ format, isProgressive, chromaSubsampling, depth, channels, width, height }: Metadata): number {
  const pixels = width * height;
  if (format === 'heif') return pixels * 18;
  if (!isProgressive) return pixels * 2;
  if (format === 'jpeg') return pixels * (chromaSubsampling === '4:2:0' ? 3 : 2 * channels);
  return pixels * channels * (depth === 'ushort' ? 2 : 1);
}

/** One decode: the large size as bare pixels, of which the small one is made. */
async function bothSizes(file: string): Promise<Developed> {
  const { data, info } = await inside(sharp(file, READ).autoOrient(), SIZES.large)
    .toColourspace('srgb')
    .timeout({ seconds: TIMEOUT_SECONDS })
    .raw({ depth: 'uchar' })
    .toBuffer({ resolveWithObject: true })
    .catch(async (error: unknown) => Promise.reject(await whyNot(file, error)));
  const { width, height, channels } = info;
  const pixels = sharp(data, { raw: { width, height, channels } });
  const [large, small] = await Promise.all([
    pixels.clone().webp(WEBP).toBuffer(),
    inside(pixels.clone(), SIZES.small).webp(WEBP).toBuffer(),
  ]);
  return { large, small, width, height };
}

const inside = (picture: Sharp, edge: number) =>
  picture.resize(edge, edge, { fit: 'inside', withoutEnlargement: true });

/** The decoder's complaint in words for the keeper. A file that cannot be opened at all is a fault of ours. */
async function whyNot(file: string, error: unknown): Promise<unknown> {
  const complaint = error instanceof Error ? error.message : '';
  const head = await headOf(file);
  if (isHeic(head)) return phoneFormat();
  if (complaint.includes('pixel limit')) return tooManyPixels(MEGAPIXELS);
  if (complaint.includes('unsupported')) return notAPicture();
  return damaged();
}

async function headOf(file: string): Promise<Buffer> {
  const handle = await open(file);
  try {
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(256), 0, 256, 0);
    return buffer.subarray(0, bytesRead);
  } finally {
    await handle.close();
  }
}

/** ISO/IEC 23008-12: the brands of pictures coded with HEVC; AVIF names its own among the compatible ones. */
function isHeic(head: Buffer): boolean {
  const brands = head.subarray(8, 64).toString('latin1');
  return (
    head.subarray(4, 8).toString('latin1') === 'ftyp' &&
    /hei[cxms]|hev[cxms]|mif1|msf1/.test(brands) &&
    !/avi[fs]/.test(brands)
  );
}
