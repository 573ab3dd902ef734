import type { ReactNode, Ref } from 'react';
import { StyleSheet, TextInput, type TextInputProps, View } from 'react-native';
import { useBreakpoint, useIsWide } from '@/components/theme/breakpoint';
import { line, radius, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { family, textMeasure } from '@/components/theme/type';
import { Text } from '@/components/ui/Text';

export type InputBoxProps = Omit<TextInputProps, 'style' | 'placeholderTextColor'> & {
  /** Fixed at the right end: "mm", "°C". */
  unit?: string;
  /** Left of what is typed: a search icon. */
  lead?: ReactNode;
  /** Right end: show the password, clear the search. */
  end?: ReactNode;
  invalid?: boolean;
  /** Codes and passwords. */
  mono?: boolean;
  ref?: Ref<TextInput>;
};

/** The well one types in. 16 px and up, so that no phone zooms in. */
export function InputBox({ unit, lead, end, invalid = false, mono = false, multiline, ref, ...rest }: InputBoxProps) {
  const theme = useTheme();
  const wide = useIsWide();
  const px = textMeasure('body', useBreakpoint());
  return (
    <View
      dataSet={{ field: true }}
      style={[
        styles.box,
        {
          backgroundColor: theme.well,
          borderColor: invalid ? theme.trouble : theme.control,
          minHeight: wide ? target.wide : target.primary,
          paddingLeft: lead ? space[3] : 14,
          paddingRight: end ? 0 : 14,
        },
      ]}
    >
      {lead}
      <TextInput
        {...rest}
        ref={ref}
        multiline={multiline}
        aria-invalid={invalid || undefined}
        placeholderTextColor={theme.ink3}
        style={[
          px,
          { color: theme.ink, fontFamily: mono ? family.code : family.text, fontSize: Math.max(16, px.fontSize) },
          styles.input,
          multiline ? styles.tall : { minHeight: wide ? target.wide - 4 : target.least },
        ]}
      />
      {unit ? (
        <Text tone="soft" whole aria-hidden>
          {unit}
        </Text>
      ) : null}
      {end}
    </View>
  );
}

const styles = StyleSheet.create({
  box: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[2],
    borderWidth: line.control,
    borderRadius: radius.control,
  },
  input: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, fontVariant: ['tabular-nums'] },
  tall: { minHeight: 88, paddingVertical: 14 },
});
