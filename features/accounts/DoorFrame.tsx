import type { ReactNode } from 'react';
import { ScrollView, StyleSheet, View } from 'react-native';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { gutter, line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Heading } from '@/components/ui/Heading';
import { Mark, Wordmark } from '@/components/ui/Mark';
import { Text } from '@/components/ui/Text';
import { usePageTitle } from '@/hooks/usePageTitle';

type Props = {
  title: string;
  /** Under the title: what this page is for. */
  words?: string;
  /** The first page of all: the mark at its largest, the product's name for a title. */
  front?: boolean;
  children: ReactNode;
};

/** Every page before a fishroom: one column of a form; on a wide screen the mark stands beside it. */
export function DoorFrame({ title, words, front = false, children }: Props) {
  const theme = useTheme();
  const breakpoint = useBreakpoint();
  const wide = breakpoint !== 'phone';
  usePageTitle(title);
  return (
    <View style={[styles.page, { backgroundColor: theme.ground }]}>
      {wide ? (
        <View style={[styles.side, { borderRightColor: theme.rule }]}>
          <Mark width={breakpoint === 'full' ? 420 : 220} look="stages" />
        </View>
      ) : null}
      <ScrollView style={styles.fill} contentContainerStyle={wide ? styles.wideBody : styles.phoneBody}>
        <View role="banner">{wide || !front ? <Wordmark markWidth={wide ? 34 : 28} /> : <FrontMark />}</View>
        <View role="main" style={styles.main}>
          <View>
            <Heading level={1} size={front && !wide ? 'display' : 'heading'} tabIndex={-1}>
              {front && !wide ? 'Kinwater' : title}
            </Heading>
            {words ? (
              <Text size={front ? 'body' : 'small'} tone="soft" style={styles.words}>
                {words}
              </Text>
            ) : null}
          </View>
          {children}
        </View>
      </ScrollView>
    </View>
  );
}

const FrontMark = () => (
  <View style={styles.front}>
    <Mark width={208} look="stages" />
  </View>
);

const styles = StyleSheet.create({
  page: { flexGrow: 1, flexShrink: 1, flexBasis: 0, flexDirection: 'row', minHeight: 0 },
  fill: { flexGrow: 1, flexShrink: 1, flexBasis: 0 },
  side: {
    flexGrow: 1,
    flexBasis: 0,
    maxWidth: 640,
    alignItems: 'center',
    justifyContent: 'center',
    borderRightWidth: line.row,
  },
  phoneBody: {
    flexGrow: 1,
    paddingHorizontal: gutter.phone,
    paddingTop: space[5],
    paddingBottom: space[8],
    gap: space[5],
  },
  wideBody: {
    flexGrow: 1,
    width: '100%',
    maxWidth: 560,
    paddingHorizontal: 56,
    paddingVertical: space[12],
    gap: space[10],
  },
  main: { gap: space[5], maxWidth: 448 },
  words: { marginTop: 6 },
  front: { paddingTop: space[8], paddingBottom: space[4] },
});
