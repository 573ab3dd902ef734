import { useRouter } from 'expo-router';
import type { ReactNode } from 'react';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TankChoice } from '@/features/entries/TankChoice';
import { useTanks } from '@/features/entries/tanks';
import { useLeave } from '@/features/entries/useLeave';
import type { FishRow } from '@/shared/fish/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { useFish } from './queries';

export type Opened = { tankId?: string | undefined; fishId?: string | undefined };

export type FishHere = {
  tank: TankRow | null;
  tanks: TankRow[];
  fish: FishRow[];
  /** The fish whose page it was opened on. */
  chosen: FishRow | null;
};

type Props = Opened & { title: string; form: string; children: (here: FishHere) => ReactNode };

/** The fish of one tank, for the forms about single fish: the tank it was opened on, the fish's own, or one that is chosen. */
export function WithFish({ title, form, tankId, fishId, children }: Props) {
  const router = useRouter();
  const leave = useLeave();
  const { data: fish, error, refetch } = useFish();
  const { data: tanks } = useTanks();
  if (!fish || !tanks) {
    return (
      <Screen title={title} close={{ label: `Close ${title}`, onPress: () => leave() }} low measure>
        {error ? (
          <ErrorState title="The fish could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading the fish" />
        )}
      </Screen>
    );
  }
  const chosen = fish.find(({ id }) => id === fishId) ?? null;
  const at = chosen?.tank?.id ?? tankId;
  if (!at && !chosen) {
    return (
      <TankChoice
        title={title}
        form={form}
        suits={({ residents }) => residents.some(({ thing }) => thing !== 'batch')}
        onPick={(tank) => router.setParams({ tank })}
      />
    );
  }
  const here = chosen && !chosen.tank ? [chosen] : fish.filter(({ tank }) => tank?.id === at);
  return children({ tank: tanks.find(({ id }) => id === at) ?? null, tanks, fish: here, chosen });
}
