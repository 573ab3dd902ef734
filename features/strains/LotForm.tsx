import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { CheckField } from '@/components/form/CheckRow';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Screen } from '@/components/ui/Screen';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { addDays, DayText, isDay } from '@/shared/days';
import { Heads, HeadsOrNone, TypedDay, TypedNote, typedLine } from '@/shared/shapes';
import { orBlank, spelledHeads } from '@/shared/spelled';
import { PROVENANCE_WORDS, PROVENANCES } from '@/shared/strains/contract';
import { useAddLot } from './queries';

const Generation = z
  .number('Type a number')
  .check(z.int('A whole number'), z.minimum(0, 'From 0'), z.maximum(50, 'At most 50'));

const LotDraft = z.strictObject({
  receivedOn: DayText,
  fromWhom: typedLine(200),
  provenance: z.enum(PROVENANCES, 'Choose where the fish came from'),
  generation: orBlank(spelledHeads(Generation)),
  heads: orBlank(spelledHeads(Heads)),
  deadOnArrival: orBlank(spelledHeads(HeadsOrNone)),
  quarantineUntil: TypedDay,
  papers: typedLine(300),
  mayBeSibs: z.boolean(),
  note: TypedNote,
});

/** Fish of one strain that came in together. */
export function LotForm({ strainId }: { strainId: string }) {
  const { today } = useRoom();
  const router = useRouter();
  const add = useAddLot(strainId);
  const [id] = useState(newId);
  const { form, notice } = useSchemaForm({
    schema: LotDraft,
    start: {
      receivedOn: today,
      fromWhom: '',
      provenance: 'wildCaught' as const,
      generation: '',
      heads: '',
      deadOnArrival: '',
      quarantineUntil: '',
      papers: '',
      mayBeSibs: false,
      note: '',
    },
    save: async ({ deadOnArrival, ...lot }) => {
      await add.mutateAsync({ id, ...lot, deadOnArrival: deadOnArrival ?? 0 });
      router.back();
    },
  });
  const received = form.values.receivedOn;
  return (
    <Form form={form} notice={notice} label="New lot" page>
      <Screen
        title="New lot"
        close={{ label: 'Close New lot', onPress: () => router.back() }}
        dock={<SubmitButton label="Save lot" />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          <DateField name="receivedOn" label="Came in" today={today} />
          <NumberField name="heads" label="How many" whole />
          <NumberField name="deadOnArrival" label="Dead on arrival" whole hint="Leave it empty when none were" />
          <SelectField
            name="provenance"
            label="Where from"
            options={PROVENANCES.map((value) => ({ value, word: PROVENANCE_WORDS[value] }))}
          />
          <TextField name="fromWhom" label="From whom" aside="not needed" />
          <NumberField
            name="generation"
            label="Generation, as the supplier says"
            whole
            hint="0 for wild caught, 1 for young of wild fish; empty when nobody knows"
          />
          <CheckField
            name="mayBeSibs"
            label="They may be sibs"
            note="kinship among them is then not known to be zero"
          />
          <DateField
            name="quarantineUntil"
            label="In quarantine until"
            aside="not needed"
            today={today}
            latest={null}
            choices={[28, 42].map((days) => ({
              word: `${days / 7} weeks`,
              day: addDays(isDay(received) ? received : today, days),
            }))}
          />
          <TextField name="papers" label="Papers" aside="not needed" />
          <TextField name="note" label="Note" aside="not needed" long />
        </View>
      </Screen>
    </Form>
  );
}
