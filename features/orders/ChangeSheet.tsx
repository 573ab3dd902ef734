import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Sheet } from '@/components/ui/Sheet';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { spelledMoney } from '@/shared/money';
import { changeOrder, type OrderPage } from '@/shared/orders/contract';
import { TypedNote } from '@/shared/shapes';
import { useAct } from './queries';
import { typedAmount } from './sums';

export function ChangeSheet({ told: { order, owner, note }, onClose }: { told: OrderPage; onClose: () => void }) {
  const room = useRoom();
  const act = useAct();
  const { form, notice } = useSchemaForm({
    schema: z.strictObject({ discountCents: spelledMoney(room.currency), note: TypedNote }),
    start: { discountCents: typedAmount(owner?.discountCents ?? 0, room.currency), note: note ?? '' },
    save: async (draft) => {
      const body = { version: order.version, ...draft };
      await act.mutateAsync(() => call(changeOrder, { params: { roomId: room.id, orderId: order.id }, body }));
      onClose();
    },
  });
  return (
    <Sheet open title="Discount and note" onClose={onClose}>
      <Form form={form} notice={notice} label="Discount and note">
        <NumberField name="discountCents" label="Discount" unit={room.currency} />
        <TextField
          name="note"
          label="Note"
          aside="not needed"
          hint="For the fishroom; the buyer does not see it."
          long
        />
        <SubmitButton label="Save order" />
      </Form>
    </Sheet>
  );
}
