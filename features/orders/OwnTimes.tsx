import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import type { OwnOrder } from '@/shared/orders/own';
import { hasLeft } from '@/shared/orders/state';
import { timeWords } from '@/shared/orders/times';
import { usePickTime } from './ownQueries';

/** The collection: agreed, or one of the times that are offered. */
export function OwnTimes({ token, order }: { token: string; order: OwnOrder }) {
  const pick = usePickTime(token);
  const [changing, setChanging] = useState(false);
  const { agreedTime, offeredTimes, today, state, room } = order;
  if (state === 'cancelled' || hasLeft(state)) return null;
  const choosing = offeredTimes.length > 0 && (agreedTime === null || changing);
  return (
    <Section title="Collection">
      <View style={{ gap: space[3] }}>
        {agreedTime ? (
          <Text strong size="large">
            {timeWords(agreedTime, today)}
          </Text>
        ) : offeredTimes.length === 0 ? (
          <Text tone="soft">The fishroom will offer times when the fish are ready.</Text>
        ) : null}
        {room.place ? <Text tone="soft">{room.place}</Text> : null}
        {pick.error ? <Notice tone="act" alert words={pick.error.message} /> : null}
        {choosing
          ? offeredTimes.map((time) => (
              <Button
                key={time}
                label={timeWords(time, today)}
                describe={`Collect ${timeWords(time, today)}`}
                busy={pick.isPending && pick.variables === time}
                onPress={() => pick.mutate(time, { onSuccess: () => setChanging(false) })}
              />
            ))
          : null}
        {agreedTime && offeredTimes.length > 0 && !changing ? (
          <Button small label="Change the time" onPress={() => setChanging(true)} />
        ) : null}
      </View>
    </Section>
  );
}
