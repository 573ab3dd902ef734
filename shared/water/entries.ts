import * as z from 'zod/mini';
import { LOSS_CAUSES } from '../broods/headEntry';
import { DayText } from '../days';
import { Id } from '../ids';
import { Heads, line, Note } from '../shapes';
import { CaCo3MgL, Celsius, MicroSiemens, NitrogenMgL, Percent, Ph } from '../units';

/** What the kit showed, in the kit's own unit, so that the screen can show it as it was read. */
const AsRead = z.record(z.string(), z.strictObject({ value: z.number(), unit: z.string() }));

const someReading = (test: Record<string, unknown>) =>
  [
    'celsius',
    'ph',
    'ghCaCo3MgL',
    'khCaCo3MgL',
    'totalAmmoniaNMgL',
    'nitriteNMgL',
    'nitrateNMgL',
    'conductivityUs',
  ].some((key) => test[key] !== null);

const WaterTested = z
  .strictObject({
    kind: z.literal('waterTested'),
    tankId: Id,
    onDay: DayText,
    celsius: z.nullable(Celsius),
    ph: z.nullable(Ph),
    ghCaCo3MgL: z.nullable(CaCo3MgL),
    khCaCo3MgL: z.nullable(CaCo3MgL),
    totalAmmoniaNMgL: z.nullable(NitrogenMgL),
    nitriteNMgL: z.nullable(NitrogenMgL),
    nitrateNMgL: z.nullable(NitrogenMgL),
    conductivityUs: z.nullable(MicroSiemens),
    asRead: AsRead,
    note: Note,
  })
  .check(z.refine(someReading, 'Type at least one reading'));

const WaterChanged = z.strictObject({
  kind: z.literal('waterChanged'),
  tankId: Id,
  onDay: DayText,
  percent: Percent.check(z.gt(0, 'Must be above zero')),
  note: Note,
});

const TreatmentStarted = z.strictObject({
  kind: z.literal('treatmentStarted'),
  careId: Id,
  tankId: Id,
  onDay: DayText,
  what: line(120, 'Say what was given'),
  why: line(200, 'Say what it is for'),
  dose: z.nullable(line(120, 'Type the dose, or leave it empty')),
  /** Planned end; null: until ended. */
  untilDay: z.nullable(DayText),
  note: Note,
});

const TreatmentEnded = z.strictObject({ kind: z.literal('treatmentEnded'), careId: Id, onDay: DayText, note: Note });

const QuarantineStarted = z.strictObject({
  kind: z.literal('quarantineStarted'),
  careId: Id,
  tankId: Id,
  onDay: DayText,
  untilDay: z.nullable(DayText),
  why: z.nullable(line(200, 'Say why, or leave it empty')),
  note: Note,
});

const SeenWell = z.strictObject({ kind: z.literal('seenWell'), tankId: Id, onDay: DayText, note: Note });

/** One incident over many tanks: a power cut, a heater, a rack that moved; with what died in it. */
const Incident = z.strictObject({
  kind: z.literal('incident'),
  tankIds: z.array(Id).check(z.minLength(1, 'Choose at least one tank'), z.maxLength(200, 'At most 200 tanks')),
  onDay: DayText,
  what: line(200, 'Say what happened'),
  losses: z.array(z.strictObject({ batchId: Id, heads: Heads, cause: z.enum(LOSS_CAUSES, 'Choose a cause') })),
  fishDied: z.array(Id),
  note: Note,
});

export const waterEntries = [
  WaterTested,
  WaterChanged,
  TreatmentStarted,
  TreatmentEnded,
  QuarantineStarted,
  SeenWell,
  Incident,
] as const;
