import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Figure } from './Figure';
import { type MaybeAction, Press } from './Press';
import { Text, type Tone } from './Text';

export type HeadlineFigure = MaybeAction & {
  /** Digits; a drawn thing (stage glyph, shapes) goes into `drawn`. */
  figure?: string;
  after?: string;
  drawn?: ReactNode;
  /** Read with the figure: "heads of 34". */
  label: string;
  tone?: Tone;
};

type Props = {
  figures: HeadlineFigure[];
  /** No rule below: something of the same section follows. */
  open?: boolean;
};

/** Three to six headline figures, ruled apart; they wrap to a second line when the text is large. */
export function FiguresStrip({ figures, open = false }: Props) {
  const theme = useTheme();
  return (
    <View
      style={[
        styles.strip,
        { borderTopColor: theme.ruleStrong, borderBottomColor: theme.rule, borderBottomWidth: open ? 0 : line.row },
      ]}
    >
      <View style={styles.cells}>
        {figures.map((figure) => (
          <Cell key={figure.label} {...figure} />
        ))}
      </View>
    </View>
  );
}

function Cell({ figure, after, drawn, label, tone, href, onPress }: HeadlineFigure) {
  const theme = useTheme();
  const wide = useIsWide();
  const said = figure === undefined ? label : `${figure}${after ?? ''} ${label}`;
  const body = (
    <>
      {drawn}
      {figure === undefined ? null : (
        <Figure size="m" after={after} tone={tone}>
          {figure}
        </Figure>
      )}
      {drawn && figure === undefined ? null : (
        <Text size={wide ? 'small' : 'label'} tone="soft" style={wide ? styles.label : styles.labelPhone}>
          {label}
        </Text>
      )}
    </>
  );
  const look = [styles.cell, { borderLeftColor: theme.rule }, drawn && figure === undefined ? styles.drawn : null];
  if (href === undefined && onPress === undefined)
    return (
      <View role="group" aria-label={said} style={look}>
        {body}
      </View>
    );
  return (
    <Press
      href={href}
      onPress={onPress}
      aria-label={said}
      style={({ pressed, hovered }) => [look, pressed || hovered ? { backgroundColor: theme.well } : null]}
    >
      {body}
    </Press>
  );
}

const styles = StyleSheet.create({
  strip: { borderTopWidth: line.section, overflow: 'hidden' },
  // Each cell carries its left rule; the first of every line is pushed out of sight.
  cells: { flexDirection: 'row', flexWrap: 'wrap', marginLeft: -13 },
  cell: {
    flexGrow: 1,
    minHeight: 64,
    paddingVertical: 10,
    paddingLeft: space[3],
    paddingRight: space[2],
    borderLeftWidth: line.row,
  },
  drawn: { justifyContent: 'center' },
  label: { marginTop: 3 },
  labelPhone: { marginTop: 3, fontSize: 14, lineHeight: 17 },
});
