import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { useTanks } from '@/features/entries/tanks';
import { useLeave } from '@/features/entries/useLeave';
import { useRoom } from '@/hooks/useRoom';
import { proposeBroodCode } from '@/shared/codes';
import type { HoldRow } from '@/shared/holds/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { EndFields } from './EndFields';
import { modeWords } from './modeWords';
import { useBroodCode } from './queries';
import { WithHold } from './WithHold';

type Props = { outcome: 'stripped' | 'released'; holdId?: string | undefined; tankId?: string | undefined };

/** A strip or a release: the hold ends, a brood begins. */
export function EndForm({ outcome, ...props }: Props) {
  const strip = outcome === 'stripped';
  const title = strip ? 'Strip' : 'Release';
  return (
    <WithHold
      title={title}
      form={strip ? 'strip' : 'release'}
      {...props}
      suits={({ mode }) => !strip || mode === null || mode === 'maternalMouthbrooder'}
    >
      {(hold) => <Prepared key={hold.id} hold={hold} outcome={outcome} />}
    </WithHold>
  );
}

/** With the code and the tank that are proposed, so that only the number is left to type. */
function Prepared({ hold, outcome }: { hold: HoldRow; outcome: Props['outcome'] }) {
  const { today } = useRoom();
  const leave = useLeave();
  const { data: tanks, error, refetch } = useTanks();
  const code = useBroodCode(hold.strainId, today);
  const title = modeWords(hold.mode).ends[outcome];
  if (!tanks || (!code.data && !code.error)) {
    return (
      <Screen title={title} close={{ label: `Close ${title}`, onPress: () => leave() }} low measure>
        {error ? (
          <ErrorState title="The tanks could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading the tanks" />
        )}
      </Screen>
    );
  }
  // Without a signal the code is worked out here; should it be taken, saving says so.
  const proposed = code.data ?? proposeBroodCode(hold.strainCode ?? 'BR', today, new Set());
  const tankId = outcome === 'released' ? hold.tank.id : nurseryOf(tanks);
  return <EndFields hold={hold} outcome={outcome} tanks={tanks} proposedCode={proposed} proposedTankId={tankId} />;
}

/** An empty nursery, in the order in which they are walked by; else the only one there is. */
function nurseryOf(tanks: TankRow[]): string | null {
  const nurseries = tanks.filter(({ purpose }) => purpose === 'nursery');
  const free = nurseries.find(({ residents }) => residents.length === 0);
  return free?.id ?? (nurseries.length === 1 ? (nurseries[0]?.id ?? null) : null);
}
