import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useEffect, useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { CheckField, CheckRow } from '@/components/form/CheckRow';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { newId } from '@/features/entries';
import { residentsWords, useTanks } from '@/features/entries/tanks';
import { useRoom } from '@/hooks/useRoom';
import { ColonyCode, proposeColonyCode } from '@/shared/codes';
import type { ColonyRow } from '@/shared/colonies/contract';
import { DayText } from '@/shared/days';
import type { FishRow } from '@/shared/fish/contract';
import { Id } from '@/shared/ids';
import { HeadsOrNone, TypedNote } from '@/shared/shapes';
import { orBlank, spelledHeads } from '@/shared/spelled';
import type { StrainRow } from '@/shared/strains/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { coloniesQuery, livingFishQuery, strainsQuery, useAddColony } from './queries';

const Draft = z.strictObject({
  strainId: z.string('Choose a strain').check(z.minLength(1, 'Choose a strain')),
  code: ColonyCode,
  tankId: z.string('Choose the tank').check(z.minLength(1, 'Choose the tank')),
  startedOn: DayText,
  males: orBlank(spelledHeads(HeadsOrNone)),
  females: orBlank(spelledHeads(HeadsOrNone)),
  unsexed: orBlank(spelledHeads(HeadsOrNone)),
  coded: z.boolean(),
  fishIds: z.array(Id),
  note: TypedNote,
});

/** A colony begins with the fish that go in: new ones counted by sex, and coded ones that are here already. */
export function NewColonyScreen({ strainId }: { strainId: string | undefined }) {
  const room = useRoom();
  const { data: strains } = useQuery(strainsQuery(room.id));
  const { data: colonies } = useQuery(coloniesQuery(room.id));
  const { data: fish } = useQuery(livingFishQuery(room.id));
  const { data: tanks } = useTanks();
  const known = strains && colonies && fish && tanks ? { strains, colonies, fish, tanks } : null;
  if (known && known.strains.length > 0 && known.tanks.length > 0)
    return (
      <Fields {...known} strainId={strainId ?? (known.strains.length === 1 ? (known.strains[0]?.id ?? '') : '')} />
    );
  return (
    <Screen title="New colony" back={`/r/${room.id}/stock/colonies`}>
      {known ? (
        <EmptyState
          title={known.strains.length === 0 ? 'A strain first' : 'A tank first'}
          words="A colony is of one strain, and lives in one tank."
        >
          {known.strains.length === 0 ? (
            <Button label="Add a strain" href={`/r/${room.id}/strains/new`} />
          ) : (
            <Button label="Add a tank" href={`/r/${room.id}/tanks/new`} />
          )}
        </EmptyState>
      ) : (
        <Loading />
      )}
    </Screen>
  );
}

type Known = { strains: StrainRow[]; colonies: ColonyRow[]; fish: FishRow[]; tanks: TankRow[]; strainId: string };

function Fields({ strains, colonies, fish, tanks, strainId }: Known) {
  const room = useRoom();
  const router = useRouter();
  const add = useAddColony();
  const [id] = useState(newId);
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: {
      strainId,
      code: '',
      tankId: '',
      startedOn: room.today,
      males: '',
      females: '',
      unsexed: '',
      coded: true,
      fishIds: [] as string[],
      note: '',
    },
    save: async ({ males, females, unsexed, coded, ...colony }) => {
      await add.mutateAsync({
        id,
        ...colony,
        newFish: { males: males ?? 0, females: females ?? 0, unsexed: unsexed ?? 0, lotId: null, coded },
      });
      router.replace(`/r/${room.id}/colonies/${id}`);
    },
  });
  const { values, touched, setFieldValue } = form;
  const strain = strains.find((one) => one.id === values.strainId);
  const proposed = strain ? proposeColonyCode(strain.code, new Set(colonies.map(({ code }) => code))) : null;
  // The code follows the strain until it is typed.
  useEffect(() => {
    if (proposed && !touched.code) void setFieldValue('code', proposed);
  }, [proposed, touched.code, setFieldValue]);
  const single = fish.filter(
    (one) => one.strainId === values.strainId && one.colony === null && one.code !== null && one.exit === null,
  );
  const toggle = (fishId: string) =>
    void setFieldValue(
      'fishIds',
      values.fishIds.includes(fishId) ? values.fishIds.filter((one) => one !== fishId) : [...values.fishIds, fishId],
    );
  return (
    <Form form={form} notice={notice} label="New colony" page>
      <Screen
        title="New colony"
        close={{ label: 'Close New colony', onPress: () => router.back() }}
        dock={<SubmitButton label="Save colony" />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          <SelectField
            name="strainId"
            label="Strain"
            options={strains.map((one) => ({
              value: one.id,
              code: one.code,
              word: [one.displayName, one.locality].filter(Boolean).join(' '),
            }))}
          />
          <SelectField
            name="tankId"
            label="In which tank"
            options={tanks.map((tank) => ({ value: tank.id, code: tank.code, word: residentsWords(tank) }))}
          />
          <TextField name="code" label="Code" mono autoCapitalize="characters" />
          <DateField name="startedOn" label="Together since" today={room.today} />
          <Section title="New fish">
            <View style={{ gap: space[3] }}>
              <NumberField name="males" label="Males" whole />
              <NumberField name="females" label="Females" whole />
              <NumberField name="unsexed" label="Not sexed yet" whole />
              <CheckField name="coded" label="Give each a code" note="else they stay anonymous until told apart" />
            </View>
          </Section>
          {single.length > 0 ? (
            <Section title="Fish that are here already" aside={`${values.fishIds.length} chosen`}>
              {single.map((one) => (
                <CheckRow
                  key={one.id}
                  label={`${one.code}, ${one.sex === 'unknown' ? 'not sexed' : one.sex}`}
                  on={values.fishIds.includes(one.id)}
                  onChange={() => toggle(one.id)}
                  note={one.tank?.code}
                >
                  <Code>{one.code ?? ''}</Code>
                </CheckRow>
              ))}
            </Section>
          ) : null}
          <TextField name="note" label="Note" aside="not needed" long />
        </View>
      </Screen>
    </Form>
  );
}
