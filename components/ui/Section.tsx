import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Heading } from './Heading';
import { Text } from './Text';

type HeadProps = {
  title: string;
  /** On the right: a count, an order, a state, or a link. */
  aside?: ReactNode;
  level?: 2 | 3;
};

/** A 2 px rule, the name, and what there is to say about all of it. */
export function SectionHead({ title, aside, level = 2 }: HeadProps) {
  const theme = useTheme();
  return (
    <View style={[styles.head, { borderTopColor: theme.ruleStrong }]}>
      <Heading level={level} size="body" style={styles.title}>
        {title}
      </Heading>
      {typeof aside === 'string' ? (
        <Text size="small" tone="soft" align="right" style={styles.aside}>
          {aside}
        </Text>
      ) : (
        aside
      )}
    </View>
  );
}

/** A head and what belongs under it, with the gap that parts it from the next. */
export function Section({ children, ...head }: HeadProps & { children?: ReactNode }) {
  return (
    <View style={styles.section}>
      <SectionHead {...head} />
      {children}
    </View>
  );
}

const styles = StyleSheet.create({
  section: { marginBottom: space[5] },
  head: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'baseline',
    justifyContent: 'space-between',
    columnGap: space[3],
    borderTopWidth: line.section,
    paddingVertical: space[2],
  },
  title: { flexShrink: 1 },
  aside: { flexShrink: 1, marginLeft: 'auto' },
});
