import * as z from 'zod/mini';
import { RoomChange, RoomDraft } from '@/shared/rooms/contract';
import { METRIC, type UnitChoices, US } from '@/shared/units';

/** An empty field is no place. */
const TypedPlace = z.pipe(
  z.optional(z.string('Type text').check(z.maxLength(120, 'Keep it under 120 letters'))),
  z.transform((text: string | undefined) => text?.trim() || null),
);

/** Which set of units a fishroom begins with; each person may choose their own. */
export const UNIT_SYSTEMS = [
  { value: 'metric', word: 'cm, °C, litres' },
  { value: 'us', word: 'in, °F, US gal' },
] as const;

const System = z.enum(['metric', 'us'], 'Choose units');

const unitsOf = (system: z.output<typeof System>): UnitChoices => (system === 'us' ? US : METRIC);

export const systemOf = (units: UnitChoices): z.output<typeof System> => (units.length === 'in' ? 'us' : 'metric');

const { name, timeZone, currency } = RoomDraft.shape;
const fields = { name, timeZone, currency, place: TypedPlace, system: System };

export const NewRoomDraft = z.pipe(
  z.strictObject(fields),
  z.transform(({ system, ...room }) => ({ ...room, units: unitsOf(system) })),
);

export const RoomFormDraft = z.pipe(
  z.strictObject({ ...fields, slug: RoomChange.shape.slug }),
  z.transform(({ system, ...room }) => ({ ...room, units: unitsOf(system) })),
);
