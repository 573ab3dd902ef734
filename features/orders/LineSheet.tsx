import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Sheet } from '@/components/ui/Sheet';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { spelledMoney } from '@/shared/money';
import { changeLine } from '@/shared/orders/contract';
import type { OrderLine, OrderRow } from '@/shared/orders/shapes';
import { Heads } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { useAct } from './queries';
import { typedAmount } from './sums';

type Props = { order: OrderRow; line: OrderLine; onClose: () => void };

/** Another number of fish, or the owner's own price; an unchanged price follows the list. */
export function LineSheet({ order, line, onClose }: Props) {
  const room = useRoom();
  const act = useAct();
  const before = typedAmount(line.cents ?? 0, room.currency);
  const { form, notice } = useSchemaForm({
    schema: z.strictObject({ heads: spelledHeads(Heads), cents: spelledMoney(room.currency) }),
    start: { heads: String(line.heads), cents: before },
    save: async ({ heads, cents }) => {
      const own = cents !== line.cents || heads === line.heads;
      const params = { roomId: room.id, orderId: order.id, lineId: line.id };
      const body = { version: order.version, heads, cents: own ? cents : null };
      await act.mutateAsync(() => call(changeLine, { params, body }));
      onClose();
    },
  });
  return (
    <Sheet open title={`Line of ${line.code}`} onClose={onClose}>
      <Form form={form} notice={notice} label="Line">
        <NumberField name="heads" label="Fish" whole step={1} least={1} />
        <NumberField
          name="cents"
          label="Price of the line"
          unit={room.currency}
          hint="Left as it is, the price follows the list when the number changes."
        />
        <SubmitButton label="Save line" />
      </Form>
    </Sheet>
  );
}
