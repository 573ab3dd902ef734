import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { WAITING_DAYS } from '@/shared/transfer/contract';
import { deletionQuery, useDeletion } from './queries';

/** Asked for with the name, carried out after the waiting time, called off by any owner until then. */
export function DeleteRoomPart() {
  const room = useRoom();
  const { data } = useQuery(deletionQuery(room.id));
  const { cancel } = useDeletion(room.id);
  const [asking, setAsking] = useState(false);
  return (
    <View style={{ gap: space[4], paddingTop: space[3] }}>
      {data?.deleteAfter ? (
        <Notice
          tone="act"
          title={`${room.name} will be deleted on ${formatDate(data.deleteAfter.slice(0, 10))}`}
          words={cancel.error?.message ?? 'Until then everything works. Save the archive above if you want to keep it.'}
        >
          <Button small label="Keep the fishroom" busy={cancel.isPending} onPress={() => cancel.mutate()} />
        </Notice>
      ) : (
        <>
          <Text tone="soft">
            {`Everything in it goes after ${WAITING_DAYS} days, for all its members. Until then any owner can call it off. A last archive stays with whoever runs this Kinwater for 30 days.`}
          </Text>
          <Button small label={`Delete ${room.name}`} onPress={() => setAsking(true)} />
        </>
      )}
      <Sheet open={asking} title={`Delete ${room.name}?`} onClose={() => setAsking(false)}>
        <NameForm onDone={() => setAsking(false)} />
      </Sheet>
    </View>
  );
}

const NameDraft = z.strictObject({ name: z.string('Type its name').check(z.minLength(1, 'Type its name')) });

function NameForm({ onDone }: { onDone: () => void }) {
  const room = useRoom();
  const { ask } = useDeletion(room.id);
  const { form, notice } = useSchemaForm({
    schema: NameDraft,
    start: { name: '' },
    save: async ({ name }) => {
      await ask.mutateAsync(name);
      onDone();
    },
  });
  return (
    <Form form={form} notice={notice} label="Delete the fishroom">
      <TextField name="name" label="Its name" needed hint={`Type ${room.name} to confirm.`} />
      <SubmitButton label={`Delete in ${WAITING_DAYS} days`} busyLabel="Asking" />
    </Form>
  );
}
