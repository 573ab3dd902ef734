import * as z from 'zod/mini';
import { DayText, formatDate } from '../days';
import { formatMoney } from '../money';
import { type Block, draw, paginate } from '../print/flow';
import { paragraph, type Span, type Style, word } from '../print/lines';
import { type Face, MARGIN_MM, type Mark, PAPERS, type Page, type Paper, rule } from '../print/page';

const Amount = z.strictObject({ words: z.string(), onDay: z.nullable(DayText), cents: z.number() });

/** A receipt as it was when the fish left. It holds no buyer’s name: that is read when it is printed. */
export const ReceiptContent = z.strictObject({
  number: z.number(),
  issuedOn: DayText,
  roomName: z.string(),
  place: z.nullable(z.string()),
  currency: z.string(),
  by: z.string(),
  way: z.string(),
  lines: z.array(z.strictObject({ heads: z.number(), code: z.string(), what: z.string(), cents: z.number() })),
  discountCents: z.number(),
  totalCents: z.number(),
  payments: z.array(Amount),
  toPayCents: z.number(),
  sheets: z.array(z.string()),
});
export type ReceiptContent = z.output<typeof ReceiptContent>;

const BODY: Style = { sizeMm: 3.9 };
const SMALL: Style = { sizeMm: 3.4, ink: 'ink2' };
const ROW_GAP_MM = 1.6;

/** A receipt on A4 or Letter: one page, more where there are many lines. */
export function receiptPages(content: ReceiptContent, buyerName: string, paper: Paper): Page[] {
  const size = PAPERS[paper];
  const widthMm = size.widthMm - 2 * MARGIN_MM;
  const roomMm = size.heightMm - 2 * MARGIN_MM;
  const money = (cents: number) => formatMoney(cents, content.currency);
  const blocks = [
    headBlock(content, buyerName, widthMm),
    ...content.lines.map(({ heads, code, what, cents }) =>
      amountRow(
        [{ text: `${heads} × `, face: 'bold' }, { text: code, face: 'code' }, ...(what ? [plain(`  ${what}`)] : [])],
        money(cents),
        widthMm,
      ),
    ),
    ...(content.discountCents > 0 ? [amountRow([plain('Discount')], money(-content.discountCents), widthMm)] : []),
    amountRow([{ text: 'Together', face: 'bold' }], money(content.totalCents), widthMm, 'bold'),
    ...content.payments.map(({ words, onDay, cents }) =>
      amountRow([plain(onDay ? `${words}, ${formatDate(onDay)}` : words)], money(-cents), widthMm),
    ),
    amountRow([{ text: 'Left to pay', face: 'bold' }], money(content.toPayCents), widthMm, 'bold'),
    footBlock(content, widthMm),
  ];
  return paginate(blocks, { firstMm: roomMm, nextMm: roomMm }).map((page) => ({
    ...size,
    marks: draw(page, { x: MARGIN_MM, y: MARGIN_MM, roomMm }),
  }));
}

const plain = (text: string): Span => ({ text, face: 'regular' });

function headBlock(content: ReceiptContent, buyerName: string, widthMm: number): Block {
  const { number, issuedOn, roomName, place, by } = content;
  const under = paragraph(
    [plain([place, `${formatDate(issuedOn)}, handed over by ${by}`, `For ${buyerName}`].filter(Boolean).join(' · '))],
    widthMm,
    SMALL,
  );
  return {
    heightMm: 17 + under.heightMm + 5,
    marks: (x, y) => [
      word(roomName, { x, y: y + 4, sizeMm: 3.9, face: 'semibold' }),
      { ...word(`Receipt for order ${number}`, { x, y: y + 12, sizeMm: 6.4, face: 'bold' }), heading: 1 },
      ...under.marks(x, y + 14),
      rule(x, y + 17 + under.heightMm + 2, widthMm, 0.8, 'ink'),
    ],
  };
}

const AMOUNT_MM = 34;

function amountRow(spans: Span[], amount: string, widthMm: number, face: Face = 'regular'): Block {
  const text = paragraph(spans, widthMm - AMOUNT_MM, BODY);
  const heightMm = text.heightMm + 2 * ROW_GAP_MM;
  return {
    heightMm,
    marks: (x, y): Mark[] => [
      ...text.marks(x, y + ROW_GAP_MM),
      word(amount, { x: x + widthMm, y: y + ROW_GAP_MM + 4, sizeMm: BODY.sizeMm, face, anchor: 'end' }),
      rule(x, y + heightMm, widthMm, 0.26, 'rule'),
    ],
  };
}

function footBlock({ sheets, way }: ReceiptContent, widthMm: number): Block {
  const says = [
    ...(sheets.length > 0
      ? [
          `${sheets.length === 1 ? 'Lineage sheet' : 'Lineage sheets'} ${sheets.join(', ')} ${sheets.length === 1 ? 'belongs' : 'belong'} to these fish.`,
        ]
      : []),
    ...(way === 'Sale' ? [] : [`The fish left as: ${way.toLowerCase()}.`]),
    'Never release fish. Owning, selling and moving them may need a permit: check locally. Kept in Kinwater.',
  ].join(' ');
  const text = paragraph([plain(says)], widthMm, SMALL);
  return { heightMm: text.heightMm + 4, gapMm: 4, marks: (x, y) => text.marks(x, y) };
}
