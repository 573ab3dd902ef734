import type { Mark } from './page';

/** A piece of a page that is never cut. */
export type Block = {
  heightMm: number;
  /** Space above it, dropped at the top of a page. */
  gapMm?: number;
  /** How much taller it may be drawn where the page has room. */
  stretchMm?: number;
  /** Stays on one page with the block after it: a heading with its first row. */
  keepsNext?: boolean;
  /** A good place to end the page before, rather than a few rows later. */
  startsSection?: boolean;
  /** Its marks with the top left corner at x and y, drawn `extraMm` taller than `heightMm`. */
  marks(x: number, y: number, extraMm: number): Mark[];
};

/** Room for blocks on the first page, which carries the foot, and on those that follow. */
export type Room = { firstMm: number; nextMm: number };

const gapOf = (block: Block, first: boolean): number => (first ? 0 : (block.gapMm ?? 0));

export const heightOf = (blocks: Block[]): number =>
  blocks.reduce((sum, block, i) => sum + gapOf(block, i === 0) + block.heightMm, 0);

/** Blocks that must stay together, in groups. */
function groupsOf(blocks: Block[]): Block[][] {
  const groups: Block[][] = [];
  let open = false;
  for (const block of blocks) {
    const last = groups.at(-1);
    if (open && last) last.push(block);
    else groups.push([block]);
    open = block.keepsNext === true;
  }
  return groups;
}

/** A page may end early, before a section, once this share of it is full. */
const FULL_ENOUGH = 0.6;

/** How many of the groups go on one page: all that fit, or those before the last section that starts low on it. */
function countFor(groups: Block[][], roomMm: number): number {
  const heightTo = (count: number) => heightOf(groups.slice(0, count).flat());
  let fits = 1;
  while (fits < groups.length && heightTo(fits + 1) <= roomMm) fits += 1;
  for (let count = fits; count > 0 && fits < groups.length; count -= 1) {
    if (groups[count]?.[0]?.startsSection === true && heightTo(count) >= roomMm * FULL_ENOUGH) return count;
  }
  return fits;
}

/** Shares blocks out over pages, in order. A group taller than a page stands alone on one and runs over its end. */
export function paginate(blocks: Block[], room: Room): Block[][] {
  const pages: Block[][] = [];
  let rest = groupsOf(blocks);
  while (rest.length > 0) {
    const take = countFor(rest, pages.length === 0 ? room.firstMm : room.nextMm);
    pages.push(rest.slice(0, take).flat());
    rest = rest.slice(take);
  }
  return pages;
}

/** Draws blocks from y downwards; room that is left goes to those that stretch, in proportion to how far they may. */
export function draw(blocks: Block[], at: { x: number; y: number; roomMm: number }): Mark[] {
  const slack = Math.max(0, at.roomMm - heightOf(blocks));
  const stretch = blocks.reduce((sum, block) => sum + (block.stretchMm ?? 0), 0);
  const share = stretch > 0 ? Math.min(1, slack / stretch) : 0;
  let y = at.y;
  return blocks.flatMap((block, i) => {
    y += gapOf(block, i === 0);
    const extra = (block.stretchMm ?? 0) * share;
    const marks = block.marks(at.x, y, extra);
    y += block.heightMm + extra;
    return marks;
  });
}
