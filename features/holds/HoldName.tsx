import { Code } from '@/components/ui/Code';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import type { HoldRow } from '@/shared/holds/contract';
import { whoHolds } from './HoldRows';
import { modeWords } from './modeWords';

/** The carer's shape and code, or that one can't tell which. */
export function HoldName({ hold }: { hold: HoldRow }) {
  return (
    <Text strong>
      <SexShape sex={modeWords(hold.mode).carer} />{' '}
      {hold.holder?.code ? <Code>{hold.holder.code}</Code> : whoHolds(hold)}
    </Text>
  );
}

/** "Tropheus duboisi Maswa · T07". */
export function HoldPlace({ hold }: { hold: HoldRow }) {
  return (
    <Text size="small" tone="soft">
      {hold.displayName ? <Text italic>{hold.displayName}</Text> : 'Species not known'}
      {hold.locality ? ` ${hold.locality}` : ''}
      {' · '}
      <Code>{hold.tank.code}</Code>
    </Text>
  );
}
