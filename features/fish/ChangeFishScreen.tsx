import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { FishCode } from '@/shared/codes';
import { KEPT_AS } from '@/shared/fish/contract';
import { TypedDay, TypedNote } from '@/shared/shapes';
import { type FishTold, fishQuery, useChangeFish } from './queries';

const draftOf = (coded: boolean) =>
  z.strictObject({
    code: coded ? FishCode : z.optional(z.string()),
    keptAs: z.enum(KEPT_AS, 'Choose what it is kept for'),
    arrivedOn: TypedDay,
    bornOn: TypedDay,
    note: TypedNote,
  });

export function ChangeFishScreen({ fishId }: { fishId: string }) {
  const room = useRoom();
  const { data } = useQuery(fishQuery(room.id, fishId));
  if (data) return <Fields told={data} />;
  return (
    <Screen title="Fish">
      <Loading />
    </Screen>
  );
}

function Fields({ told: { fish, note } }: { told: FishTold }) {
  const { today } = useRoom();
  const router = useRouter();
  const change = useChangeFish(fish.id);
  const title = fish.code ?? 'Not told apart';
  const { form, notice } = useSchemaForm({
    schema: draftOf(fish.code !== null),
    start: {
      code: fish.code ?? '',
      keptAs: fish.keptAs,
      arrivedOn: fish.arrivedOn ?? '',
      bornOn: fish.bornOn ?? '',
      note: note ?? '',
    },
    save: async ({ code, ...facts }) => {
      await change.mutateAsync({ version: fish.version, code: code || null, ...facts });
      router.back();
    },
  });
  return (
    <Form form={form} notice={notice} label={title} page>
      <Screen
        title={title}
        close={{ label: `Close ${title}`, onPress: () => router.back() }}
        dock={<SubmitButton label="Save fish" />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          {fish.code ? (
            <TextField name="code" label="Code" mono autoCapitalize="characters" />
          ) : (
            <Text tone="soft">It gets a code by being told apart.</Text>
          )}
          <SegmentedField
            name="keptAs"
            label="Kept as"
            choices={[
              { value: 'breeder', word: 'Breeder' },
              { value: 'holdback', word: 'Holdback' },
              { value: 'other', word: 'Other' },
            ]}
          />
          <DateField name="arrivedOn" label="Came in" aside="where it is known" today={today} />
          <DateField name="bornOn" label="Born" aside="where it is known" today={today} />
          <TextField name="note" label="Note" aside="not needed" long />
          <Text size="small" tone="soft">
            Sex, marks and moves are recorded on their day, not changed here.
          </Text>
        </View>
      </Screen>
    </Form>
  );
}
