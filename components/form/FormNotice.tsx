import { getIn, useFormikContext } from 'formik';
import { createContext } from 'react';
import { Notice } from '@/components/ui/Notice';
import type { FormNotice } from './useSchemaForm';

/** Set where the notice belongs into the dock, above the save button. */
export const NoticeContext = createContext<FormNotice | null>(null);

/** What was refused as a whole, or asked about an odd value. Errors of fields stand under their fields. */
export function FormNoticeBlock({ notice }: { notice: FormNotice | null }) {
  const { errors, submitCount } = useFormikContext();
  const whole: unknown = getIn(errors, 'form');
  return (
    <>
      {typeof whole === 'string' && submitCount > 0 ? <Notice tone="look" words={whole} alert /> : null}
      {notice ? <Notice tone={notice.kind === 'odd' ? 'look' : 'act'} words={notice.words} alert /> : null}
    </>
  );
}
