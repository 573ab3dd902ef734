import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { DayBars } from '@/components/ui/DayBars';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatShortDay } from '@/shared/days';
import type { Clock, SpawnInterval } from '@/shared/holds/clock';
import { clockOf } from '@/shared/holds/clockOf';
import { clockSentence, clockState, dayRangeWords, releaseDoubtDays } from '@/shared/holds/clockWords';
import type { ClockFacts } from '@/shared/holds/contract';
import { dayBars } from '@/shared/holds/dayBars';
import { windowOf } from './clockWindow';

type Props = { facts: ClockFacts | null; spawn: SpawnInterval; plan: 'strip' | 'leave' };

/** What the dates come to, while they are typed: bars, strip window, expected release. */
export function HoldPreview({ facts, spawn, plan }: Props) {
  const { today } = useRoom();
  const clock = facts ? (clockOf(facts, spawn, today)?.clock ?? null) : null;
  if (!clock) {
    return (
      <Text size="small" tone="soft">
        How long this species holds is not known here, so there are no dates yet.
      </Text>
    );
  }
  return (
    <View style={{ gap: space[2] }}>
      <PreviewBars clock={clock} plan={plan} />
      <DatesSentence clock={clock} plan={plan} />
    </View>
  );
}

export function PreviewBars({ clock, plan }: { clock: Clock; plan: Props['plan'] }) {
  const state = clockState(clock, plan);
  return (
    <DayBars
      bars={dayBars(clock, { plan })}
      sentence={clockSentence(clock)}
      windowOpen={state === 'strip' || state === 'handOver'}
      {...windowOf(clock, plan)}
    />
  );
}

/** "Strip 1–8 Jun. Release 16 Jun, ± 4 days." */
export function DatesSentence({ clock, plan }: { clock: Clock; plan: Props['plan'] }) {
  const { kind, stripFrom, stripTo, handOverFrom, handOverTo, releaseOn, hatchOn } = clock;
  const doubt = releaseDoubtDays(clock);
  const part = (word: string, when: string) => (
    <Text>
      {`${word} `}
      <Text strong>{when}</Text>
      {'. '}
    </Text>
  );
  return (
    <Text>
      {plan === 'strip' && stripFrom && stripTo ? part('Strip', dayRangeWords(stripFrom, stripTo)) : null}
      {handOverFrom && handOverTo ? part('Hand-over', dayRangeWords(handOverFrom, handOverTo)) : null}
      {kind === 'guards' ? part('Hatching about', formatShortDay(hatchOn)) : null}
      {`${kind === 'guards' ? 'Free-swimming' : 'Release'} `}
      <Text strong>{formatShortDay(releaseOn)}</Text>
      {doubt > 0 ? `, ± ${doubt} ${doubt === 1 ? 'day' : 'days'}.` : '.'}
    </Text>
  );
}
