import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { KeyValues } from '@/components/ui/KeyValues';
import { SectionHead } from '@/components/ui/Section';
import { Sheet } from '@/components/ui/Sheet';
import { Table } from '@/components/ui/Table';
import { Text } from '@/components/ui/Text';
import { type ColonyFacts, forecastOf, headsWords } from './colonyFacts';

type Props = { facts: ColonyFacts; generations: number; onClose: () => void };

/** What a colony's gene diversity, effective size and forecast rest on. */
export function ColonySheet({ facts, generations, onClose }: Props) {
  const { code, heads, diversity, depth, size, sizes } = facts;
  const forecast = forecastOf(facts, generations);
  return (
    <Sheet open onClose={onClose} title={code} width={480}>
      <View style={{ gap: space[4], paddingBottom: space[3] }}>
        <FiguresStrip
          figures={[
            { figure: diversity.toFixed(2), label: 'gene diversity' },
            { figure: size.size?.toFixed(1) ?? '–', label: 'effective size' },
            { figure: depth.toFixed(1), label: 'generations known' },
          ]}
        />
        <Text size="small" tone="soft">
          {`Of its breeders: ${headsWords(heads)}. Gene diversity is 1 less the mean of all their kinships, founders taken as unrelated.`}
        </Text>
        <View>
          <SectionHead title="Effective size" level={3} />
          <KeyValues
            pairs={sizes.map(({ key, word, size: value, because, rests }) => ({
              key: word,
              value:
                value === null
                  ? `None. ${because}`
                  : `${value.toFixed(1)}${key === size.key ? ', used for the forecast' : ''}`,
              ...(value === null ? {} : { note: rests }),
            }))}
          />
        </View>
        <View>
          <SectionHead title="If it goes on like this" level={3} />
          {forecast ? (
            <Table
              label="Gene diversity by generation"
              tight
              columns={[
                { key: 'n', word: 'Generation' },
                { key: 'gd', word: 'Gene diversity', right: true },
              ]}
              rows={forecast.map((value, n) => ({
                key: String(n),
                cells: { n: n === 0 ? 'Today' : String(n), gd: value.toFixed(3) },
              }))}
            />
          ) : (
            <Text tone="soft">{`No forecast without an effective size. ${size.because ?? ''}`}</Text>
          )}
          <Text size="small" tone="soft">
            Each generation keeps 1 less 1 by twice the effective size, if mates are left to chance (Wright 1931).
          </Text>
        </View>
      </View>
    </Sheet>
  );
}
