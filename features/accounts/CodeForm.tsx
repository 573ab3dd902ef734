import type * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { SecondStep } from '@/shared/accounts/security';

type Props = { label: string; save: (value: z.output<typeof SecondStep>) => Promise<void> };

/** What is about to happen needs a code of the authenticator, or a recovery code. */
export function CodeForm({ label, save }: Props) {
  const { form, notice } = useSchemaForm({ schema: SecondStep, start: { code: '' }, save });
  return (
    <Form form={form} notice={notice} label={label}>
      <TextField
        name="code"
        label="Code"
        needed
        mono
        autoComplete="one-time-code"
        autoCapitalize="none"
        hint="The six digits that the authenticator shows now, or a recovery code."
      />
      <SubmitButton label={label} />
    </Form>
  );
}
