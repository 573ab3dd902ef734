/** A share that misses 1 by rounding only is certain. */
export const isCertain = (share: number): boolean => share >= 1 - 1e-9;

/** "79 %", and never 0 or 100 for a doubt. */
export function shareWord(share: number): string {
  const percent = Math.round(share * 100);
  if (percent === 0) return '< 1 %';
  if (percent === 100 && !isCertain(share)) return '> 99 %';
  return `${percent} %`;
}
