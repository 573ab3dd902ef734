import type { Block } from '../print/flow';
import { word } from '../print/lines';
import { widthOf } from '../print/measure';
import { type Mark, rule } from '../print/page';
import { signHeight, signMarks } from '../print/sign';
import type { SheetContent } from './content';
import { plain, RULES, smallText, TYPE } from './parts';

const QR_MM = 22;
const SIGNATURE_MM = 64;
const TOP_MM = 4.5;
const FOLIO_TYPE_MM = 3.17;
/** Kept free for the page's number. */
const FOLIO_PAGE_MM = 30;

/** How the sheet is checked, and where it is signed: the foot of the first page. */
export function footBlock(content: SheetContent, widthMm: number, checkUrl: string): Block {
  const left = QR_MM + 5.5;
  const width = widthMm - left - SIGNATURE_MM - 6;
  const address = smallText(plain(checkUrl.replace(/^https?:\/\//, '')), width);
  const says = smallText(plain('The page shows if it was replaced or withdrawn.'), width);
  const name = smallText(plain(content.issue.by), SIGNATURE_MM - 14);
  const text = 5.2 + address.heightMm + says.heightMm + 1.4 + 4.6;
  const height = TOP_MM + Math.max(QR_MM, text);
  return {
    heightMm: height,
    marks: (x, y): Mark[] => {
      const lines = y + TOP_MM + 5.2;
      const below = y + height - 4.4;
      const [signX, signY] = [x + widthMm - SIGNATURE_MM, y + TOP_MM + QR_MM - name.heightMm - 2];
      return [
        rule(x, y, widthMm, RULES.thick, 'ink'),
        { kind: 'qr', x, y: y + TOP_MM, sizeMm: QR_MM, text: checkUrl, level: 'M', ink: 'ink' },
        word('Check this sheet', { x: x + left, y: y + TOP_MM + 3.4, sizeMm: TYPE.body, face: 'bold' }),
        ...address.marks(x + left, lines),
        ...says.marks(x + left, lines + address.heightMm),
        ...signMarks(x + left, below, 4.8),
        word('Kept in Kinwater', { x: x + left + 6.4, y: below + signHeight(4.8) - 0.9, sizeMm: 3.17, ink: 'ink2' }),
        rule(signX, signY, SIGNATURE_MM, 0.4, 'ink'),
        ...name.marks(signX, signY + 1.4),
        word('date', { x: x + widthMm, y: signY + 4.7, sizeMm: TYPE.small, ink: 'ink2', anchor: 'end' }),
      ];
    },
  };
}

/** The line at the foot of each of several pages. */
export function folio(
  content: SheetContent,
  page: { number: number; of: number },
  at: { x: number; y: number; widthMm: number },
): Mark[] {
  const { x, y, widthMm } = at;
  const style = { y, sizeMm: FOLIO_TYPE_MM, ink: 'ink2' } as const;
  const number = `Lineage sheet ${content.issue.number}`;
  const whole = `${number}, ${content.fishroom.name}`;
  const fits = widthOf(whole, 'regular', FOLIO_TYPE_MM) < widthMm - FOLIO_PAGE_MM;
  return [
    word(fits ? whole : number, { ...style, x }),
    word(`page ${page.number} of ${page.of}`, { ...style, x: x + widthMm, anchor: 'end' }),
  ];
}
