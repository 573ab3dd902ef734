import { breakLines, type Paragraph, paragraph, type Span, word } from '../print/lines';
import { widthOf } from '../print/measure';
import { box, type Face, type Mark } from '../print/page';
import { nameSpans } from '../sheets/speciesName';
import type { Label } from './label';

export const LABEL = { widthMm: 90, heightMm: 52 } as const;

const PAD_MM = 4;
const QR_MM = 31;
/** White round the square code: four modules at version 3 and above (ISO/IEC 18004). */
const QUIET_MM = 4.3;
const QR = { x: LABEL.widthMm - PAD_MM - 1.5 - QR_MM, y: 5 } as const;
const TEXT_X = 13;
const TEXT_MM = QR.x - QUIET_MM - TEXT_X;

const CODE = { largestMm: 18, singleMm: 10.5, smallestMm: 4.5, stepMm: 0.5, topMm: 3.2, lineShare: 1.02 } as const;

/** The mark's six bars, as wide as they are high there: the edge by which a label is known across the room. */
const EDGE_WIDTHS_MM = [2.65, 4.76, 5.8, 5, 2.1, 4] as const;
const EDGE_HEIGHT_MM = 4.8;

/** One label with its top left corner at x and y. */
export function labelMarks(label: Label, x: number, y: number): Mark[] {
  return [
    ...edgeMarks(x + PAD_MM, y + PAD_MM),
    ...textMarks(label, x + TEXT_X, y),
    { kind: 'qr', x: x + QR.x, y: y + QR.y, sizeMm: QR_MM, text: label.url, level: 'Q', ink: 'black' },
    word(label.typed, {
      x: x + QR.x + QR_MM / 2,
      y: y + LABEL.heightMm - 5.2,
      sizeMm: 4,
      face: 'code',
      ink: 'black',
      anchor: 'middle',
    }),
  ];
}

function edgeMarks(x: number, y: number): Mark[] {
  const step = (LABEL.heightMm - 2 * PAD_MM - EDGE_HEIGHT_MM) / (EDGE_WIDTHS_MM.length - 1);
  return EDGE_WIDTHS_MM.map(
    (width, i): Mark => ({ kind: 'area', points: box(x, y + i * step, width, EDGE_HEIGHT_MM), fill: 'black' }),
  );
}

/** As large as it goes on one line; below a size, as large as it goes on two; never cut inside a word. */
function codeSize(code: string): number {
  const longest = Math.max(...code.split(' ').map((part) => widthOf(part, 'code', 1, -0.02)));
  const lines = (size: number) => breakLines([{ text: code, face: 'code' }], TEXT_MM, size).length;
  for (let size: number = CODE.largestMm; size > CODE.smallestMm; size -= CODE.stepMm) {
    if (longest * size <= TEXT_MM && lines(size) <= (size > CODE.singleMm ? 1 : 2)) return size;
  }
  return CODE.smallestMm;
}

function codeText(code: string): Paragraph {
  const sizeMm = codeSize(code);
  return paragraph([{ text: code, face: 'code' }], TEXT_MM, { sizeMm, lineMm: sizeMm * CODE.lineShare, ink: 'black' });
}

const FACT_SIZES_MM = [3.97, 3.5, 3, 2.6, 2.2] as const;

/** What stands under the code, upper and lower part: as large as the room lets them be. */
function factTexts(label: Label, roomMm: number): Paragraph[] {
  const [upper, lower] = factSpans(label);
  const volume = label.kind === 'tank' ? { sizeMm: 5.55, lineMm: 7, ink: 'black' as const } : null;
  const set = (sizeMm: number): Paragraph[] => {
    const style = { sizeMm, lineMm: sizeMm * 1.26, ink: 'black' } as const;
    return [paragraph(upper, TEXT_MM, style), paragraph(lower, TEXT_MM, volume ?? style)];
  };
  const height = (texts: Paragraph[]) => texts.reduce((sum, text) => sum + text.heightMm, 0);
  return FACT_SIZES_MM.map(set).find((texts) => height(texts) <= roomMm) ?? set(FACT_SIZES_MM[4]);
}

function factSpans(label: Label): [Span[], Span[]] {
  const said = (text: string | null, face: Face): Span[] => (text ? [{ text, face }] : []);
  if (label.kind === 'tank') return [said(label.place, 'regular'), said(label.volume, 'bold')];
  return [label.scientific ? nameSpans(label.scientific, 'bold') : [], said(label.locality, 'regular')];
}

function textMarks(label: Label, x: number, y: number): Mark[] {
  const code = codeText(label.code);
  const bottom = LABEL.heightMm - PAD_MM;
  const facts = factTexts(label, bottom - CODE.topMm - code.heightMm - 1);
  let top = y + bottom - facts.reduce((sum, text) => sum + text.heightMm, 0);
  const below = facts.flatMap((text) => {
    const marks = text.marks(x, top);
    top += text.heightMm;
    return marks;
  });
  return [...code.marks(x, y + CODE.topMm), ...below];
}
