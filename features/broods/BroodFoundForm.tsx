import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { View } from 'react-native';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { space } from '@/components/theme/space';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import { Beside } from '@/features/entries/Beside';
import { EntryPage } from '@/features/entries/EntryPage';
import { Part } from '@/features/entries/Part';
import { TankChoice } from '@/features/entries/TankChoice';
import { useTanks } from '@/features/entries/tanks';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import type { FishRow } from '@/shared/fish/contract';
import type { StrainRow } from '@/shared/strains/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { FoundDraft, foundEntry, NOT_CLAIMED } from './broodFound';
import { ParentPicks } from './ParentPicks';
import { adultsQuery, broodCodeQuery, strainsQuery } from './queries';

const TITLE = 'Brood found';

/** Fry without a recorded hold: found in the tank, guarded by their parents, or brought in. */
export function BroodFoundForm({ tank: tankId }: { tank?: string | undefined }) {
  const { id: roomId } = useRoom();
  const router = useRouter();
  const { data: tanks } = useTanks();
  const { data: strains } = useQuery(strainsQuery(roomId));
  const { data: fish } = useQuery(adultsQuery(roomId));
  if (!tankId) return <TankChoice title={TITLE} form="brood-found" onPick={(tank) => router.setParams({ tank })} />;
  const tank = tanks?.find(({ id }) => id === tankId);
  if (!tank || !strains || !fish) return <Loading label="Loading" />;
  const here = fish.filter((one) => one.tank?.id === tankId && one.exit === null);
  return <WithCode tank={tank} strains={strains} here={here} />;
}

type CodeProps = { tank: TankRow; strains: StrainRow[]; here: FishRow[] };

function WithCode({ tank, strains, here }: CodeProps) {
  const { id: roomId, today } = useRoom();
  const living = new Set(here.flatMap(({ strainId }) => strainId ?? []));
  const strainId = living.size === 1 ? ([...living][0] ?? null) : null;
  const { data: code } = useQuery(broodCodeQuery(roomId, strainId, today));
  if (code === undefined) return <Loading label="Loading" />;
  return <Fields tank={tank} strains={strains} here={here} strainId={strainId} code={code} />;
}

function Fields({ tank, strains, here, strainId, code }: CodeProps & { strainId: string | null; code: string }) {
  const room = useRoom();
  const dams = here.filter(({ sex }) => sex !== 'male');
  const sires = here.filter(({ sex }) => sex !== 'female');
  const entry = useEntryForm({
    title: TITLE,
    draft: `broodFound:${tank.id}`,
    schema: FoundDraft,
    start: {
      start: 'found' as const,
      strainId: strainId ?? '',
      tankId: tank.id,
      code,
      onDay: room.today,
      spawnEarliest: room.today,
      spawnLatest: room.today,
      stage: 'freeSwimming' as const,
      heads: '',
      dams: dams.filter(({ sex }) => sex === 'female').map(({ id }) => id),
      sires: sires.map(({ id }) => id),
      note: '',
    },
    content: foundEntry,
    saved: ({ line }) => (line?.made['brood'] ? `/r/${room.id}/broods/${line.made['brood']}` : null),
  });
  const { start, strainId: claimed } = entry.form.values;
  return (
    <EntryPage entry={entry} subtitle={<Text tone="soft">{`in ${tank.code}`}</Text>} saveLabel="Save brood">
      <SegmentedField
        name="start"
        label="How they came"
        choices={[
          { value: 'found', word: 'Found' },
          { value: 'guarded', word: 'Guarded' },
          { value: 'acquired', word: 'Brought in' },
        ]}
      />
      <Part title="How many?" aside="empty if not counted">
        <View style={{ gap: space[4] }}>
          <NumberField name="heads" label="In all, alive" whole />
          <SegmentedField
            name="stage"
            label="They are"
            choices={[
              { value: 'eggs', word: 'Eggs' },
              { value: 'wrigglers', word: 'Wrigglers' },
              { value: 'freeSwimming', word: 'Free-swimming' },
            ]}
          />
        </View>
      </Part>
      <Part title="Spawned" aside="their age counts from here">
        <Beside>
          <DateField name="spawnEarliest" label="Not before" today={room.today} />
          <DateField name="spawnLatest" label="Not after" today={room.today} />
        </Beside>
      </Part>
      {start === 'acquired' ? (
        <Notice
          tone="look"
          words="Their parents are not known here. A lineage sheet that came with them can be taken in."
        />
      ) : (
        <Part title="Parents" aside={`each as likely; in ${tank.code} now`}>
          <ParentPicks name="dams" label="Possible mothers" fish={dams} />
          <ParentPicks name="sires" label="Possible fathers" fish={sires} />
        </Part>
      )}
      <Part title="The brood">
        <View style={{ gap: space[4] }}>
          <SelectField
            name="strainId"
            label="Strain"
            options={[
              ...strains.map((strain) => ({ value: strain.id, code: strain.code, word: strain.displayName })),
              { value: NOT_CLAIMED, word: 'None is claimed: a possible hybrid' },
            ]}
          />
          {claimed === NOT_CLAIMED ? (
            <Text size="small" tone="soft">
              No sheet will name a strain for these fish until it is settled.
            </Text>
          ) : null}
          <TextField name="code" label="Code" mono autoCapitalize="characters" />
          <DateField name="onDay" label="Found on" today={room.today} hint={`Recorded by ${room.accountName}`} />
          <TextField name="note" label="Note" aside="not needed" long />
        </View>
      </Part>
    </EntryPage>
  );
}
