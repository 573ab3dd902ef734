import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Sheet } from '@/components/ui/Sheet';
import { Invite } from '@/shared/members/contract';
import type { Role } from '@/shared/roles';
import { useMemberChanges } from './queries';
import { RoleField } from './RoleField';

/** An address and a role; the rest is in the letter. */
export function InviteSheet({ open, onClose }: { open: boolean; onClose: () => void }) {
  return (
    <Sheet open={open} title="Invite a member" onClose={onClose}>
      <InviteForm onSent={onClose} />
    </Sheet>
  );
}

const START: { email: string; role: Role } = { email: '', role: 'keeper' };

function InviteForm({ onSent }: { onSent: () => void }) {
  const { invite } = useMemberChanges();
  const { form, notice } = useSchemaForm({
    schema: Invite,
    start: START,
    save: async (body) => {
      await invite.mutateAsync(body);
      onSent();
    },
  });
  return (
    <Form form={form} notice={notice} label="Invite a member">
      <TextField
        name="email"
        label="Email"
        needed
        inputMode="email"
        autoComplete="off"
        autoCapitalize="none"
        hint="A letter with a link goes there. With or without an account, it works for both."
      />
      <RoleField role={form.values.role} />
      <SubmitButton label="Send the invitation" busyLabel="Sending" />
    </Form>
  );
}
