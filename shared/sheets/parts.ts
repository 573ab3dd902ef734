import type { Block } from '../print/flow';
import { baselineIn, fittedSize, lineHeight, type Paragraph, paragraph, type Span, word } from '../print/lines';
import { widthOf } from '../print/measure';
import { type Mark, rule } from '../print/page';

/** Sizes of a sheet's type in millimetres, from the 14 px of the screen's design at 96 dots to the inch. */
export const TYPE = {
  body: 3.7,
  small: 3.4,
  section: 3.97,
  species: 7.9,
  locality: 5.55,
  title: 11.1,
  issue: 6.6,
} as const;

/** How tightly a sheet is set. `told`: grandparents are named in a parent's note and not drawn. */
export type Setting = {
  rowMm: number;
  gapMm: number;
  headMm: number;
  slotMm: number;
  pictureMm: number;
  chartMm: number;
  cautionMm: number;
  told: boolean;
};

/** A sheet is set in the first of these that gets it onto its page. */
export const OPEN: Setting = {
  rowMm: 6.6,
  gapMm: 4.5,
  headMm: 8,
  slotMm: 2.2,
  pictureMm: 54,
  chartMm: 37,
  cautionMm: 3.4,
  told: false,
};
export const CLOSE: Setting = {
  rowMm: 5.4,
  gapMm: 2.8,
  headMm: 6.8,
  slotMm: 0.6,
  pictureMm: 54,
  chartMm: 27,
  cautionMm: 3.2,
  told: false,
};
export const TOLD: Setting = { ...CLOSE, told: true };

/** For cautions that have a page to themselves. */
export const LOOSE: Setting = { ...OPEN, cautionMm: 3.7 };

export const RULES = { thick: 0.8, section: 0.53, hair: 0.26 } as const;

/** A section's rule, name and side note. It stays with the row after it. */
export function sectionHead(title: string, side: string, widthMm: number, setting: Setting): Block {
  const height = setting.headMm;
  const at = baselineIn(height, TYPE.section);
  const room = widthMm - widthOf(title, 'bold', TYPE.section) - 4;
  const sideMm = fittedSize(side, 'regular', { widthMm: room, largestMm: TYPE.small, smallestMm: 2.4 });
  return {
    heightMm: height,
    gapMm: setting.gapMm,
    keepsNext: true,
    startsSection: true,
    marks: (x, y) => [
      rule(x, y, widthMm, RULES.section, 'ink'),
      { ...word(title, { x, y: y + at, sizeMm: TYPE.section, face: 'bold' }), heading: 2 },
      ...(side ? [word(side, { x: x + widthMm, y: y + at, sizeMm: sideMm, ink: 'ink2', anchor: 'end' })] : []),
      rule(x, y + height, widthMm, RULES.hair, 'rule'),
    ],
  };
}

/** Text in cells beside each other under no rule; as tall as its tallest cell, at least a row. */
export function cells(
  list: { x: number; text: Paragraph }[],
  row: { widthMm: number; heightMm: number; sizeMm: number; ruled: boolean },
): Block {
  const pad = Math.max(0, (row.heightMm - lineHeight({ sizeMm: row.sizeMm })) / 2);
  const height = Math.max(row.heightMm, ...list.map(({ text }) => text.heightMm + 2 * pad));
  return {
    heightMm: height,
    marks: (x, y) => [
      ...list.flatMap((cell): Mark[] => cell.text.marks(x + cell.x, y + pad)),
      ...(row.ruled ? [rule(x, y + height, row.widthMm, RULES.hair, 'rule')] : []),
    ],
  };
}

export const bodyText = (spans: Span[], widthMm: number): Paragraph => paragraph(spans, widthMm, { sizeMm: TYPE.body });
export const smallText = (spans: Span[], widthMm: number): Paragraph =>
  paragraph(spans, widthMm, { sizeMm: TYPE.small, ink: 'ink2' });

export const plain = (text: string): Span[] => [{ text, face: 'regular' }];

/** A paragraph as a block of its own. */
export const textBlock = (text: Paragraph, gapMm: number): Block => ({
  heightMm: text.heightMm,
  gapMm,
  marks: (x, y) => text.marks(x, y),
});

/** Blocks in columns side by side, as one block. */
export function sideBySide(columns: { x: number; blocks: Block[] }[], setting: Setting): Block {
  const stack = (blocks: Block[]) =>
    blocks.reduce((sum, block, i) => sum + (i ? (block.gapMm ?? 0) : 0) + block.heightMm, 0);
  return {
    heightMm: Math.max(...columns.map(({ blocks }) => stack(blocks))),
    gapMm: setting.gapMm,
    startsSection: true,
    marks: (x, y) =>
      columns.flatMap((column) => {
        let top = y;
        return column.blocks.flatMap((block, i) => {
          top += i ? (block.gapMm ?? 0) : 0;
          const marks = block.marks(x + column.x, top, 0);
          top += block.heightMm;
          return marks;
        });
      }),
  };
}
