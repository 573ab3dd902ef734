import { useRouter } from 'expo-router';
import { useState } from 'react';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Unreachable } from '@/features/call';
import { TankChoice } from '@/features/entries/TankChoice';
import { useTanks } from '@/features/entries/tanks';
import { useLeave } from '@/features/entries/useLeave';
import { useRoom } from '@/hooks/useRoom';
import { addDays } from '@/shared/days';
import { BeginFields } from './BeginFields';
import { useProposal, useProposalHere } from './queries';

type Props = { seen: 'holding' | 'spawn'; tankId?: string | undefined; colonyId?: string | undefined };

/** How far back the first look at the tank goes; the dates that are typed ask again. */
const FIRST_LOOK_DAYS = 3;

/** A full mouth, or the spawn itself, was seen: first in which tank, then by whom. */
export function HoldingForm({ seen, tankId, colonyId }: Props) {
  const router = useRouter();
  const title = seen === 'spawn' ? 'Spawn seen' : 'Holding seen';
  if (!tankId) {
    return (
      <TankChoice
        title={title}
        form={seen}
        suits={({ residents }) => residents.some(({ thing }) => thing !== 'batch')}
        onPick={(tank) => router.setParams({ tank })}
      />
    );
  }
  return <InTank key={tankId} seen={seen} title={title} tankId={tankId} colonyId={colonyId} />;
}

function InTank({ seen, title, tankId, colonyId }: Props & { title: string; tankId: string }) {
  const { today } = useRoom();
  const leave = useLeave();
  const { data: tanks } = useTanks();
  const [days, setDays] = useState({ from: addDays(today, -FIRST_LOOK_DAYS), until: today });
  const { data: asked, error, refetch } = useProposal(tankId, days.from, days.until);
  const known = useProposalHere(tankId, error instanceof Unreachable);
  const proposal = asked ?? known;
  const tank = tanks?.find(({ id }) => id === tankId);
  if (!proposal || !tank) {
    const missing = tanks && !tank;
    return (
      <Screen title={title} close={{ label: `Close ${title}`, onPress: () => leave() }} low measure>
        {error || missing ? (
          <ErrorState
            title={missing ? 'That tank is not in use' : 'The tank could not be loaded'}
            words={error?.message ?? 'Choose another tank.'}
            onRetry={() => void refetch()}
          />
        ) : (
          <Loading label="Loading the tank" />
        )}
      </Screen>
    );
  }
  return (
    <BeginFields
      seen={seen}
      tank={tank}
      colonyId={colonyId ?? onlyColony(tank.residents)}
      proposal={proposal}
      onDays={(from, until) => {
        if (from !== days.from || until !== days.until) setDays({ from, until });
      }}
    />
  );
}

function onlyColony(residents: { thing: string; id: string }[]): string | null {
  const colonies = residents.filter(({ thing }) => thing === 'colony');
  return colonies.length === 1 ? (colonies[0]?.id ?? null) : null;
}
