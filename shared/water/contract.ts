import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';

export const WaterReading = z.strictObject({
  id: Id,
  tankId: Id,
  onDay: DayText,
  at: z.string(),
  source: z.enum(['test', 'logger']),
  celsius: z.nullable(z.number()),
  ph: z.nullable(z.number()),
  ghCaCo3MgL: z.nullable(z.number()),
  khCaCo3MgL: z.nullable(z.number()),
  totalAmmoniaNMgL: z.nullable(z.number()),
  nitriteNMgL: z.nullable(z.number()),
  nitrateNMgL: z.nullable(z.number()),
  conductivityUs: z.nullable(z.number()),
  asRead: z.nullable(z.record(z.string(), z.strictObject({ value: z.number(), unit: z.string() }))),
  note: z.nullable(z.string()),
  by: z.string(),
  entryId: z.nullable(Id),
});
export type WaterReading = z.output<typeof WaterReading>;

export const CARE_KINDS = ['waterChange', 'treatment', 'quarantine', 'filter', 'seenWell', 'incident'] as const;

export const Care = z.strictObject({
  id: Id,
  tankId: Id,
  kind: z.enum(CARE_KINDS),
  onDay: DayText,
  at: z.string(),
  untilDay: z.nullable(DayText),
  /** Ended by an entry of its own, rather than by its planned day. */
  ended: z.boolean(),
  percent: z.nullable(z.number()),
  what: z.nullable(z.string()),
  why: z.nullable(z.string()),
  dose: z.nullable(z.string()),
  note: z.nullable(z.string()),
  by: z.string(),
  entryId: z.nullable(Id),
});
export type Care = z.output<typeof Care>;

/** Water tests and care of one tank, or of all since a day; newest first. */
export const listWater = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/water',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({ tankId: z.optional(Id), since: z.optional(DayText) }),
  output: z.strictObject({ readings: z.array(WaterReading), care: z.array(Care) }),
});
