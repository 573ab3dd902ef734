import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense } from 'react';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { samplesQuery } from './queries';

/** The fit and the chart are a chunk of their own: most pages never need them. */
const GrowthOf = lazy(() => import('./GrowthOf').then((module) => ({ default: module.GrowthOf })));

/** How a brood grows, as far as its samples say. */
export function GrowthPart({ broodId, heads }: { broodId: string; heads?: number | null }) {
  const room = useRoom();
  const { data, error } = useQuery(samplesQuery(room.id, { thing: 'brood', thingId: broodId }));
  if (error) return <Notice tone="look" words={`The samples could not be loaded. ${error.message}`} />;
  return (
    <Section title="Growth" aside={data && data.samples.length > 0 ? `${data.samples.length} samples` : undefined}>
      {data ? (
        <Suspense fallback={<Loading label="Working the curve out" rows={3} />}>
          <GrowthOf told={data} broodId={broodId} heads={heads ?? null} />
        </Suspense>
      ) : (
        <Loading label="Loading the samples" rows={3} />
      )}
    </Section>
  );
}
