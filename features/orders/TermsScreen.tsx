import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { changeTerms } from '@/shared/orders/contract';
import { OrderTerms, termsText } from '@/shared/orders/terms';
import { TypedNote } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';
import { termsQuery, useAct } from './queries';

const { holdDays, depositPercent, lossDays } = OrderTerms.shape;
const Draft = z.strictObject({
  holdDays: spelledHeads(holdDays),
  depositPercent: spelledHeads(depositPercent),
  lossDays: spelledHeads(lossDays),
  words: TypedNote,
  bank: TypedNote,
});

/** What the fishroom promises its buyers, and how they pay. */
export function TermsScreen() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(termsQuery(room.id));
  return (
    <Screen title="Orders" back={`/r/${room.id}/settings`} measure>
      {data ? (
        <TermsForm terms={data.terms} cards={data.cards} />
      ) : error ? (
        <ErrorState title="The terms could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the terms" rows={4} />
      )}
    </Screen>
  );
}

function TermsForm({ terms, cards }: { terms: OrderTerms; cards: boolean }) {
  const { id: roomId } = useRoom();
  const act = useAct();
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: z.encode(Draft, terms),
    save: (body) => act.mutateAsync(() => call(changeTerms, { params: { roomId }, body })),
  });
  const draft = Draft.safeParse(form.values);
  return (
    <View style={{ gap: space[5] }}>
      <Form form={form} notice={notice} label="Orders">
        <NumberField
          name="holdDays"
          label="Fish are held for"
          unit="days"
          whole
          step={1}
          least={1}
          hint="Without a deposit they are available again afterwards."
        />
        <NumberField
          name="depositPercent"
          label="Deposit proposed"
          unit="%"
          whole
          step={5}
          hint="You can ask for another amount with each order."
        />
        <NumberField
          name="lossDays"
          label="Losses are made good for"
          unit="days"
          whole
          step={1}
          hint="Counted from the day the fish leave. 0: not at all."
        />
        <TextField
          name="words"
          label="More terms"
          aside="not needed"
          long
          hint="Frozen with each order when its fish are reserved."
        />
        <TextField
          name="bank"
          label="How to pay by bank transfer"
          aside="not needed"
          long
          hint="Account holder, account, bank. It stands in the letter that asks for the deposit."
        />
        <SubmitButton label="Save terms" />
      </Form>
      {draft.success ? (
        <Section title="As the buyer reads it">
          <Text>{termsText(draft.data)}</Text>
        </Section>
      ) : null}
      <Notice
        words={
          cards
            ? 'Cards are taken: the letter that asks for money has a link to pay.'
            : 'No cards are taken: whoever runs this installation has set up no card service.'
        }
      />
    </View>
  );
}
