import { useLocalSearchParams } from 'expo-router';
import { InBatch } from '@/features/broods/InBatch';
import { batchWords } from '@/features/broods/useBatches';
import { SampleForm } from '@/features/growth/SampleForm';

export default function LengthSample() {
  const { tank, brood, batch, fish } = useLocalSearchParams<{
    tank?: string;
    brood?: string;
    batch?: string;
    fish?: string;
  }>();
  if (fish) return <SampleForm of={{ thing: 'fish', thingId: fish }} subtitle="One fish" />;
  return (
    <InBatch title="Length sample" form="length-sample" of={{ tank, brood, batch }}>
      {(one) => <SampleForm key={one.id} of={{ thing: 'batch', thingId: one.id }} subtitle={batchWords(one)} />}
    </InBatch>
  );
}
