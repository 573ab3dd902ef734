import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { useRoom } from '@/hooks/useRoom';
import { ColonyCode } from '@/shared/codes';
import type { ColonyRow } from '@/shared/colonies/contract';
import { DayText } from '@/shared/days';
import { TypedNote } from '@/shared/shapes';
import { colonyQuery, useChangeColony } from './queries';

const Draft = z.strictObject({ code: ColonyCode, startedOn: DayText, note: TypedNote });

export function ChangeColonyScreen({ colonyId }: { colonyId: string }) {
  const room = useRoom();
  const { data } = useQuery(colonyQuery(room.id, colonyId));
  if (data) return <Fields colony={data.colony} />;
  return (
    <Screen title="Colony">
      <Loading />
    </Screen>
  );
}

function Fields({ colony }: { colony: ColonyRow }) {
  const { today } = useRoom();
  const router = useRouter();
  const change = useChangeColony(colony.id);
  const { version, endedOn, code, startedOn, note } = colony;
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { code, startedOn, note: note ?? '' },
    save: async (facts) => {
      await change.mutateAsync({ version, endedOn, ...facts });
      router.back();
    },
  });
  return (
    <Form form={form} notice={notice} label={code} page>
      <Screen
        title={code}
        close={{ label: `Close ${code}`, onPress: () => router.back() }}
        dock={<SubmitButton label="Save colony" />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          <TextField name="code" label="Code" mono autoCapitalize="characters" />
          <DateField name="startedOn" label="Together since" today={today} />
          <TextField name="note" label="Note" aside="not needed" long />
        </View>
      </Screen>
    </Form>
  );
}
