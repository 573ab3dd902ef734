import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { call } from '@/features/call';
import { createRoom } from '@/shared/rooms/contract';
import { deviceCurrency, deviceSystem, deviceTimeZone } from './places';
import { RoomFields } from './RoomFields';
import { NewRoomDraft } from './roomForm';

/** The first thing after signing up: name it, and go in. */
export function NewRoomForm() {
  const cache = useQueryClient();
  const router = useRouter();
  const [start] = useState(() => ({
    name: '',
    place: '',
    timeZone: deviceTimeZone(),
    currency: deviceCurrency(),
    system: deviceSystem(),
  }));
  const { form, notice } = useSchemaForm({
    schema: NewRoomDraft,
    start,
    save: async (body) => {
      const { id } = await call(createRoom, { body });
      await cache.invalidateQueries({ queryKey: ['me'] });
      router.replace(`/r/${id}`);
    },
  });
  return (
    <Form form={form} notice={notice} label="New fishroom">
      <RoomFields timeZone={start.timeZone} />
      <SubmitButton label="Start the fishroom" busyLabel="Starting" />
    </Form>
  );
}
