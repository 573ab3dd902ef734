import { Code } from '@/components/ui/Code';
import { Text } from '@/components/ui/Text';
import type { BatchTold } from '@/shared/broods/contract';

/** Under a form's title: which fish, where, how many on the books. */
export function BatchLine({ batch }: { batch: BatchTold }) {
  return (
    <Text size="small" tone="soft">
      <Code>{batch.sources.map(({ code }) => code).join(' + ')}</Code>
      {batch.tank ? ' in ' : ''}
      {batch.tank ? <Code>{batch.tank.code}</Code> : null}
      {batch.lines.length === 0 ? ', not counted yet' : `, ${batch.balance} on the books`}
    </Text>
  );
}
