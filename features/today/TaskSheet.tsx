import { type RefObject, useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Notice } from '@/components/ui/Notice';
import { Segmented } from '@/components/ui/Segmented';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import type { Due } from '@/shared/today/due';
import { dueNote } from '@/shared/today/dueWords';
import { DoneWay } from './DoneWay';
import { GiveWay } from './GiveWay';
import { PutOffWay } from './PutOffWay';
import { SkipWay } from './SkipWay';
import { useSettle } from './useSettle';

const WAYS = [
  { value: 'done', word: 'Done' },
  { value: 'snooze', word: 'Put off' },
  { value: 'skip', word: 'Skip' },
  { value: 'assign', word: 'Give to' },
] as const;
type Way = (typeof WAYS)[number]['value'];

type Props = { due: Due; what: string; anchor: RefObject<View | null>; onClose: () => void };

/** What becomes of a task. */
export function TaskSheet({ due, what, anchor, onClose }: Props) {
  const [way, setWay] = useState<Way>('done');
  const { settle, error, busy } = useSettle(due, what, onClose);
  return (
    <Sheet open title={what} onClose={onClose} anchor={anchor} width={400}>
      <View style={{ gap: space[4] }}>
        <Text tone="soft">{dueNote(due)}</Text>
        <Segmented label="What becomes of it" as="tabs" choices={WAYS} value={way} onChange={setWay} />
        {error ? <Notice tone="act" alert words={error.message} /> : null}
        {way === 'done' ? <DoneWay due={due} busy={busy} onDone={() => void settle({ decision: 'done' })} /> : null}
        {way === 'snooze' ? <PutOffWay due={due} save={settle} /> : null}
        {way === 'skip' ? <SkipWay due={due} save={settle} /> : null}
        {way === 'assign' ? <GiveWay due={due} save={settle} /> : null}
      </View>
    </Sheet>
  );
}
