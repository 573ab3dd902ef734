import { useState } from 'react';
import * as z from 'zod/mini';
import { CheckField } from '@/components/form/CheckRow';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { formatMoney } from '@/shared/money';
import { handOver, type OrderPage } from '@/shared/orders/contract';
import { HeadsOrNone } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { useAct } from './queries';

/** The fish leave: from which tanks, with sheets, and what is paid at the door. */
export function HandOverSheet({ told, onClose }: { told: OrderPage; onClose: () => void }) {
  const room = useRoom();
  const act = useAct();
  const [paymentId] = useState(newId);
  const { order } = told;
  const takes = takesOf(told);
  const toPay = order.toPayCents ?? 0;
  const { form, notice } = useSchemaForm({
    schema: z.strictObject({
      how: z.enum(['collect', 'send'], 'Choose collected or sent'),
      heads: z.array(spelledHeads(HeadsOrNone)),
      issueSheets: z.boolean(),
      paid: z.enum(['no', 'cash', 'transfer'], 'Choose whether it is paid'),
    }),
    start: {
      how: 'collect',
      heads: takes.map(({ heads }) => String(heads)),
      issueSheets: true,
      paid: toPay > 0 ? 'cash' : 'no',
    },
    save: async ({ how, heads, issueSheets, paid }) => {
      const catches = takes
        .map(({ lineId, batchId }, i) => ({ lineId, batchId, heads: heads[i] ?? 0 }))
        .filter((one) => one.heads > 0);
      const money = paid === 'no' || toPay === 0 ? null : { id: paymentId, method: paid, cents: toPay };
      const body = { version: order.version, how, catches, issueSheets, paid: money };
      await act.mutateAsync(() => call(handOver, { params: { roomId: room.id, orderId: order.id }, body }));
      onClose();
    },
  });
  return (
    <Sheet open title={`Hand over order ${order.number}`} onClose={onClose}>
      <Form form={form} notice={notice} label="Hand over">
        <SegmentedField
          name="how"
          label="How they leave"
          choices={[
            { value: 'collect', word: 'Collected' },
            { value: 'send', word: 'Sent' },
          ]}
        />
        {takes.map(({ key, code, tank, balance }, i) => (
          <NumberField
            key={key}
            name={`heads.${i}`}
            label={`${code} from ${tank}`}
            unit="fish"
            aside={`${balance} there`}
            whole
            step={1}
          />
        ))}
        {toPay > 0 ? (
          <SegmentedField
            name="paid"
            label={`${formatMoney(toPay, room.currency)} at the door`}
            choices={[
              { value: 'cash', word: 'Cash' },
              { value: 'transfer', word: 'Transfer' },
              { value: 'no', word: 'Later' },
            ]}
          />
        ) : null}
        <CheckField name="issueSheets" label="Issue the lineage sheets" />
        <Text size="small" tone="soft">
          Heads, sheets, receipt and money are booked together. A death in the bag is booked later, as a loss.
        </Text>
        <SubmitButton label="Hand over" />
      </Form>
    </Sheet>
  );
}

/** The tanks of each line's brood, with what is proposed from each. */
const takesOf = ({ order, catches }: OrderPage) =>
  catches.flatMap(({ lineId, tanks }) =>
    tanks.flatMap(({ batchId, tank, balance, heads }) =>
      batchId
        ? [
            {
              key: `${lineId} ${batchId}`,
              lineId,
              batchId,
              balance,
              heads,
              tank: tank?.code ?? 'no tank',
              code: order.lines.find(({ id }) => id === lineId)?.code ?? '',
            },
          ]
        : [],
    ),
  );
