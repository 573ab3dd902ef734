import { useState } from 'react';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { formatMoney, spelledMoney } from '@/shared/money';
import { giveBack } from '@/shared/orders/contract';
import type { Payment } from '@/shared/orders/shapes';
import { TypedNote } from '@/shared/shapes';
import { useAct } from './queries';
import { typedAmount } from './sums';

type Props = { orderId: string; payment: Payment; onClose: () => void };

/** All or part of one payment goes back, the way it came. */
export function RefundSheet({ orderId, payment, onClose }: Props) {
  const room = useRoom();
  const act = useAct();
  const [id] = useState(newId);
  const { refundableCents, method } = payment;
  const { form, notice } = useSchemaForm({
    schema: z.strictObject({
      cents: spelledMoney(room.currency),
      because: z.enum(['refund', 'lossCredit'], 'Choose why'),
      note: TypedNote,
    }),
    start: { cents: typedAmount(refundableCents, room.currency), because: 'refund', note: '' },
    save: async (draft) => {
      const body = { id, paymentId: payment.id, ...draft };
      await act.mutateAsync(() => call(giveBack, { params: { roomId: room.id, orderId }, body }));
      onClose();
    },
  });
  return (
    <Sheet open title="Give money back" onClose={onClose}>
      <Form form={form} notice={notice} label="Give money back">
        <NumberField
          name="cents"
          label="Amount"
          unit={room.currency}
          hint={`At most ${formatMoney(refundableCents, room.currency)}`}
        />
        <SegmentedField
          name="because"
          label="Why"
          choices={[
            { value: 'refund', word: 'Order' },
            { value: 'lossCredit', word: 'Fish that died' },
          ]}
        />
        <TextField name="note" label="Note" aside="not needed" />
        <Text size="small" tone="soft">
          {method === 'card'
            ? 'The card service sends it back to the card. The buyer gets a letter.'
            : `Hand it over or transfer it yourself: this books it. The buyer gets a letter.`}
        </Text>
        <SubmitButton label={method === 'card' ? 'Give back by card' : 'Book as given back'} />
      </Form>
    </Sheet>
  );
}
