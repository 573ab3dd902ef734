import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Beside } from '@/features/entries/Beside';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { residentsWords, useTanks } from '@/features/entries/tanks';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold } from '@/shared/broods/contract';
import { FishCode } from '@/shared/codes';
import { DayText } from '@/shared/days';
import { SEXES } from '@/shared/fish/contract';
import { BatchLine } from './BatchLine';
import { InBatch } from './InBatch';
import { fishCodesQuery } from './queries';
import type { BatchesOf } from './useBatches';

const Taken = z.strictObject({ code: FishCode, sex: z.enum(SEXES, 'Choose a sex') });
const Draft = z.strictObject({
  fish: z.array(Taken).check(z.minLength(1, 'At least one fish')),
  keptAs: z.enum(['holdback', 'breeder', 'other'], 'Choose what they are kept for'),
  /** Empty: they stay in the tank they are in. */
  tankId: z.optional(z.string()),
  onDay: DayText,
  note: NoteDraft,
});

const MOST = 20;

/** Fish taken out of a batch to be kept: each gets a code, and its parents are known through the brood. */
export function HoldBackForm(of: BatchesOf) {
  return (
    <InBatch title="Hold back" form="hold-back" of={of}>
      {(batch) => <WithCodes key={batch.id} batch={batch} />}
    </InBatch>
  );
}

function WithCodes({ batch }: { batch: BatchTold }) {
  const { id: roomId } = useRoom();
  const stem = batch.sources[0]?.code.replace(/-\d\d[A-Z]+$/, '') ?? 'X';
  const { data: codes } = useQuery(fishCodesQuery(roomId, stem, MOST));
  const { data: tanks } = useTanks();
  if (!codes || !tanks) return <Loading label="Loading" />;
  return <Fields batch={batch} codes={codes} tanks={tanks} />;
}

type FieldsProps = { batch: BatchTold; codes: string[]; tanks: NonNullable<ReturnType<typeof useTanks>['data']> };

function Fields({ batch, codes, tanks }: FieldsProps) {
  const { today } = useRoom();
  const entry = useEntryForm({
    title: 'Hold back',
    draft: `holdBack:${batch.id}`,
    schema: Draft,
    start: {
      fish: [{ code: codes[0] ?? '', sex: 'unknown' as const }],
      keptAs: 'holdback' as const,
      tankId: '',
      onDay: today,
      note: '',
    },
    content: ({ fish, keptAs, tankId, onDay, note }, idOf) => ({
      kind: 'heldBack',
      batchId: batch.id,
      onDay,
      keptAs,
      tankId: tankId || null,
      colonyId: null,
      note,
      fish: fish.map(({ code, sex }, i) => ({ id: idOf(`fish ${i}`), code, sex })),
    }),
  });
  const { values, setFieldValue } = entry.form;
  const more = () => {
    const taken = new Set(values.fish.map(({ code }) => code));
    const code = codes.find((one) => !taken.has(one)) ?? '';
    void setFieldValue('fish', [...values.fish, { code, sex: 'unknown' }]);
  };
  return (
    <EntryPage
      entry={entry}
      subtitle={<BatchLine batch={batch} />}
      saveLabel={values.fish.length === 1 ? 'Hold back 1 fish' : `Hold back ${values.fish.length} fish`}
    >
      {batch.sources.length > 1 ? (
        <Notice
          tone="look"
          words="This batch holds several broods: the parents of a fish out of it are one of several pairs, weighted by heads."
        />
      ) : null}
      <Part title="Which fish?" aside={`${values.fish.length} of ${batch.balance}`}>
        <View style={{ gap: space[4] }}>
          {values.fish.map((fish, i) => (
            <Beside key={fish.code}>
              <TextField name={`fish.${i}.code`} label="Code" mono autoCapitalize="characters" />
              <SelectField
                name={`fish.${i}.sex`}
                label="Sex"
                options={[
                  { value: 'unknown', word: 'Not sexed' },
                  { value: 'male', word: 'Male' },
                  { value: 'female', word: 'Female' },
                ]}
              />
            </Beside>
          ))}
          <View style={{ flexDirection: 'row', gap: space[2] }}>
            <Button small icon="plus" label="Another fish" onPress={more} />
            {values.fish.length > 1 ? (
              <Button
                small
                kind="text"
                label="One fewer"
                onPress={() => void setFieldValue('fish', values.fish.slice(0, -1))}
              />
            ) : null}
          </View>
        </View>
      </Part>
      <SegmentedField
        name="keptAs"
        label="Kept as"
        choices={[
          { value: 'holdback', word: 'Holdback' },
          { value: 'breeder', word: 'Breeder' },
          { value: 'other', word: 'Other' },
        ]}
      />
      <SelectField
        name="tankId"
        label="Into which tank"
        placeholder="They stay where they are"
        options={tanks.map((tank) => ({ value: tank.id, code: tank.code, word: residentsWords(tank) }))}
      />
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
