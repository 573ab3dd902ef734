import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { strainQuery } from './queries';
import { StrainList } from './StrainList';
import { StrainPage } from './StrainPage';

export type StrainParts = { stock: ReactNode; history: ReactNode };

export function StrainsScreen() {
  return (
    <TwoPane
      list={<StrainList />}
      detail={null}
      nothing={<EmptyState title="Choose a strain" words="Its names, where its founders came from and its lots." />}
    />
  );
}

export function StrainScreen({ strainId, ...parts }: StrainParts & { strainId: string }) {
  return (
    <TwoPane
      list={<StrainList chosen={strainId} />}
      detail={<Detail key={strainId} strainId={strainId} {...parts} />}
    />
  );
}

function Detail({ strainId, ...parts }: StrainParts & { strainId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(strainQuery(room.id, strainId));
  if (data) return <StrainPage told={data} {...parts} />;
  return (
    <Screen title="Strain" back={`/r/${room.id}/stock/strains`}>
      {error ? (
        <ErrorState title="This strain could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the strain" />
      )}
    </Screen>
  );
}
