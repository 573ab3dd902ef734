import { useFormikContext } from 'formik';
import { View } from 'react-native';
import type * as z from 'zod/mini';
import { CheckField } from '@/components/form/CheckRow';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { space } from '@/components/theme/space';
import { Caution } from '@/components/ui/Caution';
import { Section } from '@/components/ui/Section';
import { residentsWords } from '@/features/entries/tanks';
import { useRoom } from '@/hooks/useRoom';
import { addDays, isDay } from '@/shared/days';
import type { ImportPreview } from '@/shared/sheets/importContract';
import type { StrainRow } from '@/shared/strains/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { NEW_STRAIN, type TakeInDraft } from './takeInDraft';

type Props = { preview: ImportPreview; strains: StrainRow[]; tanks: TankRow[]; left: number };

/** How many came, what they are here, where they go. */
export function TakeInFields({ preview, strains, tanks, left }: Props) {
  const { values } = useFormikContext<z.input<typeof TakeInDraft>>();
  const brood = preview.content.subject.kind === 'brood';
  const some = Number(values.heads) > 0;
  return (
    <Section title="Here">
      <View style={{ gap: space[4] }}>
        {brood || left === 0 ? (
          <NumberField
            name="heads"
            label="How many came"
            whole
            hint={left === 0 ? 'None are left to come: only what the sheet tells is taken in' : `Of ${left}`}
          />
        ) : null}
        {some ? <Settling preview={preview} strains={strains} tanks={tanks} /> : null}
        {preview.trust.signature === 'keyUnknown' ? (
          <CheckField
            name="unchecked"
            label="Take it in unchecked"
            note="its fish are marked so wherever they are shown"
          />
        ) : null}
      </View>
    </Section>
  );
}

function Settling({ preview, strains, tanks }: Omit<Props, 'left'>) {
  const { today } = useRoom();
  const { values } = useFormikContext<z.input<typeof TakeInDraft>>();
  const received = isDay(values.receivedOn) ? values.receivedOn : today;
  const claims = preview.content.strain.claim === 'strain';
  return (
    <>
      {claims ? <StrainFields preview={preview} strains={strains} /> : null}
      {preview.content.subject.kind === 'fish' ? <TextField name="code" label="Its code here" /> : null}
      <SegmentedField
        name="keptAs"
        label="Kept as"
        choices={[
          { value: 'breeder', word: 'Breeder' },
          { value: 'holdback', word: 'Holdback' },
          { value: 'other', word: 'Other' },
        ]}
      />
      <DateField name="receivedOn" label="Came in" today={today} />
      <SelectField
        name="tankId"
        label="Into which tank"
        options={[...tanks]
          .sort((a, b) => Number(b.purpose === 'quarantine') - Number(a.purpose === 'quarantine'))
          .map((tank) => ({
            value: tank.id,
            code: tank.code,
            word: residentsWords(tank),
            ...(tank.purpose === 'quarantine' ? { note: 'quarantine' } : {}),
          }))}
      />
      <DateField
        name="quarantineUntil"
        label="In quarantine until"
        aside="not needed"
        today={today}
        latest={null}
        choices={[28, 42].map((days) => ({ word: `${days / 7} weeks`, day: addDays(received, days) }))}
      />
      <Caution
        title="Keep them apart first"
        words="A tank of their own, with nets and a siphon of their own, and hands washed between tanks. A sheet says who the fish are, not that they are healthy. Ask a veterinarian where they look ill."
      />
    </>
  );
}

function StrainFields({ preview, strains }: Pick<Props, 'preview' | 'strains'>) {
  const { values } = useFormikContext<z.input<typeof TakeInDraft>>();
  const { newStrain } = preview;
  const fits = (id: string) => preview.strains.includes(id);
  return (
    <>
      <SelectField
        name="strainId"
        label="Strain here"
        hint={newStrain ? undefined : 'Its species is not in the library: add the strain first where it is missing'}
        options={[
          ...(newStrain ? [{ value: NEW_STRAIN, word: `A new strain: ${newStrain.name}` }] : []),
          ...[...strains]
            .sort((a, b) => Number(fits(b.id)) - Number(fits(a.id)))
            .map(({ id, code, displayName, locality }) => ({
              value: id,
              code,
              word: [displayName, locality].filter(Boolean).join(' '),
              ...(fits(id) ? { note: 'species and place as on the sheet' } : {}),
            })),
        ]}
      />
      {values.strainId === NEW_STRAIN ? <TextField name="newStrain.code" label="Code of the new strain" /> : null}
    </>
  );
}
