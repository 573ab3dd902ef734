import { useQuery } from '@tanstack/react-query';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { figuresOf } from './figures';
import { InbreedingFigures } from './InbreedingFigures';
import { pedigreeAroundQuery } from './queries';

/** On a brood's or fish's page: how inbred it is expected to be, and what that rests on. */
export function InbreedingPart({ id }: { id: string }) {
  const room = useRoom();
  const { data, error } = useQuery(pedigreeAroundQuery(room.id, id));
  return (
    <Section
      title="Lineage"
      aside={<TextLink label="Graph" describe="Lineage graph" href={`/r/${room.id}/lineage/${id}`} />}
    >
      {error ? (
        <Notice tone="look" words={`The lineage could not be worked out. ${error.message}`} />
      ) : data ? (
        <InbreedingFigures figures={figuresOf(data, id)} />
      ) : (
        <Loading label="Loading the lineage" rows={2} />
      )}
    </Section>
  );
}
