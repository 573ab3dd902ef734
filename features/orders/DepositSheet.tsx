import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { formatMoney, spelledMoney } from '@/shared/money';
import { moveOrder, type OrderPage } from '@/shared/orders/contract';
import { useAct } from './queries';
import { typedAmount } from './sums';

/** How much to ask before the fish are kept for good. */
export function DepositSheet({ told: { order, owner }, onClose }: { told: OrderPage; onClose: () => void }) {
  const room = useRoom();
  const act = useAct();
  const { form, notice } = useSchemaForm({
    schema: z.strictObject({ depositCents: spelledMoney(room.currency) }),
    start: { depositCents: typedAmount(owner?.proposedDepositCents ?? 0, room.currency) },
    save: async ({ depositCents }) => {
      const body = { version: order.version, move: 'askDeposit' as const, depositCents };
      await act.mutateAsync(() => call(moveOrder, { params: { roomId: room.id, orderId: order.id }, body }));
      onClose();
    },
  });
  return (
    <Sheet open title="Ask for the deposit" onClose={onClose}>
      <Form form={form} notice={notice} label="Deposit">
        <NumberField name="depositCents" label="Deposit" unit={room.currency} autoFocus />
        <Text size="small" tone="soft">
          {`Of ${formatMoney(order.totalCents ?? 0, room.currency)}. The buyer gets a letter with a link to pay.`}
        </Text>
        <SubmitButton label="Ask for the deposit" />
      </Form>
    </Sheet>
  );
}
