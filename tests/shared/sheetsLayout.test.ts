import { describe, expect, it, test } from 'vitest';
import { widthOf } from '../../shared/print/measure';
import { MARGIN_MM, type Mark, PAPERS, type Page, type TextMark, textsOf } from '../../shared/print/page';
import { SheetContent } from '../../shared/sheets/content';
import { sheetPages } from '../../shared/sheets/layout';
import { US } from '../../shared/units';
import { duboisi } from '../support/sheetContent';
import { variants } from '../support/sheetVariants';

const options = { checkUrl: 'https://larkmoor.example/sheet/n9xhMgu8R1yDZcK0s1q7YQ', hasPicture: false };
const papers = ['a4', 'letter'] as const;
/** Where lines end and spaces stand is not what these tests are about. */
const squeezed = (text: string): string => text.replace(/\s/g, '');
const textOf = (pages: Page[]): string => squeezed(pages.flatMap(textsOf).join(''));

type Box = { left: number; right: number; top: number; bottom: number; what: string };

/** The inked part of a line: capitals above the baseline, a little below it. */
function boxOf(mark: TextMark): Box {
  const width = widthOf(mark.text, mark.face, mark.sizeMm, mark.tracking);
  const left = mark.x - width * { start: 0, middle: 0.5, end: 1 }[mark.anchor];
  return {
    left,
    right: left + width,
    top: mark.y - 0.68 * mark.sizeMm,
    bottom: mark.y + 0.1 * mark.sizeMm,
    what: mark.text,
  };
}

/** Boxes of all that is read or looked at: lines of text, shapes, the square code. */
function boxesOf(marks: Mark[]): Box[] {
  return marks.flatMap((mark): Box[] => {
    if (mark.kind === 'text') return [boxOf(mark)];
    if (mark.kind === 'qr')
      return [{ left: mark.x, right: mark.x + mark.sizeMm, top: mark.y, bottom: mark.y + mark.sizeMm, what: 'qr' }];
    if (mark.kind !== 'shape') return [];
    const half = mark.sizeMm / 2;
    return [{ left: mark.x - half, right: mark.x + half, top: mark.y - half, bottom: mark.y + half, what: mark.sex }];
  });
}

function clashes(boxes: Box[]): string[] {
  const hair = 0.05;
  const over = (a: Box, b: Box) =>
    a.left < b.right - hair && b.left < a.right - hair && a.top < b.bottom - hair && b.top < a.bottom - hair;
  return boxes.flatMap((a, i) => boxes.slice(i + 1).flatMap((b) => (over(a, b) ? [`${a.what} / ${b.what}`] : [])));
}

describe.each(Object.entries(variants))('%s', (_, content) => {
  it('is a sheet', () => {
    expect(SheetContent.safeParse(content).error?.issues ?? []).toEqual([]);
  });

  it.each(papers)('has no two things in one place on %s', (paper) => {
    for (const page of sheetPages(content, paper, options)) expect(clashes(boxesOf(page.marks))).toEqual([]);
  });

  it.each(papers)('keeps to the margins of %s', (paper) => {
    const { widthMm, heightMm } = PAPERS[paper];
    for (const box of sheetPages(content, paper, options).flatMap((page) => boxesOf(page.marks))) {
      expect(box.left, box.what).toBeGreaterThanOrEqual(MARGIN_MM - 0.1);
      expect(box.right, box.what).toBeLessThanOrEqual(widthMm - MARGIN_MM + 0.1);
      expect(box.top, box.what).toBeGreaterThanOrEqual(MARGIN_MM - 0.1);
      expect(box.bottom, box.what).toBeLessThanOrEqual(heightMm - MARGIN_MM + 0.6);
    }
  });

  it('has its square code and its parents on the first page', () => {
    for (const paper of papers) {
      const [first] = sheetPages(content, paper, options);
      const codes = first?.marks.flatMap((mark) => (mark.kind === 'qr' ? [mark.text] : []));
      expect(codes).toEqual([options.checkUrl]);
      expect(first && textsOf(first)).toContain('Parents and grandparents');
    }
  });

  it('says the same on A4 and on Letter', () => {
    // The foot and the pages' numbers stand where the first page ends, which differs.
    const foot = /Checkthissheet.*?keeperdate|Lineagesheet[^,]{1,40},[^,]{1,40}?page\dof\d|page\dof\d/g;
    const [a4, letter] = papers.map((paper) => textOf(sheetPages(content, paper, options)).replace(foot, ''));
    expect(a4).toBe(letter);
  });
});

test('a sheet says who issued it, what the fish are, how inbred they are and how that is known', () => {
  const text = textOf(sheetPages(duboisi, 'a4', options));
  for (const words of [
    'Larkmoor Fishroom',
    'Tropheus duboisi',
    'Maswa, Lake Tanganyika',
    '6, not sexed, of brood DUMA-25H',
    'wild caught, from Oduya Imports, Jun 2018, papers: invoice',
    '16 to 18 Oct 2025, 8 months old',
    '9 Nov 2025, day 24 of the hold',
    'expected F = 0.037: 0 at 79 %, 0.125 at 13 %, 0.250 at 8 %',
    'equal to 2.0 full generations',
    '29 of 34, 85 %',
    'DUMA-A01 F1 · sire, 79 %',
    'DUMA-A04 F1 · dam',
    'DUMA-W01 or DUMA-W03 60 % or 40 %',
    'Dashed: not certain. One sire for all of them; which one is not certain.',
    '7 samples of 12 to 20 fish, 9 Nov 2025 to 11 May 2026.',
    'Temperature 25.8 °C 25.0 to 26.4',
    'Dam seen holding; not holding two days before. seen; Pim Roswell',
    'Match within 0.3 pH and 2 °C',
    'larkmoor.example/sheet/n9xhMgu8R1yDZcK0s1q7YQ',
    'Ines Hallworth, keeper',
  ]) {
    expect(text).toContain(squeezed(words));
  }
});

test('a buyer who reads inches and Fahrenheit gets them', () => {
  const text = textOf(sheetPages(duboisi, 'letter', { ...options, units: US }));
  expect(text).toContain(squeezed('Temperature 78.4 °F 77.0 to 79.5'));
  expect(text).toContain(squeezed('mean total length, in'));
  // 46.8 mm / 25.4 = 1.84 in.
  expect(text).toContain(squeezed('1.84 in'));
  expect(text).not.toContain(squeezed('25.8 °C'));
});

test('a possible hybrid is called that, and its strain’s code and place are not', () => {
  const text = textOf(sheetPages(variants['a possible hybrid with a long record'] ?? duboisi, 'a4', options));
  expect(text).toContain(
    squeezed(
      'Possible hybrid No strain is claimed. A parent may be Tropheus sp. "Ikola" Ikola or Tropheus duboisi Maswa.',
    ),
  );
  expect(text).not.toContain(squeezed('strain DUMA'));
});

test('an undescribed species under a trade name is said to be one, and treatment is said first', () => {
  const text = textOf(
    sheetPages(variants['an undescribed species under a trade name, treated'] ?? duboisi, 'a4', options),
  );
  expect(text).toContain(squeezed('sold as Kasanga; not traced to a place'));
  expect(text).toContain(squeezed('Red Rainbow Kasanga'));
  expect(text).toContain(squeezed('born in captivity, not meeting the rule for bred in captivity'));
  expect(text).toContain(squeezed('Salt, 2 g/L, for a torn fin, since 15 Jun 2026, end not set'));
  expect(text.indexOf('Treatmentrunning')).toBeLessThan(text.indexOf('Parentsandgrandparents'));
});

test('who goes with whom is said for fish of several pairs', () => {
  const text = textOf(sheetPages(variants['a mixed batch of two pairs'] ?? duboisi, 'a4', options));
  expect(text).toContain(squeezed('Fish of several pairs: DUMA-A01 with DUMA-A04 70 %; DUMA-A02 with DUMA-W02 30 %.'));
});

test('of very many possible sires the likeliest are drawn and the rest summed up', () => {
  const text = textOf(sheetPages(variants['a brood with fourteen possible sires'] ?? duboisi, 'a4', options));
  // 14 + 13 + … + 1 = 105 shares, and 2 for a male not known: eleven are shown, 3 + 2 + 1 + 2 of 107 are left.
  expect(text).toContain(squeezed('DUMA-B01 F1 or F2 · sire, 13 %'));
  expect(text).toContain(squeezed('4 more males sire, 7 % together'));
  expect(text).toContain(squeezed('Each of them may have another sire.'));
});

test('what is not certain is dashed and what is certain is not', () => {
  const marks = sheetPages(duboisi, 'a4', options).flatMap((page) => page.marks);
  const shapes = marks.flatMap((mark) => (mark.kind === 'shape' ? [`${mark.sex}${mark.sure ? '' : ' ?'}`] : []));
  // The brood; two possible sires, each with their parents; the dam with hers.
  expect(shapes).toEqual([
    'unsexed',
    'male ?',
    'male',
    'female',
    'male ?',
    'male ?',
    'female',
    'female',
    'male',
    'female',
  ]);
});

test('a photo takes its place in its own proportions; where it is missing, only their number is said', () => {
  const shown = {
    caption: 'One of the brood, 4.6 cm',
    takenOn: '2026-05-03',
    sha256: 'a'.repeat(64),
    widthPx: 1280,
    heightPx: 720,
  };
  const content = { ...duboisi, photos: { count: 3, shown } };
  const picture = sheetPages(content, 'a4', { ...options, hasPicture: true }).flatMap((page) =>
    page.marks.flatMap((mark) => (mark.kind === 'picture' ? [mark] : [])),
  );
  expect(picture).toHaveLength(1);
  expect((picture[0]?.widthMm ?? 0) / (picture[0]?.heightMm ?? 1)).toBeCloseTo(1280 / 720, 6);
  expect(textOf(sheetPages(content, 'a4', { ...options, hasPicture: true }))).toContain('3May2026.Oneof3photos.');
  expect(textOf(sheetPages(content, 'a4', options))).not.toContain('Oneofthebrood');
  expect(textOf(sheetPages(content, 'a4', options))).toContain('Photos3recorded');
});
