import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type PDFDocument from 'pdfkit';
import { cutOf, type LetterSet } from '../../shared/print/measure';
import type { Face } from '../../shared/print/page';
import { sfntOf } from './sfnt';

export type PdfDoc = InstanceType<typeof PDFDocument>;

const require = createRequire(import.meta.url);

/** pdfkit embeds woff, not woff2. A subset file holds one script; the layout says which one has a letter. */
const FILES: Record<LetterSet, { family: string; subset: string }> = {
  latin: { family: 'atkinson-hyperlegible-next', subset: 'latin' },
  latinExt: { family: 'atkinson-hyperlegible-next', subset: 'latin-ext' },
  otherLatin: { family: 'noto-sans', subset: 'latin-ext' },
  vietnamese: { family: 'noto-sans', subset: 'vietnamese' },
  cyrillic: { family: 'noto-sans', subset: 'cyrillic' },
  greek: { family: 'noto-sans', subset: 'greek' },
  otherMarks: { family: 'noto-sans', subset: 'latin' },
  code: { family: 'atkinson-hyperlegible-mono', subset: 'latin' },
  codeExt: { family: 'atkinson-hyperlegible-mono', subset: 'latin-ext' },
};

const CUTS: Record<Face, string> = {
  regular: '400-normal',
  italic: '400-italic',
  semibold: '600-normal',
  bold: '700-normal',
  boldItalic: '700-italic',
  code: '600-normal',
};

const unpacked = new Map<string, Buffer>();

/** Unpacked once and kept: about 2 MB for all of them. */
function fontBytes(file: string): Buffer {
  const known = unpacked.get(file);
  if (known) return known;
  const bytes = sfntOf(readFileSync(require.resolve(`@fontsource/${file}.woff`)));
  unpacked.set(file, bytes);
  return bytes;
}

/** The font that prints the letters of a set in a face, registered with the document under the name that is returned. */
export function fontFor(doc: PdfDoc, set: LetterSet, face: Face): string {
  const { family, subset } = FILES[set];
  const file = `${family}/files/${family}-${subset}-${CUTS[cutOf(set, face)]}`;
  doc.registerFont(file, fontBytes(file));
  return file;
}
