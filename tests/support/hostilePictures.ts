import { deflateSync, gzipSync } from 'node:zlib';
import sharp from 'sharp';
import type { Reason } from '@/shared/refusal';
import * as b from './pictureBytes';

/**
 * What must become of a file. `harmless`: either refused or stored re-encoded, as the decoder sees fit, but never a fault.
 */
export type PictureCase = {
  name: string;
  make: () => Buffer | Promise<Buffer>;
  outcome: 'stored' | 'harmless' | Reason;
};

/** Text that must not survive in any stored file. */
export const MARK = 'KWMARK-<script>alert(1)</script>';
const mark = Buffer.from(MARK);

const jpeg = () => b.fourFields().jpeg().toBuffer();
const png = () => b.fourFields().png().toBuffer();
const webp = () => b.fourFields().webp().toBuffer();
const avif = () => b.fourFields().avif({ effort: 0 }).toBuffer();
const text = (words: string) => () => Buffer.from(words);
const joined = (...parts: (Buffer | string)[]) =>
  Buffer.concat(parts.map((part) => (typeof part === 'string' ? Buffer.from(part, 'latin1') : part)));

/** ISO base media file: a `ftyp` box with these brands, then nothing that can be decoded. */
const mediaFile = (...brands: string[]) => {
  const body = Buffer.from(`ftyp${brands[0]}\0\0\0\0${brands.join('')}`, 'latin1');
  const length = Buffer.alloc(4);
  length.writeUInt32BE(body.length + 4);
  return Buffer.concat([length, body, Buffer.alloc(4000, 7)]);
};

const SVG = `<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"><script>${MARK}</script><image href="file:///etc/passwd"/></svg>`;

/** Files that are no photo, each sent as `fish.jpg`. */
export const notPictures: PictureCase[] = [
  { name: 'nothing but zeros', make: () => Buffer.alloc(5000), outcome: 'unsupported' },
  { name: 'one byte', make: () => Buffer.from([0xff]), outcome: 'unsupported' },
  { name: 'plain text', make: text('My best male, taken on Sunday'), outcome: 'unsupported' },
  { name: 'an SVG', make: text(SVG), outcome: 'unsupported' },
  { name: 'an SVG with an XML head', make: text(`<?xml version="1.0"?>${SVG}`), outcome: 'unsupported' },
  { name: 'an SVG behind a byte order mark', make: text(`\ufeff${SVG}`), outcome: 'unsupported' },
  { name: 'a packed SVG', make: () => gzipSync(SVG), outcome: 'unsupported' },
  { name: 'an SVG full of nested entities', make: text(entityBomb()), outcome: 'unsupported' },
  { name: 'a GIF', make: () => b.fourFields().gif().toBuffer(), outcome: 'unsupported' },
  { name: 'a TIFF', make: () => b.fourFields().tiff().toBuffer(), outcome: 'unsupported' },
  { name: 'a big-endian TIFF head', make: () => joined('MM\0*\0\0\0\x08', Buffer.alloc(500)), outcome: 'unsupported' },
  { name: 'a HEIC of a phone', make: () => mediaFile('heic', 'mif1', 'heic'), outcome: 'unsupported' },
  { name: 'a HEIC with the general brand first', make: () => mediaFile('mif1', 'heic'), outcome: 'unsupported' },
  { name: 'a HEIC burst', make: () => mediaFile('hevc', 'msf1'), outcome: 'unsupported' },
  { name: 'an MP4 film', make: () => mediaFile('isom', 'mp42'), outcome: 'unsupported' },
  { name: 'a QuickTime film', make: () => mediaFile('qt  '), outcome: 'unsupported' },
  { name: 'a PDF', make: text('%PDF-1.7\n1 0 obj <</Type/Catalog>> endobj\n%%EOF'), outcome: 'unsupported' },
  { name: 'a web page', make: text(`<!doctype html><title>x</title>${MARK}`), outcome: 'unsupported' },
  { name: 'a script', make: text('#!/bin/sh\nrm -rf "$HOME"\n'), outcome: 'unsupported' },
  { name: 'a program', make: () => joined('\x7fELF', Buffer.alloc(4000, 3)), outcome: 'unsupported' },
  { name: 'a ZIP', make: () => joined('PK\x03\x04', Buffer.alloc(4000, 1)), outcome: 'unsupported' },
  { name: 'a BMP', make: () => joined('BM', Buffer.alloc(4000, 9)), outcome: 'unsupported' },
  { name: 'an icon', make: () => joined('\0\0\x01\0\x01\0', Buffer.alloc(400)), outcome: 'unsupported' },
  { name: 'a PPM', make: () => joined('P6\n9 9\n255\n', Buffer.alloc(243, 8)), outcome: 'unsupported' },
  { name: 'a Photoshop file', make: () => joined('8BPS\0\x01', Buffer.alloc(400)), outcome: 'unsupported' },
  { name: 'PostScript', make: text('%!PS-Adobe-3.0 EPSF-3.0\n(x) show\n'), outcome: 'unsupported' },
  { name: 'a JPEG 2000', make: () => joined('\0\0\0\x0cjP  \r\n\x87\n', Buffer.alloc(900)), outcome: 'unsupported' },
  { name: 'a JPEG XL', make: () => joined('\xff\x0a', Buffer.alloc(900)), outcome: 'unsupported' },
  {
    name: 'a Radiance picture',
    make: text('#?RADIANCE\nFORMAT=32-bit_rle_rgbe\n\n-Y 9 +X 9\n'),
    outcome: 'unsupported',
  },
  { name: 'an OpenEXR', make: () => joined('\x76\x2f\x31\x01', Buffer.alloc(900)), outcome: 'unsupported' },
  { name: 'a FITS', make: text('SIMPLE  =                    T'.padEnd(2880)), outcome: 'unsupported' },
  { name: 'a table of numbers', make: text('1,2,3\n4,5,6\n7,8,9\n'), outcome: 'unsupported' },
  {
    name: 'a WAV in the container of WebP',
    make: () => joined('RIFF\x40\0\0\0WAVEfmt ', Buffer.alloc(90)),
    outcome: 'unsupported',
  },
];

function entityBomb(): string {
  const steps = Array.from({ length: 9 }, (_, i) => `<!ENTITY a${i + 1} "${`&a${i};`.repeat(10)}">`).join('');
  return `<!DOCTYPE svg [<!ENTITY a0 "fish">${steps}]><svg xmlns="http://www.w3.org/2000/svg"><text>&a9;</text></svg>`;
}

/** Whole pictures with something else inside or behind: the picture is kept, the rest is not. */
export const polyglots: PictureCase[] = [
  {
    name: 'a JPEG with a ZIP behind it',
    make: async () => joined(await jpeg(), 'PK\x03\x04', mark),
    outcome: 'stored',
  },
  {
    name: 'a JPEG with a page in its comment',
    make: async () => b.jpegWith(await jpeg(), b.jpegSegment(0xfe, mark)),
    outcome: 'stored',
  },
  {
    name: 'a JPEG with a PDF in its comment',
    make: async () => b.jpegWith(await jpeg(), b.jpegSegment(0xfe, joined('%PDF-1.7 ', mark))),
    outcome: 'stored',
  },
  { name: 'a PNG with a page behind it', make: async () => joined(await png(), `<html>${MARK}`), outcome: 'stored' },
  {
    name: 'a PNG with a script as text',
    make: async () => b.pngWith(await png(), b.pngChunk('tEXt', joined('Comment\0', mark))),
    outcome: 'stored',
  },
  {
    name: 'a PNG with a chunk of its own kind',
    make: async () => b.pngWith(await png(), b.pngChunk('kwXx', mark)),
    outcome: 'stored',
  },
  { name: 'a WebP with a script behind it', make: async () => joined(await webp(), mark), outcome: 'harmless' },
  { name: 'an AVIF with a page behind it', make: async () => joined(await avif(), mark), outcome: 'harmless' },
  { name: 'two JPEGs in one file', make: async () => joined(await jpeg(), await jpeg(), mark), outcome: 'stored' },
  {
    name: 'a page with a JPEG behind it',
    make: async () => joined(`<html>${MARK}`, await jpeg()),
    outcome: 'unsupported',
  },
  { name: 'a GIF head before a JPEG', make: async () => joined('GIF89a', await jpeg()), outcome: 'unsupported' },
  {
    name: 'a PDF with a JPEG inside',
    make: async () => joined('%PDF-1.7\nstream\n', await jpeg()),
    outcome: 'unsupported',
  },
  { name: 'a line break before a PNG', make: async () => joined('\n', await png()), outcome: 'unsupported' },
  { name: 'the head of a PNG before a JPEG', make: async () => joined(b.PNG_START, await jpeg()), outcome: 'invalid' },
  {
    name: 'the head of a JPEG before a PNG',
    make: async () => joined('\xff\xd8\xff', await png()),
    outcome: 'invalid',
  },
];

const oneBitText = (bytes: number) => deflateSync(Buffer.alloc(bytes), { level: 9 });

/** Small files that unpack to something enormous. */
export const bombs: PictureCase[] = [
  { name: 'a PNG of 268 million pixels', make: () => b.blackPng(16_384, 16_384), outcome: 'too-large' },
  { name: 'a PNG just over 60 million pixels', make: () => b.blackPng(7_747, 7_747), outcome: 'too-large' },
  { name: 'a PNG just under 60 million pixels', make: () => b.blackPng(7_740, 7_740), outcome: 'stored' },
  {
    name: 'a PNG that claims two billion a side',
    make: () => b.pngOf(b.pngHeader(2 ** 31 - 1, 2 ** 31 - 1), b.pngChunk('IDAT', oneBitText(100))),
    outcome: 'harmless',
  },
  { name: 'a PNG of one endless line', make: () => b.blackPng(59_000_000, 1), outcome: 'too-large' },
  {
    name: 'a PNG with a colour profile of 90 MB',
    make: async () => b.pngWith(await png(), b.pngChunk('iCCP', joined('p\0\0', oneBitText(90_000_000)))),
    outcome: 'harmless',
  },
  {
    name: 'a PNG with 20 packed texts of 20 MB',
    make: async () =>
      b.pngWith(
        await png(),
        ...Array.from({ length: 20 }, () => b.pngChunk('zTXt', joined('k\0\0', oneBitText(20_000_000)))),
      ),
    outcome: 'harmless',
  },
  {
    name: 'a PNG with 50,000 small texts',
    make: async () =>
      b.pngWith(await png(), ...Array.from({ length: 50_000 }, (_, i) => b.pngChunk('tEXt', joined(`k${i}\0v`)))),
    outcome: 'harmless',
  },
  {
    name: 'a PNG with more pixels than its header says',
    make: () => b.pngOf(b.pngHeader(10, 10, 8, 0), b.pngChunk('IDAT', oneBitText(200_000_000))),
    outcome: 'harmless',
  },
  {
    name: 'a JPEG that claims 65,500 a side',
    make: async () => b.jpegClaiming(await jpeg(), 65_500, 65_500),
    outcome: 'too-large',
  },
  {
    name: 'a JPEG that claims more lines than it has',
    make: async () => b.jpegClaiming(await jpeg(), 96, 60_000),
    outcome: 'harmless',
  },
  { name: 'a JPEG of 500 scans', make: manyScans, outcome: 'harmless' },
  { name: 'a WebP of 268 million pixels in 38 bytes', make: () => blueWebp(16_383), outcome: 'too-large' },
  { name: 'a WebP of 59 million pixels in 38 bytes', make: () => blueWebp(7_700), outcome: 'stored' },
  {
    name: 'a progressive JPEG of 59 million pixels',
    make: () => b.plain(7_700, 7_700).jpeg({ progressive: true }).toBuffer(),
    outcome: 'stored',
  },
  {
    name: 'a progressive JPEG of 59 million pixels in full colour',
    make: async () =>
      b.jpegClaiming(
        await b.plain(64, 64).jpeg({ progressive: true, chromaSubsampling: '4:4:4' }).toBuffer(),
        7_700,
        7_700,
      ),
    outcome: 'too-large',
  },
  {
    name: 'an interlaced PNG of 59 million pixels of 64 bits',
    make: () => b.pngOf(b.pngHeader(7_700, 7_700, 16, 6, 1), b.pngChunk('IDAT', oneBitText(1000))),
    outcome: 'too-large',
  },
  {
    name: 'an interlaced PNG of 40 million pixels that lies on its side',
    make: async () =>
      b.pngWith(
        await b.plain(8_000, 5_000).png({ progressive: true }).toBuffer(),
        b.pngChunk('eXIf', b.exifBlock([b.orientationTag(6)]).subarray(6)),
      ),
    outcome: 'stored',
  },

  {
    name: 'an AVIF of 17 million pixels',
    make: () => b.plain(4_250, 4_000).avif({ effort: 0, quality: 1 }).toBuffer(),
    outcome: 'too-large',
  },
  { name: 'a WebP of 400 frames', make: manyFrames, outcome: 'stored' },
];

/** Plain blue needs no bit a pixel in lossless WebP, so the header's size (14 bits each) can be anything. */
async function blueWebp(edge: number): Promise<Buffer> {
  const small = await b.plain(40, 40).webp({ lossless: true, effort: 0 }).toBuffer();
  const alphaAndVersion = small.readUInt32LE(21) >>> 28;
  small.writeUInt32LE(((alphaAndVersion << 28) | ((edge - 1) << 14) | (edge - 1)) >>> 0, 21);
  return small;
}

/** A progressive JPEG whose last scan is there 500 times: each makes a decoder go over the whole picture again. */
async function manyScans(): Promise<Buffer> {
  const whole = await b.plain(3000, 2000).jpeg({ progressive: true }).toBuffer();
  const last = whole.lastIndexOf(Buffer.from([0xff, 0xda]));
  const scan = whole.subarray(last, whole.length - 2);
  return joined(whole.subarray(0, last), ...Array.from({ length: 500 }, () => scan), '\xff\xd9');
}

function manyFrames(): Promise<Buffer> {
  const frames = Buffer.alloc(64 * 64 * 3 * 400, 90);
  for (let i = 0; i < frames.length; i += 4096) frames[i] = i % 251;
  return sharp(frames, { raw: { width: 64, height: 64 * 400, channels: 3, pageHeight: 64 } })
    .webp({ loop: 0, effort: 0 })
    .toBuffer();
}

const FORMATS = {
  JPEG: () => b.likePhoto(400, 300).jpeg().toBuffer(),
  'progressive JPEG': () => b.likePhoto(400, 300).jpeg({ progressive: true }).toBuffer(),
  PNG: () => b.likePhoto(200, 150).png().toBuffer(),
  'interlaced PNG': () => b.likePhoto(200, 150).png({ progressive: true }).toBuffer(),
  WebP: () => b.likePhoto(400, 300).webp().toBuffer(),
  'lossless WebP': () => b.likePhoto(200, 150).webp({ lossless: true, effort: 0 }).toBuffer(),
  AVIF: () => b.likePhoto(400, 300).avif({ effort: 0 }).toBuffer(),
};
const SHARES = [0.02, 0.1, 0.3, 0.5, 0.75, 0.95];

/** Every format, cut off at many places: half a picture is no picture. */
export const truncated: PictureCase[] = Object.entries(FORMATS).flatMap(([format, make]) =>
  SHARES.map((share) => ({
    name: `${/^[AI]|^in/.test(format) ? 'an' : 'a'} ${format} of which ${share * 100} % arrived`,
    make: async () => {
      const whole = await make();
      return whole.subarray(0, Math.floor(whole.length * share));
    },
    outcome: 'invalid' as const,
  })),
);

/** Every format with bytes changed in the middle: a decoder may get over it, or not. */
export const spoiled: PictureCase[] = Object.entries(FORMATS).map(([format, make]) => ({
  name: `${/^[AI]|^in/.test(format) ? 'an' : 'a'} ${format} with spoiled bytes`,
  make: async () => {
    const whole = await make();
    for (let i = 0; i < 40; i++) whole[Math.floor(whole.length * (0.4 + i / 100))] = (i * 67) % 256;
    return whole;
  },
  outcome: 'harmless',
}));

/** Headers and parts that contradict the rules of their format. */
export const malformed: PictureCase[] = [
  { name: 'a PNG without pixels', make: () => b.pngOf(b.pngHeader(9, 9)), outcome: 'invalid' },
  { name: 'a PNG without a header', make: () => b.pngOf(b.pngChunk('IDAT', oneBitText(90))), outcome: 'invalid' },
  {
    name: 'a PNG of width 0',
    make: () => b.pngOf(b.pngHeader(0, 9), b.pngChunk('IDAT', oneBitText(90))),
    outcome: 'invalid',
  },
  {
    name: 'a PNG of an unknown colour kind',
    make: () => b.pngOf(b.pngHeader(9, 9, 8, 5), b.pngChunk('IDAT', oneBitText(900))),
    outcome: 'invalid',
  },
  {
    name: 'a PNG with colours from a table that is missing',
    make: () => b.pngOf(b.pngHeader(9, 9, 8, 3), b.pngChunk('IDAT', oneBitText(90))),
    outcome: 'harmless',
  },
  { name: 'a PNG whose check sum is wrong', make: async () => withByte(await png(), 30, 0x55), outcome: 'invalid' },
  {
    name: 'a PNG with a chunk of 4 GB',
    make: async () => joined((await png()).subarray(0, 33), '\xff\xff\xff\xffIDAT', Buffer.alloc(50)),
    outcome: 'invalid',
  },
  { name: 'a PNG that is nothing but its first eight bytes', make: () => b.PNG_START, outcome: 'invalid' },
  { name: 'a JPEG that is nothing but its marker', make: () => Buffer.from([0xff, 0xd8, 0xff]), outcome: 'invalid' },
  { name: 'a JPEG of height 0', make: async () => b.jpegClaiming(await jpeg(), 96, 0), outcome: 'invalid' },
  {
    name: 'a JPEG without a scan',
    make: async () => {
      const whole = await jpeg();
      return whole.subarray(0, b.frameOf(whole) + 19);
    },
    outcome: 'invalid',
  },
  {
    name: 'a JPEG with an unknown number of colours',
    make: async () => {
      const whole = await jpeg();
      return withByte(whole, b.frameOf(whole) + 9, 7);
    },
    outcome: 'invalid',
  },
  { name: 'a WebP that claims another length', make: async () => withByte(await webp(), 6, 0x7f), outcome: 'harmless' },
  { name: 'a WebP that is nothing but its head', make: async () => (await webp()).subarray(0, 16), outcome: 'invalid' },
  { name: 'an AVIF that is nothing but its brands', make: () => mediaFile('avif', 'mif1', 'miaf'), outcome: 'invalid' },
];

const withByte = (bytes: Buffer, at: number, value: number): Buffer => {
  bytes[at] = value;
  return bytes;
};

const withExif = (block: () => Buffer) => async () => b.jpegWith(await jpeg(), b.app1(block()));

/** Broken or hostile metadata in a whole picture: the picture is stored, the metadata is not. */
export const oddMetadata: PictureCase[] = [
  { name: 'an empty Exif block', make: withExif(() => joined('Exif\0\0')), outcome: 'stored' },
  {
    name: 'an Exif block cut off',
    make: withExif(() => b.exifBlock([b.orientationTag(1)]).subarray(0, 17)),
    outcome: 'stored',
  },
  {
    name: 'an Exif block with the wrong byte order',
    make: withExif(() => withByte(withByte(b.exifBlock([b.orientationTag(6)]), 6, 0x4d), 7, 0x4d)),
    outcome: 'stored',
  },
  {
    name: 'an Exif directory that points to itself',
    make: withExif(() => b.exifBlock([b.orientationTag(1)], [], 8)),
    outcome: 'stored',
  },
  {
    name: 'an Exif directory inside itself',
    make: withExif(() => b.exifBlock([{ tag: 0x8769, type: b.TYPES.LONG, value: 8 }])),
    outcome: 'stored',
  },
  {
    name: 'an Exif tag of four billion values',
    make: withExif(() => b.exifBlock([{ tag: 0x0112, type: b.TYPES.SHORT, count: 0xffffffff, value: 1 }])),
    outcome: 'stored',
  },
  {
    name: 'an Exif text beyond the end',
    make: withExif(() => b.exifBlock([], [{ tag: 0x9003, type: b.TYPES.ASCII, count: 20, value: 0x7fffffff }])),
    outcome: 'stored',
  },
  {
    name: 'an Exif block of 60 kB of noise',
    make: withExif(() => joined('Exif\0\0II*\0\x08\0\0\0', Buffer.alloc(60_000, 0x5a))),
    outcome: 'stored',
  },
  {
    name: 'two thousand Exif tags',
    make: withExif(() => b.exifBlock(Array.from({ length: 2000 }, (_, i) => ({ tag: 0xc000 + i, type: 4, value: i })))),
    outcome: 'stored',
  },
  {
    name: 'fifty Exif blocks',
    make: async () =>
      b.jpegWith(
        await jpeg(),
        ...Array.from({ length: 50 }, () => b.app1(b.exifBlock([b.orientationTag(1)], [b.takenTag(MARK)]))),
      ),
    outcome: 'stored',
  },
  ...[0, 9, 255, 65_535].map((value) => ({
    name: `orientation ${value}`,
    make: withExif(() => b.exifBlock([b.orientationTag(value)])),
    outcome: 'stored' as const,
  })),
  {
    name: 'an orientation that is a text',
    make: withExif(() => b.exifBlock([{ tag: 0x0112, type: b.TYPES.ASCII, value: MARK }])),
    outcome: 'stored',
  },
  {
    name: 'a time of taking of 50 kB',
    make: withExif(() => b.exifBlock([], [b.takenTag(`${MARK}${'9'.repeat(50_000)}`)])),
    outcome: 'stored',
  },
  {
    name: 'XMP',
    make: async () => b.jpegWith(await jpeg(), b.app1(joined('http://ns.adobe.com/xap/1.0/\0<x:xmpmeta>', mark))),
    outcome: 'stored',
  },
  {
    name: 'XMP in a WebP',
    make: () => b.fourFields().withXmp(`<x:xmpmeta xmlns:x="adobe:ns:meta/">KWMARK</x:xmpmeta>`).webp().toBuffer(),
    outcome: 'stored',
  },
  {
    name: 'IPTC',
    make: async () =>
      b.jpegWith(
        await jpeg(),
        b.jpegSegment(0xed, joined('Photoshop 3.0\x008BIM\x04\x04\0\0\0\0\0\x25\x1c\x02\x78\0\x20', mark)),
      ),
    outcome: 'stored',
  },
  {
    name: 'a colour profile of noise',
    make: async () =>
      b.jpegWith(await jpeg(), b.jpegSegment(0xe2, joined('ICC_PROFILE\0\x01\x01', Buffer.alloc(3000, 0x41), mark))),
    outcome: 'stored',
  },
  {
    name: 'a text in a PNG in every language',
    make: async () => b.pngWith(await png(), b.pngChunk('iTXt', joined('XML:com.adobe.xmp\0\0\0\0\0', mark))),
    outcome: 'stored',
  },
  {
    name: 'an Exif chunk of noise in a PNG',
    make: async () => b.pngWith(await png(), b.pngChunk('eXIf', joined('II*\0\xff\xff\xff\xff', mark))),
    outcome: 'stored',
  },
];

/** Unusual but honest pictures: all are stored. */
export const unusual: PictureCase[] = [
  { name: 'a CMYK JPEG', make: () => b.fourFields().toColourspace('cmyk').jpeg().toBuffer(), outcome: 'stored' },
  { name: 'a grey JPEG', make: () => b.fourFields().greyscale().jpeg().toBuffer(), outcome: 'stored' },
  {
    name: 'a PNG of 16 bits a colour',
    make: () => b.fourFields().toColourspace('rgb16').png().toBuffer(),
    outcome: 'stored',
  },
  {
    name: 'a grey PNG of 16 bits',
    make: () => b.fourFields().toColourspace('grey16').png().toBuffer(),
    outcome: 'stored',
  },
  { name: 'a PNG of one bit', make: () => b.blackPng(50, 40), outcome: 'stored' },
  {
    name: 'a PNG with a colour table',
    make: () => b.fourFields().png({ palette: true }).toBuffer(),
    outcome: 'stored',
  },
  { name: 'a PNG with transparency', make: () => b.fourFields().ensureAlpha(0.3).png().toBuffer(), outcome: 'stored' },
  {
    name: 'a WebP with transparency',
    make: () => b.fourFields().ensureAlpha(0.3).webp().toBuffer(),
    outcome: 'stored',
  },
  { name: 'an AVIF', make: avif, outcome: 'stored' },
  { name: 'an animated WebP', make: manyFrames, outcome: 'stored' },
  { name: 'an animated PNG', make: animatedPng, outcome: 'stored' },
  { name: 'a picture of one pixel', make: () => b.plain(1, 1).png().toBuffer(), outcome: 'stored' },
  { name: 'a picture one pixel high', make: () => b.plain(5000, 1).png().toBuffer(), outcome: 'stored' },
  { name: 'a picture one pixel wide', make: () => b.plain(1, 5000).jpeg().toBuffer(), outcome: 'stored' },
  {
    name: 'a JPEG in the colours of a wide-gamut phone',
    make: () => b.fourFields().withIccProfile('p3').jpeg().toBuffer(),
    outcome: 'stored',
  },
  {
    name: 'a JPEG with restart marks',
    make: async () => b.jpegWith(await jpeg(), b.jpegSegment(0xdd, Buffer.from([0, 0]))),
    outcome: 'stored',
  },
];

/** A PNG whose animation has a second frame, which plain readers skip. */
async function animatedPng(): Promise<Buffer> {
  const still = await png();
  const frame = Buffer.alloc(26);
  frame.writeUInt32BE(96, 4);
  frame.writeUInt32BE(64, 8);
  const control = b.pngChunk('acTL', Buffer.from('0000000200000000', 'hex'));
  const second = b.pngChunk('fdAT', joined('\0\0\0\x02', oneBitText(64 * (1 + 96 * 3))));
  const whole = b.pngWith(still, control, b.pngChunk('fcTL', frame));
  frame.writeUInt32BE(1, 0);
  return joined(
    whole.subarray(0, whole.length - 12),
    b.pngChunk('fcTL', frame),
    second,
    whole.subarray(whole.length - 12),
  );
}
