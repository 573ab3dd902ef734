import QRCode from 'qrcode';
import { runsOf } from '../../shared/print/measure';
import {
  type AreaMark,
  INKS,
  type LineMark,
  type Mark,
  type PictureMark,
  type Point,
  type QrMark,
  type ShapeMark,
  type TextMark,
} from '../../shared/print/page';
import { qrRuns } from '../../shared/print/qrRuns';
import { type PdfDoc as Doc, fontFor } from './fonts';

const PT_PER_MM = 72 / 25.4;
const pt = (mm: number): number => mm * PT_PER_MM;

/** Printed for a letter that no font file holds. */
const REPLACEMENT = '\ufffd';

/** Draws one mark of a page. Words and pictures are tagged for screen readers; rules and shapes are decoration. */
export function paint(doc: Doc, mark: Mark, picture: Buffer | null): void {
  const draw = () => drawMark(doc, mark, picture);
  const tag = tagOf(mark);
  if (tag) {
    doc.addStructure(doc.struct(tag.type, tag.options, draw));
    return;
  }
  doc.markContent('Artifact', { type: 'Layout' });
  draw();
  doc.endMarkedContent();
}

function tagOf(mark: Mark): { type: string; options: { alt?: string } } | null {
  if (mark.kind === 'text') return { type: mark.heading ? `H${mark.heading}` : 'P', options: {} };
  if (mark.kind === 'qr') return { type: 'Figure', options: { alt: `Square code: ${mark.text}` } };
  if (mark.kind === 'picture') return { type: 'Figure', options: { alt: mark.alt } };
  return null;
}

function drawMark(doc: Doc, mark: Mark, picture: Buffer | null): void {
  switch (mark.kind) {
    case 'text':
      paintText(doc, mark);
      break;
    case 'qr':
      paintQr(doc, mark);
      break;
    case 'picture':
      paintPicture(doc, mark, picture);
      break;
    case 'line':
      paintLine(doc, mark);
      break;
    case 'area':
      paintArea(doc, mark);
      break;
    case 'shape':
      paintShape(doc, mark);
      break;
  }
}

function paintPicture(doc: Doc, { x, y, widthMm, heightMm }: PictureMark, picture: Buffer | null): void {
  if (picture) doc.image(picture, pt(x), pt(y), { fit: [pt(widthMm), pt(heightMm)] });
}

type Printed = { text: string; font: string };

function printedRuns(doc: Doc, { text, face }: TextMark): Printed[] {
  return runsOf(text, face).map((run) =>
    run.set === null
      ? { text: REPLACEMENT.repeat([...run.text].length), font: fontFor(doc, 'otherMarks', face) }
      : { text: run.text, font: fontFor(doc, run.set, face) },
  );
}

/** Composing letters of parts is off: it would print "ị" as two glyphs, the second of which no reader can copy. */
const FEATURES = { tnum: true, kern: true, ccmp: false };
// pdfkit hands features on to fontkit, which takes them by name as well; pdfkit's types know the list alone.
const featureList = FEATURES as unknown as PDFKit.Mixins.OpenTypeFeatures[];

function paintText(doc: Doc, mark: TextMark): void {
  const runs = printedRuns(doc, mark);
  const options: PDFKit.Mixins.TextOptions = {
    lineBreak: false,
    baseline: 'alphabetic',
    features: featureList,
    characterSpacing: pt(mark.tracking * mark.sizeMm),
  };
  doc.fontSize(pt(mark.sizeMm)).fillColor(INKS[mark.ink]);
  const widths = runs.map((run) => doc.font(run.font).widthOfString(run.text, options));
  const width = widths.reduce((sum, each) => sum + each, 0);
  let x = pt(mark.x) - width * { start: 0, middle: 0.5, end: 1 }[mark.anchor];
  for (const [i, run] of runs.entries()) {
    doc.font(run.font).text(run.text, x, pt(mark.y), options);
    x += widths[i] ?? 0;
  }
}

function trace(doc: Doc, points: Point[]): void {
  for (const [i, [x, y]] of points.entries()) {
    if (i === 0) doc.moveTo(pt(x), pt(y));
    else doc.lineTo(pt(x), pt(y));
  }
}

function paintLine(doc: Doc, { points, widthMm, ink, dashMm }: LineMark): void {
  trace(doc, points);
  doc.lineWidth(pt(widthMm)).strokeColor(INKS[ink]);
  if (dashMm) doc.dash(pt(dashMm[0]), { space: pt(dashMm[1]) });
  doc.stroke().undash();
}

function paintArea(doc: Doc, { points, fill, stroke }: AreaMark): void {
  trace(doc, points);
  doc.closePath().fillColor(INKS[fill]);
  if (!stroke) doc.fill();
  else doc.lineWidth(pt(stroke.widthMm)).strokeColor(INKS[stroke.ink]).fillAndStroke();
}

const SHAPE_STROKE_MM = 0.46;

function paintShape(doc: Doc, { x, y, sizeMm, sex, sure, filled }: ShapeMark): void {
  const half = sizeMm / 2;
  if (sex === 'male') doc.rect(pt(x - half), pt(y - half), pt(sizeMm), pt(sizeMm));
  else if (sex === 'female') doc.circle(pt(x), pt(y), pt(half));
  else {
    const reach = half * 1.15;
    trace(doc, [
      [x, y - reach],
      [x + reach, y],
      [x, y + reach],
      [x - reach, y],
    ]);
    doc.closePath();
  }
  doc
    .lineWidth(pt(SHAPE_STROKE_MM))
    .strokeColor(INKS.ink)
    .fillColor(INKS[filled && sure ? 'ink' : 'paper']);
  if (!sure) doc.dash(pt(1.05), { space: pt(0.8) });
  doc.fillAndStroke().undash();
}

function paintQr(doc: Doc, mark: QrMark): void {
  const { modules } = QRCode.create(mark.text, { errorCorrectionLevel: mark.level });
  const step = pt(mark.sizeMm) / modules.size;
  for (const { row, column, length } of qrRuns(modules.size, (r, c) => modules.get(r, c) === 1)) {
    doc.rect(pt(mark.x) + column * step, pt(mark.y) + row * step, length * step, step);
  }
  doc.fill(INKS[mark.ink]);
}
