import { formatDate } from '../days';
import type { Block } from '../print/flow';
import { lineHeight, type Paragraph, paragraph, type Span } from '../print/lines';
import type { SheetContent, SheetFact } from './content';
import type { Treatment } from './husbandry';
import { bodyText, cells, plain, type Setting, TYPE } from './parts';
import { partialDayWords } from './sayings';

const DATE_MM = 26;
const HOW_MM = 62;
const GUTTER_MM = 5;
/** Small, on the lines of the text beside it. */
const HOW = { sizeMm: TYPE.small, lineMm: lineHeight({ sizeMm: TYPE.body }), ink: 'ink2' } as const;

/** One dated fact a row: when, what, how it is known and by whom. The first rows stay with their heading. */
export function knownRows(known: SheetFact[], widthMm: number, setting: Setting): Block[] {
  const row = { widthMm, heightMm: setting.rowMm - 0.7, sizeMm: TYPE.body, ruled: true };
  return known.map((fact, i) => ({
    ...cells(
      [
        {
          x: 0,
          text: paragraph(plain(fact.on ? partialDayWords(fact.on) : 'no date'), DATE_MM - 2, {
            sizeMm: TYPE.body,
            ink: 'ink2',
          }),
        },
        { x: DATE_MM, text: bodyText(plain(fact.what), widthMm - DATE_MM - HOW_MM - GUTTER_MM) },
        { x: widthMm - HOW_MM, text: paragraph(plain(sourceOf(fact)), HOW_MM, HOW) },
      ],
      row,
    ),
    keepsNext: i === 0 && known.length > 1,
  }));
}

const sourceOf = ({ how, by }: SheetFact): string => [how, by].filter((part) => part !== null).join('; ');

export function treatmentRows(treatments: Treatment[], widthMm: number, setting: Setting): Block[] {
  const row = { widthMm, heightMm: setting.rowMm, sizeMm: TYPE.body, ruled: true };
  return treatments.map(({ what, why, from, to }) => {
    const until = to ? `from ${formatDate(from)} until ${formatDate(to)}` : `since ${formatDate(from)}, end not set`;
    const spans: Span[] = [{ text: what, face: 'bold' }, ...plain(`${why ? `, for ${why}` : ''}, ${until}`)];
    return cells([{ x: 0, text: bodyText(spans, widthMm) }], row);
  });
}

/** Cautions in two columns, each opening with what it is about. */
export function cautionsBlock(cautions: SheetContent['cautions'], widthMm: number, setting: Setting): Block {
  const width = (widthMm - GUTTER_MM - 2) / 2;
  const texts = cautions.map(
    ({ about, text }): Paragraph =>
      paragraph([{ text: `${about}. `, face: 'bold' }, ...plain(text)], width, { sizeMm: setting.cautionMm }),
  );
  const [left, right] = halves(texts);
  const stack = (list: Paragraph[]) => list.reduce((sum, text) => sum + text.heightMm + 1.2, 0);
  const draw = (list: Paragraph[], x: number, y: number) => {
    let top = y;
    return list.flatMap((text) => {
      const marks = text.marks(x, top);
      top += text.heightMm + 1.2;
      return marks;
    });
  };
  return {
    heightMm: 1.4 + Math.max(stack(left), stack(right)),
    marks: (x, y) => [...draw(left, x, y + 1.4), ...draw(right, x + width + GUTTER_MM + 2, y + 1.4)],
  };
}

/** Cut where the two columns come out most alike. */
function halves(texts: Paragraph[]): [Paragraph[], Paragraph[]] {
  const height = (list: Paragraph[]) => list.reduce((sum, text) => sum + text.heightMm, 0);
  const apart = (cut: number) => Math.abs(height(texts.slice(0, cut)) - height(texts.slice(cut)));
  let best = texts.length;
  for (let cut = 1; cut < texts.length; cut += 1) if (apart(cut) < apart(best)) best = cut;
  return [texts.slice(0, best), texts.slice(best)];
}
