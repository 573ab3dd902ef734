import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { useTanks } from '@/features/entries/tanks';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';
import { CheckAddress, type SheetSource } from '@/shared/sheets/importContract';
import { importPreviewQuery, strainsHereQuery } from './importQueries';
import { SourceChoice } from './SourceChoice';
import { TakeInForm } from './TakeInForm';

/** Takes a sheet of another fishroom in: from its file, or from the address that is printed on it. */
export function TakeInScreen({ from }: { from?: string | undefined }) {
  const room = useRoom();
  const router = useRouter();
  const [source, setSource] = useState<SheetSource | null>(() => {
    const at = CheckAddress.safeParse(from);
    return at.success ? { from: 'address', at: at.data } : null;
  });
  const close = { label: 'Close Take a sheet in', onPress: () => router.back() };
  if (!may(room.role, 'stock:write'))
    return (
      <Screen title="Take a sheet in" close={close}>
        <Notice words="An owner or keeper takes sheets in." />
      </Screen>
    );
  if (source) return <Looking source={source} onOther={() => setSource(null)} onSource={setSource} />;
  return (
    <Screen title="Take a sheet in" close={close} low measure>
      <SourceChoice onSource={setSource} />
    </Screen>
  );
}

type LookingProps = { source: SheetSource; onOther: () => void; onSource: (source: SheetSource) => void };

function Looking({ source, onOther, onSource }: LookingProps) {
  const room = useRoom();
  const router = useRouter();
  const preview = useQuery(importPreviewQuery(room.id, source));
  const { data: strains } = useQuery(strainsHereQuery(room.id));
  const { data: tanks } = useTanks();
  if (preview.data && strains && tanks)
    return (
      <TakeInForm
        key={preview.data.taken}
        source={source}
        preview={preview.data}
        strains={strains}
        tanks={tanks}
        onOther={onOther}
        onSource={onSource}
      />
    );
  return (
    <Screen
      title="Take a sheet in"
      close={{ label: 'Close Take a sheet in', onPress: () => router.back() }}
      low
      measure
    >
      {preview.error ? (
        <View style={{ gap: space[4] }}>
          <ErrorState
            title="This sheet is not taken in"
            words={preview.error.message}
            onRetry={() => void preview.refetch()}
          />
          <Button label="Choose another sheet" onPress={onOther} />
        </View>
      ) : (
        <Loading label="Checking the sheet" />
      )}
    </Screen>
  );
}
