import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { SelectList } from '@/components/form/SelectList';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { useRoom } from '@/hooks/useRoom';
import type { TankRow } from '@/shared/tanks/contract';
import { residentsWords, useTanks } from './tanks';
import { useLeave } from './useLeave';

type Props = {
  title: string;
  /** Of the form's own address, such as `holding`: a scanned label leads back to it. */
  form: string;
  onPick: (tankId: string) => void;
  /** Left out of the choice: empty tanks where fish are recorded. */
  suits?: (tank: TankRow) => boolean;
};

/** The first question of a form that was not opened from a tank: which one. Scanning its label is the quick answer. */
export function TankChoice({ title, form, onPick, suits = () => true }: Props) {
  const { id: roomId } = useRoom();
  const leave = useLeave();
  const { data: tanks, error, refetch } = useTanks();
  return (
    <Screen
      title={title}
      subtitle="In which tank?"
      close={{ label: `Close ${title}`, onPress: () => leave() }}
      dock={
        <Button
          kind="primary"
          icon="scan"
          grow
          label="Scan a tank label"
          href={`/r/${roomId}/record/scan?next=${form}`}
        />
      }
      low
      measure
    >
      {tanks ? (
        <TankList tanks={tanks.filter(suits)} onPick={onPick} />
      ) : error ? (
        <ErrorState title="The tanks could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the tanks" />
      )}
    </Screen>
  );
}

/** Tanks to choose from, by code, place or who lives there. */
export function TankList({ tanks, onPick }: { tanks: TankRow[]; onPick: (tankId: string) => void }) {
  const { id: roomId } = useRoom();
  const router = useRouter();
  const [chosen, setChosen] = useState<string | null>(null);
  if (tanks.length === 0) {
    return (
      <EmptyState
        small
        title="No tank for this yet"
        words="Add a tank and say who lives in it; then it can be recorded here."
      >
        <Button label="To the tanks" small onPress={() => router.push(`/r/${roomId}/stock/tanks`)} />
      </EmptyState>
    );
  }
  return (
    <View>
      <SelectList
        id="tanks"
        label="Tank"
        value={chosen}
        options={tanks.map((tank) => ({
          value: tank.id,
          code: tank.code,
          word: residentsWords(tank),
          ...(tank.place ? { note: tank.place } : {}),
        }))}
        onPick={(tankId) => {
          setChosen(tankId);
          onPick(tankId);
        }}
      />
    </View>
  );
}
