import { Code } from '@/components/ui/Code';
import { Text } from '@/components/ui/Text';
import type { FishHere } from './WithFish';

/** Under a form's title: "DUMA-A in T07". */
export function FishLine({ here: { tank, fish } }: { here: FishHere }) {
  const colonies = [...new Set(fish.flatMap(({ colony }) => colony?.code ?? []))];
  if (!tank) return null;
  return (
    <Text size="small" tone="soft">
      {colonies.length > 0 ? <Code>{colonies.join(', ')}</Code> : 'Fish'}
      {' in '}
      <Code>{tank.code}</Code>
    </Text>
  );
}
