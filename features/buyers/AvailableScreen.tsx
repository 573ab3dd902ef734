import { useQuery } from '@tanstack/react-query';
import { StyleSheet, View } from 'react-native';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { ErrorState } from '@/components/ui/ErrorState';
import { LinkRow } from '@/components/ui/LinkRow';
import { Loading } from '@/components/ui/Loading';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import type { AvailablePage } from '@/shared/buyers/available';
import { howToAsk } from '@/shared/buyers/publicWords';
import { FishForSale } from './FishForSale';
import { PublicFrame } from './PublicFrame';
import { availableQuery } from './publicQueries';

/** What anyone sees of a fishroom: which fish are available, and how to ask for them. */
export function AvailableScreen({ slug }: { slug: string }) {
  const { data, error, refetch } = useQuery(availableQuery(slug));
  if (data) return <Page page={data} />;
  return (
    <Screen title="Fish available">
      {error ? (
        <ErrorState
          title="There is no such page"
          words={`${error.message}. Look at the address again, or ask whoever gave it to you.`}
          onRetry={() => void refetch()}
        />
      ) : (
        <Loading label="Loading what is available" />
      )}
    </Screen>
  );
}

function Page({ page }: { page: AvailablePage }) {
  const theme = useTheme();
  const now = page.fish.filter(({ coming }) => coming === null);
  const coming = page.fish.filter((fish) => fish.coming !== null);
  return (
    <PublicFrame page={page}>
      <Section title="Available now" aside="price each">
        {now.length === 0 ? <Text tone="soft">No fish are available at the moment.</Text> : null}
        <View role="list" style={[styles.list, { borderTopColor: theme.rule }]}>
          {now.map((fish) => (
            <FishForSale key={fish.broodId} fish={fish} page={page} />
          ))}
        </View>
      </Section>
      {coming.length > 0 ? (
        <Section title="Coming">
          <View role="list" style={[styles.list, { borderTopColor: theme.rule }]}>
            {coming.map((fish) => (
              <FishForSale key={fish.broodId} fish={fish} page={page} />
            ))}
          </View>
        </Section>
      ) : null}
      {page.strains.length > 0 ? (
        <Section title="Tell me when">
          <Rows label="Tell me when">
            {page.strains.map(({ id, name, locality }) => (
              <LinkRow
                key={id}
                title={[name, locality].filter(Boolean).join(' ')}
                note="when they have reached the size you want"
                href={`/available/${page.slug}/ask?strain=${id}`}
              />
            ))}
          </Rows>
        </Section>
      ) : null}
      <Section title="How to ask">
        <View style={{ gap: 8 }}>
          <Text tone="soft">{howToAsk(page)}</Text>
          <Text tone="soft">{page.terms}</Text>
        </View>
      </Section>
    </PublicFrame>
  );
}

const styles = StyleSheet.create({ list: { borderTopWidth: line.row } });
