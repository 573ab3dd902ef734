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
/** "mean .125" in small type. */
const NOTE = 74;

const longest = (fish: readonly KinFish[]) => Math.max(2, ...fish.map(({ short }) => short.length));

/** Columns as wide as their codes need, within what still compares at a glance. */
export function kinshipSizes(across: readonly KinFish[], down: readonly KinFish[]): KinshipSizes {
  const codes = longest(across) * CHARACTER;
  const rowHead = Math.min(140, Math.max(down.some(({ note }) => note) ? NOTE : 56, SHAPE + longest(down) * CHARACTER));
  const stacked = codes + SHAPE > 84;
  return {
    column: Math.min(104, Math.max(70, stacked ? codes + 14 : codes + SHAPE + 6)),
    row: 56,
    rowHead,
    columnHead: stacked ? 52 : 40,
    stacked,
  };
}
