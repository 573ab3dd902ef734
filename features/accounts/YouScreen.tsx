import { Form } from '@/components/form/Form';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { changeAccount, type Me } from '@/shared/accounts/contract';
import { useAskAgain, useMe } from './queries';
import { UnitFields } from './UnitFields';
import { YouForm } from './youForm';

/** How one is named, and the units one reads and types. */
export function YouScreen() {
  const room = useRoom();
  const { account } = useMe();
  return (
    <Screen title="Name and units" back={`/r/${room.id}/settings`} measure>
      <YouFields key={account.version} account={account} />
    </Screen>
  );
}

function YouFields({ account }: { account: Me['account'] }) {
  const room = useRoom();
  const askAgain = useAskAgain();
  const { form, notice } = useSchemaForm({
    schema: YouForm,
    start: {
      name: account.name,
      whose: account.choices.units ? ('own' as const) : ('room' as const),
      units: account.choices.units ?? room.units,
    },
    save: async ({ name, choices }) => {
      await call(changeAccount, { body: { name, choices, version: account.version } });
      await askAgain();
    },
  });
  return (
    <Form form={form} notice={notice} label="Name and units">
      <TextField name="name" label="Your name" needed autoComplete="name" hint="Stands beside what you record." />
      <Section title="Units" aside="What is recorded stays the same">
        <SegmentedField
          name="whose"
          label="Units to read and type"
          choices={[
            { value: 'room', word: 'As the fishroom' },
            { value: 'own', word: 'My own' },
          ]}
        />
      </Section>
      {form.values.whose === 'own' ? <UnitFields /> : null}
      <SubmitButton label="Save name and units" />
    </Form>
  );
}
