/*
 * Prints shared/print/letters.ts: which letter is in which font file, and how wide it is. The layout of a page must come
 * out the same in the browser and on the server, so it measures with this table instead of with either one's fonts.
 * Run after an update of the fonts: node scripts/font-widths.mjs > shared/print/letters.ts
 */
import { createRequire } from 'node:module';

const require = createRequire(import.meta.url);
const fontkit = createRequire(require.resolve('pdfkit'))('fontkit');

const NEXT = {
  regular: '400-normal',
  italic: '400-italic',
  semibold: '600-normal',
  bold: '700-normal',
  boldItalic: '700-italic',
};
const NOTO = { regular: '400-normal', bold: '700-normal' };
const SETS = [
  { name: 'latin', family: 'atkinson-hyperlegible-next', subset: 'latin', cuts: NEXT },
  { name: 'latinExt', family: 'atkinson-hyperlegible-next', subset: 'latin-ext', cuts: NEXT },
  { name: 'otherLatin', family: 'noto-sans', subset: 'latin-ext', cuts: NOTO, upTo: 0x24f },
  { name: 'vietnamese', family: 'noto-sans', subset: 'vietnamese', cuts: NOTO },
  { name: 'cyrillic', family: 'noto-sans', subset: 'cyrillic', cuts: NOTO },
  { name: 'greek', family: 'noto-sans', subset: 'greek', cuts: NOTO },
  { name: 'otherMarks', family: 'noto-sans', subset: 'latin', cuts: NOTO },
  { name: 'code', family: 'atkinson-hyperlegible-mono', subset: 'latin', cuts: { code: '600-normal' } },
  { name: 'codeExt', family: 'atkinson-hyperlegible-mono', subset: 'latin-ext', cuts: { code: '600-normal' } },
];

const open = (set, cut) =>
  fontkit.openSync(require.resolve(`@fontsource/${set.family}/files/${set.family}-${set.subset}-${cut}.woff`));

/** Printable letters, without combining marks, soft hyphens, joiners and all spaces but two. */
const isLetter = (code) => code === 0x20 || code === 0xa0 || !/[\p{M}\p{C}\p{Z}]/u.test(String.fromCodePoint(code));

function tableOf(set, taken) {
  const fonts = Object.entries(set.cuts).map(([face, cut]) => [face, open(set, cut)]);
  const letters = [...fonts[0][1].characterSet]
    .filter((code) => isLetter(code) && code <= (set.upTo ?? 0xfffd) && !taken.has(code))
    .sort((a, b) => a - b);
  for (const code of letters) taken.add(code);
  const widths = fonts.map(([face, font]) => {
    const perEm = 1000 / font.unitsPerEm;
    return [
      face,
      letters.map((code) => Math.round(font.layout(String.fromCodePoint(code), ['tnum']).advanceWidth * perEm)),
    ];
  });
  return { letters: String.fromCodePoint(...letters), widths: Object.fromEntries(widths) };
}

/** The table as data: by set, its letters in code order and, by face, their widths in thousandths of the size. */
export function letterTable() {
  const text = new Set();
  const code = new Set();
  return Object.fromEntries(SETS.map((set) => [set.name, tableOf(set, set.name.startsWith('code') ? code : text)]));
}

function source(table) {
  const quoted = (text) => `'${text.replace(/[\\']/g, '\\$&').replaceAll('\u00a0', '\\u00a0')}'`;
  const sets = Object.entries(table).map(([name, { letters, widths }]) => {
    const faces = Object.entries(widths).map(([face, list]) => `      ${face}: '${list.join(' ')}',`);
    return `  ${name}: {\n    letters: ${quoted(letters)},\n    widths: {\n${faces.join('\n')}\n    },\n  },`;
  });
  return `/*
 * Written by scripts/font-widths.mjs from the font files. By set: its letters in code order and, by face, their widths
 * in thousandths of the size, tabular figures on; one width where all are alike. The first set that holds a letter prints it.
 */
export const LETTERS = {\n${sets.join('\n')}\n} as const;\n`;
}

if (process.argv[1] === new URL(import.meta.url).pathname) process.stdout.write(source(letterTable()));
