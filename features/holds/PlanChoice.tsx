import { useMutation } from '@tanstack/react-query';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import { useRecord } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import type { HoldRow } from '@/shared/holds/contract';
import type { EntryContent } from '@/shared/record/kinds';

/** Strip her or leave her: recorded by the tap, undone from the strip. */
export function PlanChoice({ hold, mayChange }: { hold: HoldRow; mayChange: boolean }) {
  const { today } = useRoom();
  const record = useRecord();
  const change = useMutation({ mutationFn: (content: EntryContent) => record(content) });
  const plan = change.isPending && change.variables.kind === 'holdPlanned' ? change.variables.plan : hold.plan;
  return (
    <Section title="Plan">
      {mayChange ? (
        <Segmented
          label="Plan"
          value={plan}
          onChange={(next) => {
            if (next !== hold.plan) change.mutate({ kind: 'holdPlanned', holdId: hold.id, onDay: today, plan: next });
          }}
          choices={[
            { value: 'strip', word: 'Strip her' },
            { value: 'leave', word: 'Leave her' },
          ]}
        />
      ) : (
        <Text>{plan === 'strip' ? 'Strip her' : 'Leave her'}</Text>
      )}
      {change.error ? <Notice tone="act" alert words={change.error.message} /> : null}
    </Section>
  );
}
