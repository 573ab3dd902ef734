import { Code } from '@/components/ui/Code';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { daysHeld } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { whoHolds } from './whoHolds';

/** Under a form's title: "DUMA-A04 in T07 · day 22". */
export function HoldLine({ hold }: { hold: HoldRow }) {
  const { today } = useRoom();
  return (
    <Text size="small" tone="soft">
      {hold.holder?.code ? <Code>{hold.holder.code}</Code> : whoHolds(hold)}
      {' in '}
      <Code>{hold.tank.code}</Code>
      {` · day ${daysHeld(hold, today)}`}
    </Text>
  );
}
