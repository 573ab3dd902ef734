import PDFDocument from 'pdfkit';
import type { Page } from '../../shared/print/page';
import { paint } from './paint';

const PT_PER_MM = 72 / 25.4;

export type PdfInfo = { title: string; author: string; subject: string; madeOn: Date };

/** Paints pages into one tagged PDF. The same pages and date give the same bytes. */
export async function pdfOf(pages: Page[], info: PdfInfo, picture: Buffer | null = null): Promise<Buffer> {
  const doc = new PDFDocument({
    autoFirstPage: false,
    pdfVersion: '1.7',
    tagged: true,
    lang: 'en-GB',
    displayTitle: true,
    info: {
      Title: info.title,
      Author: info.author,
      Subject: info.subject,
      Creator: 'Kinwater',
      Producer: 'Kinwater',
      CreationDate: info.madeOn,
    },
  });
  const chunks: Buffer[] = [];
  const done = new Promise<void>((resolve, reject) => doc.on('end', resolve).on('error', reject));
  doc.on('data', (chunk: Buffer) => chunks.push(chunk));
  for (const page of pages) {
    doc.addPage({ size: [page.widthMm * PT_PER_MM, page.heightMm * PT_PER_MM], margin: 0 });
    for (const mark of page.marks) paint(doc, mark, picture);
  }
  doc.end();
  await done;
  return Buffer.concat(chunks);
}
