import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from '@/components/ui/Code';
import { Icon } from '@/components/ui/Icon';
import type { IconName } from '@/components/ui/iconMarks';
import { Press } from '@/components/ui/Press';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { dayWords } from '@/shared/days';
import { clockState } from '@/shared/holds/clockWords';
import type { HoldToday } from '@/shared/today/holdsToday';

const SHOWN = 6;

/** The next dates of the holds, side by side; under the calendar of a wide screen. */
export function NextStrip({ holds }: { holds: HoldToday[] }) {
  const next = holds.flatMap((one) => wordsOf(one) ?? []).slice(0, SHOWN);
  if (next.length === 0) return null;
  return (
    <Section title="Next">
      <View style={styles.clip}>
        <View style={styles.strip}>
          {next.map((one) => (
            <NextCell key={one.hold.id} {...one} />
          ))}
        </View>
      </View>
    </Section>
  );
}

type Next = Pick<HoldToday, 'hold' | 'nextOn'> & { words: string; icon: IconName };

/** What the date is: a window's end while it is open, else the start of what comes. */
function wordsOf({ hold, clock, nextOn }: HoldToday): Next | null {
  if (!clock) return null;
  const swims = clock.kind === 'guards';
  switch (clockState(clock, hold.plan)) {
    case 'strip':
      return { hold, nextOn, words: 'Strip by', icon: 'strip' };
    case 'early':
      return hold.plan === 'strip' && clock.stripFrom
        ? { hold, nextOn, words: 'Strip from', icon: 'strip' }
        : { hold, nextOn, words: 'Hand-over from', icon: 'move' };
    case 'handOver':
      return { hold, nextOn, words: 'Hand-over by', icon: 'move' };
    case 'waiting':
      return { hold, nextOn, words: swims ? 'Swims from' : 'Release from', icon: 'release' };
    case 'release':
      return { hold, nextOn, words: swims ? 'Swims by' : 'Release by', icon: 'release' };
    default:
      return null;
  }
}

function NextCell({ hold, nextOn, words, icon }: Next) {
  const room = useRoom();
  const theme = useTheme();
  const when = dayWords(nextOn, room.today);
  const who = hold.holder?.code;
  return (
    <Press
      href={`/r/${room.id}/holds/${hold.id}`}
      aria-label={`${when}: ${words} ${who ?? hold.tank.code}`}
      style={({ pressed, hovered }) => [
        styles.cell,
        { borderLeftColor: theme.rule },
        pressed || hovered ? { backgroundColor: theme.well } : null,
      ]}
    >
      <Text strong>{when.charAt(0).toUpperCase() + when.slice(1)}</Text>
      <Icon name={icon} />
      <Text size="small" tone="soft">
        {words}
      </Text>
      {who ? (
        <Code size="small">{who}</Code>
      ) : (
        <Text size="small" strong>
          {'1 in '}
          <Code>{hold.tank.code}</Code>
        </Text>
      )}
    </Press>
  );
}

const styles = StyleSheet.create({
  clip: { overflow: 'hidden' },
  // Each cell carries its left rule; the first of every line is pushed out of sight.
  strip: { flexDirection: 'row', flexWrap: 'wrap', marginLeft: -13, rowGap: space[3] },
  cell: {
    flexGrow: 1,
    flexBasis: 104,
    maxWidth: 180,
    gap: space[1],
    paddingLeft: space[3],
    paddingRight: space[2],
    paddingVertical: space[1],
    borderLeftWidth: line.row,
  },
});
