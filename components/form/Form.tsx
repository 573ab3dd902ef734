import { FormikProvider, type FormikValues, type useFormik } from 'formik';
import { type ReactNode, useEffect, useRef } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { FormNoticeBlock, NoticeContext } from './FormNotice';
import { focusFirstError } from './focusFirstError';
import type { FormNotice } from './useSchemaForm';

type Props<Draft extends FormikValues> = {
  /** What `useSchemaForm` returns. */
  form: ReturnType<typeof useFormik<Draft>>;
  notice: FormNotice | null;
  /** Names the form for a screen reader: "Holding seen". */
  label: string;
  /** Round a whole `Screen` whose dock has the save button; what is refused then stands above that button. */
  page?: boolean;
  children: ReactNode;
};

/** One column of fields. After a refused save the focus moves to the first field with an error. */
export function Form<Draft extends FormikValues>({ form, notice, label, page = false, children }: Props<Draft>) {
  const box = useRef<View>(null);
  const answered = useRef(0);
  const { submitCount, isSubmitting, isValidating, errors } = form;
  useEffect(() => {
    if (submitCount === answered.current || isSubmitting || isValidating) return;
    answered.current = submitCount;
    if (Object.keys(errors).length > 0) focusFirstError(box.current);
  }, [submitCount, isSubmitting, isValidating, errors]);
  return (
    <FormikProvider value={form}>
      <NoticeContext value={page ? notice : null}>
        {/* Round a whole page it is no landmark: the page's own stand inside, and its heading names it. */}
        <View
          ref={box}
          role={page ? undefined : 'form'}
          aria-label={page ? undefined : label}
          style={page ? styles.page : styles.form}
        >
          {children}
          {page ? null : <FormNoticeBlock notice={notice} />}
        </View>
      </NoticeContext>
    </FormikProvider>
  );
}

const styles = StyleSheet.create({
  form: { gap: space[5] },
  page: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minHeight: 0 },
});

/** Fields one under the other inside a page's form. */
export function Fields({ children }: { children: ReactNode }) {
  return <View style={styles.form}>{children}</View>;
}
