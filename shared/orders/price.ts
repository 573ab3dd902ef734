import * as z from 'zod/mini';

export const LOTS = ['single', 'pair', 'trio', 'group', 'colony'] as const;
export type Lot = (typeof LOTS)[number];
export const LOT_WORDS: Record<Lot, string> = {
  single: 'each',
  pair: 'pair',
  trio: 'trio',
  group: 'group',
  colony: 'whole colony',
};

/** Prices as they are stored with what is offered. */
export const PriceClasses = z.array(z.object({ fromTenthsMm: z.number(), cents: z.number() }));
export const PriceLots = z.array(z.object({ lot: z.enum(LOTS), heads: z.nullish(z.number()), cents: z.number() }));

export type Prices = { classes: z.output<typeof PriceClasses>; lots: z.output<typeof PriceLots> };

const LOT_HEADS: Partial<Record<Lot, number>> = { pair: 2, trio: 3 };

/**
 * What so many heads cost: by the class that their length has reached (the first, when nobody measured them), or by lot;
 * null when no price is set for it.
 */
export function priceOf(
  { classes, lots }: Prices,
  { lot, heads, lengthTenthsMm }: { lot: Lot; heads: number; lengthTenthsMm: number | null },
): number | null {
  if (lot !== 'single') {
    const offer = lots.find((one) => one.lot === lot);
    const size = offer?.heads ?? LOT_HEADS[lot] ?? heads;
    return offer && heads % size === 0 ? offer.cents * (heads / size) : null;
  }
  const rising = [...classes].sort((a, b) => a.fromTenthsMm - b.fromTenthsMm);
  const reached = rising.findLast(({ fromTenthsMm }) => fromTenthsMm <= (lengthTenthsMm ?? 0)) ?? rising[0];
  return reached ? reached.cents * heads : null;
}
