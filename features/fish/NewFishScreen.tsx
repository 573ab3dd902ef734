import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useEffect, useState } from 'react';
import { View } from 'react-native';
import { CheckField } from '@/components/form/CheckRow';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { newId } from '@/features/entries';
import { residentsWords, useTanks } from '@/features/entries/tanks';
import { useRoom } from '@/hooks/useRoom';
import type { ColonyRow } from '@/shared/colonies/contract';
import { formatDate } from '@/shared/days';
import { PROVENANCE_WORDS, PROVENANCES, type StrainRow } from '@/shared/strains/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { emptyFish, NewFishDraft } from './newFish';
import { codesQuery, coloniesQuery, lotsQuery, strainsQuery, useAddFish } from './queries';

type Asked = { strainId: string | undefined; colonyId: string | undefined };

/** Founders and other fish from outside, several at once: with codes, or anonymous. */
export function NewFishScreen(asked: Asked) {
  const room = useRoom();
  const { data: strains } = useQuery(strainsQuery(room.id));
  const { data: colonies } = useQuery(coloniesQuery(room.id));
  const { data: tanks } = useTanks();
  if (strains && strains.length === 0)
    return (
      <Screen title="Add fish" back={`/r/${room.id}/stock/fish`}>
        <EmptyState title="A strain first" words="Every fish that comes in is of a strain.">
          <Button label="Add a strain" href={`/r/${room.id}/strains/new`} />
        </EmptyState>
      </Screen>
    );
  if (strains && colonies && tanks) return <Fields strains={strains} colonies={colonies} tanks={tanks} asked={asked} />;
  return (
    <Screen title="Add fish">
      <Loading />
    </Screen>
  );
}

type FieldsProps = { strains: StrainRow[]; colonies: ColonyRow[]; tanks: TankRow[]; asked: Asked };

function Fields({ strains, colonies, tanks, asked }: FieldsProps) {
  const room = useRoom();
  const router = useRouter();
  const add = useAddFish();
  const [madeIds] = useState(() => Array.from({ length: 200 }, newId));
  const { form, notice } = useSchemaForm({
    schema: NewFishDraft,
    start: {
      ...emptyFish,
      strainId: asked.strainId ?? (strains.length === 1 ? (strains[0]?.id ?? '') : ''),
      colonyId: asked.colonyId ?? '',
      arrivedOn: room.today,
    },
    save: async ({ heads, codes, coded, ...fish }) => {
      const ids = madeIds.slice(0, heads);
      const given = coded ? codes.split(/[\s,;]+/).filter(Boolean) : [];
      await add.mutateAsync({ ids, codes: ids.map((_, i) => given[i] ?? null), ...fish });
      const [first] = ids;
      router.replace(heads === 1 && first ? `/r/${room.id}/fish/${first}` : `/r/${room.id}/stock/fish`);
    },
  });
  const { values, touched, setFieldValue } = form;
  const strain = strains.find(({ id }) => id === values.strainId);
  const colony = colonies.find(({ id }) => id === values.colonyId);
  const heads = Math.min(200, Number(values.heads) || 0);
  const { data: free } = useQuery(codesQuery(room.id, colony?.code ?? strain?.code ?? '', heads));
  const { data: lots = [] } = useQuery(lotsQuery(room.id, values.strainId));
  const proposed = free?.join(' ') ?? null;
  // Codes follow strain, colony and number until they are typed.
  useEffect(() => {
    if (proposed !== null && !touched.codes) void setFieldValue('codes', proposed);
  }, [proposed, touched.codes, setFieldValue]);
  return (
    <Form form={form} notice={notice} label="Add fish" page>
      <Screen
        title="Add fish"
        close={{ label: 'Close Add fish', onPress: () => router.back() }}
        dock={<SubmitButton label={heads === 1 ? 'Save 1 fish' : `Save ${heads} fish`} />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          <Text tone="soft">Fish that came from outside. Young of your own are held back from their brood.</Text>
          <SelectField
            name="strainId"
            label="Strain"
            options={strains.map((one) => ({
              value: one.id,
              code: one.code,
              word: [one.displayName, one.locality].filter(Boolean).join(' '),
            }))}
          />
          <NumberField name="heads" label="How many" whole />
          <SegmentedField
            name="sex"
            label="Sex"
            choices={[
              { value: 'male', word: 'Male' },
              { value: 'female', word: 'Female' },
              { value: 'unknown', word: 'Not sexed' },
            ]}
          />
          <SelectField
            name="colonyId"
            label="Into which colony"
            placeholder="None"
            options={[
              { value: '', word: 'None' },
              ...colonies
                .filter(({ strainId }) => strainId === values.strainId)
                .map(({ id, code, tank }) => ({ value: id, code, word: tank ? `in ${tank.code}` : 'in no tank' })),
            ]}
          />
          {values.colonyId ? null : (
            <SelectField
              name="tankId"
              label="Into which tank"
              placeholder="Not yet in a tank"
              options={[
                { value: '', word: 'Not yet in a tank' },
                ...tanks.map((tank) => ({ value: tank.id, code: tank.code, word: residentsWords(tank) })),
              ]}
            />
          )}
          <CheckField name="coded" label="Give each a code" note="else they stay anonymous until told apart" />
          {values.coded ? (
            <TextField name="codes" label={heads === 1 ? 'Code' : 'Codes'} mono autoCapitalize="characters" long />
          ) : null}
          <TextField name="mark" label="Known by" aside="not needed" hint="A notch, a scar, a tag" />
          <SegmentedField
            name="keptAs"
            label="Kept as"
            choices={[
              { value: 'breeder', word: 'Breeder' },
              { value: 'holdback', word: 'Holdback' },
              { value: 'other', word: 'Other' },
            ]}
          />
          {lots.length > 0 ? (
            <SelectField
              name="lotId"
              label="Came with the lot"
              placeholder="No lot"
              options={[
                { value: '', word: 'No lot' },
                ...lots.map((lot) => ({
                  value: lot.id,
                  word: `${formatDate(lot.receivedOn)}, ${lot.fromWhom ?? PROVENANCE_WORDS[PROVENANCES.find((one) => one === lot.provenance) ?? 'unknown']}`,
                })),
              ]}
            />
          ) : null}
          <DateField name="arrivedOn" label="Came in" today={room.today} />
          <DateField name="bornOn" label="Born" aside="where it is known" today={room.today} />
          <TextField name="note" label="Note" aside="not needed" long />
        </View>
      </Screen>
    </Form>
  );
}
