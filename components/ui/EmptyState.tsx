import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Heading } from './Heading';
import { Mark } from './Mark';
import { Text } from './Text';

type Props = {
  /** "No colonies yet". */
  title: string;
  /** What the thing is, and what adding one makes possible. */
  words: string;
  /** Buttons, the primary first. */
  children?: ReactNode;
  /** A list that a filter has emptied: no drawing. */
  small?: boolean;
};

/** Nothing here yet: the fish drawn in dashes, its mouth already full. */
export function EmptyState({ title, words, children, small = false }: Props) {
  return (
    <View style={small ? styles.small : styles.state}>
      {small ? null : <Mark look="empty" width={178} />}
      <View>
        <Heading level={2} size={small ? 'title' : 'heading'} style={styles.title}>
          {title}
        </Heading>
        <Text tone="soft">{words}</Text>
      </View>
      {children ? <View style={styles.actions}>{children}</View> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  state: { paddingTop: space[12], gap: space[6], maxWidth: 460 },
  small: { paddingVertical: space[6], gap: space[4], maxWidth: 460 },
  title: { marginBottom: 6 },
  actions: { gap: space[2], alignItems: 'stretch' },
});
