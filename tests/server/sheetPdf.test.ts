import { createHash } from 'node:crypto';
import jsQR from 'jsqr';
import sharp from 'sharp';
import { describe, expect, it, test } from 'vitest';
import { letterTable } from '../../scripts/font-widths';
import { sheetPdf } from '../../server/print';
import { LETTERS } from '../../shared/print/letters';
import { runsOf, unprintable, widthOf } from '../../shared/print/measure';
import { MARGIN_MM, PAPERS, textsOf } from '../../shared/print/page';
import type { SheetContent } from '../../shared/sheets/content';
import { sheetPages } from '../../shared/sheets/layout';
import { printedPage, readPdf } from '../support/readPdf';
import { duboisi } from '../support/sheetContent';
import { variants } from '../support/sheetVariants';

const checkUrl = 'https://larkmoor.example/sheet/n9xhMgu8R1yDZcK0s1q7YQ';
/** The micro sign and the Greek letter share a glyph: which of the two was meant can't be read back. */
const squeezed = (text: string): string => text.normalize('NFKC').replace(/\s/g, '');
const textOf = async (content: SheetContent): Promise<string> => {
  const pages = await readPdf(await sheetPdf(content, 'a4', { checkUrl }));
  return squeezed(pages.flatMap((page) => page.lines.map((line) => line.text)).join(''));
};

describe.each(Object.entries(variants))('%s', (_, content) => {
  it.each(['a4', 'letter'] as const)(
    'says on %s paper what it says on the screen, within the margins',
    async (paper) => {
      const drawn = sheetPages(content, paper, { checkUrl, hasPicture: false });
      const printed = await readPdf(await sheetPdf(content, paper, { checkUrl }));
      const said = (texts: string[]) => squeezed(texts.join(''));
      expect(printed.map((page) => said(page.lines.map((line) => line.text)))).toEqual(
        drawn.map((page) => said(textsOf(page))),
      );
      // Kerning is not measured by the layout; it must not push a line over the edge.
      for (const line of printed.flatMap((page) => page.lines)) {
        expect(line.leftMm, line.text).toBeGreaterThan(MARGIN_MM - 0.3);
        expect(line.rightMm, line.text).toBeLessThan(PAPERS[paper].widthMm - MARGIN_MM + 0.3);
      }
    },
  );
});

test.each(['a4', 'letter'] as const)('%s pages are the size of the paper', async (paper) => {
  for (const page of await readPdf(await sheetPdf(duboisi, paper, { checkUrl }))) {
    expect(page.widthMm).toBeCloseTo(PAPERS[paper].widthMm, 3);
    expect(page.heightMm).toBeCloseTo(PAPERS[paper].heightMm, 3);
  }
});

test('the square code on the printed sheet opens its check page', async () => {
  const { data, width, height } = await printedPage(await sheetPdf(duboisi, 'a4', { checkUrl }), 1, 150);
  expect(jsQR(data, width, height)?.data).toBe(checkUrl);
});

test('the same sheet comes out as the same file, byte for byte', async () => {
  const [once, again] = await Promise.all([1, 2].map(() => sheetPdf(duboisi, 'a4', { checkUrl })));
  expect(once?.equals(again ?? Buffer.alloc(0))).toBe(true);
});

test('names in Polish, Turkish, Vietnamese, Greek and Cyrillic are printed in full', async () => {
  for (const by of [
    'Żółkiewska Łucja',
    'Gülşen Iğdır',
    'Nguyễn Thị Hạnh',
    'Ελένη Παπαδοπούλου',
    'Ольга Щербакова',
    'Ōtsuka',
  ]) {
    expect(await textOf({ ...duboisi, issue: { ...duboisi.issue, by } })).toContain(squeezed(by));
    expect(unprintable(by)).toEqual([]);
  }
});

test('a letter that no font holds prints as a replacement sign, the rest of the name as it is', async () => {
  const text = await textOf({ ...duboisi, issue: { ...duboisi.issue, by: 'Tanaka 田中, keeper' } });
  expect(text).toContain('Tanaka\ufffd\ufffd,keeper');
  expect(unprintable('Tanaka 田中, keeper')).toEqual(['田', '中']);
});

test('an accent typed apart from its letter is printed on it', async () => {
  expect(await textOf({ ...duboisi, issue: { ...duboisi.issue, by: 'Rene\u0301e' } })).toContain('Renée');
});

test('text is measured as the fonts are: the table is the one the font files give', () => {
  expect(LETTERS).toEqual(letterTable());
});

test('text changes its font only where it must', () => {
  expect(runsOf('Łódź', 'bold').map(({ text, set }) => `${text}:${set}`)).toEqual([
    'Ł:latinExt',
    'ód:latin',
    'ź:latinExt',
  ]);
  // Atkinson Hyperlegible Mono 600: every letter is 632 thousandths wide.
  expect(widthOf('DUMA-26C', 'code', 10)).toBeCloseTo(8 * 6.32, 9);
});

describe('the photo', () => {
  const made = sharp({ create: { width: 640, height: 400, channels: 3, background: '#205060' } })
    .webp()
    .toBuffer();
  const withPhoto = async (): Promise<{ content: SheetContent; picture: Buffer }> => {
    const picture = await made;
    const sha256 = createHash('sha256').update(picture).digest('hex');
    const shown = { caption: 'One of the brood, 4.6 cm', takenOn: '2026-05-03', sha256, widthPx: 640, heightPx: 400 };
    return { content: { ...duboisi, photos: { count: 2, shown } }, picture };
  };
  const blue = ({ data }: { data: Uint8ClampedArray }): number => {
    let count = 0;
    for (let i = 0; i < data.length; i += 4)
      if (Math.abs((data[i] ?? 0) - 0x20) < 6 && Math.abs((data[i + 2] ?? 0) - 0x60) < 6) count += 1;
    return count;
  };

  it('is printed when it is the one that was signed for', async () => {
    const { content, picture } = await withPhoto();
    const pdf = await sheetPdf(content, 'a4', { checkUrl, picture });
    // 81 by 50.6 mm at 50 dots to the inch is about 15 900 dots.
    expect(blue(await printedPage(pdf, 1, 50))).toBeGreaterThan(14_000);
  });

  it('is left out when another file is put in its place', async () => {
    const { content } = await withPhoto();
    const other = await sharp({ create: { width: 640, height: 400, channels: 3, background: '#205061' } })
      .png()
      .toBuffer();
    const pdf = await sheetPdf(content, 'a4', { checkUrl, picture: other });
    expect(blue(await printedPage(pdf, 1, 50))).toBe(0);
    expect((await readPdf(pdf)).flatMap((page) => page.lines.map((line) => line.text)).join(' ')).not.toContain(
      'One of the brood',
    );
  });
});
