import type * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { TextField } from '@/components/form/TextField';
import { Caution } from '@/components/ui/Caution';
import { EntryPage } from '@/features/entries/EntryPage';
import { Part } from '@/features/entries/Part';
import { TankWords } from '@/features/entries/TankLine';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { addDays } from '@/shared/days';
import type { TankRow } from '@/shared/tanks/contract';
import { InTank } from './InTank';
import type { TankWater } from './queries';
import { RunningCare } from './RunningCare';
import { TREATMENT_CAUTION, TreatingDraft, treatingOf } from './treating';

/** A treatment or a quarantine begins; those that run can be ended here. */
export function TreatmentForm({ tankId }: { tankId?: string | undefined }) {
  return (
    <InTank title="Treatment" form="treatment" tankId={tankId}>
      {(tank, water) => <Fields key={tank.id} tank={tank} water={water} />}
    </InTank>
  );
}

function Fields({ tank, water }: { tank: TankRow; water: TankWater }) {
  const { today } = useRoom();
  const start: z.input<typeof TreatingDraft> = {
    as: 'treatment',
    what: '',
    why: '',
    dose: '',
    onDay: today,
    untilDay: '',
    note: '',
  };
  const entry = useEntryForm({
    title: 'Treatment',
    draft: `treatment:${tank.id}`,
    schema: TreatingDraft,
    start,
    content: (value, idOf) => treatingOf(tank.id, value, idOf),
  });
  const medicine = entry.form.values.as === 'treatment';
  return (
    <EntryPage
      entry={entry}
      subtitle={<TankWords tank={tank} />}
      saveLabel={medicine ? 'Save treatment' : 'Save quarantine'}
    >
      <RunningCare care={water.care} end={entry.record} />
      <SegmentedField
        name="as"
        label="What begins"
        choices={[
          { value: 'treatment', word: 'Treatment' },
          { value: 'quarantine', word: 'Quarantine' },
        ]}
      />
      {medicine ? (
        <>
          <TextField name="what" label="What is given" needed />
          <TextField name="why" label="What for" needed />
          <TextField
            name="dose"
            label="Dose"
            aside="if known"
            hint="As on the label: so much to so many litres, how often."
          />
          <Caution words={TREATMENT_CAUTION} />
        </>
      ) : (
        <TextField name="why" label="Why" aside="not needed" />
      )}
      <Part title="From">
        <DateField name="onDay" label="From" quiet today={today} />
      </Part>
      <Part title="Until" aside="empty: until it is ended">
        <DateField
          name="untilDay"
          label="Until"
          quiet
          today={today}
          latest={null}
          choices={[5, 7, 14, 28].map((days) => ({ word: `${days} days`, day: addDays(today, days) }))}
        />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
