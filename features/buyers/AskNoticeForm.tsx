import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { Text } from '@/components/ui/Text';
import type { AvailablePage } from '@/shared/buyers/available';
import { AskerFields } from './AskerFields';
import { NOTICE_START, NoticeAsk, noticeAsked } from './askDraft';
import { useAsk } from './publicQueries';

type Props = { slug: string; strain: AvailablePage['strains'][number]; onSent: (to: string) => void };

export function AskNoticeForm({ slug, strain, onSent }: Props) {
  const ask = useAsk(slug);
  const { form, notice } = useSchemaForm({
    schema: NoticeAsk,
    start: NOTICE_START,
    save: async (draft) => {
      await ask.mutateAsync(noticeAsked(strain.id, draft));
      onSent(draft.email);
    },
  });
  return (
    <Form form={form} notice={notice} label="Tell me when">
      <Text>
        <Text strong italic>
          {strain.name}
        </Text>
        {strain.locality ? `  ${strain.locality}` : ''}
      </Text>
      <NumberField
        name="lengthTenthsMm"
        label="Tell me when they are"
        unit="cm"
        hint="A letter comes when half of the fish for sale are that long."
      />
      <NumberField name="heads" label="How many you would like" aside="not needed" unit="fish" whole />
      <AskerFields />
      <SubmitButton label="Tell me" busyLabel="Sending" />
    </Form>
  );
}
