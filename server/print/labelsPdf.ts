import type { Label, LabelPaper } from '../../shared/labels/label';
import { labelPages } from '../../shared/labels/layout';
import { pdfOf } from './pdf';

/** Labels as a PDF: one 90 by 52 mm page each for a label printer, or eight to a sheet of A4 or Letter. */
export async function labelsPdf(
  labels: Label[],
  paper: LabelPaper,
  from: { fishroom: string; madeOn: Date; skip?: number },
): Promise<Buffer> {
  const info = {
    title: 'Labels',
    author: from.fishroom,
    subject: labels.map(({ code }) => code).join(', '),
    madeOn: from.madeOn,
  };
  return pdfOf(labelPages(labels, paper, from), info);
}
