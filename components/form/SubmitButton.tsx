import { useFormikContext } from 'formik';
import { use } from 'react';
import { Button } from '@/components/ui/Button';
import type { IconName } from '@/components/ui/iconMarks';
import { FormNoticeBlock, NoticeContext } from './FormNotice';

type Props = {
  /** Names the record: "Save hold". */
  label: string;
  icon?: IconName;
  busyLabel?: string;
  disabledBecause?: string | null;
  /** A text or plain button for a second way to save. */
  kind?: 'primary' | 'plain';
};

/** Saves the form it stands in; busy until the screen is true again. Full width. */
export function SubmitButton({ label, icon, busyLabel, disabledBecause, kind = 'primary' }: Props) {
  const { isSubmitting, submitForm } = useFormikContext();
  const notice = use(NoticeContext);
  return (
    <>
      {notice ? <FormNoticeBlock notice={notice} /> : null}
      <Button
        label={label}
        icon={icon}
        kind={kind}
        grow
        busy={isSubmitting}
        busyLabel={busyLabel}
        disabledBecause={disabledBecause}
        onPress={() => void submitForm()}
      />
    </>
  );
}
