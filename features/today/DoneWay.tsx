import type { ReactNode } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDay } from '@/shared/days';
import type { Due } from '@/shared/today/due';
import { nextDueOn } from '@/shared/today/repeat';
import { dueHref } from './dueLooks';

/** One's own task is done by saying so; one that is worked out is settled by what is recorded. */
export function DoneWay({ due, busy, onDone }: { due: Due; busy: boolean; onDone: () => void }) {
  const room = useRoom();
  if (due.own) {
    const next = nextDueOn({ ...due.own, dueOn: due.own.dueOn ?? due.dueOn }, room.today);
    return (
      <Way words={next ? `It comes back on ${formatDay(next, room.today)}.` : 'It happens once.'}>
        <Button kind="primary" icon="tick" grow label="Done" busy={busy} onPress={onDone} />
      </Way>
    );
  }
  return (
    <Way words="What you record settles it by itself. Without a record it only leaves the list, this once.">
      <Button kind="primary" grow label="Open it" href={dueHref(room, due)} />
      <Button icon="tick" grow label="Done without a record" busy={busy} onPress={onDone} />
    </Way>
  );
}

const Way = ({ words, children }: { words: string; children: ReactNode }) => (
  <View style={{ gap: space[3] }}>
    <Text size="small">{words}</Text>
    {children}
  </View>
);
