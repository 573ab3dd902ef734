/*
 * Prints shared/print/letters.ts: which letter is in which font file, and how wide it is. The layout of a page must come
 * out the same in the browser and on the server, so it measures with this table instead of with either one's fonts.
 * Run after an update of the fonts: npx tsx scripts/font-widths.ts > shared/print/letters.ts
 */
import { createRequire } from 'node:module';
import { pathToFileURL } from 'node:url';

type Font = {
  unitsPerEm: number;
  characterSet: number[];
  layout(text: string, features: string[]): { advanceWidth: number };
};
type LetterSet = { name: string; family: string; subset: string; cuts: Record<string, string>; upTo?: number };
type Table = Record<string, { letters: string; widths: Record<string, string> }>;

const require = createRequire(import.meta.url);
// pdfkit's own reader of fonts, so that the table measures what the painter will draw.
const fontkit: { openSync(path: string): Font } = createRequire(require.resolve('pdfkit'))('fontkit');

const NEXT = {
  regular: '400-normal',
  italic: '400-italic',
  semibold: '600-normal',
  bold: '700-normal',
  boldItalic: '700-italic',
};
const NOTO = { regular: '400-normal', bold: '700-normal' };
const MONO = { code: '600-normal' };
const SETS: LetterSet[] = [
  { name: 'latin', family: 'atkinson-hyperlegible-next', subset: 'latin', cuts: NEXT },
  { name: 'latinExt', family: 'atkinson-hyperlegible-next', subset: 'latin-ext', cuts: NEXT },
  { name: 'otherLatin', family: 'noto-sans', subset: 'latin-ext', cuts: NOTO, upTo: 0x24f },
  { name: 'vietnamese', family: 'noto-sans', subset: 'vietnamese', cuts: NOTO },
  { name: 'cyrillic', family: 'noto-sans', subset: 'cyrillic', cuts: NOTO },
  { name: 'greek', family: 'noto-sans', subset: 'greek', cuts: NOTO },
  { name: 'otherMarks', family: 'noto-sans', subset: 'latin', cuts: NOTO },
  { name: 'code', family: 'atkinson-hyperlegible-mono', subset: 'latin', cuts: MONO },
  { name: 'codeExt', family: 'atkinson-hyperlegible-mono', subset: 'latin-ext', cuts: MONO },
];

const open = ({ family, subset }: LetterSet, cut: string): Font =>
  fontkit.openSync(require.resolve(`@fontsource/${family}/files/${family}-${subset}-${cut}.woff`));

/** Printable letters, without combining marks, soft hyphens, joiners and all spaces but two. */
const isLetter = (code: number): boolean =>
  code === 0x20 || code === 0xa0 || !/[\p{M}\p{C}\p{Z}]/u.test(String.fromCodePoint(code));

function tableOf(set: LetterSet, taken: Set<number>): Table[string] {
  const fonts = Object.entries(set.cuts).map(([face, cut]) => ({ face, font: open(set, cut) }));
  const letters = (fonts[0]?.font.characterSet ?? [])
    .filter((code) => isLetter(code) && code <= (set.upTo ?? 0xfffd) && !taken.has(code))
    .sort((a, b) => a - b);
  for (const code of letters) taken.add(code);
  const widths = fonts.map(({ face, font }) => {
    const width = (code: number) => font.layout(String.fromCodePoint(code), ['tnum']).advanceWidth;
    const list = letters.map((code) => Math.round((width(code) * 1000) / font.unitsPerEm));
    return [face, (new Set(list).size === 1 ? list.slice(0, 1) : list).join(' ')];
  });
  return { letters: String.fromCodePoint(...letters), widths: Object.fromEntries(widths) };
}

/** By set: its letters in code order and, by face, their widths in thousandths of the size; one where all are alike. */
export function letterTable(): Table {
  const text = new Set<number>();
  const code = new Set<number>();
  return Object.fromEntries(SETS.map((set) => [set.name, tableOf(set, set.cuts === MONO ? code : text)]));
}

function source(table: Table): string {
  const quoted = (text: string) => `'${text.replace(/[\\']/g, '\\$&').replaceAll('\u00a0', '\\u00a0')}'`;
  const sets = Object.entries(table).map(([name, { letters, widths }]) => {
    const faces = Object.entries(widths).map(([face, list]) => `      ${face}: '${list}',`);
    return `  ${name}: {\n    letters: ${quoted(letters)},\n    widths: {\n${faces.join('\n')}\n    },\n  },`;
  });
  return `/*
 * Written by scripts/font-widths.ts from the font files. By set: its letters in code order and, by face, their widths in
 * thousandths of the size, tabular figures on; one width where all are alike. The first set that holds a letter prints it.
 */
export const LETTERS = {\n${sets.join('\n')}\n} as const;\n`;
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) process.stdout.write(source(letterTable()));
