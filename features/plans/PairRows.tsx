import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { Figure } from '@/components/ui/Figure';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { SectionHead } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import type { LineageNode } from '@/shared/lineage/contract';
import { type FoundersOf, whyRelated } from './why';

type Props = {
  pairs: { male: string; female: string; fryInbreeding: number }[];
  limit: number;
  founders: FoundersOf;
  byId: ReadonlyMap<string, LineageNode>;
};

/** Every male with every female: pairs cannot be kept apart in one tank. */
export function PairRows({ pairs, limit, founders, byId }: Props) {
  const codeOf = (id: string) => byId.get(id)?.code ?? '';
  return (
    <View>
      <SectionHead title="Every pair" aside="expected F of the young" level={3} />
      <Rows label="Pairs" open>
        {pairs.map(({ male, female, fryInbreeding }) => {
          const over = fryInbreeding > limit + 1e-9;
          return (
            <Row
              key={`${male} ${female}`}
              title={
                <View style={{ flexDirection: 'row', alignItems: 'center', flexWrap: 'wrap', gap: space[2] }}>
                  <SexShape sex="male" />
                  <Code>{codeOf(male)}</Code>
                  <Text tone="soft">×</Text>
                  <SexShape sex="female" />
                  <Code>{codeOf(female)}</Code>
                </View>
              }
              note={
                <Text size="small" tone="soft">
                  {whyRelated(founders, byId, male, female, fryInbreeding)}
                </Text>
              }
              trailing={
                <View style={{ alignItems: 'flex-end' }}>
                  <Figure size="s" tone={over ? 'trouble' : 'ink'}>
                    {fryInbreeding.toFixed(3)}
                  </Figure>
                  {over ? (
                    <Text size="small" tone="trouble">
                      {`over ${limit}`}
                    </Text>
                  ) : null}
                </View>
              }
            />
          );
        })}
      </Rows>
    </View>
  );
}
