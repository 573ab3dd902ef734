import type { Clock } from '@/shared/holds/clock';
import { dayNumber } from '@/shared/holds/dayBars';

/** The captions under the bars: "strip 21–28", "release ~36". */
export function windowOf(clock: Clock, plan: 'strip' | 'leave'): { windowWords?: string; endWords: string } {
  const { kind, stripFrom, stripTo, handOverFrom, handOverTo, releaseOn } = clock;
  const days = (word: string, from: string, to: string) => ({
    windowWords: `${word} ${dayNumber(clock, from)}–${dayNumber(clock, to)}`,
  });
  const window =
    plan === 'strip' && stripFrom && stripTo
      ? days('strip', stripFrom, stripTo)
      : handOverFrom && handOverTo
        ? days('hand-over', handOverFrom, handOverTo)
        : {};
  return { ...window, endWords: `${kind === 'guards' ? 'swim' : 'release'} ~${dayNumber(clock, releaseOn)}` };
}
