import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import type { ReactNode } from 'react';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { useLast } from '@/features/entries/useLast';
import { useLeave } from '@/features/entries/useLeave';
import { useRoom } from '@/hooks/useRoom';
import type { HoldRow } from '@/shared/holds/contract';
import { HoldPicks } from './HoldPicks';
import { openHoldsQuery } from './queries';

type Props = {
  title: string;
  /** The form's own address, for the label that is scanned. */
  form: string;
  holdId?: string | undefined;
  tankId?: string | undefined;
  /** Species that are never stripped are not offered for it. */
  suits?: (hold: HoldRow) => boolean;
  children: (hold: HoldRow) => ReactNode;
};

/** The hold that a form is about: the one it was opened on, the only one of its tank, or one that is chosen. */
export function WithHold({ title, form, holdId, tankId, suits = () => true, children }: Props) {
  const room = useRoom();
  const router = useRouter();
  const leave = useLeave();
  const { data, error, refetch } = useQuery(openHoldsQuery(room.id));
  const close = { label: `Close ${title}`, onPress: () => leave() };
  const open = data?.filter(suits) ?? [];
  const inTank = open.filter((hold) => hold.tank.id === tankId);
  const found = holdId ? open.find(({ id }) => id === holdId) : inTank.length === 1 ? inTank[0] : undefined;
  const last = useLast(found);
  const chosen = holdId && last?.id !== holdId ? found : last;
  if (chosen) return children(chosen);
  if (!data) {
    return (
      <Screen title={title} close={close} low measure>
        {error ? (
          <ErrorState title="The holds could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading the holds" />
        )}
      </Screen>
    );
  }
  if (holdId) return <Gone title={title} close={close} holdId={holdId} />;
  const here = inTank.length > 0 ? inTank : open;
  return (
    <Screen
      title={title}
      subtitle={open.length > 0 ? 'Which one?' : undefined}
      close={close}
      dock={
        <Button
          kind="primary"
          icon="scan"
          grow
          label="Scan a tank label"
          href={`/r/${room.id}/record/scan?next=${form}`}
        />
      }
      low
      measure
    >
      {here.length > 0 ? (
        <HoldPicks holds={here} onPick={(hold) => router.setParams({ hold })} />
      ) : (
        <EmptyState
          small
          title="Nobody holds"
          words="When you see a full mouth, record it first: the days count from there."
        >
          <Button label="Holding seen" small href={`/r/${room.id}/record/holding${tankId ? `?tank=${tankId}` : ''}`} />
        </EmptyState>
      )}
    </Screen>
  );
}

type GoneProps = { title: string; close: { label: string; onPress: () => void }; holdId: string };

function Gone({ title, close, holdId }: GoneProps) {
  const { id: roomId } = useRoom();
  return (
    <Screen title={title} close={close} low measure>
      <EmptyState
        small
        title="This hold has ended"
        words="It may have been recorded by someone else. Its page says how and when."
      >
        <Button label="Open the hold" small href={`/r/${roomId}/holds/${holdId}`} />
      </EmptyState>
    </Screen>
  );
}
