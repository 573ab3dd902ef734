import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from './Icon';
import type { IconName } from './iconMarks';
import { Press } from './Press';
import { Text } from './Text';

/** Where this device's records stand. */
export type SavedState =
  | { kind: 'saved' }
  | { kind: 'saving' }
  | { kind: 'waiting'; count: number }
  | { kind: 'refused'; count: number }
  | { kind: 'offline'; count: number };

const records = (count: number) => `${count} ${count === 1 ? 'record' : 'records'}`;

/** The state in words. */
export function savedWords(state: SavedState): string {
  switch (state.kind) {
    case 'saved':
      return 'All saved';
    case 'saving':
      return 'Saving';
    case 'waiting':
      return `${state.count} waiting`;
    case 'refused':
      return `${state.count} not saved`;
    case 'offline':
      return state.count === 0
        ? 'No signal'
        : `No signal. ${records(state.count)} wait${state.count === 1 ? 's' : ''} here`;
  }
}

export const savedIcon: Record<SavedState['kind'], IconName> = {
  saved: 'saved',
  saving: 'waiting',
  waiting: 'waiting',
  refused: 'warn',
  offline: 'offline',
};

type Props = {
  state: SavedState;
  /** On the right: the fishroom and the time of what is shown. */
  place: string;
  /** Shows or hides what waits. */
  onPress?: () => void;
  open?: boolean;
};

/** The strip on top of a phone's screen. Taller and dashed without a signal. */
export function SavedLine({ state, place, onPress, open = false }: Props) {
  const theme = useTheme();
  const offline = state.kind === 'offline';
  const body = (
    <>
      <View style={styles.left}>
        <Icon name={savedIcon[state.kind]} tone={state.kind === 'refused' ? 'trouble' : 'soft'} />
        <Text size={offline ? 'small' : 'label'} semi={!offline} strong={offline} tone={offline ? 'ink' : 'soft'}>
          {savedWords(state)}
        </Text>
      </View>
      {offline ? (
        <Text size="small" semi style={styles.underlined}>
          {open ? 'Hide' : 'Show'}
        </Text>
      ) : (
        <Text size="label" semi tone="soft" align="right" style={styles.place}>
          {place}
        </Text>
      )}
    </>
  );
  const look = offline
    ? [styles.strip, styles.offline, { backgroundColor: theme.sheet, borderColor: theme.control }]
    : styles.strip;
  return (
    <View role="status" aria-live="polite">
      {onPress ? (
        <Press onPress={onPress} aria-expanded={open} aria-label={`${savedWords(state)}. ${place}`} style={look}>
          {body}
        </Press>
      ) : (
        <View style={look}>{body}</View>
      )}
    </View>
  );
}

const styles = StyleSheet.create({
  strip: {
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: space[3],
    minHeight: 40,
    paddingHorizontal: space[4],
    paddingVertical: space[1],
  },
  offline: { minHeight: 52, borderBottomWidth: 2, borderStyle: 'dashed' },
  left: { flexDirection: 'row', alignItems: 'center', gap: space[2], flexShrink: 1 },
  place: { flexShrink: 1 },
  underlined: { textDecorationLine: 'underline', textUnderlineOffset: 4 },
});
