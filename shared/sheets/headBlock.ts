import { formatDate } from '../days';
import type { Block } from '../print/flow';
import { baselineIn, fittedSize, paragraph, type Span, word } from '../print/lines';
import { type Mark, rule } from '../print/page';
import type { SheetContent } from './content';
import { plain, RULES, TYPE } from './parts';

const TITLE_MM = 11.8;
const ISSUE_MM = 62;

/** Whose sheet it is, and its number: the top of the first page. */
export function headBlock({ fishroom, issue }: SheetContent, widthMm: number): Block {
  const name = paragraph(
    [{ text: fishroom.name, face: 'bold' }, ...placeSpans(fishroom.place)],
    widthMm - ISSUE_MM - 6,
    { sizeMm: 4 },
  );
  const facts = paragraph(issueSpans(issue), ISSUE_MM, { sizeMm: TYPE.small, ink: 'ink2', align: 'end' });
  const numberSize = fittedSize(issue.number, 'code', { widthMm: ISSUE_MM, largestMm: TYPE.issue, smallestMm: 3 });
  const left = name.heightMm + TITLE_MM;
  const right = 4.4 + 8 + facts.heightMm;
  const height = Math.max(left, right) + 2.6;
  return {
    heightMm: height,
    marks: (x, y): Mark[] => {
      const edge = x + widthMm;
      const base = y + height - 2.6;
      const title = {
        x,
        y: base - TITLE_MM + baselineIn(TITLE_MM, TYPE.title),
        sizeMm: TYPE.title,
        face: 'bold',
      } as const;
      const top = base - right;
      return [
        ...name.marks(x, base - left),
        { ...word('Lineage sheet', title), heading: 1 },
        word('Issue', {
          x: edge,
          y: top + baselineIn(4.4, 3.4),
          sizeMm: 3.4,
          face: 'semibold',
          ink: 'ink2',
          anchor: 'end',
        }),
        word(issue.number, {
          x: edge,
          y: top + 4.4 + baselineIn(8, numberSize),
          sizeMm: numberSize,
          face: 'code',
          anchor: 'end',
        }),
        ...facts.marks(edge, top + 12.4),
        rule(x, y + height, widthMm, RULES.thick, 'ink'),
      ];
    },
  };
}

const placeSpans = (place: string | null): Span[] =>
  place ? [{ text: `, ${place}`, face: 'regular', ink: 'ink2' }] : [];

function issueSpans(issue: SheetContent['issue']): Span[] {
  return [
    ...plain(`issued ${formatDate(issue.on)}`),
    ...(issue.order ? [...plain(', for order '), { text: issue.order, face: 'code' } as const] : []),
    ...(issue.replaces ? [...plain(', replaces '), { text: issue.replaces.number, face: 'code' } as const] : []),
    ...(issue.replaces?.because ? plain(`: ${issue.replaces.because}`) : []),
  ];
}
