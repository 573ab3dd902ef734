import * as z from 'zod/mini';
import { Id } from '../ids';

export const ARCHIVE_FORMAT = 'kinwater-archive';
export const ARCHIVE_VERSION = 1;

/** `kinwater.json`, the first file of an archive. README.md describes the rest. */
export const ArchiveNote = z.strictObject({
  format: z.literal(ARCHIVE_FORMAT),
  version: z.literal(ARCHIVE_VERSION),
  /** The last step of the database that the rows were written by. */
  schema: z.string(),
  roomId: Id,
  madeAt: z.string(),
});
export type ArchiveNote = z.output<typeof ArchiveNote>;

/** `people.json`: whoever is named in the rows; nothing of their account but the name. */
export const ArchivePeople = z.array(z.strictObject({ id: Id, name: z.string().check(z.maxLength(200)) }));
export type ArchivePeople = z.output<typeof ArchivePeople>;

/** A cell that a spreadsheet would take for a formula is shown as text (OWASP, CSV injection). Numbers stay numbers. */
export const safeCell = (cell: string): string => (/^[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell);
