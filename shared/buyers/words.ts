import { type Day, formatDay } from '../days';
import type { SizeToday } from '../growth/sizeToday';
import { formatMoney } from '../money';
import { LOT_WORDS } from '../orders/price';
import { TENTHS_MM_PER, type UnitChoices } from '../units';
import type { Promised } from './promise';

/** "5 cm", "2 in": a length that was chosen, without the zeros of a measurement. */
export const chosenLength = (tenthsMm: number, { length }: UnitChoices): string =>
  `${Number((tenthsMm / TENTHS_MM_PER[length]).toFixed(2))} ${length}`;

const plural = (count: number, one: string): string => `${count} ${count === 1 ? one : `${one}s`}`;

/** "By the growth curve of 4 samples, the last on Mon 3 Nov with 20 fish." */
export function sizeRests({ measuredOn, lastOn, samples, fish }: SizeToday, today: Day): string {
  if (measuredOn) return `As measured on ${formatDay(measuredOn, today)}, ${fish} fish; they have grown since.`;
  return `By the growth curve of ${plural(samples, 'sample')}, the last on ${formatDay(lastOn, today)} with ${fish} fish.`;
}

/** "About 9 of 17 have reached 5 cm (5 to 13)." */
export function reachedWords({ expected, low, high }: Promised, available: number, length: string): string {
  const range = low === high ? '' : ` (${low} to ${high})`;
  return `About ${expected} of ${available} have reached ${length}${range}.`;
}

/** What to make of a promise of so many. */
export function promiseWords({ verdict, low, expected }: Promised, wanted: number): string {
  if (verdict === 'sure') return `${wanted} can be promised: at least ${low} ${low === 1 ? 'is' : 'are'} there.`;
  if (verdict === 'likely')
    return `${wanted} are likely there, but not sure: only ${low} ${low === 1 ? 'is' : 'are'}. Measure before you promise.`;
  return expected === 0
    ? `${wanted} can’t be promised: hardly any are there yet.`
    : `${wanted} can’t be promised: only about ${expected} are there.`;
}

type Prices = {
  classes: readonly { fromTenthsMm: number; cents: number }[];
  lots: readonly { lot: keyof typeof LOT_WORDS; heads: number; cents: number }[];
};

/** Prices with a shop's discount taken off, to the nearest minor unit. */
export function lessPercent({ classes, lots }: Prices, percent: number): Prices {
  const off = (cents: number) => Math.round((cents * (100 - percent)) / 100);
  return {
    classes: classes.map((one) => ({ ...one, cents: off(one.cents) })),
    lots: lots.map((one) => ({ ...one, cents: off(one.cents) })),
  };
}

export type PriceLine = { what: string; price: string };

/** The prices of fish as a list: a line for each length class, and for each lot. */
export function priceLines(prices: Prices, currency: string, units: UnitChoices): PriceLine[] {
  const classes = prices.classes.map(({ fromTenthsMm, cents }, i) => {
    const next = prices.classes[i + 1];
    const from = chosenLength(fromTenthsMm, units);
    const what = next ? `${from} to ${chosenLength(next.fromTenthsMm, units)}` : `from ${from}`;
    return { what, price: `${formatMoney(cents, currency)} each` };
  });
  const lots = prices.lots.map(({ lot, heads, cents }) => ({
    what: lot === 'group' ? `group of ${heads}` : LOT_WORDS[lot],
    price: formatMoney(cents, currency),
  }));
  return [...classes, ...lots];
}
