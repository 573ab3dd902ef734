import { useRouter } from 'expo-router';
import { useState } from 'react';
import * as z from 'zod/mini';
import { CheckField } from '@/components/form/CheckRow';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { promiseOf } from '@/shared/buyers/promise';
import { orderRequest, type RequestRow } from '@/shared/buyers/requests';
import { chosenLength, promiseWords } from '@/shared/buyers/words';
import { Id } from '@/shared/ids';
import { LOT_WORDS, LOTS } from '@/shared/orders/price';
import { Heads } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { useAct } from './queries';
import { thereOf } from './requestFacts';

const Draft = z.strictObject({
  broodId: Id,
  heads: spelledHeads(Heads),
  lot: z.enum(LOTS, 'Choose how they go'),
  reserve: z.boolean(),
  outOfTurn: z.boolean(),
});

const SOLD = LOTS.filter((lot) => lot !== 'colony');

/** Answers a request with an order: from which brood, how many, held at once. */
export function OrderForm({ request }: { request: RequestRow }) {
  const room = useRoom();
  const router = useRouter();
  const act = useAct();
  const [[orderId, lineId]] = useState(() => [newId(), newId()] as const);
  const { sources, heads, place, version } = request;
  // The brood that can give the most of that length stands first.
  const from = sources
    .filter(({ available }) => available > 0)
    .sort((a, b) => thereOf(b, request) - thereOf(a, request));
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: {
      broodId: from[0]?.broodId ?? '',
      heads: String(heads ?? 1),
      lot: 'single' as const,
      reserve: true,
      outOfTurn: false,
    },
    odd: (draft) => oddOf(draft, request, room.units),
    save: async (draft) => {
      const params = { roomId: room.id, requestId: request.id };
      await act.mutateAsync(() => call(orderRequest, { params, body: { version, orderId, lineId, ...draft } }));
      router.replace(`/r/${room.id}/orders/${orderId}`);
    },
  });
  if (from.length === 0)
    return (
      <Section title="Make an order">
        <Text tone="soft">Nothing of it is available. A letter goes out by itself when fish come free.</Text>
      </Section>
    );
  return (
    <Section title="Make an order">
      <Form form={form} notice={notice} label="Make an order">
        <SelectField
          name="broodId"
          label="From brood"
          options={from.map(({ broodId, code, available }) => ({
            value: broodId,
            code,
            word: '',
            note: `${available} available`,
          }))}
        />
        <NumberField name="heads" label="Fish" whole step={1} least={1} />
        <SelectField
          name="lot"
          label="How they go"
          options={SOLD.map((value) => ({ value, word: value === 'single' ? 'Each by its size' : LOT_WORDS[value] }))}
        />
        <CheckField name="reserve" label="Hold the fish now" note="a letter tells the buyer" />
        {(place ?? 1) > 1 ? <CheckField name="outOfTurn" label="Out of turn: others asked before" /> : null}
        <SubmitButton label="Make order" />
      </Form>
    </Section>
  );
}

/** "6 can’t be promised: only about 4 are there. Make the order nevertheless?" */
function oddOf(
  { broodId, heads }: z.output<typeof Draft>,
  { sources, lengthTenthsMm }: RequestRow,
  units: ReturnType<typeof useRoom>['units'],
): string | null {
  const source = sources.find((one) => one.broodId === broodId);
  if (!source?.size || lengthTenthsMm === null) return null;
  const promised = promiseOf(source.size, source.available, { heads, lengthTenthsMm });
  if (promised.verdict === 'sure') return null;
  return `At ${chosenLength(lengthTenthsMm, units)}: ${promiseWords(promised, heads)} Make the order nevertheless?`;
}
