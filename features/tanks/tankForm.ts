import * as z from 'zod/mini';
import { TypedNote, typedLine } from '@/shared/shapes';
import { orBlank, spelledHeads, spelledSide, spelledTemperature, spelledVolume } from '@/shared/spelled';
import { TankFacts, type TankRow } from '@/shared/tanks/contract';
import type { UnitChoices } from '@/shared/units';

/** A tank as it is typed, in the person's units. */
export const tankDraft = (units: UnitChoices) =>
  z.strictObject({
    ...TankFacts.shape,
    place: typedLine(80),
    walkOrder: spelledHeads(TankFacts.shape.walkOrder),
    litres: spelledVolume(units),
    heaterC: orBlank(spelledTemperature(units)),
    lengthTenthsMm: orBlank(spelledSide(units)),
    widthTenthsMm: orBlank(spelledSide(units)),
    heightTenthsMm: orBlank(spelledSide(units)),
    fillTenthsMm: orBlank(spelledSide(units)),
    glassTenthsMm: orBlank(spelledSide(units)),
    note: TypedNote,
  });

export type TankDraft = z.input<ReturnType<typeof tankDraft>>;

export const emptyTank = (code: string, walkOrder: number): TankDraft => ({
  code,
  place: '',
  walkOrder: String(walkOrder),
  purpose: 'colony',
  litres: '',
  heaterC: '',
  lengthTenthsMm: '',
  widthTenthsMm: '',
  heightTenthsMm: '',
  fillTenthsMm: '',
  glassTenthsMm: '',
  standKg: null,
  note: '',
});

export function tankAsTyped(tank: TankRow, units: UnitChoices): TankDraft {
  const { id: _id, version: _version, residents: _residents, retiredOn: _retired, ...facts } = tank;
  return z.encode(tankDraft(units), facts);
}
