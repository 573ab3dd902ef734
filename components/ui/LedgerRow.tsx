import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Figure } from './Figure';
import { Icon } from './Icon';
import type { IconName } from './iconMarks';
import { type MaybeAction, Press } from './Press';
import { useRowsLook } from './Rows';
import { Text } from './Text';

type Props = MaybeAction & {
  /** "3 May". */
  date: string;
  icon?: IconName;
  /** "Loss, found dead". */
  event: ReactNode;
  /** −1: shown in trouble's colour when it is a loss, else in ink with its sign. */
  change?: number;
  /** A loss; a sale or a move changes heads without being one. */
  loss?: boolean;
  /** What is left after it. */
  heads?: number;
  /** Who recorded it, where heads do not matter. */
  by?: string;
  /** Taken back later: struck through and kept. */
  corrected?: boolean;
  action?: ReactNode;
  label?: string;
};

/** A line of the head-count ledger or a log. */
export function LedgerRow(props: Props) {
  const { action, href, onPress, label } = props;
  const theme = useTheme();
  const { listed } = useRowsLook();
  const wide = useIsWide();
  const body = <LedgerBody {...props} />;
  const look = [styles.row, { minHeight: wide ? 36 : 44 }];
  return (
    <View role={listed ? 'listitem' : undefined} style={[styles.line, { borderBottomColor: theme.rule }]}>
      {href === undefined && onPress === undefined ? (
        <View style={look}>{body}</View>
      ) : (
        <Press
          href={href}
          onPress={onPress}
          aria-label={label}
          style={({ pressed, hovered }) => [look, pressed || hovered ? { backgroundColor: theme.well } : null]}
        >
          {body}
        </Press>
      )}
      {action}
    </View>
  );
}

function LedgerBody({ date, icon, event, change, loss = false, heads, by, corrected = false }: Props) {
  const wide = useIsWide();
  return (
    <>
      <Text size="small" tone="soft" style={{ width: wide ? 60 : 64 }}>
        {date}
      </Text>
      {icon && !wide ? <Icon name={icon} tone={corrected ? 'faint' : 'ink'} /> : null}
      <Text size="small" tone={corrected ? 'faint' : 'ink'} style={corrected ? styles.struck : styles.event}>
        {event}
      </Text>
      {change ? (
        <Text size="small" strong tone={corrected ? 'faint' : loss ? 'trouble' : 'ink'} whole>
          {change > 0 ? `+${change}` : `−${-change}`}
        </Text>
      ) : null}
      {heads === undefined ? null : (
        <View style={styles.heads}>
          <Figure tone={corrected ? 'faint' : 'ink'}>{String(heads)}</Figure>
        </View>
      )}
      {by ? (
        <Text size="small" tone="soft" align="right">
          {by}
        </Text>
      ) : null}
    </>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', alignItems: 'center', borderBottomWidth: line.row },
  row: { flexDirection: 'row', alignItems: 'center', gap: space[3], paddingVertical: 3, flexGrow: 1, flexShrink: 1 },
  event: { flexGrow: 1, flexShrink: 1, flexBasis: 0 },
  struck: { flexGrow: 1, flexShrink: 1, flexBasis: 0, textDecorationLine: 'line-through' },
  heads: { minWidth: 34, alignItems: 'flex-end' },
});
