import type { Clock } from '@/shared/holds/clock';
import { type DayBar, dayBars, dayNumber } from '@/shared/holds/dayBars';

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

/** The bars of a hold; a female that is left to release has no strip window. */
export function barsOf(
  clock: Clock,
  plan: 'strip' | 'leave',
  marks: { checkedOn?: readonly string[]; endedOn?: string | null } = {},
): DayBar[] {
  const bars = dayBars(clock, { checks: marks.checkedOn ?? [], endedOn: marks.endedOn ?? null });
  return plan === 'strip' ? bars : bars.map((bar) => ({ ...bar, strip: false }));
}
