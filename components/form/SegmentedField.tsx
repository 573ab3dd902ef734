import { type Choice, Segmented } from '@/components/ui/Segmented';
import { FieldFrame } from './FieldFrame';
import { describedBy, useFieldState } from './useFieldState';

type Props<Value extends string> = {
  name: string;
  label: string;
  choices: readonly Choice<Value>[];
  hint?: string;
  /** The label stands above already. */
  quiet?: boolean;
  /** Told as well as stored: to fill in other fields. */
  onPick?: (value: Value) => void;
};

/** Two to four answers side by side. */
export function SegmentedField<Value extends string>({ name, label, choices, hint, quiet, onPick }: Props<Value>) {
  const field = useFieldState(name);
  const value = choices.find((choice) => choice.value === field.value)?.value ?? null;
  return (
    <FieldFrame label={label} hint={hint} field={field} quiet={quiet}>
      <Segmented
        label={label}
        choices={choices}
        value={value}
        onChange={(next) => {
          field.change(next);
          onPick?.(next);
        }}
        invalid={field.error !== null}
        describedBy={describedBy(field, hint)}
      />
    </FieldFrame>
  );
}
