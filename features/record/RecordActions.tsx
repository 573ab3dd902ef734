import { type Href, useRouter } from 'expo-router';
import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from '@/components/ui/Icon';
import { Notice } from '@/components/ui/Notice';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { RECORD_GROUPS, type RecordAction } from './actions';
import { DraftRows } from './DraftRows';
import { useAtOnce } from './useAtOnce';
import type { Here } from './useHere';

type Props = {
  here: Here;
  /** The sheet closes as a form opens, or when something was recorded at once. */
  onGone: () => void;
  /** Out of a page of its own, which is not come back to. */
  replaces?: boolean;
};

/** Everything that can be recorded, a tap away, in groups that go by how often. */
export function RecordActions({ here, onGone, replaces = false }: Props) {
  const { id: roomId } = useRoom();
  const router = useRouter();
  const { act, error } = useAtOnce(here, onGone);
  const go = (action: RecordAction) => {
    const at = addressOf(roomId, action, here);
    onGone();
    if (replaces) router.replace(at);
    else router.push(at);
  };
  return (
    <View>
      {error ? <Notice tone="act" words={error.message} alert /> : null}
      <DraftRows onGone={onGone} />
      {RECORD_GROUPS.map(({ word, actions }) => (
        <Group key={word} word={word}>
          {actions.map((action, i) => (
            <ActionCell
              key={action.word}
              action={action}
              second={i % 2 === 1}
              last={i >= actions.length - 2}
              onPress={act(action) ?? (() => go(action))}
            />
          ))}
        </Group>
      ))}
    </View>
  );
}

/** The form's address, with the tank and the thing it was opened on. */
function addressOf(roomId: string, { form, takes, atOnce }: RecordAction, { ids }: Here): Href {
  const query = new URLSearchParams();
  for (const thing of takes) if (ids[thing]) query.set(thing, ids[thing]);
  if (atOnce === 'oneDead') query.set('one', '1');
  const text = query.toString();
  return `/r/${roomId}/record/${form}${text ? `?${text}` : ''}` as Href; // forms of the table are routes
}

function Group({ word, children }: { word: string; children: React.ReactNode }) {
  const theme = useTheme();
  return (
    <View role="group" aria-label={word} style={[styles.group, { borderTopColor: theme.rule }]}>
      <View style={styles.label}>
        <Text size="small" semi tone="soft" aria-hidden>
          {word}
        </Text>
      </View>
      <View style={[styles.cells, { borderLeftColor: theme.rule }]}>{children}</View>
    </View>
  );
}

type CellProps = { action: RecordAction; second: boolean; last: boolean; onPress: () => void };

function ActionCell({ action, second, last, onPress }: CellProps) {
  const theme = useTheme();
  const wide = useIsWide();
  return (
    <Press
      aria-label={action.word}
      onPress={onPress}
      style={({ pressed, hovered }) => [
        styles.cell,
        { minHeight: wide ? 46 : 50, borderColor: theme.rule },
        second ? styles.second : null,
        last ? null : styles.ruled,
        pressed || hovered ? { backgroundColor: theme.well } : null,
      ]}
    >
      <Icon name={action.icon} />
      <Text semi style={styles.word}>
        {action.word}
      </Text>
    </Press>
  );
}

const styles = StyleSheet.create({
  group: { flexDirection: 'row', borderTopWidth: line.row },
  label: { width: 76, paddingTop: space[4], paddingRight: space[2] },
  cells: { flexDirection: 'row', flexWrap: 'wrap', flexGrow: 1, flexShrink: 1, borderLeftWidth: line.row },
  cell: {
    width: '50%',
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[3],
    paddingLeft: space[3],
    paddingRight: space[1],
    paddingVertical: space[1],
  },
  second: { borderLeftWidth: line.row },
  ruled: { borderBottomWidth: line.row },
  word: { flexShrink: 1, lineHeight: 20 },
});
