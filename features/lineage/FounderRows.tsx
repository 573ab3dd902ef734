import { StyleSheet, View } from 'react-native';
import { SharePips } from '@/components/chart/SharePips';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { Icon } from '@/components/ui/Icon';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import { shareWords } from '@/shared/sheets/sayings';
import type { FounderFacts, GroupFacts } from './founderFacts';

/** What each founder gave, a bar for every 2 %, and on how many fish it hangs. */
export function FounderRows({ facts }: { facts: GroupFacts }) {
  return (
    <Rows bleed open label="Founders’ shares">
      <VirtualList items={facts.founders} keyOf={({ id }) => id} estimate={92}>
        {(founder) => <FounderRow founder={founder} />}
      </VirtualList>
      {facts.unknownShare > 0 ? (
        <Row
          {...percentOf(facts.unknownShare)}
          marginWidth={62}
          title="Parents nobody knows"
          note="Counted as one founder in the founder equivalents"
        >
          <SharePips share={facts.unknownShare} height={16} />
        </Row>
      ) : null}
    </Rows>
  );
}

function FounderRow({ founder }: { founder: FounderFacts }) {
  const room = useRoom();
  const { id, code, sex, share, standing, words } = founder;
  const trouble = standing !== 'carried';
  return (
    <Row
      href={`/r/${room.id}/lineage/${id}`}
      label={`${code}, ${share === 0 ? 'no share' : shareWords(share)}. ${words}`}
      {...percentOf(share)}
      marginWidth={62}
      title={
        <View style={styles.title}>
          <SexShape sex={sex} />
          <Code>{code}</Code>
        </View>
      }
      note={
        <View style={styles.note}>
          {trouble ? <Icon name="warn" size={16} tone="trouble" /> : null}
          <Text size="small" tone={trouble ? 'trouble' : 'soft'} style={styles.words}>
            {words}
          </Text>
        </View>
      }
    >
      {share > 0 ? <SharePips share={share} height={16} /> : null}
    </Row>
  );
}

/** The margin figure: "38 %"; what rounds to none but isn't is said as under 1. */
const percentOf = (share: number): { figure: string; figureAfter: string } => ({
  figure: share > 0 && share < 0.005 ? '<1' : String(Math.round(share * 100)),
  figureAfter: '%',
});

const styles = StyleSheet.create({
  title: { flexDirection: 'row', alignItems: 'center', gap: space[2] },
  note: { flexDirection: 'row', alignItems: 'flex-start', gap: 6, marginBottom: 6 },
  words: { flexShrink: 1 },
});
