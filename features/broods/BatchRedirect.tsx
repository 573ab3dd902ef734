import { useQuery } from '@tanstack/react-query';
import { Redirect } from 'expo-router';
import { Code } from '@/components/ui/Code';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { useRoom } from '@/hooks/useRoom';
import { batchQuery } from './queries';

/** A batch has no page of its own: it is on its brood's; one that is mixed asks which. */
export function BatchRedirect({ batchId }: { batchId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(batchQuery(room.id, batchId));
  const [only, ...others] = data?.sources ?? [];
  if (only && others.length === 0) return <Redirect href={`/r/${room.id}/broods/${only.broodId}`} />;
  return (
    <Screen title="Batch" back={`/r/${room.id}/stock/broods`} measure>
      {data ? (
        <Rows label="Broods in this batch">
          {data.sources.map(({ broodId, code, share }) => (
            <Row
              key={broodId}
              href={`/r/${room.id}/broods/${broodId}`}
              label={code}
              figure={String(Math.round(share * 100))}
              unit="%"
              title={<Code>{code}</Code>}
              note={`of ${data.balance} heads`}
            />
          ))}
        </Rows>
      ) : error ? (
        <ErrorState title="This batch could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the batch" />
      )}
    </Screen>
  );
}
