import { FormikProvider, type FormikValues, type useFormik } from 'formik';
import { type ReactNode, useEffect, useRef } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Notice } from '@/components/ui/Notice';
import { focusFirstError } from './focusFirstError';
import type { FormNotice } from './useSchemaForm';

type Props<Draft extends FormikValues> = {
  /** What `useSchemaForm` returns. */
  form: ReturnType<typeof useFormik<Draft>>;
  notice: FormNotice | null;
  /** Names the form for a screen reader: "Holding seen". */
  label: string;
  children: ReactNode;
};

/** One column of fields. After a refused save the focus moves to the first field with an error. */
export function Form<Draft extends FormikValues>({ form, notice, label, children }: Props<Draft>) {
  const box = useRef<View>(null);
  const answered = useRef(0);
  const { submitCount, isSubmitting, isValidating, errors } = form;
  useEffect(() => {
    if (submitCount === answered.current || isSubmitting || isValidating) return;
    answered.current = submitCount;
    if (Object.keys(errors).length > 0) focusFirstError(box.current);
  }, [submitCount, isSubmitting, isValidating, errors]);
  const whole: unknown = 'form' in errors ? errors['form'] : undefined;
  return (
    <FormikProvider value={form}>
      <View ref={box} role="form" aria-label={label} style={styles.form}>
        {children}
        {typeof whole === 'string' ? <Notice tone="look" words={whole} /> : null}
        {notice ? <Notice tone={notice.kind === 'odd' ? 'look' : 'act'} words={notice.words} alert /> : null}
      </View>
    </FormikProvider>
  );
}

const styles = StyleSheet.create({ form: { gap: space[5] } });
