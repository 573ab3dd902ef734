import { useState } from 'react';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Sheet } from '@/components/ui/Sheet';
import { call } from '@/features/call';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { DayText } from '@/shared/days';
import { spelledMoney } from '@/shared/money';
import { type OrderPage, recordPayment } from '@/shared/orders/contract';
import { TypedNote } from '@/shared/shapes';
import { useAct } from './queries';
import { typedAmount } from './sums';

/** Cash or a bank transfer, as it arrived. */
export function PaymentSheet({ told: { order, owner }, onClose }: { told: OrderPage; onClose: () => void }) {
  const room = useRoom();
  const act = useAct();
  const [id] = useState(newId);
  const deposit = order.state === 'depositAsked' ? (owner?.depositCents ?? null) : null;
  const { form, notice } = useSchemaForm({
    schema: z.strictObject({
      method: z.enum(['cash', 'transfer'], 'Choose cash or bank transfer'),
      cents: spelledMoney(room.currency),
      onDay: DayText,
      note: TypedNote,
    }),
    start: {
      method: 'transfer',
      cents: typedAmount(deposit ?? order.toPayCents ?? 0, room.currency),
      onDay: room.today,
      note: '',
    },
    save: async (draft) => {
      const kind = deposit === null ? ('balance' as const) : ('deposit' as const);
      await act.mutateAsync(() =>
        call(recordPayment, { params: { roomId: room.id, orderId: order.id }, body: { id, kind, ...draft } }),
      );
      onClose();
    },
  });
  return (
    <Sheet open title={deposit === null ? 'Book a payment' : 'Book the deposit'} onClose={onClose}>
      <Form form={form} notice={notice} label="Payment">
        <SegmentedField
          name="method"
          label="How it came"
          choices={[
            { value: 'transfer', word: 'Bank transfer' },
            { value: 'cash', word: 'Cash' },
          ]}
        />
        <NumberField name="cents" label="Amount" unit={room.currency} />
        <DateField name="onDay" label="On" today={room.today} />
        <TextField name="note" label="Note" aside="not needed" />
        <SubmitButton label="Book payment" />
      </Form>
    </Sheet>
  );
}
