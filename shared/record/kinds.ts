import * as z from 'zod/mini';
import { broodEntries } from '../broods/entries';
import { fishEntries } from '../fish/entries';
import { growthEntries } from '../growth/entries';
import { holdEntries } from '../holds/entries';
import { photoEntries } from '../photos/entries';
import { waterEntries } from '../water/entries';

/** Within these minutes an entry that nothing was built on is removed by Undo; later it is corrected by another entry. */
export const UNDO_MINUTES = 10;

/** Every kind of entry. A feature adds its own shapes in `shared/<feature>/entries.ts`; the server adds what they do. */
export const EntryContent = z.discriminatedUnion(
  'kind',
  [...fishEntries, ...holdEntries, ...broodEntries, ...growthEntries, ...photoEntries, ...waterEntries],
  'That kind of entry is not known',
);
export type EntryContent = z.output<typeof EntryContent>;
export type EntryKind = EntryContent['kind'];
export type ContentOf<K extends EntryKind> = Extract<EntryContent, { kind: K }>;
