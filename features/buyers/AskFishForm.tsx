import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import type { AvailableFish } from '@/shared/buyers/available';
import { factsLine } from '@/shared/buyers/publicWords';
import { AskerFields } from './AskerFields';
import { FISH_START, FishAsk, fishAsked } from './askDraft';
import { useAsk } from './publicQueries';

type Props = { slug: string; fish: AvailableFish; onSent: (to: string) => void };

export function AskFishForm({ slug, fish, onSent }: Props) {
  const ask = useAsk(slug);
  const { form, notice } = useSchemaForm({
    schema: FishAsk,
    start: FISH_START,
    save: async (draft) => {
      await ask.mutateAsync(fishAsked(fish.broodId, draft));
      onSent(draft.email);
    },
  });
  const wanted = FishAsk.shape.heads.safeParse(form.values.heads);
  const more = wanted.success && wanted.data > fish.available;
  return (
    <Form form={form} notice={notice} label="Ask for fish">
      <Text>
        <Text strong italic>
          {fish.name}
        </Text>
        {`  ${factsLine(fish)}`}
      </Text>
      <NumberField
        name="heads"
        label="How many"
        unit="fish"
        whole
        step={1}
        least={1}
        hint={`${fish.available} available`}
      />
      {more ? (
        <Notice words="That is more than are available. Your request waits in the row, and a letter tells you when they come free." />
      ) : null}
      <NumberField name="lengthTenthsMm" label="No shorter than" aside="not needed" unit="cm" />
      <AskerFields />
      <SubmitButton label="Ask for these fish" busyLabel="Sending" />
    </Form>
  );
}
