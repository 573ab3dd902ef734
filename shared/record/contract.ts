import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { Instant, queryNumber } from '../shapes';
import { EntryContent, type EntryKind, UNDO_MINUTES } from './kinds';

export { type EntryKind, UNDO_MINUTES };

/**
 * What Record writes: one envelope for every kind. The id is made on the device, so sending twice stores once; the same id
 * with other content is a conflict. `dependsOn` names entries that must have been stored first (offline, in order).
 */
export const EntryDraft = z.strictObject({
  id: Id,
  madeAt: Instant,
  dependsOn: z.array(Id).check(z.maxLength(50, 'At most fifty')),
  content: EntryContent,
});
export type EntryDraft = z.output<typeof EntryDraft>;

const About = z.strictObject({
  thing: z.enum(['tank', 'colony', 'fish', 'hold', 'brood', 'batch', 'strain']),
  id: Id,
});
export type About = z.output<typeof About>;

/** An entry as history shows it. `said` is one line in the keeper's words. */
export const EntryLine = z.strictObject({
  id: Id,
  kind: z.string(),
  onDay: DayText,
  madeAt: z.string(),
  receivedAt: z.string(),
  by: z.strictObject({ id: Id, name: z.string() }),
  said: z.string(),
  about: z.array(About),
  /** Rows it made, by what they are, such as { brood: id }. */
  made: z.record(z.string(), z.string()),
  undone: z.nullable(z.strictObject({ at: z.string(), by: z.string() })),
  /** Until this instant it can be undone outright, if nothing was built on it. */
  undoUntil: z.string(),
});
export type EntryLine = z.output<typeof EntryLine>;

export const recordEntry = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/entries',
  needs: 'entry:record',
  params: inRoom({}),
  body: EntryDraft,
  output: EntryLine,
});

export const undoEntry = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/entries/:entryId/undo',
  needs: 'entry:record',
  params: inRoom({ entryId: Id }),
  output: EntryLine,
});

export const listEntries = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/entries',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({
    thing: z.optional(z.enum(['tank', 'colony', 'fish', 'hold', 'brood', 'batch', 'strain'])),
    thingId: z.optional(Id),
    limit: z.optional(queryNumber(500)),
    before: z.optional(z.string()),
  }),
  output: z.strictObject({ entries: z.array(EntryLine) }),
});
