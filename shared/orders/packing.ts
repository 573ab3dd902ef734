/*
 * What to have ready before fish leave: bags by the length of the fish, a third water and two thirds air. Common practice,
 * no source; a carrier's own rules come first.
 */
const SIZES = [
  { upToTenthsMm: 400, perBag: 8 },
  { upToTenthsMm: 600, perBag: 4 },
  { upToTenthsMm: 900, perBag: 2 },
  { upToTenthsMm: Number.POSITIVE_INFINITY, perBag: 1 },
];
const WATER_PER_BAG_L = 2;
const BAGS_PER_BOX = 6;

export type Packing = { bags: number; waterL: number; boxes: number };

/** Bags, water and boxes for the lines of an order; fish of different broods never share a bag. */
export function packingFor(lines: { heads: number; lengthTenthsMm: number | null }[]): Packing {
  const bags = lines.reduce((sum, { heads, lengthTenthsMm }) => sum + Math.ceil(heads / perBag(lengthTenthsMm)), 0);
  return { bags, waterL: bags * WATER_PER_BAG_L, boxes: Math.ceil(bags / BAGS_PER_BOX) };
}

/** Fish that nobody measured are taken for middling ones. */
const perBag = (lengthTenthsMm: number | null): number =>
  SIZES.find(({ upToTenthsMm }) => (lengthTenthsMm ?? 500) < upToTenthsMm)?.perBag ?? 1;

/** The cautions of live transport, for whoever hands over and whoever collects. */
export const TRANSPORT_CAUTIONS = [
  'Do not feed for a day before the journey: a full gut fouls the bag.',
  'Use water from their own tank, and a box that holds the warmth. Fish that do not know each other travel apart.',
  'Sending live fish: the carrier’s rules and local law decide. Many carriers refuse animals. Ask before you book.',
  'Owning, selling and moving these fish may need a permit: check where you are and where they go.',
  'Never release fish, eggs or water into a stream, pond or drain.',
];
