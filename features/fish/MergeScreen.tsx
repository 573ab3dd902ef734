import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { useRoom } from '@/hooks/useRoom';
import type { FishRow } from '@/shared/fish/contract';
import { TypedNote } from '@/shared/shapes';
import { fishListQuery, useMergeFish } from './queries';

const Draft = z.strictObject({
  intoId: z.string('Choose the record that stays').check(z.minLength(1, 'Choose the record that stays')),
  note: TypedNote,
});

/** Two records turn out to be one fish. */
export function MergeScreen({ fishId }: { fishId: string }) {
  const { id: roomId } = useRoom();
  const { data } = useQuery(fishListQuery(roomId, 'all'));
  if (data) return <Fields fishId={fishId} fish={data} />;
  return (
    <Screen title="Same fish as another" back={`/r/${roomId}/fish/${fishId}`}>
      <Loading label="Loading the fish" />
    </Screen>
  );
}

function Fields({ fishId, fish }: { fishId: string; fish: FishRow[] }) {
  const room = useRoom();
  const router = useRouter();
  const merge = useMergeFish(fishId);
  const own = fish.find(({ id }) => id === fishId);
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { intoId: '', note: '' },
    save: async (body) => {
      await merge.mutateAsync(body);
      router.replace(`/r/${room.id}/fish/${body.intoId}`);
    },
  });
  const others = fish.filter(
    ({ id, code, strainId, exit }) =>
      id !== fishId && code !== null && exit?.kind !== 'merged' && strainId === (own?.strainId ?? null),
  );
  return (
    <Form form={form} notice={notice} label="Same fish as another" page>
      <Screen
        title={`${own?.code ?? 'This fish'} is another’s record`}
        close={{ label: 'Close', onPress: () => router.back() }}
        dock={<SubmitButton label="Make them one" />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          <Notice
            words={`The record of ${own?.code ?? 'this fish'} ends. What was found, measured and photographed goes to the one that stays; in the pedigree they are one from now on.`}
          />
          <SelectField
            name="intoId"
            label="The record that stays"
            options={others.map(({ id, code, tank, exit }) => ({
              value: id,
              code: code ?? '',
              word: exit ? 'not here any more' : (tank?.code ?? ''),
            }))}
          />
          <TextField name="note" label="How you know" aside="not needed" long />
        </View>
      </Screen>
    </Form>
  );
}
