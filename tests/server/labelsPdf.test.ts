import jsQR from 'jsqr';
import { describe, expect, it, test } from 'vitest';
import { labelsPdf } from '../../server/print';
import type { Label } from '../../shared/labels/label';
import { cut, printedPage, readPdf } from '../support/readPdf';

const from = { fishroom: 'Larkmoor Fishroom', madeOn: new Date('2026-06-20T12:00:00Z') };
const address = (n: number): string => `https://larkmoor.example/r/01890a5d-ac96-774b-bcce-b302099a8057/scan/T${n}-7H4`;

const tank = (n: number): Label => ({
  kind: 'tank',
  code: `T${String(n).padStart(2, '0')}`,
  place: 'Left rack, middle',
  volume: '450 L',
  url: address(n),
  typed: `T${n}-7H4`,
});
const colony: Label = {
  kind: 'colony',
  code: 'DUMA-A',
  scientific: 'Tropheus duboisi',
  locality: 'Maswa',
  url: address(90),
  typed: 'DUMA-A-7H4',
};

const DOTS = 200;
const dots = (mm: number): number => Math.round((mm / 25.4) * DOTS);
const linesOf = async (pdf: Buffer): Promise<string> =>
  (await readPdf(pdf))
    .flatMap((page) => page.lines.map((line) => line.text))
    .join(' ')
    .replace(/\s+/g, ' ');

/** The square code of the label whose top left corner is at x and y, read off the printed page. */
async function scanned(pdf: Buffer, page: number, x = 0, y = 0): Promise<string | undefined> {
  const printed = await printedPage(pdf, page, DOTS);
  const width = Math.min(dots(90), printed.width - dots(x));
  const height = Math.min(dots(52), printed.height - dots(y));
  const { data } = cut(printed, { left: dots(x), top: dots(y), width, height });
  return jsQR(data, width, height)?.data;
}

describe('single labels', () => {
  it('are pages of 90 by 52 mm, one each', async () => {
    const pages = await readPdf(await labelsPdf([tank(3), colony], 'single', from));
    expect(pages.map(({ widthMm, heightMm }) => [Math.round(widthMm * 100), Math.round(heightMm * 100)])).toEqual([
      [9000, 5200],
      [9000, 5200],
    ]);
  });

  it('open the tank or colony they stand for when scanned', async () => {
    const pdf = await labelsPdf([tank(3), colony], 'single', from);
    expect(await scanned(pdf, 1)).toBe(address(3));
    expect(await scanned(pdf, 2)).toBe(address(90));
  });

  it('are scanned with a stripe of algae across a twelfth of the square', async () => {
    const printed = await printedPage(await labelsPdf([tank(3)], 'single', from), 1, DOTS);
    for (let y = dots(20); y < dots(22.5); y += 1)
      printed.data.fill(40, (y * printed.width + dots(50)) * 4, (y * printed.width + dots(88)) * 4);
    expect(jsQR(printed.data, printed.width, printed.height)?.data).toBe(address(3));
  });

  it('say the tank, its place and its volume, and nothing of fish', async () => {
    expect(await linesOf(await labelsPdf([tank(3)], 'single', from))).toBe('T03 Left rack, middle 450 L T3-7H4');
  });

  it('say a colony’s strain', async () => {
    expect(await linesOf(await labelsPdf([colony], 'single', from))).toBe('DUMA-A Tropheus duboisi Maswa DUMA-A-7H4');
  });

  it('are black and white alone', async () => {
    const { data } = await printedPage(await labelsPdf([tank(3)], 'single', from), 1, DOTS);
    // Poppler smooths edges to grey; no dot has a hue.
    const hued = data.findIndex((value, i) => i % 4 === 0 && (value !== data[i + 1] || value !== data[i + 2]));
    expect(hued).toBe(-1);
  });
});

describe.each([
  ['a4', 182],
  ['letter', 187.9],
] as const)('a sheet of %s', (paper, widthMm) => {
  const labels = Array.from({ length: 9 }, (_, i) => tank(i + 1));

  it('holds eight labels to cut, and goes on to a second page', async () => {
    const pages = await readPdf(await labelsPdf(labels, paper, from));
    const codes = pages.map((page) => page.lines.flatMap(({ text }) => (/^T\d\d$/.test(text) ? [text] : [])));
    expect(codes).toEqual([['T01', 'T02', 'T03', 'T04', 'T05', 'T06', 'T07', 'T08'], ['T09']]);
  });

  it('has every label where the cutting lines are', async () => {
    const pdf = await labelsPdf(labels, paper, from);
    for (const n of [1, 2, 7, 8]) {
      const x = 14 + ((n - 1) % 2) * (widthMm - 90);
      const y = 25 + Math.floor((n - 1) / 2) * 55.5;
      expect(await scanned(pdf, 1, x, y)).toBe(address(n));
    }
  });
});

test('a tank code is printed 18 mm high in type, a longer one as large as fits', async () => {
  const [first] = await readPdf(await labelsPdf([tank(3)], 'single', from));
  const code = first?.lines.find(({ text }) => text === 'T03');
  // Three letters of Atkinson Hyperlegible Mono, 0.632 of the size each, set 2 % closer.
  expect((code?.rightMm ?? 0) - (code?.leftMm ?? 0)).toBeCloseTo(18 * 3 * 0.612, 0);
});
