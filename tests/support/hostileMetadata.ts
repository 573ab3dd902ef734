import { joined, jpeg, MARK, mark, type PictureCase, png, withByte } from './hostileCase';
import * as b from './pictureBytes';

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
