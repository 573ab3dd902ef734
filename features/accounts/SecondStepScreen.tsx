import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { TextLink } from '@/components/ui/TextLink';
import { SecondStep } from '@/shared/accounts/security';
import { DoorFrame } from './DoorFrame';
import { useDoor } from './door';

/** The code of the authenticator, after the password or the link. */
export function SecondStepScreen({ next }: { next: string | undefined }) {
  const door = useDoor(next);
  const { form, notice } = useSchemaForm({ schema: SecondStep, start: { code: '' }, save: door.byCode });
  return (
    <DoorFrame title="One more step" words="Type the six digits that your authenticator shows now, or a recovery code.">
      <Form form={form} notice={notice} label="Code">
        <TextField name="code" label="Code" needed mono autoFocus autoComplete="one-time-code" autoCapitalize="none" />
        <SubmitButton label="Sign in" busyLabel="Signing in" />
      </Form>
      <TextLink label="Begin again" href="/sign-in" />
    </DoorFrame>
  );
}
