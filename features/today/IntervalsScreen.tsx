import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
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
import { may } from '@/shared/roles';
import { spelledHeads } from '@/shared/spelled';
import { changeIntervals } from '@/shared/today/contract';
import { Intervals } from '@/shared/today/intervals';
import { intervalsQuery } from './queries';

const days = spelledHeads(Intervals.shape.holdCheck);
const ByStage = z.strictObject({ fry: days, juvenile: days, subadult: days, adult: days });
const Draft = z.strictObject({
  holdCheck: days,
  stageCheck: days,
  headCount: ByStage,
  lengthSample: ByStage,
  waterTest: days,
  waterChange: days,
  reservationEnds: days,
});

const STAGES = [
  ['fry', 'Fry'],
  ['juvenile', 'Juveniles'],
  ['subadult', 'Subadults'],
  ['adult', 'Adults'],
] as const;

/** After how many days something is due again: Today, the letter and the calendar follow. */
export function IntervalsScreen() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(intervalsQuery(room.id));
  return (
    <Screen title="When things are due" back={`/r/${room.id}/settings`} measure>
      {data ? (
        <Fields intervals={data} />
      ) : error ? (
        <ErrorState title="The intervals could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the intervals" rows={4} />
      )}
    </Screen>
  );
}

function Fields({ intervals }: { intervals: Intervals }) {
  const { id: roomId, role } = useRoom();
  const cache = useQueryClient();
  const change = useMutation({
    mutationFn: (body: Intervals) => call(changeIntervals, { params: { roomId }, body }),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: z.encode(Draft, intervals),
    save: (body) => change.mutateAsync(body),
  });
  return (
    <Form form={form} notice={notice} label="When things are due">
      <View style={{ gap: space[4] }}>
        <Text tone="soft">Due again after so many days.</Text>
        <Days name="holdCheck" label="A look at a female that holds" />
        <Days name="stageCheck" label="Eggs and wrigglers" />
        <Section title="Head count">
          <ByStages of="headCount" />
        </Section>
        <Section title="Length sample">
          <ByStages of="lengthSample" />
        </Section>
        <Section title="Water">
          <View style={{ gap: space[4] }}>
            <Days name="waterTest" label="Water test" />
            <Days name="waterChange" label="Water change" />
          </View>
        </Section>
        <Days name="reservationEnds" label="A reservation ends: told before" />
        {change.isSuccess && !form.dirty ? <Notice words="Saved." /> : null}
        {may(role, 'room:manage') ? (
          <SubmitButton label="Save intervals" />
        ) : (
          <Notice words="An owner changes these." />
        )}
      </View>
    </Form>
  );
}

const Days = ({ name, label }: { name: string; label: string }) => (
  <NumberField name={name} label={label} unit="days" whole step={1} least={1} />
);

const ByStages = ({ of }: { of: 'headCount' | 'lengthSample' }) => (
  <View style={{ gap: space[4] }}>
    {STAGES.map(([stage, word]) => (
      <Days key={stage} name={`${of}.${stage}`} label={word} />
    ))}
  </View>
);
