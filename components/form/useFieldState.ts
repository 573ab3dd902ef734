import { getIn, useFormikContext } from 'formik';
import { useId } from 'react';

/** A field by its path in the draft: "length", "sires.0.weight". */
export function useFieldState(name: string) {
  const form = useFormikContext<Record<string, unknown>>();
  const id = useId();
  const value: unknown = getIn(form.values, name);
  const problem: unknown = getIn(form.errors, name);
  const seen = form.submitCount > 0 || getIn(form.touched, name) === true;
  const error = seen && typeof problem === 'string' ? problem : null;
  return {
    value,
    text: typeof value === 'string' ? value : typeof value === 'number' ? String(value) : '',
    error,
    labelId: `${id}label`,
    hintId: `${id}hint`,
    errorId: `${id}error`,
    change: (next: unknown) => void form.setFieldValue(name, next),
    /** Left: from now on its error shows while typing. */
    leave: () => void form.setFieldTouched(name, true, true),
    submit: () => void form.submitForm(),
  };
}

export type FieldState = ReturnType<typeof useFieldState>;

/** What a control passes on so that its label, hint and error are read with it. */
export function describedBy(field: FieldState, hint: string | undefined): string | undefined {
  const ids = [hint ? field.hintId : null, field.error ? field.errorId : null].filter((id) => id !== null);
  return ids.length > 0 ? ids.join(' ') : undefined;
}
