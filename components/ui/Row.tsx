import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, marginColumn, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { Theme } from '@/components/theme/theme';
import { Figure } from './Figure';
import { type MaybeAction, Press } from './Press';
import { useRowsLook } from './Rows';
import { Text, type Tone } from './Text';

export type RowProps = MaybeAction & {
  /** What a screen reader says for the whole row: code and state. Needed where the row can be pressed. */
  label?: string;
  /** The number the keeper would call across the room. */
  figure?: string;
  figureAfter?: string;
  figureTone?: Tone;
  /** Under the figure: "heads", "day". */
  unit?: string;
  /** In place of the figure: a time, a check box, a shape with a code. */
  margin?: ReactNode;
  marginWidth?: number;
  /** Left of the words: an icon. */
  lead?: ReactNode;
  title: ReactNode;
  /** At the right end of the title's line: "Strip by Wed 20". */
  state?: ReactNode;
  /** Second line. */
  note?: ReactNode;
  /** Right of both lines. */
  trailing?: ReactNode;
  /** Under the lines, over the whole width right of the rule: day-bars. */
  children?: ReactNode;
  /** At the far right, in the middle of the row's height: an arrow. */
  end?: ReactNode;
  /** A button of its own at the end, outside the row's press. */
  action?: ReactNode;
  /** Words in the middle of the row's height. */
  middle?: boolean;
  /** Shown in the detail beside. */
  selected?: boolean;
  /** Recorded here, not yet sent. */
  waiting?: boolean;
};

/** One line of the ledger: margin figure, rule, content, trailing. */
export function Row(props: RowProps) {
  const { label, action, selected = false, waiting = false, href, onPress } = props;
  const theme = useTheme();
  const { listed, inset } = useRowsLook();
  const pressable = href !== undefined || onPress !== undefined;
  const frame = [styles.row, { borderBottomColor: theme.rule, paddingLeft: inset, paddingRight: inset }];
  return (
    <View role={listed ? 'listitem' : undefined} style={selected ? { backgroundColor: theme.select } : null}>
      <View style={styles.line}>
        {pressable ? (
          <Press
            href={href}
            onPress={onPress}
            aria-label={label}
            aria-current={selected ? true : undefined}
            style={({ pressed, hovered }) => [
              frame,
              pressed || (hovered && !selected) ? { backgroundColor: theme.well } : null,
            ]}
          >
            <RowBody {...props} />
          </Press>
        ) : (
          <View style={frame}>
            <RowBody {...props} />
          </View>
        )}
        {action ? <View style={[styles.action, { borderBottomColor: theme.rule }]}>{action}</View> : null}
      </View>
      {selected ? <View style={[styles.edge, { width: 6, backgroundColor: theme.ink }]} /> : null}
      {waiting ? (
        <View style={[styles.edge, styles.waiting, { borderLeftColor: theme.control, left: inset - 8 }]} />
      ) : null}
    </View>
  );
}

function RowBody(props: RowProps) {
  const theme = useTheme();
  const at = props.middle ? styles.middle : null;
  return (
    <>
      <Margin {...props} theme={theme} />
      {props.lead ? <View style={styles.lead}>{props.lead}</View> : null}
      <View style={[styles.content, at]}>
        <View style={styles.top}>
          <View style={styles.words}>
            <View style={props.state ? styles.titleLine : null}>
              {typeof props.title === 'string' ? <Text strong>{props.title}</Text> : props.title}
              {props.state ? <View style={styles.state}>{trailingOf(props.state)}</View> : null}
            </View>
            {typeof props.note === 'string' ? (
              <Text size="small" tone="soft">
                {props.note}
              </Text>
            ) : (
              props.note
            )}
          </View>
          {props.trailing ? <View style={[styles.trailing, at]}>{trailingOf(props.trailing)}</View> : null}
        </View>
        {props.children}
      </View>
      {props.end ? <View style={styles.lead}>{props.end}</View> : null}
    </>
  );
}

const trailingOf = (trailing: ReactNode) =>
  typeof trailing === 'string' ? (
    <Text size="small" tone="soft" align="right">
      {trailing}
    </Text>
  ) : (
    trailing
  );

function Margin(props: RowProps & { theme: Theme }) {
  const { figure, figureAfter, figureTone, unit, margin, marginWidth, theme } = props;
  const wide = useIsWide();
  if (figure === undefined && margin === undefined) return null;
  const column = { minWidth: marginWidth ?? (wide ? marginColumn.wide : marginColumn.phone) };
  if (margin !== undefined)
    return <View style={[styles.margin, styles.marginNode, column, { borderRightColor: theme.rule }]}>{margin}</View>;
  return (
    <View style={[styles.margin, column, { borderRightColor: theme.rule }]}>
      <Figure after={figureAfter} tone={figureTone}>
        {figure ?? ''}
      </Figure>
      {unit ? (
        <Text size="label" tone="soft" style={styles.unit}>
          {unit}
        </Text>
      ) : null}
    </View>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', alignItems: 'stretch' },
  row: {
    flexGrow: 1,
    flexShrink: 1,
    flexDirection: 'row',
    alignItems: 'stretch',
    minHeight: 64,
    borderBottomWidth: line.row,
    gap: space[3],
  },
  margin: {
    alignItems: 'flex-end',
    paddingTop: 10,
    paddingBottom: space[2],
    paddingRight: 10,
    borderRightWidth: line.row,
    flexShrink: 0,
  },
  marginNode: { justifyContent: 'center', alignItems: 'flex-start', paddingTop: space[2] },
  unit: { marginTop: 2 },
  lead: { justifyContent: 'center', flexShrink: 0 },
  content: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, paddingVertical: 10 },
  middle: { justifyContent: 'center' },
  top: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space[3], alignItems: 'stretch' },
  words: { flexGrow: 1, flexShrink: 1, flexBasis: 130, minWidth: 0 },
  titleLine: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space[2] },
  state: { marginLeft: 'auto', flexShrink: 1, maxWidth: '100%' },
  trailing: { alignItems: 'flex-end', flexShrink: 1, maxWidth: '62%' },
  action: { justifyContent: 'center', borderBottomWidth: line.row },
  edge: { position: 'absolute', left: 0, top: 0, bottom: 1 },
  waiting: { borderLeftWidth: 3, borderStyle: 'dashed' },
});
