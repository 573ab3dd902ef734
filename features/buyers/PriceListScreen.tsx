import { useQuery } from '@tanstack/react-query';
import { StyleSheet, View } from 'react-native';
import type * as z from 'zod/mini';
import { Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { PaperTheme, useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Heading } from '@/components/ui/Heading';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import type { listOffers, Offer } from '@/shared/buyers/offers';
import { lessPercent, priceLines } from '@/shared/buyers/words';
import { formatDate } from '@/shared/days';
import { formatLength } from '@/shared/unitWords';
import { offersQuery } from './queries';

const LESS = ['0', '10', '15', '20', '25', '30', '40'] as const;

/** What is listed, on paper: for shops with their discount taken off already. */
export function PriceListScreen() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(offersQuery(room.id));
  const [less, setLess] = useUrlWord<string>('less', '0', LESS);
  return (
    <Screen
      title="Price list"
      back={`/r/${room.id}/buyers/availability`}
      actions={<Button small icon="print" label="Print" onPress={() => globalThis.print()} />}
      measure
    >
      {data ? (
        <View style={{ gap: space[4] }}>
          <Select
            label="For whom"
            value={less}
            onChange={setLess}
            options={LESS.map((value) => ({
              value,
              word: value === '0' ? 'Prices as listed' : `For shops, ${value} % taken off`,
            }))}
          />
          <Listed told={data} less={Number(less)} />
        </View>
      ) : error ? (
        <ErrorState title="The prices could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the prices" />
      )}
    </Screen>
  );
}

function Listed({ told, less }: { told: z.output<typeof listOffers.output>; less: number }) {
  const listed = told.offers.filter(({ listing, available }) => listing?.listed && available > 0);
  if (listed.length === 0)
    return (
      <EmptyState title="Nothing is listed" words="A brood that is listed and has fish stands here with its prices." />
    );
  const named = [...listed].sort((a, b) => (a.displayName ?? '').localeCompare(b.displayName ?? ''));
  return (
    <PaperTheme>
      <Paper offers={named} less={less} contact={told.page.contact} />
    </PaperTheme>
  );
}

type PaperProps = { offers: Offer[]; less: number; contact: string | null };

function Paper({ offers, less, contact }: PaperProps) {
  const room = useRoom();
  const theme = useTheme();
  return (
    <View
      role="document"
      aria-label="Price list"
      dataSet={{ printRoot: true }}
      style={[styles.paper, { backgroundColor: theme.ground }]}
    >
      <View style={[styles.head, { borderBottomColor: theme.ink }]}>
        <Heading level={2} size="title">
          {room.name}
        </Heading>
        <Text size="small">{`Prices of ${formatDate(room.today)}${less > 0 ? `, ${less} % taken off` : ''}`}</Text>
      </View>
      {offers.map((offer) => (
        <PaperLine key={offer.broodId} offer={offer} less={less} />
      ))}
      {contact ? <Text size="small">{contact}</Text> : null}
    </View>
  );
}

function PaperLine({ offer, less }: { offer: Offer; less: number }) {
  const room = useRoom();
  const theme = useTheme();
  const { code, displayName, locality, available, size, possibleHybrid, listing } = offer;
  const prices = listing?.prices ?? { classes: [], lots: [] };
  const facts = [
    ...(possibleHybrid ? ['possible hybrid'] : locality ? [locality] : []),
    size ? `${formatLength(size.meanTenthsMm, room.units)} today` : 'not measured',
    `brood ${code}`,
  ];
  return (
    <View dataSet={{ printKeep: true }} style={[styles.line, { borderBottomColor: theme.rule }]}>
      <View style={styles.what}>
        <Text strong italic>
          {displayName ?? 'Species not settled'}
        </Text>
        <Text size="small">{facts.join(' · ')}</Text>
        <Text size="small">{`${available} available`}</Text>
      </View>
      <View style={styles.prices}>
        {priceLines(lessPercent(prices, less), room.currency, room.units).map(({ what, price }) => (
          <View key={what} style={styles.price}>
            <Text size="small">{what}</Text>
            <Text size="small" strong align="right">
              {price}
            </Text>
          </View>
        ))}
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  paper: { padding: space[5], gap: space[2] },
  head: { borderBottomWidth: 2, paddingBottom: space[2] },
  line: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    columnGap: space[4],
    paddingVertical: space[2],
    borderBottomWidth: 1,
  },
  what: { flexGrow: 1, flexShrink: 1, flexBasis: 200 },
  prices: { flexGrow: 1, flexShrink: 1, flexBasis: 200 },
  price: { flexDirection: 'row', justifyContent: 'space-between', gap: space[3] },
});
