import { deflateSync } from 'node:zlib';
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
export const mark = Buffer.from(MARK);

export const jpeg = () => b.fourFields().jpeg().toBuffer();
export const png = () => b.fourFields().png().toBuffer();
export const webp = () => b.fourFields().webp().toBuffer();
export const avif = () => b.fourFields().avif({ effort: 0 }).toBuffer();
export const joined = (...parts: (Buffer | string)[]) =>
  Buffer.concat(parts.map((part) => (typeof part === 'string' ? Buffer.from(part, 'latin1') : part)));

/** ISO base media file: a `ftyp` box with these brands, then nothing that can be decoded. */
export const mediaFile = (...brands: string[]) => {
  const body = Buffer.from(`ftyp${brands[0]}\0\0\0\0${brands.join('')}`, 'latin1');
  const length = Buffer.alloc(4);
  length.writeUInt32BE(body.length + 4);
  return Buffer.concat([length, body, Buffer.alloc(4000, 7)]);
};

export const oneBitText = (bytes: number) => deflateSync(Buffer.alloc(bytes), { level: 9 });

export const withByte = (bytes: Buffer, at: number, value: number): Buffer => {
  bytes[at] = value;
  return bytes;
};
