import { useState } from 'react';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Sheet } from '@/components/ui/Sheet';
import { useRoom } from '@/hooks/useRoom';
import type { MemberLine } from '@/shared/members/contract';
import { ROLES } from '@/shared/roles';
import { useMemberChanges } from './queries';
import { RoleField } from './RoleField';

const RoleForm = z.strictObject({ role: z.enum(ROLES, 'Choose a role') });

/** Another role for a member, or none. */
export function MemberSheet({ member, onClose }: { member: MemberLine; onClose: () => void }) {
  const { accountId } = useRoom();
  const { setRole } = useMemberChanges();
  const { form, notice } = useSchemaForm({
    schema: RoleForm,
    start: { role: member.role },
    save: async ({ role }) => {
      await setRole.mutateAsync({ accountId: member.accountId, role, version: member.version });
      onClose();
    },
  });
  return (
    <Sheet open title={member.name} onClose={onClose}>
      <Form form={form} notice={notice} label={`Role of ${member.name}`}>
        <RoleField role={form.values.role} />
        <SubmitButton label="Save role" />
        {member.accountId === accountId ? null : <Remove member={member} onDone={onClose} />}
      </Form>
    </Sheet>
  );
}

/** Asked once more: whoever is removed is out at once. */
function Remove({ member, onDone }: { member: MemberLine; onDone: () => void }) {
  const [asking, setAsking] = useState(false);
  const { remove } = useMemberChanges();
  if (!asking) return <Button kind="text" small label="Remove from the fishroom" onPress={() => setAsking(true)} />;
  return (
    <Notice
      tone={remove.error ? 'act' : 'look'}
      alert
      title={`Remove ${member.name}?`}
      words={remove.error?.message ?? 'Out at once. What was recorded stays, under the same name.'}
    >
      <Button
        small
        label={`Remove ${member.name}`}
        busy={remove.isPending}
        busyLabel="Removing"
        onPress={() => remove.mutate(member.accountId, { onSuccess: onDone })}
      />
      <Button small kind="text" label="Keep" onPress={() => setAsking(false)} />
    </Notice>
  );
}
