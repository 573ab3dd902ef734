import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from './Icon';
import { Press } from './Press';
import { type SavedState, savedIcon, savedWords } from './SavedLine';
import { Text } from './Text';

type Props = {
  saved: SavedState;
  onSaved?: () => void;
  person: string;
  onPerson: () => void;
  narrow: boolean;
};

/** Who is signed in, and where this device's records stand. */
export function RailFoot({ saved, onSaved, person, onPerson, narrow }: Props) {
  const theme = useTheme();
  const words = saved.kind === 'saved' ? 'Saved' : savedWords(saved);
  const state = (
    <>
      <Icon name={savedIcon[saved.kind]} tone={saved.kind === 'refused' ? 'trouble' : 'soft'} />
      <Text
        size={narrow ? 'label' : 'small'}
        tone={saved.kind === 'saved' ? 'soft' : 'ink'}
        strong={saved.kind !== 'saved'}
        style={styles.shrink}
      >
        {words}
      </Text>
    </>
  );
  const look = [styles.state, saved.kind === 'offline' ? [styles.offline, { borderColor: theme.control }] : null];
  return (
    <View style={narrow ? styles.footNarrow : styles.foot}>
      <Press onPress={onPerson} aria-label={`Account: ${person}`} aria-haspopup="menu" style={styles.person}>
        <Text size={narrow ? 'label' : 'small'} tone="soft" align={narrow ? 'center' : 'left'}>
          {narrow ? 'Account' : person}
        </Text>
      </Press>
      <View role="status" aria-live="polite" style={styles.status}>
        {onSaved && saved.kind !== 'saved' ? (
          <Press onPress={onSaved} aria-label={words} style={look}>
            {state}
          </Press>
        ) : (
          <View style={look}>{state}</View>
        )}
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  foot: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    justifyContent: 'space-between',
    alignItems: 'center',
    columnGap: space[2],
    paddingHorizontal: 18,
    paddingTop: 4,
  },
  footNarrow: { alignItems: 'center', paddingTop: 4 },
  status: { flexShrink: 1, maxWidth: '100%' },
  person: { minHeight: 44, justifyContent: 'center', flexShrink: 1 },
  state: { flexDirection: 'row', alignItems: 'center', gap: 6, minHeight: 44 },
  offline: { borderTopWidth: 2, borderStyle: 'dashed' },
  shrink: { flexShrink: 1 },
});
