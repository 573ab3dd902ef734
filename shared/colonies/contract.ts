import * as z from 'zod/mini';
import { ColonyCode } from '../codes';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { FishRow } from '../fish/contract';
import { Id } from '../ids';
import { HeadsOrNone, Note, Version } from '../shapes';

const ColonyFacts = z.strictObject({
  code: ColonyCode,
  strainId: Id,
  startedOn: DayText,
  note: Note,
});

export const ColonyRow = z.strictObject({
  id: Id,
  version: Version,
  ...ColonyFacts.shape,
  endedOn: z.nullable(DayText),
  strainCode: z.string(),
  speciesId: z.string(),
  displayName: z.string(),
  locality: z.nullable(z.string()),
  tank: z.nullable(z.strictObject({ id: Id, code: z.string() })),
  males: z.number(),
  females: z.number(),
  unsexed: z.number(),
  /** Females that hold, or pairs that guard, today. */
  openHolds: z.number(),
});
export type ColonyRow = z.output<typeof ColonyRow>;

export const listColonies = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/colonies',
  needs: 'stock:see',
  params: inRoom({}),
  output: z.strictObject({ colonies: z.array(ColonyRow) }),
});

export const readColony = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/colonies/:colonyId',
  needs: 'stock:see',
  params: inRoom({ colonyId: Id }),
  output: z.strictObject({
    colony: ColonyRow,
    members: z.array(FishRow),
    /** Those that left, with when and how. */
    former: z.array(z.strictObject({ fish: FishRow, fromDay: DayText, untilDay: DayText })),
  }),
});

/** A colony begins with the fish that go in: coded ones that are here already, and new founders without codes, counted by sex. */
export const addColony = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/colonies',
  needs: 'stock:write',
  params: inRoom({}),
  body: z.strictObject({
    id: Id,
    ...ColonyFacts.shape,
    tankId: Id,
    fishIds: z.array(Id).check(z.maxLength(200, 'At most 200 fish at once')),
    newFish: z.strictObject({
      males: HeadsOrNone,
      females: HeadsOrNone,
      unsexed: HeadsOrNone,
      lotId: z.nullable(Id),
      /** Give them codes at once; without, they stay anonymous until someone tells them apart. */
      coded: z.boolean('Say yes or no'),
    }),
  }),
  output: ColonyRow,
});

export const changeColony = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/colonies/:colonyId',
  needs: 'stock:write',
  params: inRoom({ colonyId: Id }),
  body: z.strictObject({
    version: Version,
    endedOn: z.nullable(DayText),
    code: ColonyCode,
    startedOn: DayText,
    note: Note,
  }),
  output: ColonyRow,
});
