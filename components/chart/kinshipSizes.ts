import type { KinFish } from './KinshipTable';

export type KinshipSizes = {
  column: number;
  row: number;
  rowHead: number;
  columnHead: number;
  /** Shape above the code, where the code is as wide as its column. */
  stacked: boolean;
};

const CHARACTER = 8;
const SHAPE = 26;

const longest = (fish: readonly KinFish[]) => Math.max(2, ...fish.map(({ code }) => code.length));

/** Columns as wide as their codes need, within what still compares at a glance. */
export function kinshipSizes(across: readonly KinFish[], down: readonly KinFish[], small: boolean): KinshipSizes {
  const codes = longest(across) * CHARACTER;
  const rowHead = Math.min(140, Math.max(60, SHAPE + longest(down) * CHARACTER));
  if (small) return { column: Math.min(84, Math.max(48, codes + 8)), row: 44, rowHead, columnHead: 48, stacked: true };
  const stacked = codes + SHAPE > 84;
  return {
    column: Math.min(104, Math.max(70, stacked ? codes + 14 : codes + SHAPE + 6)),
    row: 56,
    rowHead,
    columnHead: stacked ? 52 : 40,
    stacked,
  };
}
