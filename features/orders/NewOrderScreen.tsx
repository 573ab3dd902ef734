import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { CheckField } from '@/components/form/CheckRow';
import { Fields, Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { call } from '@/features/call';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { Id } from '@/shared/ids';
import { addBuyerName } from '@/shared/orders/buyerNames';
import { addOrder } from '@/shared/orders/contract';
import { ORDER_WAY_WORDS, ORDER_WAYS } from '@/shared/orders/state';
import { Heads, TypedNote, typedLine } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { broodsToSellQuery, buyerNamesQuery, useAct } from './queries';

const LineDraft = z.strictObject({ id: Id, broodId: Id, heads: spelledHeads(Heads) });

const Draft = z.strictObject({
  buyerId: Id,
  email: typedLine(254),
  way: z.enum(ORDER_WAYS, 'Choose how the fish go'),
  lines: z.array(LineDraft),
  note: TypedNote,
  reserve: z.boolean(),
});

type Line = z.input<typeof LineDraft>;
const emptyLine = (): Line => ({ id: newId(), broodId: '', heads: '1' });

/** Somebody asks at the door or by telephone: who, which fish, and whether they are held at once. */
export function NewOrderScreen() {
  const room = useRoom();
  const router = useRouter();
  const act = useAct();
  const [orderId] = useState(newId);
  const [fresh, setFresh] = useState<{ id: string; name: string } | null>(null);
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { buyerId: '', email: '', way: 'sale', lines: [emptyLine()], note: '', reserve: true },
    save: async ({ email, lines, ...facts }) => {
      const params = { roomId: room.id };
      await act.mutateAsync(async () => {
        if (fresh?.id === facts.buyerId) await call(addBuyerName, { params, body: { ...fresh, email } });
        // Kept from here on: a second try must not make the buyer again.
        setFresh(null);
        const told = lines.map((line) => ({ ...line, fishId: null, lot: 'single' as const, note: null }));
        await call(addOrder, { params, body: { id: orderId, requestId: null, ...facts, lines: told } });
      });
      router.replace(`/r/${room.id}/orders/${orderId}`);
    },
  });
  const pickNew = (name: string) => {
    const id = newId();
    setFresh({ id, name });
    void form.setFieldValue('buyerId', id);
  };
  const setLines = (lines: Line[]) => void form.setFieldValue('lines', lines);
  return (
    <Form form={form} notice={notice} label="New order" page>
      <Screen
        title="New order"
        close={{ label: 'Close New order', onPress: () => router.back() }}
        dock={<SubmitButton label={form.values.reserve ? 'Reserve the fish' : 'Save order'} />}
        low
        measure
      >
        <Fields>
          <BuyerFields fresh={fresh} onNew={pickNew} />
          <Section title="Fish" aside={form.values.lines.length > 1 ? `${form.values.lines.length} lines` : undefined}>
            <View style={{ gap: space[4] }}>
              {form.values.lines.map(({ id }, i) => (
                <LineFields key={id} index={i} />
              ))}
              <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
                <Button
                  small
                  icon="plus"
                  label="Another brood"
                  onPress={() => setLines([...form.values.lines, emptyLine()])}
                />
                {form.values.lines.length > 1 ? (
                  <Button small label="Leave the last out" onPress={() => setLines(form.values.lines.slice(0, -1))} />
                ) : null}
              </View>
            </View>
          </Section>
          <SegmentedField
            name="way"
            label="How they go"
            choices={ORDER_WAYS.map((value) => ({ value, word: ORDER_WAY_WORDS[value] }))}
          />
          <TextField
            name="note"
            label="Note"
            aside="not needed"
            hint="For the fishroom; the buyer does not see it."
            long
          />
          <CheckField name="reserve" label="Hold the fish now" />
        </Fields>
      </Screen>
    </Form>
  );
}

type BuyerProps = { fresh: { id: string; name: string } | null; onNew: (name: string) => void };

function BuyerFields({ fresh, onNew }: BuyerProps) {
  const room = useRoom();
  const { data: buyers = [] } = useQuery(buyerNamesQuery(room.id));
  const known = buyers.map(({ id, name, email }) => ({ value: id, word: name, note: email ?? 'no address' }));
  return (
    <>
      <SelectField
        name="buyerId"
        label="Buyer"
        options={fresh ? [{ value: fresh.id, word: fresh.name, note: 'new' }, ...known] : known}
        onNew={onNew}
        newWord={(name) => `Add ${name} as a buyer`}
      />
      {fresh ? (
        <TextField
          name="email"
          label={`Email of ${fresh.name}`}
          aside="not needed"
          inputMode="email"
          autoCapitalize="none"
          hint="Without one no letters go out."
        />
      ) : null}
    </>
  );
}

function LineFields({ index }: { index: number }) {
  const room = useRoom();
  const { data: broods = [] } = useQuery(broodsToSellQuery(room.id));
  const options = broods.map(({ id, code, displayName, available }) => ({
    value: id,
    code,
    word: displayName ?? '',
    italic: true,
    note: `${available} available`,
  }));
  return (
    <View style={{ gap: space[3] }}>
      <SelectField name={`lines.${index}.broodId`} label="Brood" options={options} />
      <NumberField name={`lines.${index}.heads`} label="Fish" whole step={1} least={1} />
    </View>
  );
}
