import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { getDocument, VerbosityLevel } from 'pdfjs-dist/legacy/build/pdf.mjs';
import sharp from 'sharp';

const PT_PER_MM = 72 / 25.4;

export type PdfLine = { text: string; leftMm: number; rightMm: number; baselineMm: number };
export type PdfPage = { widthMm: number; heightMm: number; lines: PdfLine[] };

/** What a PDF says, page by page, in the order it is written, read by a library that did not write it. */
export async function readPdf(pdf: Buffer): Promise<PdfPage[]> {
  const document = await getDocument({ data: new Uint8Array(pdf), verbosity: VerbosityLevel.ERRORS }).promise;
  const pages: PdfPage[] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const [, , width = 0, height = 0] = page.view;
    const { items } = await page.getTextContent();
    const lines = items.flatMap((item): PdfLine[] => {
      if (!('str' in item) || item.str === '') return [];
      const [, , , , x = 0, y = 0]: number[] = item.transform;
      const left = x / PT_PER_MM;
      return [
        { text: item.str, leftMm: left, rightMm: left + item.width / PT_PER_MM, baselineMm: (height - y) / PT_PER_MM },
      ];
    });
    pages.push({ widthMm: width / PT_PER_MM, heightMm: height / PT_PER_MM, lines });
  }
  await document.destroy();
  return pages;
}

export type Pixels = { data: Uint8ClampedArray; width: number; height: number };

/** A page as a printer would put it down, by Poppler (Debian's poppler-utils). */
export async function printedPage(pdf: Buffer, page: number, dotsPerInch: number): Promise<Pixels> {
  const folder = await mkdtemp(join(tmpdir(), 'printed-'));
  try {
    const file = join(folder, 'paper.pdf');
    await writeFile(file, pdf);
    const which = ['-f', String(page), '-l', String(page)];
    await promisify(execFile)('pdftoppm', [
      '-r',
      String(dotsPerInch),
      ...which,
      '-singlefile',
      '-png',
      file,
      join(folder, 'page'),
    ]);
    const image = sharp(await readFile(join(folder, 'page.png'))).ensureAlpha();
    const { data, info } = await image.raw().toBuffer({ resolveWithObject: true });
    return { data: new Uint8ClampedArray(data), width: info.width, height: info.height };
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

/** A rectangle of a printed page. */
export function cut(from: Pixels, box: { left: number; top: number; width: number; height: number }): Pixels {
  const data = new Uint8ClampedArray(box.width * box.height * 4);
  for (let row = 0; row < box.height; row += 1) {
    const start = ((box.top + row) * from.width + box.left) * 4;
    data.set(from.data.subarray(start, start + box.width * 4), row * box.width * 4);
  }
  return { data, width: box.width, height: box.height };
}
