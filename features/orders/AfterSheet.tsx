import { useState } from 'react';
import * as z from 'zod/mini';
import { CheckField } from '@/components/form/CheckRow';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { newId } from '@/features/entries';
import { useTanks } from '@/features/entries/tanks';
import { useRoom } from '@/hooks/useRoom';
import { Id } from '@/shared/ids';
import { bookLoss, type OrderPage, returnFish } from '@/shared/orders/contract';
import { Heads, TypedNote } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { useAct } from './queries';

type Props = { told: OrderPage; what: 'returned' | 'lost'; onClose: () => void };

const linesOf = ({ order }: OrderPage) =>
  order.lines.map(({ id, code, heads }) => ({ value: id, word: `${heads} fish`, code }));

/** What happened to fish that had left. */
export function AfterSheet({ what, ...props }: Props) {
  return what === 'returned' ? <Returned {...props} /> : <Lost {...props} />;
}

function Returned({ told, onClose }: Omit<Props, 'what'>) {
  const room = useRoom();
  const act = useAct();
  const [id] = useState(newId);
  const { data: tanks = [] } = useTanks();
  const { form, notice } = useSchemaForm({
    schema: z.strictObject({ lineId: Id, heads: spelledHeads(Heads), tankId: Id, note: TypedNote }),
    start: { lineId: told.order.lines[0]?.id ?? '', heads: '1', tankId: '', note: '' },
    save: async (draft) => {
      const body = { id, onDay: room.today, ...draft };
      await act.mutateAsync(() => call(returnFish, { params: { roomId: room.id, orderId: told.order.id }, body }));
      onClose();
    },
  });
  const quarantine = tanks.filter(({ purpose }) => purpose === 'quarantine');
  return (
    <Sheet open title="Fish came back" onClose={onClose}>
      <Form form={form} notice={notice} label="Fish came back">
        <SelectField name="lineId" label="Which" options={linesOf(told)} />
        <NumberField name="heads" label="How many" whole step={1} least={1} />
        <SelectField
          name="tankId"
          label="Quarantine tank"
          options={quarantine.map((tank) => ({ value: tank.id, code: tank.code, word: tank.place ?? '' }))}
          hint={
            quarantine.length === 0
              ? 'No tank is set up for quarantine. Make one under Tanks.'
              : 'They stay apart, and are not available.'
          }
        />
        <TextField name="note" label="Why" aside="not needed" />
        <SubmitButton label="Take them back" />
      </Form>
    </Sheet>
  );
}

function Lost({ told, onClose }: Omit<Props, 'what'>) {
  const room = useRoom();
  const act = useAct();
  const { form, notice } = useSchemaForm({
    schema: z.strictObject({ lineId: Id, heads: spelledHeads(Heads), beyondTerms: z.boolean() }),
    start: { lineId: told.order.lines[0]?.id ?? '', heads: '1', beyondTerms: false },
    save: async (body) => {
      await act.mutateAsync(() => call(bookLoss, { params: { roomId: room.id, orderId: told.order.id }, body }));
      onClose();
    },
  });
  return (
    <Sheet open title="Fish died on the way" onClose={onClose}>
      <Form form={form} notice={notice} label="Fish died on the way">
        <SelectField name="lineId" label="Which" options={linesOf(told)} />
        <NumberField name="heads" label="How many" whole step={1} least={1} />
        <CheckField name="beyondTerms" label="Make it good though it is later than the terms say" />
        <Text size="small" tone="soft">
          Money for them goes back under Payments.
        </Text>
        <SubmitButton label="Book the loss" />
      </Form>
    </Sheet>
  );
}
