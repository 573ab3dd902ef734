import type { ReactNode } from 'react';
import { Image, ScrollView, StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { gutter, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Heading } from '@/components/ui/Heading';
import { Text } from '@/components/ui/Text';
import { usePageTitle } from '@/hooks/usePageTitle';
import type { AvailablePage } from '@/shared/buyers/available';
import { coverWords, pageTitle } from '@/shared/buyers/publicWords';
import { publicPhoto } from './publicQueries';

/** The fishroom's name and picture, and the fish: beside each other on a wide screen. Its measures are those of the page as it is sent. */
export function PublicFrame({ page, children }: { page: AvailablePage; children: ReactNode }) {
  const theme = useTheme();
  const wide = useIsWide();
  usePageTitle(pageTitle(page));
  return (
    <ScrollView dataSet={{ flow: true }} style={{ backgroundColor: theme.ground }}>
      <View style={wide ? styles.beside : null}>
        <View style={wide ? styles.side : null}>
          <View role="banner" style={wide ? styles.wideHead : styles.head}>
            <Heading level={1} size="page">
              {page.name}
            </Heading>
            {page.words ? (
              <Text tone="soft" style={{ marginTop: 6 }}>
                {page.words}
              </Text>
            ) : null}
          </View>
          <Cover page={page} />
        </View>
        <View role="main" style={wide ? styles.wideList : styles.list}>
          {children}
        </View>
      </View>
    </ScrollView>
  );
}

function Cover({ page }: { page: AvailablePage }) {
  const wide = useIsWide();
  const words = coverWords(page);
  if (!page.photo || !words) return null;
  const uri = publicPhoto(page.slug, page.photo.id, 'large');
  return (
    <View style={{ marginBottom: space[3] }}>
      <Image
        source={{ uri }}
        alt={words.caption}
        resizeMode="cover"
        style={{ width: '100%', height: wide ? 380 : 184 }}
      />
      <View style={[styles.caption, { paddingLeft: wide ? 40 : gutter.phone }]}>
        <Text size="small" tone="soft" style={{ flexShrink: 1 }}>
          {words.caption}
        </Text>
        <Text size="small" tone="soft" whole>
          {words.on}
        </Text>
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  beside: { flexDirection: 'row' },
  side: { width: 500, flexShrink: 0 },
  head: { paddingHorizontal: gutter.phone, paddingTop: 20, paddingBottom: 14 },
  wideHead: { paddingLeft: 40, paddingRight: 24, paddingTop: 40, paddingBottom: 24 },
  caption: {
    flexDirection: 'row',
    justifyContent: 'space-between',
    gap: space[3],
    paddingRight: gutter.phone,
    paddingTop: space[2],
  },
  list: { paddingHorizontal: gutter.phone, paddingBottom: 40 },
  wideList: {
    flexGrow: 1,
    flexShrink: 1,
    flexBasis: 0,
    minWidth: 0,
    paddingTop: 40,
    paddingLeft: 40,
    paddingRight: 48,
    paddingBottom: 40,
  },
});
