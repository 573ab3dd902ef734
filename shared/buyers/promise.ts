import { type BatchSize, type HeadsSpan, headsAtLeast } from '../growth/sizes';
import type { SizeToday } from '../growth/sizeToday';

/** Whether so many fish over a length can be promised: `sure` at the low end of the range, `likely` at the middle. */
export type Promised = HeadsSpan & { verdict: 'sure' | 'likely' | 'short' };

export const batchSizeOf = ({ meanTenthsMm, seMm, cv, cvSd }: SizeToday): BatchSize => ({
  meanMm: meanTenthsMm / 10,
  seMm,
  cv,
  cvSd,
});

/**
 * "Six at 5 cm now", held against how the lengths of the available fish are spread. Those that are reserved are taken to be
 * as long as the rest. Throws `BadValue` for a length that is not above zero.
 */
export function promiseOf(
  size: SizeToday,
  available: number,
  wanted: { heads: number; lengthTenthsMm: number },
): Promised {
  const span = headsAtLeast(batchSizeOf(size), wanted.lengthTenthsMm / 10, Math.max(0, available));
  const verdict = span.low >= wanted.heads ? 'sure' : span.expected >= wanted.heads ? 'likely' : 'short';
  return { ...span, verdict };
}
