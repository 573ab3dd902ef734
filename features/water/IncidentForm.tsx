import { useQuery } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { Button } from '@/components/ui/Button';
import { Caution } from '@/components/ui/Caution';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { call } from '@/features/call';
import { EntryPage } from '@/features/entries/EntryPage';
import { Part } from '@/features/entries/Part';
import { useTanks } from '@/features/entries/tanks';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useLeave } from '@/features/entries/useLeave';
import { useRoom } from '@/hooks/useRoom';
import { LOSS_CAUSE_WORDS, LOSS_CAUSES } from '@/shared/broods/headEntry';
import { type FishRow, listFish } from '@/shared/fish/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { ButtonWrap } from './ButtonWrap';
import { IncidentDraft, incidentOf, USUAL_INCIDENTS } from './happening';
import { IncidentLosses } from './IncidentLosses';
import { IncidentTanks } from './IncidentTanks';

/** One thing that happened to many tanks, with what died of it, as one record. */
export function IncidentForm({ tankId }: { tankId?: string | undefined }) {
  const room = useRoom();
  const leave = useLeave();
  const { data: tanks } = useTanks();
  const fish = useQuery({
    queryKey: [room.id, 'record', 'fish'],
    queryFn: ({ signal }) => call(listFish, { params: { roomId: room.id }, signal }),
    select: (told): FishRow[] => told.fish.filter(({ exit }) => exit === null),
  });
  if (!tanks || !fish.data) {
    return (
      <Screen title="Incident" close={{ label: 'Close Incident', onPress: () => leave() }} low measure>
        <Loading label="Loading the tanks" />
      </Screen>
    );
  }
  return <Fields tanks={tanks} fish={fish.data} tankId={tankId} />;
}

type FieldsProps = { tanks: TankRow[]; fish: FishRow[]; tankId: string | undefined };

function Fields({ tanks, fish, tankId }: FieldsProps) {
  const room = useRoom();
  const start: z.input<typeof IncidentDraft> = {
    what: '',
    tankIds: tankId ? [tankId] : [],
    cause: 'equipment',
    losses: {},
    fishDied: [],
    onDay: room.today,
    note: '',
  };
  const hit = (tankIds: readonly string[]) => {
    const batches = tanks.filter(({ id }) => tankIds.includes(id)).flatMap(({ residents }) => residents);
    const swimmers = fish.filter(({ tank }) => tank && tankIds.includes(tank.id));
    return new Set([...batches, ...swimmers].map(({ id }) => id));
  };
  const entry = useEntryForm({
    title: 'Incident',
    draft: 'incident',
    schema: IncidentDraft,
    start,
    content: (value) => incidentOf(value, (id) => hit(value.tankIds).has(id)),
  });
  const { tankIds, what } = entry.form.values;
  return (
    <EntryPage entry={entry} saveLabel="Save incident">
      <Part title="What happened?">
        <ButtonWrap>
          {USUAL_INCIDENTS.map((usual) => (
            <Button
              key={usual}
              label={usual}
              small
              kind={what === usual ? 'primary' : 'plain'}
              onPress={() => void entry.form.setFieldValue('what', usual)}
            />
          ))}
        </ButtonWrap>
        <TextField name="what" label="In words" needed />
      </Part>
      <Caution words="Electricity and water: switch off at the socket before you reach in or touch a wet plug." />
      <IncidentTanks tanks={tanks} />
      <IncidentLosses
        batches={tanks
          .filter(({ id }) => tankIds.includes(id))
          .flatMap(({ residents, code }) =>
            residents
              .filter(({ thing, heads }) => thing === 'batch' && heads > 0)
              .map((batch) => ({ ...batch, tank: code })),
          )}
        fish={fish.filter(({ tank }) => tank && tankIds.includes(tank.id))}
      />
      <SelectField
        name="cause"
        label="Losses put down to"
        options={LOSS_CAUSES.map((cause) => ({ value: cause, word: LOSS_CAUSE_WORDS[cause] }))}
      />
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={room.today} hint={`Recorded by ${room.accountName}`} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
