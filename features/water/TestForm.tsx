import { View } from 'react-native';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { TextField } from '@/components/form/TextField';
import { space } from '@/components/theme/space';
import { Beside } from '@/features/entries/Beside';
import { EntryPage } from '@/features/entries/EntryPage';
import { Part } from '@/features/entries/Part';
import { TankWords } from '@/features/entries/TankLine';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { formatShortDay } from '@/shared/days';
import type { TankRow } from '@/shared/tanks/contract';
import {
  formatAmmonia,
  formatConductivity,
  formatHardness,
  formatNitrate,
  formatNitrite,
  formatPh,
  formatTemperature,
} from '@/shared/unitWords';
import { Findings } from './Findings';
import { InTank } from './InTank';
import type { TankWater } from './queries';
import { emptyTest, type ReadingName, readingWords, testDraft, testOf } from './testing';

/** The readings of a kit, in its own units; what they mean is said while they are typed. */
export function TestForm({ tankId }: { tankId?: string | undefined }) {
  return (
    <InTank title="Water test" form="water-test" tankId={tankId}>
      {(tank, water) => <Fields key={tank.id} tank={tank} water={water} />}
    </InTank>
  );
}

const LINES: readonly (readonly ReadingName[])[] = [
  ['celsius', 'ph'],
  ['totalAmmoniaNMgL', 'nitriteNMgL'],
  ['nitrateNMgL', 'conductivityUs'],
  ['ghCaCo3MgL', 'khCaCo3MgL'],
];

function Fields({ tank, water }: { tank: TankRow; water: TankWater }) {
  const { today, units } = useRoom();
  const entry = useEntryForm({
    title: 'Water test',
    draft: `waterTest:${tank.id}`,
    schema: testDraft(units),
    start: emptyTest(today),
    content: (test, _idOf, typed) => testOf(tank.id, test, typed, units),
  });
  const words = readingWords(units);
  const { latest } = water.now ?? {};
  const last = lastOf(latest ?? null, units);
  return (
    <EntryPage entry={entry} subtitle={<TankWords tank={tank} />} saveLabel="Save test">
      <Part title="Readings" aside={latest ? `last ${formatShortDay(latest.onDay)}` : 'never tested yet'}>
        <View style={{ gap: space[4] }}>
          {LINES.map((line) => (
            <Beside key={line[0]}>
              {line.map((name) => (
                <NumberField
                  name={name}
                  key={name}
                  {...words[name]}
                  {...(last[name] ? { hint: `last ${last[name]}` } : {})}
                />
              ))}
            </Beside>
          ))}
        </View>
      </Part>
      <Findings draft={entry.form.values} water={water} />
      <Part title="When">
        <DateField name="onDay" label="When" quiet today={today} />
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}

type Latest = NonNullable<TankWater['now']>['latest'];

/** The last value of each reading in words, beside the field. */
function lastOf(latest: Latest, units: ReturnType<typeof useRoom>['units']): Partial<Record<ReadingName, string>> {
  if (!latest) return {};
  const { celsius, ph, totalAmmoniaNMgL, nitriteNMgL, nitrateNMgL, ghCaCo3MgL, khCaCo3MgL, conductivityUs } = latest;
  const said = (value: number | null, word: (value: number) => string) => (value === null ? '' : word(value));
  return {
    celsius: said(celsius, (value) => formatTemperature(value, units)),
    ph: said(ph, formatPh),
    totalAmmoniaNMgL: said(totalAmmoniaNMgL, (value) => formatAmmonia(value, units)),
    nitriteNMgL: said(nitriteNMgL, (value) => formatNitrite(value, units)),
    nitrateNMgL: said(nitrateNMgL, (value) => formatNitrate(value, units)),
    ghCaCo3MgL: said(ghCaCo3MgL, (value) => formatHardness(value, 'GH', units)),
    khCaCo3MgL: said(khCaCo3MgL, (value) => formatHardness(value, 'KH', units)),
    conductivityUs: said(conductivityUs, formatConductivity),
  };
}
