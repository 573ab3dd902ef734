import { useRouter } from 'expo-router';
import { type ReactNode, useState } from 'react';
import { SelectList } from '@/components/form/SelectList';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TankChoice } from '@/features/entries/TankChoice';
import { useLast } from '@/features/entries/useLast';
import { useLeave } from '@/features/entries/useLeave';
import type { BatchTold } from '@/shared/broods/contract';
import { type BatchesOf, batchWords, useBatches } from './useBatches';

type Props = {
  title: string;
  form: string;
  of: BatchesOf;
  children: (batch: BatchTold) => ReactNode;
};

/** The batch that a form is about: asked for where a tank or brood has several. */
export function InBatch({ title, form, of, children }: Props) {
  const router = useRouter();
  const leave = useLeave();
  const { batches, error } = useBatches(of);
  const [chosen, setChosen] = useState<string | null>(null);
  const only = useLast(batches?.length === 1 ? batches[0] : batches?.find(({ id }) => id === chosen));
  if (!of.tank && !of.brood && !of.batch) {
    const suits = ({ residents }: { residents: { thing: string }[] }) =>
      residents.some(({ thing }) => thing === 'batch');
    return <TankChoice title={title} form={form} suits={suits} onPick={(tank) => router.setParams({ tank })} />;
  }
  if (only) return children(only);
  return (
    <Screen
      title={title}
      subtitle="Which batch?"
      close={{ label: `Close ${title}`, onPress: () => leave() }}
      low
      measure
    >
      {error ? (
        <ErrorState title="The batch could not be loaded" words={error.message} />
      ) : !batches ? (
        <Loading label="Loading the batch" />
      ) : batches.length === 0 ? (
        <EmptyState
          small
          title="No fry are recorded here"
          words="Choose another tank, or record the strip or release first."
        />
      ) : (
        <SelectList
          id="batches"
          label="Batch"
          value={chosen}
          options={batches.map((batch) => ({ value: batch.id, word: batchWords(batch) }))}
          onPick={setChosen}
        />
      )}
    </Screen>
  );
}
