import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { FieldFrame } from './FieldFrame';
import { InputBox } from './InputBox';
import { StepKey } from './StepKey';
import { describedBy, useFieldState } from './useFieldState';

type Props = {
  name: string;
  label: string;
  /** Fixed inside the field: "mm", "heads". */
  unit?: string;
  hint?: string;
  aside?: string;
  /** Whole numbers get a keypad without a comma. */
  whole?: boolean;
  /** Minus and plus beside it, for counts that are near what is prefilled. */
  step?: number;
  least?: number;
  autoFocus?: boolean;
  needed?: boolean;
};

/** A number with its unit. Comma and point are both read; the draft keeps the text as typed. */
export function NumberField({
  name,
  label,
  unit,
  hint,
  aside,
  whole = false,
  step,
  least = 0,
  autoFocus,
  needed,
}: Props) {
  const field = useFieldState(name);
  const now = Number(field.text.replace(',', '.')) || 0;
  const stepTo = (next: number) => field.change(String(Math.max(least, Number(next.toFixed(6)))));
  return (
    <FieldFrame label={label} hint={hint} aside={aside} field={field}>
      <View style={styles.line}>
        {step ? <StepKey icon="minus" label={`${step} less`} onPress={() => stepTo(now - step)} /> : null}
        <View style={styles.fill}>
          <InputBox
            value={field.text}
            onChangeText={field.change}
            onBlur={field.leave}
            onSubmitEditing={field.submit}
            inputMode={whole ? 'numeric' : 'decimal'}
            autoComplete="off"
            autoFocus={autoFocus}
            selectTextOnFocus
            unit={unit}
            invalid={field.error !== null}
            aria-label={unit ? `${label}, ${unit}` : label}
            aria-describedby={describedBy(field, hint)}
            aria-required={needed}
          />
        </View>
        {step ? <StepKey icon="plus" label={`${step} more`} onPress={() => stepTo(now + step)} /> : null}
      </View>
    </FieldFrame>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', gap: space[2] },
  fill: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
});
