import { avif, joined, jpeg, oneBitText, type PictureCase, png } from './hostileCase';
import { manyFrames } from './hostileSizes';
import * as b from './pictureBytes';

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
