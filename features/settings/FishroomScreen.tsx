import { queryOptions, useQuery, useQueryClient } from '@tanstack/react-query';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { ErrorState } from '@/components/ui/ErrorState';
import { KeyValues } from '@/components/ui/KeyValues';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';
import { changeRoom, getRoom, type RoomPage } from '@/shared/rooms/contract';
import { RoomFields } from './RoomFields';
import { RoomFormDraft, systemOf, UNIT_SYSTEMS } from './roomForm';

const roomQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'room'],
    queryFn: ({ signal }) => call(getRoom, { params: { roomId }, signal }),
  });

/** What the fishroom is called, where it is, and what it counts in. Owners change it, everyone may read it. */
export function FishroomScreen() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(roomQuery(room.id));
  return (
    <Screen title="Fishroom" back={`/r/${room.id}/settings`} measure>
      {error ? <ErrorState title="Not loaded" words={error.message} onRetry={refetch} /> : null}
      {data ? (
        may(room.role, 'room:manage') ? (
          <RoomEdit key={data.version} page={data} />
        ) : (
          <RoomFacts page={data} />
        )
      ) : error ? null : (
        <Loading label="Loading the fishroom" rows={4} />
      )}
    </Screen>
  );
}

function RoomEdit({ page }: { page: RoomPage }) {
  const cache = useQueryClient();
  const { form, notice } = useSchemaForm({
    schema: RoomFormDraft,
    start: {
      name: page.name,
      place: page.place ?? '',
      timeZone: page.timeZone,
      currency: page.currency,
      system: systemOf(page.units),
      slug: page.slug,
    },
    save: async (body) => {
      await call(changeRoom, { params: { roomId: page.id }, body: { ...body, version: page.version } });
      await Promise.all([
        cache.invalidateQueries({ queryKey: [page.id] }),
        cache.invalidateQueries({ queryKey: ['me'] }),
      ]);
    },
  });
  return (
    <Form form={form} notice={notice} label="Fishroom">
      <RoomFields timeZone={page.timeZone} />
      <TextField
        name="slug"
        label="Public address"
        mono
        autoCapitalize="none"
        hint={`Your availability page is at /available/${form.values.slug}. Changing it breaks links that are out.`}
      />
      <SubmitButton label="Save fishroom" />
    </Form>
  );
}

function RoomFacts({ page }: { page: RoomPage }) {
  const units = UNIT_SYSTEMS.find(({ value }) => value === systemOf(page.units))?.word ?? '';
  return (
    <KeyValues
      pairs={[
        { key: 'Name', value: page.name },
        { key: 'Place', value: page.place ?? 'not given' },
        { key: 'Time zone', value: page.timeZone.replaceAll('_', ' ') },
        { key: 'Currency', value: page.currency },
        { key: 'Units', value: units, note: 'You may read in your own: Name and units' },
      ]}
    />
  );
}
