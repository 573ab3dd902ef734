import * as z from 'zod/mini';
import { TankCode } from '../codes';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { line, Note, Version } from '../shapes';
import { Celsius, Litres, SideTenthsMm } from '../units';

export const TANK_PURPOSES = ['colony', 'growOut', 'nursery', 'quarantine', 'display'] as const;
export const TANK_PURPOSE_WORDS = {
  colony: 'Colony',
  growOut: 'Grow-out',
  nursery: 'Nursery or tumbler',
  quarantine: 'Quarantine',
  display: 'Display',
};

export const TankFacts = z.strictObject({
  code: TankCode,
  place: z.nullable(line(80, 'Type the place, or leave it empty')),
  walkOrder: z
    .number('Type a number')
    .check(z.int('A whole number'), z.minimum(0, 'From 0'), z.maximum(9999, 'At most 9999')),
  lengthTenthsMm: z.nullable(SideTenthsMm),
  widthTenthsMm: z.nullable(SideTenthsMm),
  heightTenthsMm: z.nullable(SideTenthsMm),
  /** Depth of the water. */
  fillTenthsMm: z.nullable(SideTenthsMm),
  glassTenthsMm: z.nullable(SideTenthsMm),
  standKg: z.nullable(
    z.number('Type a weight').check(z.minimum(0, 'Zero or more'), z.maximum(5000, 'That is over 5 t')),
  ),
  /** Water in it, typed or worked out from the sides. */
  litres: Litres,
  heaterC: z.nullable(Celsius),
  purpose: z.enum(TANK_PURPOSES, 'Choose what the tank is for'),
  note: Note,
});
export type TankFacts = z.output<typeof TankFacts>;

/** Who lives in a tank today, in short. */
export const Resident = z.strictObject({
  thing: z.enum(['colony', 'fish', 'batch']),
  id: Id,
  /** The colony's or fish's code; for a batch its broods' codes. */
  code: z.string(),
  strainId: z.nullable(Id),
  strainCode: z.nullable(z.string()),
  displayName: z.nullable(z.string()),
  heads: z.number(),
  since: DayText,
});
export type Resident = z.output<typeof Resident>;

export const Lodging = z.strictObject({
  name: z.string(),
  speciesId: z.string(),
  locality: z.nullable(z.string()),
  males: z.number(),
  females: z.number(),
  unsexed: z.number(),
  smallestMm: z.nullable(z.number()),
  largestMm: z.nullable(z.number()),
});

export const TankRow = z.strictObject({
  id: Id,
  version: Version,
  ...TankFacts.shape,
  retiredOn: z.nullable(DayText),
  residents: z.array(Resident),
});
export type TankRow = z.output<typeof TankRow>;

export const listTanks = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/tanks',
  needs: 'stock:see',
  params: inRoom({}),
  output: z.strictObject({ tanks: z.array(TankRow) }),
});

export const readTank = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/tanks/:tankId',
  needs: 'stock:see',
  params: inRoom({ tankId: Id }),
  output: z.strictObject({
    tank: TankRow,
    /** Who lives in it as the stocking check takes them: by species, sex and size. */
    lodgers: z.array(Lodging),
    /** Their species: the library's id, and what this fishroom set. */
    species: z.array(
      z.strictObject({
        id: z.string(),
        name: z.string(),
        about: z.nullable(z.record(z.string(), z.unknown())),
        overrides: z.record(z.string(), z.unknown()),
      }),
    ),
    /** Everyone who ever lived in it, newest first. */
    stays: z.array(z.strictObject({ resident: Resident, fromDay: DayText, untilDay: z.nullable(DayText) })),
  }),
});

export const addTank = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/tanks',
  needs: 'stock:write',
  params: inRoom({}),
  body: z.strictObject({ id: Id, ...TankFacts.shape }),
  output: TankRow,
});

export const changeTank = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/tanks/:tankId',
  needs: 'stock:write',
  params: inRoom({ tankId: Id }),
  body: z.strictObject({ version: Version, retiredOn: z.nullable(DayText), ...TankFacts.shape }),
  output: TankRow,
});
