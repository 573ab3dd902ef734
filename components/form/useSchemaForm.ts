import { type FormikErrors, type FormikValues, prepareDataForValidation, setIn, useFormik } from 'formik';
import { useRef, useState } from 'react';
import * as z from 'zod/mini';
import { Refusal } from '@/shared/refusal';
import { zodAsYup } from './zodAsYup';

/** What stands above the save button: a refusal, or a question about an odd but possible value. */
export type FormNotice = { kind: 'refused' | 'odd'; words: string };

type Options<Value, Draft extends FormikValues> = {
  /** The draft's shape: texts as typed in, the stored value out. */
  schema: z.core.$ZodType<Value, Draft>;
  start: Draft;
  /** Usually a mutation's `mutateAsync`. A `Refusal` it throws lands on its fields. */
  save: (value: Value) => Promise<unknown>;
  /** Asked once before saving: "82 mm is far above the others. Keep it?" Null when nothing is odd. */
  odd?: (value: Value) => string | null;
};

const NO_SIGNAL = 'No signal. What you typed is still here: try again when the connection is back.';
const BROKEN = 'That did not work, and the fault is ours. What you typed is still here: try again.';

/** Draft in, value out, refusals on their fields. */
export function useSchemaForm<Value, Draft extends FormikValues>({ schema, start, save, odd }: Options<Value, Draft>) {
  const [notice, setNotice] = useState<FormNotice | null>(null);
  const answered = useRef<string | null>(null);
  const form = useFormik<Draft>({
    initialValues: start,
    validationSchema: zodAsYup(schema),
    validateOnBlur: false,
    onSubmit: async (draft, helpers) => {
      // Formik blanks '' to undefined when it validates but not when it submits.
      const value = await z.parseAsync(schema, prepareDataForValidation(draft));
      const question = odd?.(value) ?? null;
      if (question !== null && question !== answered.current) {
        answered.current = question;
        setNotice({ kind: 'odd', words: question });
        return;
      }
      setNotice(null);
      try {
        await save(value);
      } catch (error) {
        // Thrown by the browser's only fetch when there is no answer at all.
        const noSignal = error instanceof Error && error.name === 'Unreachable';
        setNotice({ kind: 'refused', words: noSignal ? NO_SIGNAL : error instanceof Refusal ? error.message : BROKEN });
        if (noSignal) return;
        if (!(error instanceof Refusal)) throw error;
        helpers.setErrors(nested<Draft>(error.fields));
      }
    },
  });
  return { form, notice };
}

/** `'sires.0.weight'` becomes an error at that place of the draft. */
function nested<Draft>(fields: Record<string, string>): FormikErrors<Draft> {
  let errors: FormikErrors<Draft> = {};
  for (const [path, message] of Object.entries(fields)) errors = setIn(errors, path, message);
  return errors;
}
