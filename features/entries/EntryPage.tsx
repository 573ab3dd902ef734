import type { FormikValues } from 'formik';
import type { ReactNode } from 'react';
import { Fields, Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { useRoom } from '@/hooks/useRoom';
import { dayOf, fromToday } from '@/shared/days';
import type { useEntryForm } from './useEntryForm';

type Props<Value, Draft extends FormikValues> = {
  entry: ReturnType<typeof useEntryForm<Value, Draft>>;
  /** Where: colony, tank, species. */
  subtitle?: ReactNode;
  /** Names the record: "Save hold". */
  saveLabel: string;
  cannotSaveBecause?: string | null;
  /** In place of the fields while a conflict is to be settled; its own buttons stand in the dock. */
  clash?: { fields: ReactNode; dock: ReactNode } | null;
  children: ReactNode;
};

/** The page of a Record form: one column, the save button where the thumb is, a draft that outlives the page. */
export function EntryPage<Value, Draft extends FormikValues>(props: Props<Value, Draft>) {
  const { entry, subtitle, saveLabel, cannotSaveBecause, clash, children } = props;
  return (
    <Form form={entry.form} notice={entry.notice} label={entry.title} page>
      <Screen
        title={entry.title}
        subtitle={subtitle}
        close={{ label: entry.closeLabel, onPress: entry.close }}
        dock={clash ? clash.dock : <SubmitButton label={saveLabel} disabledBecause={cannotSaveBecause} />}
        low
        measure
      >
        {clash ? (
          clash.fields
        ) : (
          <>
            {entry.found ? <DraftNotice at={entry.found.at} startOver={entry.startOver} /> : null}
            <Fields>{children}</Fields>
          </>
        )}
      </Screen>
    </Form>
  );
}

function DraftNotice({ at, startOver }: { at: string; startOver: () => void }) {
  const room = useRoom();
  const when = fromToday(dayOf(Date.parse(at), room.timeZone), room.today);
  return (
    <Notice words={`Your draft from ${when}, not saved yet.`}>
      <Button label="Start over" small onPress={startOver} />
    </Notice>
  );
}
