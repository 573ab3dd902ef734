import { inflateSync } from 'node:zlib';

const WOFF = 0x774f4646;
const WOFF_HEADER = 44;
const WOFF_ENTRY = 20;
const SFNT_HEADER = 12;
const SFNT_ENTRY = 16;

type Table = { entry: Buffer; data: Buffer };

/**
 * Unpacks a font file of the web (WOFF 1.0, W3C Recommendation of 2012, sections 4 to 6) into the plain font it holds.
 * pdfkit reads both, but it unpacks a packed font anew, in slow code, for nearly every letter.
 */
export function sfntOf(woff: Buffer): Buffer {
  if (woff.readUInt32BE(0) !== WOFF) throw new Error('That is not a WOFF file');
  const count = woff.readUInt16BE(12);
  const tables = Array.from({ length: count }, (_, i) => tableAt(woff, WOFF_HEADER + i * WOFF_ENTRY));
  const header = Buffer.alloc(SFNT_HEADER + count * SFNT_ENTRY);
  woff.copy(header, 0, 4, 8);
  header.writeUInt16BE(count, 4);
  // What follows speeds up searches; a power of two, its exponent and the rest (OpenType, "Organization of an OpenType Font").
  const power = Math.floor(Math.log2(count));
  header.writeUInt16BE(2 ** power * SFNT_ENTRY, 6);
  header.writeUInt16BE(power, 8);
  header.writeUInt16BE((count - 2 ** power) * SFNT_ENTRY, 10);
  let offset = header.length;
  for (const [i, { entry, data }] of tables.entries()) {
    const at = SFNT_HEADER + i * SFNT_ENTRY;
    entry.copy(header, at, 0, 4);
    entry.copy(header, at + 4, 16, 20);
    header.writeUInt32BE(offset, at + 8);
    header.writeUInt32BE(entry.readUInt32BE(12), at + 12);
    offset += data.length;
  }
  return Buffer.concat([header, ...tables.map(({ data }) => data)]);
}

/** One entry of the directory with its table, unpacked where it was packed, filled up to four bytes. */
function tableAt(woff: Buffer, at: number): Table {
  const entry = woff.subarray(at, at + WOFF_ENTRY);
  const [offset, packed, length] = [entry.readUInt32BE(4), entry.readUInt32BE(8), entry.readUInt32BE(12)];
  const bytes = woff.subarray(offset, offset + packed);
  const data = packed < length ? inflateSync(bytes) : bytes;
  if (data.length !== length) throw new Error('The font file is damaged');
  return { entry, data: Buffer.concat([data, Buffer.alloc((4 - (length % 4)) % 4)]) };
}
