import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, radius, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { moveFocus } from '@/components/ui/moveFocus';
import { Press } from '@/components/ui/Press';
import { Text } from '@/components/ui/Text';

export type ChoiceCard = {
  value: string;
  /** "Yours". */
  title: string;
  /** "now, on this phone". */
  aside?: string;
  /** All of it in words, for a screen reader. */
  label: string;
  /** Words and bars. */
  children?: ReactNode;
};

type Props = { label: string; cards: readonly ChoiceCard[]; value: string | null; onChange: (value: string) => void };

/** Two or three things to choose from that need more than a word: both records of a conflict, plans of a hold. */
export function ChoiceCards({ label, cards, value, onChange }: Props) {
  const wide = useIsWide();
  const reachable = cards.some((card) => card.value === value) ? value : cards[0]?.value;
  return (
    <View
      role="radiogroup"
      aria-label={label}
      onKeyDown={(event) => moveFocus(event, '[role=radio]', { press: true })}
      style={wide ? styles.beside : styles.stacked}
    >
      {cards.map((card) => (
        <Card
          key={card.value}
          card={card}
          on={card.value === value}
          reachable={card.value === reachable}
          onPick={() => onChange(card.value)}
        />
      ))}
    </View>
  );
}

type CardProps = { card: ChoiceCard; on: boolean; reachable: boolean; onPick: () => void };

function Card({ card, on, reachable, onPick }: CardProps) {
  const theme = useTheme();
  const wide = useIsWide();
  return (
    <Press
      role="radio"
      aria-checked={on}
      aria-label={card.label}
      tabIndex={reachable ? 0 : -1}
      onPress={onPick}
      style={[
        styles.card,
        wide ? styles.half : null,
        on
          ? { borderWidth: 3, borderColor: theme.ink, padding: 12.5 }
          : { borderWidth: line.control, borderColor: theme.control, padding: 14 },
      ]}
    >
      <View style={styles.top}>
        <View
          style={[
            styles.bar,
            { borderColor: on ? theme.ink : theme.control, backgroundColor: on ? theme.ink : 'transparent' },
          ]}
        />
        <Text size="large" strong>
          {card.title}
        </Text>
        {card.aside ? (
          <Text size="small" tone="soft" align="right" style={styles.aside}>
            {card.aside}
          </Text>
        ) : null}
      </View>
      {card.children ? <View style={styles.body}>{card.children}</View> : null}
    </Press>
  );
}

const styles = StyleSheet.create({
  stacked: { gap: space[3] },
  beside: { flexDirection: 'row', gap: space[3], alignItems: 'stretch' },
  half: { flexGrow: 1, flexShrink: 1, flexBasis: 0 },
  card: { borderRadius: radius.control },
  top: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space[3] },
  bar: { width: 10, height: 26, borderWidth: 2 },
  aside: { marginLeft: 'auto', flexShrink: 1 },
  body: { marginTop: space[2] },
});
