import { useId, useRef, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { line, radius, space, target } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from '@/components/ui/Code';
import { Icon } from '@/components/ui/Icon';
import { Press } from '@/components/ui/Press';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { FieldFrame } from './FieldFrame';
import { SelectList } from './SelectList';
import { describedBy, useFieldState } from './useFieldState';

export type Option = {
  value: string;
  word: string;
  /** Set as a code before the word. */
  code?: string;
  /** Second line, searched too. */
  note?: string;
  italic?: boolean;
};

type SelectProps = {
  label: string;
  options: readonly Option[];
  value: string | null;
  onChange: (value: string) => void;
  placeholder?: string;
  invalid?: boolean;
  describedBy?: string;
  /** Makes what was searched for when it is not there: "Add Ines as a buyer". */
  onNew?: (text: string) => void;
  newWord?: (text: string) => string;
};

/** One of many, found by typing where there are more than eight. */
export function Select(props: SelectProps) {
  const { label, options, value, onChange, placeholder = 'Choose', invalid = false } = props;
  const theme = useTheme();
  const wide = useIsWide();
  const anchor = useRef<View>(null);
  const listId = useId();
  const [open, setOpen] = useState(false);
  const chosen = options.find((option) => option.value === value);
  return (
    <View>
      <Press
        ref={anchor}
        role="combobox"
        aria-label={`${label}: ${chosen ? [chosen.code, chosen.word].filter(Boolean).join(' ') : placeholder}`}
        aria-haspopup="dialog"
        aria-expanded={open}
        aria-controls={open ? listId : undefined}
        aria-invalid={invalid || undefined}
        aria-describedby={props.describedBy}
        onPress={() => setOpen(true)}
        onKeyDown={(event) => {
          if (event.key !== 'ArrowDown') return;
          event.preventDefault();
          setOpen(true);
        }}
        style={[
          styles.box,
          {
            minHeight: wide ? target.wide : target.primary,
            backgroundColor: theme.well,
            borderColor: invalid ? theme.trouble : theme.control,
          },
        ]}
      >
        <View style={styles.words}>
          {chosen?.code ? <Code>{chosen.code}</Code> : null}
          <Text tone={chosen ? 'ink' : 'faint'} italic={chosen?.italic} cut style={styles.word}>
            {chosen?.word ?? placeholder}
          </Text>
        </View>
        <View style={styles.arrow}>
          <Icon name="next" size={20} tone="soft" />
        </View>
      </Press>
      <Sheet open={open} onClose={() => setOpen(false)} title={label} anchor={anchor} width={380}>
        <SelectList
          {...props}
          id={listId}
          onPick={(next) => {
            setOpen(false);
            onChange(next);
          }}
          onNew={
            props.onNew &&
            ((text) => {
              setOpen(false);
              props.onNew?.(text);
            })
          }
        />
      </Sheet>
    </View>
  );
}

type FieldProps = Omit<SelectProps, 'value' | 'onChange' | 'invalid' | 'describedBy'> & {
  name: string;
  hint?: string;
  aside?: string;
  onPicked?: (value: string) => void;
};

/** `Select` as a field of a form. */
export function SelectField({ name, hint, aside, onPicked, ...select }: FieldProps) {
  const field = useFieldState(name);
  return (
    <FieldFrame label={select.label} hint={hint} aside={aside} field={field}>
      <Select
        {...select}
        value={field.text === '' ? null : field.text}
        onChange={(value) => {
          field.change(value);
          onPicked?.(value);
        }}
        invalid={field.error !== null}
        describedBy={describedBy(field, hint)}
      />
    </FieldFrame>
  );
}

const styles = StyleSheet.create({
  box: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: space[2],
    paddingHorizontal: 14,
    borderWidth: line.control,
    borderRadius: radius.control,
  },
  words: { flexDirection: 'row', alignItems: 'baseline', gap: space[2], flexGrow: 1, flexShrink: 1, minWidth: 0 },
  word: { flexShrink: 1 },
  arrow: { transform: [{ rotate: '90deg' }] },
});
