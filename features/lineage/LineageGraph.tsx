import { useMemo } from 'react';
import { View } from 'react-native';
import { PedigreeGraph } from '@/components/chart/PedigreeGraph';
import { space } from '@/components/theme/space';
import { Text } from '@/components/ui/Text';
import type { Nodes } from './entries';
import { GRAPH_LEGEND, graphOf } from './graphOf';
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
  const stageOf = useStages();
  const drawing = useMemo(() => graphOf(shown, all, stageOf), [shown, all, stageOf]);
  return (
    <View style={{ gap: space[2] }}>
      <PedigreeGraph label={label} {...drawing} selected={selected} onSelect={onSelect} windowHeight={windowHeight} />
      <Text size="small" tone="soft">
        {GRAPH_LEGEND}
      </Text>
    </View>
  );
}
