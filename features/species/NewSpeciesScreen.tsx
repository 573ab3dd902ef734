import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { line } from '@/shared/shapes';
import { SpeciesAbout } from '@/shared/species/contract';
import { BREEDING_MODES, type BreedingMode, type Carers, MODE_WORDS } from '@/shared/species/species';
import { useAddSpecies } from './queries';

/** A choice that starts open: the shape judges what was chosen. */
const chosen = <S extends z.ZodMiniType<string, string>>(shape: S) =>
  z.codec(z.optional(z.string()), shape, {
    decode: (text) => (text ?? '') as z.input<S>,
    encode: (stored) => stored,
  });

const Draft = z.strictObject({
  scientificName: line(120, 'Type the name'),
  mode: SpeciesAbout.shape.mode,
  kin: chosen(SpeciesAbout.shape.kin),
  body: SpeciesAbout.shape.body,
  waters: chosen(SpeciesAbout.shape.waters),
});

const KIN = [
  ['tropheini', 'Shore grazers of Tanganyika'],
  ['cyphotilapia', 'Large deep-water humpheads'],
  ['openWater', 'Sand and open water of Tanganyika'],
  ['mbunaAndHaps', 'Rock and sand fish of Malawi'],
  ['victoriaAndRivers', 'Victoria and its rivers'],
  ['dwarfRiver', 'Small river mouthbrooders'],
  ['biparental', 'Goby cichlids, both parents hold'],
  ['tilapia', 'Tilapias'],
  ['caveSpawner', 'Cave spawners'],
] as const;
const BODIES = [
  ['deep', 'Deep'],
  ['standard', 'As most'],
  ['slender', 'Slender'],
] as const;
const WATERS = [
  ['tanganyika', 'Lake Tanganyika'],
  ['malawi', 'Lake Malawi'],
  ['victoriaAndRivers', 'Victoria and rivers'],
  ['lagoons', 'Lagoons and brackish water'],
] as const;
const options = (pairs: readonly (readonly [string, string])[]) => pairs.map(([value, word]) => ({ value, word }));

const CARERS: Record<BreedingMode, Carers> = {
  maternalMouthbrooder: 'mother',
  biparentalMouthbrooder: 'pair',
  paternalMouthbrooder: 'father',
  substrateSpawner: 'pair',
};

/** A species that is not built in: its figures are filled in from its relatives until they are set. */
export function NewSpeciesScreen({ name = '' }: { name: string | undefined }) {
  const room = useRoom();
  const router = useRouter();
  const add = useAddSpecies();
  const [id] = useState(newId);
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: {
      scientificName: name,
      mode: 'maternalMouthbrooder' as BreedingMode,
      kin: '',
      body: 'standard' as const,
      waters: '',
    },
    save: async ({ scientificName, ...about }) => {
      await add.mutateAsync({ id, scientificName, about: { ...about, carers: CARERS[about.mode] }, figures: {} });
      router.replace(`/r/${room.id}/strains/new?species=${id}`);
    },
  });
  return (
    <Form form={form} notice={notice} label="New species" page>
      <Screen
        title="New species"
        close={{ label: 'Close New species', onPress: () => router.back() }}
        dock={<SubmitButton label="Save species" />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          <TextField name="scientificName" label="Name" hint="Such as Tropheus sp. ‘Black’, or as far as it is known" />
          <SelectField
            name="mode"
            label="How the young are cared for"
            options={BREEDING_MODES.map((value) => ({ value, word: MODE_WORDS[value] }))}
          />
          <SelectField name="kin" label="Nearest relatives" options={options(KIN)} />
          <SelectField name="waters" label="Home water" options={options(WATERS)} />
          <SelectField name="body" label="Shape" options={options(BODIES)} />
          <Text size="small" tone="soft">
            Figures such as days of holding are filled in from its relatives and say so. Set your own on its page.
          </Text>
        </View>
      </Screen>
    </Form>
  );
}
