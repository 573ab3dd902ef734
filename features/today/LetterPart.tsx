import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { useMyDay } from './queries';

const NEVER = 'never';
const HOURS = Array.from({ length: 24 }, (_, hour) => ({
  value: String(hour),
  word: `${String(hour).padStart(2, '0')}:00`,
}));
const Draft = z.pipe(
  z.strictObject({ hour: z.string('Choose an hour') }),
  z.transform(({ hour }) => (hour === NEVER ? null : Number(hour))),
);

/** Whether a letter comes, and at which hour of the fishroom's clock. */
export function LetterPart({ hour }: { hour: number | null }) {
  const { timeZone } = useRoom();
  const { setHour } = useMyDay();
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { hour: hour === null ? NEVER : String(hour) },
    save: (next) => setHour.mutateAsync(next),
  });
  return (
    <Section title="Daily letter">
      <Form form={form} notice={notice} label="Daily letter">
        <Text tone="soft">
          What is due, once a day, to your email address. On a day when nothing is due, no letter comes.
        </Text>
        <SelectField
          name="hour"
          label="Comes at"
          hint={`On the fishroom’s clock, ${timeZone.replaceAll('_', ' ')}.`}
          options={[{ value: NEVER, word: 'No letter' }, ...HOURS]}
        />
        {setHour.isSuccess && String(hour ?? NEVER) === form.values.hour ? <Notice words="Saved." /> : null}
        <SubmitButton label="Save daily letter" kind="plain" />
      </Form>
    </Section>
  );
}
