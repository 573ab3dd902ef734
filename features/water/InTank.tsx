import { useRouter } from 'expo-router';
import type { ReactNode } from 'react';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { TankChoice } from '@/features/entries/TankChoice';
import { useTanks } from '@/features/entries/tanks';
import { useLeave } from '@/features/entries/useLeave';
import type { TankRow } from '@/shared/tanks/contract';
import { type TankWater, useTodayFacts, waterOf } from './queries';

type Props = {
  title: string;
  form: string;
  tankId?: string | undefined;
  children: (tank: TankRow, water: TankWater) => ReactNode;
};

/** The tank that a form is about, asked for first where it is not known, with its water so far. */
export function InTank({ title, form, tankId, children }: Props) {
  const router = useRouter();
  const leave = useLeave();
  const { data: tanks, error, refetch } = useTanks();
  const facts = useTodayFacts();
  if (!tankId) return <TankChoice title={title} form={form} onPick={(tank) => router.setParams({ tank })} />;
  const tank = tanks?.find(({ id }) => id === tankId);
  // The form starts from the last readings: it waits for them, unless they cannot be had.
  if (tank && (facts.data || facts.error)) return children(tank, waterOf(facts.data, tankId));
  const missing = tanks !== undefined && !tank;
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
