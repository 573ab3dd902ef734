import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Because } from '@/shared/today/contract';
import type { Due } from '@/shared/today/due';
import type { Decision } from './useSettle';

const Draft = z.strictObject({ because: Because });
type Props = { due: Due; save: (decision: Decision) => Promise<void> };

/** Not this time, and why. */
export function SkipWay({ due, save }: Props) {
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { because: '' },
    save: ({ because }) => save({ decision: 'skip', because }),
  });
  const again = due.own?.everyDays || !due.own;
  return (
    <Form form={form} notice={notice} label="Skip">
      <TextField
        name="because"
        label="Why not"
        needed
        maxLength={200}
        hint={again ? 'Only this once: it comes back at its time.' : 'It leaves the list for good.'}
      />
      <SubmitButton label="Skip it" />
    </Form>
  );
}
