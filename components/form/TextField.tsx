import { FieldFrame } from './FieldFrame';
import { InputBox, type InputBoxProps } from './InputBox';
import { describedBy, useFieldState } from './useFieldState';

export type TextFieldProps = Pick<
  InputBoxProps,
  | 'autoComplete'
  | 'inputMode'
  | 'placeholder'
  | 'autoFocus'
  | 'autoCapitalize'
  | 'maxLength'
  | 'unit'
  | 'mono'
  | 'end'
  | 'enterKeyHint'
  | 'secureTextEntry'
> & {
  /** Path in the draft. */
  name: string;
  label: string;
  hint?: string;
  aside?: string;
  /** Several lines: notes. */
  long?: boolean;
  /** Must be filled; said to a screen reader. */
  needed?: boolean;
};

/** A line of text, or a note of several. Enter saves. */
export function TextField({ name, label, hint, aside, long = false, needed, ...input }: TextFieldProps) {
  const field = useFieldState(name);
  return (
    <FieldFrame label={label} hint={hint} aside={aside} field={field}>
      <InputBox
        {...input}
        value={field.text}
        onChangeText={field.change}
        onBlur={field.leave}
        onSubmitEditing={long ? undefined : field.submit}
        multiline={long}
        invalid={field.error !== null}
        aria-label={label}
        aria-describedby={describedBy(field, hint)}
        aria-required={needed}
      />
    </FieldFrame>
  );
}
