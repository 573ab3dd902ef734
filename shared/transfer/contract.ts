import * as z from 'zod/mini';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { line } from '../shapes';
import { IMPORT_KINDS } from './importFields';

/** What a look at everything that is stored found. All lists are empty when all is well. */
export const IntegrityReport = z.strictObject({
  /** 'ok', or what SQLite found wrong with its file. */
  database: z.string(),
  references: z.array(z.strictObject({ table: z.string(), to: z.string(), count: z.number() })),
  /** How many pictures were compared with their rows. */
  pictures: z.number(),
  /** Pictures whose row is there and whose files are not; whose files are not those that were stored; without a row. */
  missing: z.array(Id),
  damaged: z.array(Id),
  unclaimed: z.array(Id),
  /** Batches out of which more fish went alive than ever came in. */
  belowZero: z.array(Id),
});
export type IntegrityReport = z.output<typeof IntegrityReport>;

/** Looks at the database's file, and at this fishroom's pictures and head counts. Hashes every picture: takes a while. */
export const checkIntegrity = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/integrity',
  needs: 'data:export',
  params: inRoom({}),
  output: IntegrityReport,
});

/** The whole fishroom as a zip: JSON lines by table and the pictures. README.md describes it. */
export const exportArchive = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/export/archive',
  needs: 'data:export',
  kind: 'file',
  params: inRoom({}),
  output: z.unknown(),
});

/** Every table as CSV, in a zip. */
export const exportTables = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/export/tables',
  needs: 'data:export',
  kind: 'file',
  params: inRoom({}),
  output: z.unknown(),
});

/** A form with the archive in `file`. Makes a fishroom of it, which belongs to whoever sends it. */
export const importArchive = endpoint({
  method: 'POST',
  path: '/api/archives',
  needs: 'signedIn',
  kind: 'upload',
  output: z.strictObject({ id: Id }),
});

/** Days between the word and the deed. */
export const WAITING_DAYS = 14;

const Deletion = z.strictObject({ deleteAfter: z.nullable(z.string()) });

export const readDeletion = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/deletion',
  needs: 'room:manage',
  params: inRoom({}),
  output: Deletion,
});

/** The fishroom's name is typed to confirm. */
export const askDeletion = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/deletion',
  needs: 'room:manage',
  params: inRoom({}),
  body: z.strictObject({ name: z.string('Type its name').check(z.maxLength(200, 'Type its name')) }),
  output: Deletion,
});

export const cancelDeletion = endpoint({
  method: 'DELETE',
  path: '/api/rooms/:roomId/deletion',
  needs: 'room:manage',
  params: inRoom({}),
  output: Deletion,
});

/** The password once more, where the account has one. */
export const deleteAccount = endpoint({
  method: 'POST',
  path: '/api/me/delete',
  needs: 'signedIn',
  body: z.strictObject({ current: z.nullable(z.string('Type your password').check(z.maxLength(200, 'Too long'))) }),
  output: z.strictObject({ ok: z.literal(true) }),
});

export const ImportAsk = z.strictObject({
  kind: z.enum(IMPORT_KINDS, 'Choose what the file holds'),
  fileName: line(200, 'Name the file'),
  text: z.string('Choose a file').check(z.maxLength(180_000, 'At most 180 000 letters: split the file')),
  /** Null: guessed from the header, or as remembered from the last file of the kind. */
  columns: z.nullable(z.record(z.string(), z.nullable(z.string()))),
  units: z.strictObject({
    length: z.enum(['mm', 'cm', 'in'], 'Choose a unit'),
    temperature: z.enum(['C', 'F'], 'Choose a unit'),
    volume: z.enum(['L', 'usGal', 'impGal'], 'Choose a unit'),
  }),
});
export type ImportAsk = z.output<typeof ImportAsk>;

/** `row` is the line as a spreadsheet numbers it; the header is 1. */
const BadLine = z.strictObject({ row: z.number(), column: z.string(), value: z.string(), why: z.string() });
export type BadLine = z.output<typeof BadLine>;

const ImportLine = z.strictObject({
  id: Id,
  kind: z.enum(IMPORT_KINDS),
  fileName: z.string(),
  rows: z.number(),
  createdAt: z.string(),
  undoneAt: z.nullable(z.string()),
});
export type ImportLine = z.output<typeof ImportLine>;

/** Stores nothing: names every line and value that would be refused. */
export const previewImport = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/imports/preview',
  needs: 'data:import',
  params: inRoom({}),
  body: ImportAsk,
  output: z.strictObject({
    headers: z.array(z.string()),
    columns: z.record(z.string(), z.nullable(z.string())),
    /** Headers that are months or days and hold head counts. */
    counts: z.array(z.string()),
    rows: z.number(),
    sample: z.array(z.array(z.string())),
    /** Needed fields that no column was found for. */
    missing: z.array(z.string()),
    bad: z.array(BadLine),
    badRows: z.number(),
  }),
});

/** All lines or none. */
export const runImport = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/imports',
  needs: 'data:import',
  params: inRoom({}),
  body: ImportAsk,
  output: ImportLine,
});

export const listImports = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/imports',
  needs: 'data:import',
  params: inRoom({}),
  output: z.strictObject({ imports: z.array(ImportLine) }),
});

/** Takes a whole import back, while nothing was built on it. */
export const undoImport = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/imports/:importId/undo',
  needs: 'data:import',
  params: inRoom({ importId: Id }),
  output: ImportLine,
});
