import { View } from 'react-native';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { TextField } from '@/components/form/TextField';
import { space } from '@/components/theme/space';
import { Caution } from '@/components/ui/Caution';
import { Segmented } from '@/components/ui/Segmented';
import { EntryPage } from '@/features/entries/EntryPage';
import { NoteDraft } from '@/features/entries/note';
import { Part } from '@/features/entries/Part';
import { TankWords } from '@/features/entries/TankLine';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { DayText, fromToday } from '@/shared/days';
import { spelledPercent } from '@/shared/spelled';
import type { TankRow } from '@/shared/tanks/contract';
import { formatVolume } from '@/shared/unitWords';
import { WATER_CHANGE_CAUTION } from '@/shared/water/waterChange';
import { InTank } from './InTank';
import type { TankWater } from './queries';

const Draft = z.strictObject({ percent: spelledPercent, onDay: DayText, note: NoteDraft });

const USUAL = ['20', '30', '50', '75'] as const;
/** Where nothing was ever changed. Common practice, no source. */
const FIRST = '30';

/** How much of the water was changed. */
export function ChangeForm({ tankId }: { tankId?: string | undefined }) {
  return (
    <InTank title="Water change" form="water-change" tankId={tankId}>
      {(tank, water) => <Fields key={tank.id} tank={tank} water={water} />}
    </InTank>
  );
}

function Fields({ tank, water }: { tank: TankRow; water: TankWater }) {
  const { today, units } = useRoom();
  const { changedOn = null, changedPercent = null } = water.now ?? {};
  const entry = useEntryForm({
    title: 'Water change',
    draft: `waterChange:${tank.id}`,
    schema: Draft,
    start: { percent: changedPercent === null ? FIRST : String(changedPercent), onDay: today, note: '' },
    content: ({ percent, onDay, note }) => ({ kind: 'waterChanged', tankId: tank.id, percent, onDay, note }),
  });
  const { percent } = entry.form.values;
  const litres = (tank.litres * Number(percent.replace(',', '.'))) / 100;
  const isPart = Number.isFinite(litres) && litres > 0 && litres <= tank.litres;
  const last = changedOn
    ? `last ${fromToday(changedOn, today)}${changedPercent ? `, ${changedPercent} %` : ''}`
    : 'first one';
  return (
    <EntryPage entry={entry} subtitle={<TankWords tank={tank} />} saveLabel="Save water change">
      <Part title="How much?" aside={last}>
        <View style={{ gap: space[3] }}>
          <Segmented
            label="Usual parts"
            value={USUAL.find((one) => one === percent) ?? null}
            onChange={(value) => void entry.form.setFieldValue('percent', value)}
            choices={USUAL.map((value) => ({ value, word: `${value} %` }))}
          />
          <NumberField
            name="percent"
            label="Part of the water"
            unit="%"
            {...(isPart ? { hint: `${formatVolume(litres, units)} of ${formatVolume(tank.litres, units)}` } : {})}
          />
        </View>
      </Part>
      <Caution words={WATER_CHANGE_CAUTION} />
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}
