import sharp from 'sharp';
import { joined, jpeg, oneBitText, type PictureCase, png } from './hostileCase';
import * as b from './pictureBytes';

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

export function manyFrames(): Promise<Buffer> {
  const frames = Buffer.alloc(64 * 64 * 3 * 400, 90);
  for (let i = 0; i < frames.length; i += 4096) frames[i] = i % 251;
  return sharp(frames, { raw: { width: 64, height: 64 * 400, channels: 3, pageHeight: 64 } })
    .webp({ loop: 0, effort: 0 })
    .toBuffer();
}
