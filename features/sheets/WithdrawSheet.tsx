import { View } from 'react-native';
import * as z from 'zod/mini';
import { CheckField } from '@/components/form/CheckRow';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { line } from '@/shared/shapes';
import type { SheetRow } from '@/shared/sheets/contract';
import { useWithdrawSheet } from './queries';

const Draft = z.strictObject({ because: line(200, 'Say why it is withdrawn'), revokeLink: z.boolean() });

/** A sheet that should not count any more: its page keeps saying so, or is closed altogether. */
export function WithdrawSheet({ row, onClose }: { row: SheetRow; onClose: () => void }) {
  const withdraw = useWithdrawSheet(row.id);
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { because: '', revokeLink: false },
    save: async (draft) => {
      await withdraw.mutateAsync(draft);
      onClose();
    },
  });
  return (
    <Sheet open onClose={onClose} title={`Withdraw ${row.number}?`}>
      <Form form={form} notice={notice} label={`Withdraw ${row.number}`}>
        <View style={{ gap: space[4] }}>
          <Text tone="soft">
            This cannot be taken back. The paper that the buyer has stays; its check page will say that it is withdrawn,
            and why.
          </Text>
          <TextField name="because" label="Why" />
          <CheckField name="revokeLink" label="Close its check page too" note="then nobody can read it there" />
          <SubmitButton label="Withdraw it" />
        </View>
      </Form>
    </Sheet>
  );
}
