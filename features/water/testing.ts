import * as z from 'zod/mini';
import { NoteDraft } from '@/features/entries/note';
import { DayText } from '@/shared/days';
import type { ContentOf } from '@/shared/record/kinds';
import {
  orBlank,
  spelledAmmonia,
  spelledConductivity,
  spelledHardness,
  spelledNitrate,
  spelledNitrite,
  spelledPh,
  spelledTemperature,
} from '@/shared/spelled';
import type { UnitChoices } from '@/shared/units';

/** A test as it is typed, in the kit's and the reader's units. */
export const testDraft = (units: UnitChoices) =>
  z
    .strictObject({
      celsius: orBlank(spelledTemperature(units)),
      ph: orBlank(spelledPh),
      totalAmmoniaNMgL: orBlank(spelledAmmonia(units)),
      nitriteNMgL: orBlank(spelledNitrite(units)),
      nitrateNMgL: orBlank(spelledNitrate(units)),
      ghCaCo3MgL: orBlank(spelledHardness(units)),
      khCaCo3MgL: orBlank(spelledHardness(units)),
      conductivityUs: orBlank(spelledConductivity),
      onDay: DayText,
      note: NoteDraft,
    })
    .check(
      z.refine((test) => READINGS.some((name) => test[name] !== null), {
        error: 'Type at least one reading',
        path: ['celsius'],
      }),
    );

const READINGS = [
  'celsius',
  'ph',
  'totalAmmoniaNMgL',
  'nitriteNMgL',
  'nitrateNMgL',
  'ghCaCo3MgL',
  'khCaCo3MgL',
  'conductivityUs',
] as const;
export type ReadingName = (typeof READINGS)[number];
export type Test = z.output<ReturnType<typeof testDraft>>;
export type TestDraft = z.input<ReturnType<typeof testDraft>>;

export const emptyTest = (today: string): TestDraft => ({
  celsius: '',
  ph: '',
  totalAmmoniaNMgL: '',
  nitriteNMgL: '',
  nitrateNMgL: '',
  ghCaCo3MgL: '',
  khCaCo3MgL: '',
  conductivityUs: '',
  onDay: today,
  note: '',
});

/** What each reading is called, and the unit that is typed. */
export function readingWords(units: UnitChoices): Record<ReadingName, { label: string; unit: string }> {
  const hardness = units.hardness === 'ppm' ? 'ppm' : null;
  return {
    celsius: { label: 'Temperature', unit: units.temperature === 'C' ? '°C' : '°F' },
    ph: { label: 'pH', unit: '' },
    totalAmmoniaNMgL: { label: 'Total ammonia', unit: `mg/L ${units.ammoniaAs}` },
    nitriteNMgL: { label: 'Nitrite', unit: `mg/L ${units.nitriteAs}` },
    nitrateNMgL: { label: 'Nitrate', unit: `mg/L ${units.nitrateAs}` },
    ghCaCo3MgL: { label: 'General hardness', unit: hardness ?? 'dGH' },
    khCaCo3MgL: { label: 'Carbonate hardness', unit: hardness ?? 'dKH' },
    conductivityUs: { label: 'Conductivity', unit: 'µS/cm' },
  };
}

/** What was read so far: fields that are empty or not yet a number say nothing. */
export function readSoFar(draft: TestDraft, units: UnitChoices): Omit<Test, 'onDay' | 'note'> {
  const { shape } = testDraft(units);
  const of = (name: ReadingName): number | null => z.safeParse(shape[name], draft[name] || undefined).data ?? null;
  return {
    celsius: of('celsius'),
    ph: of('ph'),
    totalAmmoniaNMgL: of('totalAmmoniaNMgL'),
    nitriteNMgL: of('nitriteNMgL'),
    nitrateNMgL: of('nitrateNMgL'),
    ghCaCo3MgL: of('ghCaCo3MgL'),
    khCaCo3MgL: of('khCaCo3MgL'),
    conductivityUs: of('conductivityUs'),
  } as Omit<Test, 'onDay' | 'note'>; // brands: each was read by its own field's shape
}

/** The entry, with what the kit showed beside what is stored of it. */
export function testOf(tankId: string, test: Test, draft: TestDraft, units: UnitChoices): ContentOf<'waterTested'> {
  const words = readingWords(units);
  const asRead = Object.fromEntries(
    READINGS.filter((name) => test[name] !== null).map((name) => [
      name,
      { value: Number((draft[name] ?? '').replace(',', '.')), unit: words[name].unit || 'pH' },
    ]),
  );
  return { kind: 'waterTested', tankId, ...test, asRead };
}
