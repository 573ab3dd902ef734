import { paragraph, word } from '../print/lines';
import { box, MARGIN_MM, type Mark, PAPERS, type Page, type Paper, rule } from '../print/page';
import type { Label, LabelPaper } from './label';
import { LABEL, labelMarks } from './labelMarks';

const COLUMNS = 2;
const ROWS = 4;
export const LABELS_A_SHEET = COLUMNS * ROWS;
const HEAD_MM = 11;
const GAP_MM = 3.5;
const CUT_DASH = [1.6, 1.2] as const;
/** Measured with a ruler, it tells whether the printer kept to size. */
const GAUGE_MM = 50;

/**
 * Labels in the order given: one page each, or eight to a sheet of A4 or Letter with lines to cut on. `skip` places of the
 * first sheet stay free: they were used up before.
 */
export function labelPages(
  labels: Label[],
  paper: LabelPaper,
  { fishroom, skip = 0 }: { fishroom: string; skip?: number },
): Page[] {
  if (paper === 'single') return labels.map((label) => ({ ...LABEL, marks: labelMarks(label, 0, 0) }));
  const places = [...Array.from({ length: skip }, () => null), ...labels];
  return Array.from({ length: Math.ceil(places.length / LABELS_A_SHEET) }, (_, i) =>
    gridPage(places.slice(i * LABELS_A_SHEET, (i + 1) * LABELS_A_SHEET), paper, fishroom),
  );
}

function gridPage(places: (Label | null)[], paper: Paper, fishroom: string): Page {
  const size = PAPERS[paper];
  const width = size.widthMm - 2 * MARGIN_MM;
  const between = width - COLUMNS * LABEL.widthMm;
  const labels = places.filter((label) => label !== null);
  const rows = Math.ceil(places.length / COLUMNS);
  const end = MARGIN_MM + HEAD_MM + rows * (LABEL.heightMm + GAP_MM);
  return {
    ...size,
    marks: [
      ...headMarks(labels, fishroom, width),
      ...places.flatMap((label, i) => {
        if (!label) return [];
        const x = MARGIN_MM + (i % COLUMNS) * (LABEL.widthMm + between);
        const y = MARGIN_MM + HEAD_MM + Math.floor(i / COLUMNS) * (LABEL.heightMm + GAP_MM);
        return [...cutMarks(x, y), ...labelMarks(label, x, y)];
      }),
      ...footMarks(labels, end + 1, width),
    ],
  };
}

function headMarks(labels: Label[], fishroom: string, width: number): Mark[] {
  const kinds = new Set(labels.map(({ kind }) => kind));
  const title = kinds.size > 1 ? 'Labels' : kinds.has('tank') ? 'Tank labels' : 'Colony labels';
  const edge = MARGIN_MM + width;
  const y = MARGIN_MM + 5;
  return [
    {
      ...word(`${title}, ${LABEL.widthMm} × ${LABEL.heightMm} mm`, { x: MARGIN_MM, y, sizeMm: 5.55, face: 'bold' }),
      heading: 1,
    },
    word(`${fishroom} · print at 100 %, cut on the dashes`, { x: edge, y, sizeMm: 3.4, ink: 'ink2', anchor: 'end' }),
    rule(MARGIN_MM, MARGIN_MM + 7.6, width, 0.8, 'ink'),
  ];
}

function cutMarks(x: number, y: number): Mark[] {
  const corners = box(x, y, LABEL.widthMm, LABEL.heightMm);
  const first = corners.slice(0, 1);
  return [{ kind: 'line', points: [...corners, ...first], widthMm: 0.26, ink: 'rule', dashMm: CUT_DASH }];
}

function footMarks(labels: Label[], y: number, width: number): Mark[] {
  const tanks = labels.some(({ kind }) => kind === 'tank');
  const says = [
    ...(tanks ? ['A tank’s label never names the fish, so it stays right when they move.'] : []),
    'Scan the square to see or record what is inside; the short code under it can be typed.',
  ].join(' ');
  const text = paragraph([{ text: says, face: 'regular' }], width - GAUGE_MM - 8, { sizeMm: 3.4, ink: 'ink2' });
  const [x, at] = [MARGIN_MM + width - GAUGE_MM, y + 2];
  const end = (dx: number): Mark => ({
    kind: 'line',
    points: [
      [x + dx, at - 1],
      [x + dx, at + 1],
    ],
    widthMm: 0.26,
    ink: 'ink',
  });
  return [
    ...text.marks(MARGIN_MM, y),
    rule(x, at, GAUGE_MM, 0.26, 'ink'),
    end(0),
    end(GAUGE_MM),
    word(`${GAUGE_MM} mm at 100 %`, { x: x + GAUGE_MM / 2, y: at + 4.4, sizeMm: 3.17, ink: 'ink2', anchor: 'middle' }),
  ];
}
