import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from './Button';
import { Heading } from './Heading';
import { Icon } from './Icon';
import { Text } from './Text';

type Props = {
  /** "This tank was not found". */
  title: string;
  /** What the keeper can do. */
  words: string;
  onRetry?: () => void;
  retryLabel?: string;
};

/** In place of what could not be shown. */
export function ErrorState({ title, words, onRetry, retryLabel = 'Try again' }: Props) {
  return (
    <View role="alert" style={styles.state}>
      <Icon name="warn" size={36} tone="trouble" />
      <View>
        <Heading level={2} size="title" style={styles.title}>
          {title}
        </Heading>
        <Text tone="soft">{words}</Text>
      </View>
      {onRetry ? <Button label={retryLabel} onPress={onRetry} /> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  state: { paddingTop: space[10], gap: space[4], maxWidth: 460 },
  title: { marginBottom: space[1] },
});
