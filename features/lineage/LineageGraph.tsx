import { View } from 'react-native';
import { PedigreeGraph } from '@/components/chart/PedigreeGraph';
import { space } from '@/components/theme/space';
import { Loading } from '@/components/ui/Loading';
import { Text } from '@/components/ui/Text';
import { useWorked } from '@/hooks/useWorked';
import { deskWith } from './desk';
import type { Nodes } from './entries';
import { GRAPH_LEGEND } from './graphOf';
import { useStages } from './stages';

type Props = {
  label: string;
  shown: Nodes;
  all: Nodes;
  selected: string | null;
  onSelect: (id: string) => void;
  windowHeight: number;
};

/** The drawing of a part of the pedigree; a chunk of its own, since placing it takes a library. */
export function LineageGraph({ label, shown, all, selected, onSelect, windowHeight }: Props) {
  const stages = useStages();
  const { data: drawing } = useWorked('drawing', [all, shown, stages], async () => {
    const { desk, turn } = await deskWith(all);
    return desk.drawing(
      turn,
      shown.map(({ id }) => id),
      stages,
    );
  });
  if (!drawing) return <Loading label="Drawing the lineage" rows={4} />;
  return (
    <View style={{ gap: space[2] }}>
      <PedigreeGraph label={label} {...drawing} selected={selected} onSelect={onSelect} windowHeight={windowHeight} />
      <Text size="small" tone="soft">
        {GRAPH_LEGEND}
      </Text>
    </View>
  );
}
