import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { formatMoney } from '@/shared/money';
import { cancelOrder, type OrderPage } from '@/shared/orders/contract';
import { line } from '@/shared/shapes';
import { useAct } from './queries';

const Draft = z.strictObject({ because: line(300, 'Say why it is cancelled') });

/** The fish are free at once; money goes back by a step of its own, for the owner decides how much. */
export function CancelSheet({ told: { order, owner }, onClose }: { told: OrderPage; onClose: () => void }) {
  const room = useRoom();
  const act = useAct();
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { because: '' },
    save: async ({ because }) => {
      const body = { version: order.version, because };
      await act.mutateAsync(() => call(cancelOrder, { params: { roomId: room.id, orderId: order.id }, body }));
      onClose();
    },
  });
  const paid = owner?.receivedCents ?? 0;
  return (
    <Sheet open title={`Cancel order ${order.number}`} onClose={onClose}>
      <Form form={form} notice={notice} label="Cancel order">
        <TextField name="because" label="Why?" hint="The buyer reads this." autoFocus />
        <Text size="small" tone="soft">
          {paid > 0
            ? `${formatMoney(paid, room.currency)} was paid. Give it back, or part of it, under Payments afterwards.`
            : 'Nothing was paid. The fish are available again at once.'}
        </Text>
        <SubmitButton label="Cancel order" />
      </Form>
    </Sheet>
  );
}
