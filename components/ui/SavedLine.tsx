import { StyleSheet, View } from 'react-native';
import { space, target } from '@/components/theme/space';
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
  /** The fishroom's name leads to the account and the other fishrooms. */
  onPlace?: () => void;
};

/** The strip on top of a phone's screen. Taller and dashed without a signal. */
export function SavedLine({ state, place, onPress, open = false, onPlace }: Props) {
  const theme = useTheme();
  const offline = state.kind === 'offline';
  const look = offline
    ? [styles.strip, styles.offline, { backgroundColor: theme.sheet, borderColor: theme.control }]
    : styles.strip;
  return (
    <View style={look}>
      <View role="status" aria-live="polite" style={offline ? styles.grow : styles.shrink}>
        {onPress ? (
          <Press onPress={onPress} aria-expanded={open} aria-label={savedWords(state)} style={styles.state}>
            <State state={state} open={open} />
          </Press>
        ) : (
          <View style={styles.state}>
            <State state={state} />
          </View>
        )}
      </View>
      {offline ? null : <PlaceWords place={place} onPlace={onPlace} />}
    </View>
  );
}

function State({ state, open }: { state: SavedState; open?: boolean }) {
  const offline = state.kind === 'offline';
  return (
    <>
      <Icon name={savedIcon[state.kind]} tone={state.kind === 'refused' ? 'trouble' : 'soft'} />
      <Text size={offline ? 'small' : 'label'} semi={!offline} strong={offline} tone={offline ? 'ink' : 'soft'}>
        {savedWords(state)}
      </Text>
      {offline && open !== undefined ? (
        <Text size="small" semi style={styles.underlined}>
          {open ? 'Hide' : 'Show'}
        </Text>
      ) : null}
    </>
  );
}

function PlaceWords({ place, onPlace }: { place: string; onPlace: (() => void) | undefined }) {
  const words = (
    <Text size="label" semi tone="soft" align="right" cut>
      {place}
    </Text>
  );
  if (!onPlace) return <View style={styles.shrink}>{words}</View>;
  return (
    <Press onPress={onPlace} aria-label={`Settings and account: ${place}`} style={[styles.shrink, styles.place]}>
      {words}
    </Press>
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
  },
  offline: { minHeight: 52, borderBottomWidth: 2, borderStyle: 'dashed' },
  state: { flexDirection: 'row', alignItems: 'center', gap: space[2], minHeight: 40 },
  grow: { flexGrow: 1, flexShrink: 1 },
  shrink: { flexShrink: 1 },
  // Reaches over the strip's own edge, to be met by a thumb.
  place: { minHeight: target.least, justifyContent: 'center', marginVertical: -4, paddingLeft: space[3] },
  underlined: { marginLeft: 'auto', textDecorationLine: 'underline', textUnderlineOffset: 4 },
});
