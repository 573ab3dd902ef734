import { joined, jpeg, mediaFile, oneBitText, type PictureCase, png, webp, withByte } from './hostileCase';
import * as b from './pictureBytes';

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
