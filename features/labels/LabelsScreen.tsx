import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import { addressOf } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { MOST_LABELS, printLabels } from '@/shared/labels/contract';
import type { LabelPaper } from '@/shared/labels/label';
import { LABELS_A_SHEET } from '@/shared/labels/layout';
import { ChoosePart } from './ChoosePart';
import { coloniesQuery, tanksQuery } from './queries';
import { SheetPicture } from './SheetPicture';

const PAPERS = [
  { value: 'single', word: 'One a page' },
  { value: 'a4', word: 'A4' },
  { value: 'letter', word: 'Letter' },
] as const;

/** Labels with a square code for tanks and colonies: what is chosen, on which paper, and from which place of a used sheet on. */
export function LabelsScreen({ tank, colony }: { tank?: string | undefined; colony?: string | undefined }) {
  const room = useRoom();
  const tanks = useQuery(tanksQuery(room.id));
  const colonies = useQuery(coloniesQuery(room.id));
  const [chosen, setChosen] = useState<ReadonlySet<string>>(() => new Set([tank, colony].flatMap((id) => id ?? [])));
  const [paper, setPaper] = useState<LabelPaper>('a4');
  const [from, setFrom] = useState('1');
  const picked = (rows: { id: string }[] = []) => rows.filter(({ id }) => chosen.has(id)).map(({ id }) => id);
  const [tankIds, colonyIds] = [picked(tanks.data), picked(colonies.data)];
  const count = tankIds.length + colonyIds.length;
  const skip = paper === 'single' ? 0 : Number(from) - 1;
  const print = () => {
    const query = {
      ...(tankIds.length > 0 ? { tanks: tankIds.join(',') } : {}),
      ...(colonyIds.length > 0 ? { colonies: colonyIds.join(',') } : {}),
      ...(skip > 0 ? { skip: String(skip) } : {}),
    };
    void globalThis.open(addressOf(printLabels, { params: { roomId: room.id, paper }, query }), '_blank');
  };
  const error = tanks.error ?? colonies.error;
  const toChoose = tanks.data && colonies.data;
  return (
    <Screen
      title="Labels"
      back={`/r/${room.id}/stock/tanks`}
      measure
      dock={
        <Button
          kind="primary"
          icon="print"
          grow
          label={count === 0 ? 'Print labels' : count === 1 ? 'Print one label' : `Print ${count} labels`}
          disabledBecause={
            count === 0 ? 'Choose a tank or a colony' : count > MOST_LABELS ? `At most ${MOST_LABELS} at once` : null
          }
          onPress={print}
        />
      }
    >
      {!toChoose ? (
        error ? (
          <ErrorState
            title="The tanks could not be loaded"
            words={error.message}
            onRetry={() => void tanks.refetch()}
          />
        ) : (
          <Loading label="Loading the tanks" />
        )
      ) : tanks.data.length === 0 ? (
        <EmptyState title="No tanks yet" words="A label bears the code of a tank. Add a tank first." />
      ) : (
        <View style={{ gap: space[5], paddingVertical: space[3] }}>
          <View style={{ gap: space[3] }}>
            <Segmented label="Paper" choices={PAPERS} value={paper} onChange={setPaper} />
            {paper === 'single' ? null : (
              <View style={{ flexDirection: 'row', gap: space[4], alignItems: 'flex-end' }}>
                <SheetPicture skip={skip} count={count} />
                <View style={{ flexGrow: 1, flexShrink: 1, gap: space[2] }}>
                  <Text size="small" semi>
                    First free place on the sheet
                  </Text>
                  <Select
                    label="First free place on the sheet"
                    value={from}
                    options={Array.from({ length: LABELS_A_SHEET }, (_, i) => ({
                      value: String(i + 1),
                      word: i === 0 ? '1, a whole sheet' : String(i + 1),
                    }))}
                    onChange={setFrom}
                  />
                </View>
              </View>
            )}
            <Text size="small" tone="soft">
              90 × 52 mm each. Print at 100 % on wet-proof stock; the ruler at the foot of a sheet must measure 50 mm. A
              tank’s label never names the fish.
            </Text>
          </View>
          <ChoosePart
            title="Tanks"
            rows={tanks.data.map(({ id, code, place }) => ({ id, code, note: place ?? '' }))}
            chosen={chosen}
            onChange={setChosen}
          />
          <ChoosePart
            title="Colonies"
            rows={colonies.data.map(({ id, code, displayName }) => ({ id, code, note: displayName }))}
            chosen={chosen}
            onChange={setChosen}
          />
        </View>
      )}
    </Screen>
  );
}
