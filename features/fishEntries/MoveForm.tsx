import { useRouter } from 'expo-router';
import type * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { PickField } from '@/components/form/PickGrid';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { EntryPage } from '@/features/entries/EntryPage';
import { Part } from '@/features/entries/Part';
import { TankChoice } from '@/features/entries/TankChoice';
import { TankWords } from '@/features/entries/TankLine';
import { residentsWords, useTanks } from '@/features/entries/tanks';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import type { FishRow } from '@/shared/fish/contract';
import type { Resident, TankRow } from '@/shared/tanks/contract';
import { MoveCheck } from './MoveCheck';
import { APART, keyOf, MoveDraft, moveOf, ONE_FISH } from './moving';
import { useFish, useTodayFacts } from './queries';
import type { Moving } from './stocked';
import { WhichFish } from './WhichFish';

type Props = {
  tankId?: string | undefined;
  colonyId?: string | undefined;
  batchId?: string | undefined;
  fishId?: string | undefined;
};

/** A colony, a batch or part of it, or a single fish goes to another tank. */
export function MoveForm({ tankId, colonyId, batchId, fishId }: Props) {
  const router = useRouter();
  const { data: tanks } = useTanks();
  const { data: fish } = useFish();
  if (!tanks || !fish) {
    return (
      <Screen title="Move" low measure>
        <Loading label="Loading the tanks" />
      </Screen>
    );
  }
  const one = fish.find(({ id }) => id === fishId);
  const home = tanks.find(({ residents }) => residents.some(({ id }) => id === colonyId || id === batchId));
  const from = tanks.find(({ id }) => id === (one?.tank?.id ?? home?.id ?? tankId)) ?? null;
  if (!from && !one) {
    return (
      <TankChoice
        title="Move"
        form="move"
        suits={({ residents }) => residents.length > 0}
        onPick={(tank) => router.setParams({ tank })}
      />
    );
  }
  const what = one ? ONE_FISH : colonyId ? `colony:${colonyId}` : batchId ? `batch:${batchId}` : '';
  return <Fields key={from?.id} from={from} tanks={tanks} fish={fish} what={what} fishId={fishId ?? ''} />;
}

type FieldsProps = { from: TankRow | null; tanks: TankRow[]; fish: FishRow[]; what: string; fishId: string };

function Fields({ from, tanks, fish, what, fishId }: FieldsProps) {
  const { today } = useRoom();
  const { data: facts } = useTodayFacts();
  const residents = from?.residents ?? [];
  const only = residents.length === 1 && residents[0]?.thing === 'batch' ? keyOf(residents[0]) : '';
  const start: z.input<typeof MoveDraft> = {
    what: what || only,
    fishId,
    heads: '',
    toTankId: '',
    joins: APART,
    colony: 'leave',
    onDay: today,
    note: '',
  };
  const entry = useEntryForm({
    title: 'Move',
    draft: `move:${from?.id ?? fishId}`,
    schema: MoveDraft,
    start,
    content: (value, idOf) => moveOf(value, from, tankOf(value.toTankId), idOf),
  });
  const tankOf = (id: string) => tanks.find((tank) => tank.id === id);
  const { values } = entry.form;
  const moved = residents.find((one) => keyOf(one) === values.what);
  const to = tankOf(values.toTankId);
  const here = fish.filter((one) => (from ? one.tank?.id === from.id : one.id === fishId));
  const moving = movingOf(values, moved);
  return (
    <EntryPage entry={entry} subtitle={<TankWords tank={from} />} saveLabel="Save move">
      <WhatMoves residents={residents} single={here.length > 0} />
      {values.what === ONE_FISH ? <WhichFish fish={here} label="Which fish?" anonymous /> : null}
      {moved?.thing === 'batch' ? (
        <NumberField
          name="heads"
          label="How many"
          unit="heads"
          whole
          hint={`Empty: all ${moved.heads}. A part becomes a batch of its own.`}
        />
      ) : null}
      <SelectField
        name="toTankId"
        label="To which tank"
        options={tanks
          .filter(({ id }) => id !== from?.id)
          .map((tank) => ({
            value: tank.id,
            code: tank.code,
            word: residentsWords(tank),
            ...(tank.place ? { note: tank.place } : {}),
          }))}
      />
      {to && values.what === ONE_FISH ? <ItsColony to={to} /> : null}
      {to && moved?.thing === 'batch' ? <MixOrNot to={to} /> : null}
      {to && moving && facts ? <MoveCheck tank={to} moving={moving} fish={fish} facts={facts} /> : null}
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}

function movingOf({ what, fishId, heads }: z.input<typeof MoveDraft>, moved: Resident | undefined): Moving | null {
  if (what === ONE_FISH) return fishId ? { thing: 'fish', id: fishId, heads: 1 } : null;
  if (!moved) return null;
  const typed = Number(heads);
  return { thing: moved.thing, id: moved.id, heads: heads && typed > 0 ? typed : moved.heads };
}

function WhatMoves({ residents, single }: { residents: readonly Resident[]; single: boolean }) {
  const of = (wanted: Resident['thing']) => residents.filter(({ thing }) => thing === wanted);
  const wholes = [...of('colony'), ...of('batch')];
  return (
    <Part title="What moves?">
      <PickField
        name="what"
        label="What moves?"
        columns={4}
        picks={[
          ...wholes.map((one) => ({
            value: keyOf(one),
            word: one.thing === 'colony' ? `All of ${one.code}` : one.code,
            note: `${one.heads} ${one.thing === 'batch' ? 'heads' : 'fish'}`,
          })),
          ...(single ? [{ value: ONE_FISH, word: 'One fish' }] : []),
        ]}
      />
    </Part>
  );
}

function ItsColony({ to }: { to: TankRow }) {
  const colony = to.residents.find(({ thing }) => thing === 'colony');
  return (
    <SegmentedField
      name="colony"
      label="Its colony"
      choices={[
        { value: 'leave', word: 'Leaves it' },
        { value: 'stay', word: 'Stays in it' },
        ...(colony ? [{ value: 'join' as const, word: `Joins ${colony.code}` }] : []),
      ]}
    />
  );
}

function MixOrNot({ to }: { to: TankRow }) {
  const batches = to.residents.filter(({ thing }) => thing === 'batch');
  if (batches.length === 0) return null;
  return (
    <SegmentedField
      name="joins"
      label="In the new tank"
      hint="Mixed, they can’t be told apart again: each brood has its share of the heads."
      choices={[
        { value: APART, word: 'Kept apart' },
        ...batches.map(({ id, code }) => ({ value: id, word: `Mixed with ${code}` })),
      ]}
    />
  );
}
