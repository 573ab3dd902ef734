import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useEffect } from 'react';
import { View } from 'react-native';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { proposeStrainCode } from '@/shared/codes';
import { SOURCE_WORDS } from '@/shared/sheets/sourceCodes';
import { NAMING_WORDS, NAMINGS, PROVENANCE_WORDS, PROVENANCES, type StrainRow } from '@/shared/strains/contract';
import { setSpeciesQuery, strainQuery, strainsQuery, useAddStrain, useChangeStrain } from './queries';
import { speciesOptions } from './speciesOptions';
import { emptyStrain, StrainDraft, strainAsTyped } from './strainForm';

/** `species` is one that was just added, to go on with. */
export function NewStrainScreen({ species }: { species: string | undefined }) {
  const room = useRoom();
  const router = useRouter();
  const { data: strains } = useQuery(strainsQuery(room.id));
  const { data: set } = useQuery(setSpeciesQuery(room.id));
  const add = useAddStrain();
  if (!strains || !set) return <Waiting title="New strain" />;
  return (
    <StrainForm
      title="New strain"
      start={{ ...emptyStrain, speciesId: species ?? '' }}
      options={speciesOptions(set)}
      taken={new Set(strains.map(({ code }) => code))}
      save={async (facts) => {
        const { id } = await add.mutateAsync({ id: newId(), ...facts });
        router.replace(`/r/${room.id}/strains/${id}`);
      }}
    />
  );
}

export function ChangeStrainScreen({ strainId }: { strainId: string }) {
  const room = useRoom();
  const { data } = useQuery(strainQuery(room.id, strainId));
  const { data: set } = useQuery(setSpeciesQuery(room.id));
  if (!data || !set) return <Waiting title="Strain" />;
  return <Changing strain={data.strain} options={speciesOptions(set)} />;
}

function Changing({ strain, options }: { strain: StrainRow; options: FormProps['options'] }) {
  const router = useRouter();
  const change = useChangeStrain(strain.id);
  return (
    <StrainForm
      title={strain.code}
      start={strainAsTyped(strain)}
      options={options}
      taken={null}
      save={async (facts) => {
        await change.mutateAsync({ ...facts, version: strain.version, retiredOn: strain.retiredOn });
        router.back();
      }}
    />
  );
}

const Waiting = ({ title }: { title: string }) => (
  <Screen title={title}>
    <Loading />
  </Screen>
);

type Facts = Omit<Parameters<ReturnType<typeof useChangeStrain>['mutateAsync']>[0], 'version' | 'retiredOn'>;
type FormProps = {
  title: string;
  start: StrainDraft;
  options: ReturnType<typeof speciesOptions>;
  /** Codes in use, when a new one is to be proposed. */
  taken: ReadonlySet<string> | null;
  save: (facts: Facts) => Promise<void>;
};

function StrainForm({ title, start, options, taken, save }: FormProps) {
  const room = useRoom();
  const router = useRouter();
  const { form, notice } = useSchemaForm({ schema: StrainDraft, start, save });
  const { values, touched, setFieldValue } = form;
  const species = options.find(({ value }) => value === values.speciesId)?.word;
  const proposed = taken && species ? proposeStrainCode(species, values.locality ?? null, taken) : null;
  // The code follows species and locality until it is typed.
  useEffect(() => {
    if (proposed && !touched.code) void setFieldValue('code', proposed);
  }, [proposed, touched.code, setFieldValue]);
  return (
    <Form form={form} notice={notice} label={title} page>
      <Screen
        title={title}
        close={{ label: `Close ${title}`, onPress: () => router.back() }}
        dock={<SubmitButton label="Save strain" />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          <SelectField
            name="speciesId"
            label="Species"
            options={options}
            onNew={(name) => router.push(`/r/${room.id}/species/new?name=${encodeURIComponent(name)}`)}
            newWord={(name) => `Add ${name} as a species`}
          />
          <TextField name="locality" label="Locality" aside="not needed" hint="Where its founders were caught" />
          <SegmentedField
            name="localityKnown"
            label="How sure is the locality?"
            choices={[
              { value: 'known', word: 'Known' },
              { value: 'trade', word: 'Trade name' },
              { value: 'unknown', word: 'Not known' },
            ]}
          />
          <TextField
            name="code"
            label="Code"
            mono
            autoCapitalize="characters"
            hint="Its fish and broods are named by it"
          />
          <Section title="Where from">
            <View style={{ gap: space[4] }}>
              <SelectField
                name="provenance"
                label="Its founders"
                options={PROVENANCES.map((value) => ({ value, word: PROVENANCE_WORDS[value] }))}
              />
              <TextField name="fromWhom" label="From whom" aside="not needed" />
              <DateField name="acquiredOn" label="When" today={room.today} aside="not needed" />
              <TextField
                name="papers"
                label="Papers"
                aside="not needed"
                hint="Invoice or permit number, where it is kept"
              />
              <SelectField
                name="citesSource"
                label="Source, as on permits"
                placeholder="Not needed"
                options={[
                  { value: '', word: 'Not needed' },
                  ...Object.entries(SOURCE_WORDS).map(([value, word]) => ({ value, word })),
                ]}
              />
            </View>
          </Section>
          <Section title="Names">
            <View style={{ gap: space[4] }}>
              <SelectField
                name="naming"
                label="How the name is meant"
                options={NAMINGS.map((value) => ({ value, word: NAMING_WORDS[value] }))}
              />
              <TextField
                name="scientificName"
                label="Name as printed"
                aside="not needed"
                hint="Left empty, it is the species' name"
              />
              <TextField name="tradeName" label="Trade name" aside="not needed" />
              <TextField name="synonyms" label="Other names" aside="not needed" />
            </View>
          </Section>
          <TextField name="note" label="Note" aside="not needed" long />
        </View>
      </Screen>
    </Form>
  );
}
