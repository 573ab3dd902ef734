import * as z from 'zod/mini';
import { Note } from '../shapes';

const whole = (low: number, high: number, says: string) =>
  z.number('Type a number').check(z.int('A whole number'), z.minimum(low, says), z.maximum(high, says));

/** What a fishroom promises and asks; frozen with each order when its fish are reserved. */
export const OrderTerms = z.strictObject({
  /** Days for which heads are held without a deposit. */
  holdDays: whole(1, 90, 'From 1 to 90 days'),
  depositPercent: whole(0, 100, 'From 0 to 100'),
  /** Fish that die within so many days of leaving are made good; 0: not at all. */
  lossDays: whole(0, 30, 'From 0 to 30 days'),
  words: Note,
  /** How to pay by bank transfer, as it stands in letters. */
  bank: Note,
});
export type OrderTerms = z.output<typeof OrderTerms>;

/** Where the program starts. Common practice, no source. */
export const DEFAULT_TERMS: OrderTerms = { holdDays: 7, depositPercent: 30, lossDays: 2, words: null, bank: null };

/** The terms as a buyer reads them. */
export function termsText({ holdDays, depositPercent, lossDays, words }: OrderTerms): string {
  const days = (count: number) => (count === 1 ? 'one day' : `${count} days`);
  return [
    `The fish are held for ${days(holdDays)}${depositPercent > 0 ? ', and from the deposit on until they are collected' : ''}.`,
    ...(depositPercent > 0 ? [`The deposit is ${depositPercent} % of the price.`] : []),
    lossDays > 0
      ? `Fish that die within ${days(lossDays)} of leaving are made good: send word and a photo in that time.`
      : 'Losses after the fish have left are not made good.',
    ...(words ? [words] : []),
  ].join('\n');
}
