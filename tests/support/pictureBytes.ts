import { crc32, deflateSync } from 'node:zlib';
import sharp, { type Sharp } from 'sharp';

/** Corners of the test photo, so that a turn or a mirroring shows: red, green, blue, yellow from top left to bottom right. */
export const CORNERS = { A: [220, 30, 30], B: [30, 200, 30], C: [30, 30, 220], D: [220, 220, 30] } as const;

/** Four plain fields of colour; `A` top left, `B` top right, `C` bottom left, `D` bottom right. */
export function fourFields(width = 96, height = 64): Sharp {
  const pixels = Buffer.alloc(width * height * 3);
  for (let y = 0; y < height; y++)
    for (let x = 0; x < width; x++) {
      const top = y < height / 2;
      const left = x < width / 2;
      const colour = top ? (left ? CORNERS.A : CORNERS.B) : left ? CORNERS.C : CORNERS.D;
      pixels.set(colour, (y * width + x) * 3);
    }
  return sharp(pixels, { raw: { width, height, channels: 3 } });
}

/** Something a camera could have seen: waves of colour under noise, the same at every run. */
export function likePhoto(width: number, height: number): Sharp {
  const pixels = Buffer.alloc(width * height * 3);
  let state = 1;
  for (let i = 0; i < pixels.length; i++) {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    const x = Math.floor(i / 3) % width;
    const y = Math.floor(i / 3 / width);
    pixels[i] = 116 + 60 * Math.sin(x / (70 + 20 * (i % 3)) + y / 90) + (state >>> 0) / 0xaaaaaaa;
  }
  return sharp(pixels, { raw: { width, height, channels: 3 } });
}

export const plain = (width: number, height: number): Sharp =>
  sharp({ create: { width, height, channels: 3, background: { r: 60, g: 90, b: 120 } } });

/* ---------- PNG (W3C PNG, third edition) ---------- */

export const PNG_START = Buffer.from('89504e470d0a1a0a', 'hex');

export function pngChunk(type: string, data: Buffer): Buffer {
  const named = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  return Buffer.concat([u32(data.length), named, u32(crc32(named))]);
}

const u32 = (value: number): Buffer => {
  const bytes = Buffer.alloc(4);
  bytes.writeUInt32BE(value >>> 0);
  return bytes;
};

export const pngHeader = (width: number, height: number, depth = 8, colour = 2, interlace = 0): Buffer =>
  pngChunk('IHDR', Buffer.concat([u32(width), u32(height), Buffer.from([depth, colour, 0, 0, interlace])]));

export const pngOf = (...chunks: Buffer[]): Buffer =>
  Buffer.concat([PNG_START, ...chunks, pngChunk('IEND', Buffer.alloc(0))]);

/** Black pixels, one bit each: a tiny file of enormous size when unpacked. */
export const blackPng = (width: number, height: number): Buffer =>
  pngOf(
    pngHeader(width, height, 1, 0),
    pngChunk('IDAT', deflateSync(Buffer.alloc(height * (1 + Math.ceil(width / 8))), { level: 9 })),
  );

/** Puts a chunk right behind the header. */
export const pngWith = (png: Buffer, ...chunks: Buffer[]): Buffer =>
  Buffer.concat([png.subarray(0, 33), ...chunks, png.subarray(33)]);

/* ---------- JPEG (ITU T.81) ---------- */

/** A marker segment with its length. */
export function jpegSegment(marker: number, data: Buffer): Buffer {
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(data.length + 2, 2);
  return Buffer.concat([head, data]);
}

/** Puts segments right behind the start marker. */
export const jpegWith = (jpeg: Buffer, ...segments: Buffer[]): Buffer =>
  Buffer.concat([jpeg.subarray(0, 2), ...segments, jpeg.subarray(2)]);

export const app1 = (data: Buffer): Buffer => jpegSegment(0xe1, data);

/** Changes the size that the frame header claims. */
export function jpegClaiming(jpeg: Buffer, width: number, height: number): Buffer {
  const copy = Buffer.from(jpeg);
  const at = frameOf(copy);
  copy.writeUInt16BE(height, at + 5);
  copy.writeUInt16BE(width, at + 7);
  return copy;
}

/** Where the frame header begins. Walks the segments, since tables may contain the same bytes. */
export function frameOf(jpeg: Buffer): number {
  let at = 2;
  while (at + 4 < jpeg.length) {
    const marker = jpeg[at + 1] ?? 0;
    if (marker === 0xc0 || marker === 0xc2) return at;
    at += 2 + jpeg.readUInt16BE(at + 2);
  }
  throw new Error('no frame header');
}

/* ---------- Exif (CIPA DC-008) ---------- */

export type Tag = { tag: number; type: number; count?: number; value: number | string };
const ASCII = 2;
const SHORT = 3;
const LONG = 4;

/** An Exif block, little endian: tags of the first directory, and of the Exif directory behind it. */
export function exifBlock(first: Tag[], exif: Tag[] = [], nextDirectory = 0): Buffer {
  const pointer: Tag[] = exif.length > 0 ? [{ tag: 0x8769, type: LONG, value: 0 }] : [];
  const tags = [...first, ...pointer];
  const firstAt = 8;
  const exifAt = firstAt + 2 + tags.length * 12 + 4;
  const textAt = exif.length > 0 ? exifAt + 2 + exif.length * 12 + 4 : exifAt;
  const texts: Buffer[] = [];
  const directory = (list: Tag[], next: number): Buffer => {
    const bytes = Buffer.alloc(2 + list.length * 12 + 4);
    bytes.writeUInt16LE(list.length, 0);
    list.forEach(({ tag, type, count, value }, i) => {
      const at = 2 + i * 12;
      bytes.writeUInt16LE(tag, at);
      bytes.writeUInt16LE(type, at + 2);
      if (typeof value === 'string') {
        const text = Buffer.from(`${value}\0`, 'utf8');
        bytes.writeUInt32LE(count ?? text.length, at + 4);
        bytes.writeUInt32LE(textAt + texts.reduce((sum, one) => sum + one.length, 0), at + 8);
        texts.push(text);
      } else {
        bytes.writeUInt32LE(count ?? 1, at + 4);
        bytes.writeUInt32LE(tag === 0x8769 && value === 0 ? exifAt : value, at + 8);
      }
    });
    bytes.writeUInt32LE(next, 2 + list.length * 12);
    return bytes;
  };
  const parts = [directory(tags, nextDirectory), ...(exif.length > 0 ? [directory(exif, 0)] : [])];
  const header = Buffer.from('49492a0008000000', 'hex');
  return Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), header, ...parts, ...texts]);
}

export const orientationTag = (value: number): Tag => ({ tag: 0x0112, type: SHORT, value });
export const takenTag = (text: string): Tag => ({ tag: 0x9003, type: ASCII, value: text });
export const digitizedTag = (text: string): Tag => ({ tag: 0x9004, type: ASCII, value: text });
export const TYPES = { ASCII, SHORT, LONG };

/** A JPEG whose camera wrote this as the time of taking. */
export const takenAt = async (text: string): Promise<Buffer> =>
  jpegWith(await fourFields().jpeg().toBuffer(), app1(exifBlock([], [takenTag(text)])));
