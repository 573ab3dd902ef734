import { createRequire } from 'node:module';
import { cutOf, type LetterSet } from '../../shared/print/measure';
import type { Face } from '../../shared/print/page';

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

const CUTS: Record<string, string> = {
  regular: '400-normal',
  italic: '400-italic',
  semibold: '600-normal',
  bold: '700-normal',
  boldItalic: '700-italic',
  code: '600-normal',
};

/** The font file that prints the letters of a set in a face. */
export function fontFile(set: LetterSet, face: Face): string {
  const { family, subset } = FILES[set];
  const cut = CUTS[cutOf(set, face)] ?? CUTS['regular'];
  return require.resolve(`@fontsource/${family}/files/${family}-${subset}-${cut}.woff`);
}
