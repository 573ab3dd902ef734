import { useId } from 'react';
import { StyleSheet, View, type ViewStyle } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, radius, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import type { Theme } from '@/components/theme/theme';
import { Icon } from './Icon';
import type { IconName } from './iconMarks';
import { type Action, Press, type PressState } from './Press';
import { Text, type Tone } from './Text';

export type ButtonKind = 'primary' | 'plain' | 'text';

export type ButtonProps = Action & {
  /** Verb first, and the record's name: "Save hold". */
  label: string;
  /** One primary to a screen. */
  kind?: ButtonKind;
  /** 48 px instead of 56 on a phone. */
  small?: boolean;
  icon?: IconName;
  /** Pressed and not yet answered; presses are ignored. */
  busy?: boolean;
  busyLabel?: string;
  /** Why it cannot be pressed now, in words under it; dashed while it stands. */
  disabledBecause?: string | null;
  /** Takes the width there is. */
  grow?: boolean;
  /** For a screen reader, where the label alone is not enough. */
  describe?: string;
};

/** The one button: ink fill, outline or underlined words. */
export function Button(props: ButtonProps) {
  const { label, kind = 'plain', small = false, icon, busy = false, busyLabel = 'Saving', grow = false } = props;
  const { disabledBecause, describe, href, onPress } = props;
  const theme = useTheme();
  const wide = useIsWide();
  const reasonId = useId();
  const off = Boolean(disabledBecause);
  const tone: Tone = off ? 'faint' : kind === 'primary' ? 'inverse' : 'ink';
  const minHeight = wide ? target.wide : small ? target.least : target.primary;
  const face = (state: PressState) => [
    styles.box,
    { minHeight, paddingHorizontal: kind === 'text' ? space[2] : wide ? space[4] : small ? 14 : space[4] },
    looks(theme, kind, off, state),
    grow ? null : styles.fit,
  ];
  return (
    <View style={grow ? styles.grow : null}>
      <Press
        href={href}
        onPress={onPress}
        unavailable={off || busy}
        aria-label={describe ?? label}
        aria-busy={busy}
        aria-describedby={off ? reasonId : undefined}
        style={face}
      >
        {icon ? <Icon name={icon} tone={tone} /> : null}
        <Text
          size={small || wide ? 'small' : 'body'}
          strong
          tone={tone}
          align="center"
          style={kind === 'text' ? styles.underlined : styles.label}
        >
          {busy ? busyLabel : label}
        </Text>
      </Press>
      {disabledBecause ? (
        <Text id={reasonId} size="small" tone="soft" style={{ marginTop: space[1] }}>
          {disabledBecause}
        </Text>
      ) : null}
    </View>
  );
}

function looks(theme: Theme, kind: ButtonKind, off: boolean, { pressed, hovered }: PressState): ViewStyle {
  if (off) return { borderColor: kind === 'text' ? 'transparent' : theme.control, borderStyle: 'dashed' };
  if (kind === 'primary')
    return { backgroundColor: theme.actFill, borderColor: theme.actFill, opacity: pressed ? 0.8 : 1 };
  const backgroundColor = pressed || hovered ? theme.well : 'transparent';
  return { borderColor: kind === 'plain' ? theme.control : 'transparent', backgroundColor };
}

const styles = StyleSheet.create({
  box: {
    flexDirection: 'row',
    alignItems: 'center',
    justifyContent: 'center',
    gap: space[2] + 2,
    paddingVertical: space[2],
    borderRadius: radius.control,
    borderWidth: line.control,
  },
  fit: { alignSelf: 'flex-start' },
  grow: { flexGrow: 1, flexShrink: 1 },
  label: { flexShrink: 1, lineHeight: 20 },
  underlined: {
    flexShrink: 1,
    textDecorationLine: 'underline',
    textUnderlineOffset: 4,
    textDecorationThickness: 1,
  },
});
