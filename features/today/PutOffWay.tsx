import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { useRoom } from '@/hooks/useRoom';
import { addDays, DayText } from '@/shared/days';
import type { Due } from '@/shared/today/due';
import type { Decision } from './useSettle';

const Draft = z.strictObject({ until: DayText });
type Props = { due: Due; save: (decision: Decision) => Promise<void> };

/** Out of the list until a day. */
export function PutOffWay({ due, save }: Props) {
  const { today } = useRoom();
  const tomorrow = addDays(today, 1);
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { until: due.dueOn >= tomorrow ? addDays(due.dueOn, 1) : tomorrow },
    save: ({ until }) => save({ decision: 'snooze', until }),
  });
  return (
    <Form form={form} notice={notice} label="Put off">
      <DateField
        name="until"
        label="Until"
        today={today}
        earliest={tomorrow}
        latest={null}
        choices={[
          { word: 'Tomorrow', day: tomorrow },
          { word: 'In 3 days', day: addDays(today, 3) },
          { word: 'In a week', day: addDays(today, 7) },
        ]}
      />
      <SubmitButton label="Put off" />
    </Form>
  );
}
