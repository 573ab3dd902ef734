import { type Block, draw, heightOf, paginate, type Room } from '../print/flow';
import { MARGIN_MM, type Mark, PAPERS, type Page, type Paper } from '../print/page';
import type { SheetContent } from './content';
import { folio, footBlock } from './footBlock';
import { CLOSE, LOOSE, OPEN, type Setting, TOLD } from './parts';
import { type Sections, type SheetOptions, sectionsOf } from './sections';

const FOLIO_MM = 7;
const FOOT_GAP_MM = 3;

/**
 * Lays a sheet out on A4 or Letter. The first page is the sheet itself, with the square code and the signature at its
 * foot; what it has no room for, cautions first, goes on the pages after it. All that is drawn comes from the content
 * and the options, so that the screen and the PDF say the same. Millimetres throughout.
 */
export function sheetPages(content: SheetContent, paper: Paper, options: SheetOptions): Page[] {
  const size = PAPERS[paper];
  const widthMm = size.widthMm - 2 * MARGIN_MM;
  const heightMm = size.heightMm - 2 * MARGIN_MM;
  const foot = footBlock(content, widthMm, options.checkUrl);
  const above = heightMm - foot.heightMm - FOOT_GAP_MM;
  const set = (setting: Setting) => sectionsOf(content, widthMm, setting, options);
  const sheets = { open: set(OPEN), close: set(CLOSE), told: set(TOLD) };
  const whole = onOnePage(sheets, above);
  const room = { firstMm: above - FOLIO_MM, nextMm: heightMm - FOLIO_MM };
  const pages = whole ? [whole] : onPages(sheets, set(LOOSE).cautions, room);
  const under = pages.length > 1 ? FOLIO_MM : 0;
  const bottom = size.heightMm - MARGIN_MM;
  return pages.map((blocks, i) => {
    const roomMm = (i === 0 ? above : heightMm) - under;
    const marks: Mark[] = [
      ...draw(blocks, { x: MARGIN_MM, y: MARGIN_MM, roomMm }),
      ...(i === 0 ? foot.marks(MARGIN_MM, bottom - under - foot.heightMm, 0) : []),
      ...(under > 0 ? folio(content, { number: i + 1, of: pages.length }, { x: MARGIN_MM, y: bottom, widthMm }) : []),
    ];
    return { ...size, marks };
  });
}

type Sheets = { open: Sections; close: Sections; told: Sections };

/** Everything on one page, or nothing if it has no room for it. */
function onOnePage({ open, close }: Sheets, roomMm: number): Block[] | undefined {
  const whole = [open, close].map(({ family, record, cautions }) => [...family, ...record, ...cautions]);
  return whole.find((blocks) => heightOf(blocks) <= roomMm);
}

/**
 * As much of the sheet on the first page as it holds, however close: all but the cautions, or up to growth and water, or
 * up to the pedigree. What is left goes on the next ones.
 */
function onPages({ open, close, told }: Sheets, cautions: Block[], room: Room): Block[][] {
  for (const count of [open.record.length, 1, 0]) {
    const settings = count > 0 ? [open, close] : [open, close, told];
    const first = settings
      .map(({ family, record }) => [...family, ...record.slice(0, count)])
      .find((blocks) => heightOf(blocks) <= room.firstMm);
    if (first)
      return [first, ...paginate([...open.record.slice(count), ...cautions], { ...room, firstMm: room.nextMm })];
  }
  return paginate([...open.family, ...open.record, ...cautions], room);
}
