import { createHash } from 'node:crypto';
import sharp from 'sharp';
import type { Paper } from '../../shared/print/page';
import type { SheetContent } from '../../shared/sheets/content';
import { sheetPages } from '../../shared/sheets/layout';
import type { SheetOptions } from '../../shared/sheets/sections';
import { pdfOf } from './pdf';

/** Long side of the printed photo: 81 mm at 300 dots to the inch. */
const PICTURE_PX = 960;

/**
 * A lineage sheet as a PDF for A4 or Letter. `picture` is the file of the photo that the content names; another one, or
 * none, leaves the photo's place out, so that a sheet never shows a picture that was not signed for.
 */
export async function sheetPdf(
  content: SheetContent,
  paper: Paper,
  options: Omit<SheetOptions, 'hasPicture'> & { picture?: Buffer },
): Promise<Buffer> {
  const picture = await pictureFor(content, options.picture);
  const pages = sheetPages(content, paper, { ...options, hasPicture: picture !== null });
  const info = {
    title: `Lineage sheet ${content.issue.number}`,
    author: content.fishroom.name,
    subject: content.subject.code,
    madeOn: new Date(`${content.issue.on}T12:00:00Z`),
  };
  return pdfOf(pages, info, picture);
}

async function pictureFor({ photos }: SheetContent, file: Buffer | undefined): Promise<Buffer | null> {
  if (!file || !photos.shown) return null;
  if (createHash('sha256').update(file).digest('hex') !== photos.shown.sha256) return null;
  return sharp(file, { limitInputPixels: 60_000_000 })
    .resize(PICTURE_PX, PICTURE_PX, { fit: 'inside', withoutEnlargement: true })
    .flatten({ background: '#ffffff' })
    .jpeg({ quality: 85, chromaSubsampling: '4:4:4' })
    .toBuffer();
}
