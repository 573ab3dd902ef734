import { minorDigits } from '@/shared/money';

/** An amount as it is typed: 1250 is "12.50". */
export function typedAmount(cents: number, currency: string): string {
  const digits = minorDigits(currency);
  return (cents / 10 ** digits).toFixed(digits);
}
