import { gzipSync } from 'node:zlib';
import { avif, joined, jpeg, MARK, mark, mediaFile, type PictureCase, png, webp } from './hostileCase';
import * as b from './pictureBytes';

const text = (words: string) => () => Buffer.from(words);

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
