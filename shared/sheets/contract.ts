import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { line } from '../shapes';
import { SheetContent } from './content';
import { PublicJwk, Recalled } from './sheetFile';
import { Address } from './wording';

const Token = z.string('A sheet’s address is needed').check(z.regex(/^[\w-]{22}$/, 'That is not a sheet’s address'));

export const SheetRow = z.strictObject({
  id: Id,
  /** As printed: "2026-0031". */
  number: z.string(),
  token: z.string(),
  subject: z.strictObject({ thing: z.enum(['fish', 'brood']), id: Id, code: z.string() }),
  heads: z.number(),
  issuedOn: DayText,
  by: z.string(),
  state: z.enum(['valid', 'replaced', 'withdrawn']),
  replacedBy: z.nullable(z.string()),
  withdrawnBecause: z.nullable(z.string()),
  linkRevoked: z.boolean(),
});
export type SheetRow = z.output<typeof SheetRow>;

/** What a sheet is made for: one fish, or so many heads of a brood. */
export const SheetDraft = z.strictObject({
  thing: z.enum(['fish', 'brood'], 'Choose a fish or a brood'),
  subjectId: Id,
  /** Of a brood, how many fish it goes with; of a fish always one. */
  heads: z
    .number('Type how many')
    .check(z.int('Whole fish only'), z.minimum(1, 'At least one'), z.maximum(100_000, 'That is too many')),
  replaces: z.nullable(Id),
  because: z.nullable(line(200, 'Say why it is replaced')),
});
export type SheetDraft = z.output<typeof SheetDraft>;

export const listSheets = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/sheets',
  needs: 'sheet:see',
  params: inRoom({}),
  query: z.strictObject({ thing: z.optional(z.enum(['fish', 'brood'])), thingId: z.optional(Id) }),
  output: z.strictObject({ sheets: z.array(SheetRow) }),
});

/** What a sheet would say if it were issued now: nothing is frozen, numbered or signed. */
export const previewSheet = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/sheet-preview',
  needs: 'sheet:see',
  params: inRoom({}),
  query: z.strictObject({ thing: z.enum(['fish', 'brood']), id: Id }),
  output: z.strictObject({ content: SheetContent }),
});

export const issueSheet = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/sheets',
  needs: 'sheet:issue',
  params: inRoom({}),
  body: SheetDraft,
  output: SheetRow,
});

export const readSheet = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/sheets/:sheetId',
  needs: 'sheet:see',
  params: inRoom({ sheetId: Id }),
  output: z.strictObject({
    row: SheetRow,
    content: SheetContent,
    jws: z.string(),
    keysAt: z.string(),
    checkUrl: z.string(),
  }),
});

export const printSheet = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/sheets/:sheetId/pdf/:paper',
  needs: 'sheet:see',
  kind: 'file',
  params: inRoom({ sheetId: Id, paper: z.enum(['a4', 'letter']) }),
  output: z.unknown(),
});

export const withdrawSheet = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/sheets/:sheetId/withdrawal',
  needs: 'sheet:withdraw',
  params: inRoom({ sheetId: Id }),
  body: z.strictObject({ because: line(200, 'Say why it is withdrawn'), revokeLink: z.boolean('Say yes or no') }),
  output: SheetRow,
});

export const listKeys = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/keys',
  needs: 'key:manage',
  params: inRoom({}),
  output: z.strictObject({
    keys: z.array(z.strictObject({ id: z.string(), createdAt: z.string(), retiredAt: z.nullable(z.string()) })),
    keysAt: z.string(),
  }),
});

/** A new key signs from now on; the old one still verifies what it signed. */
export const rotateKey = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/keys',
  needs: 'key:manage',
  params: inRoom({}),
  output: z.strictObject({ id: z.string() }),
});

const SheetSettings = z.strictObject({
  /** Whether sheets name the people and fishrooms that founders and ancestors came from. */
  showPeople: z.boolean('Say yes or no'),
});

export const readSheetSettings = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/sheet-settings',
  needs: 'key:manage',
  params: inRoom({}),
  output: SheetSettings,
});

export const changeSheetSettings = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/sheet-settings',
  needs: 'key:manage',
  params: inRoom({}),
  body: SheetSettings,
  output: SheetSettings,
});

/** Anyone with the address: the sheet, what became of it, and where its keys are. The page verifies the signature itself. */
export const checkSheetPage = endpoint({
  method: 'GET',
  path: '/api/sheets/:token',
  needs: 'public',
  params: z.strictObject({ token: Token }),
  output: z.strictObject({
    jws: z.string(),
    keysAt: z.string(),
    keys: z.array(z.unknown()),
    state: z.enum(['valid', 'replaced', 'withdrawn']),
    at: z.nullable(z.string()),
    because: z.nullable(z.string()),
    replacedBy: z.nullable(z.strictObject({ number: z.string(), token: z.string() })),
    checkUrl: z.string(),
  }),
});

export const printCheckedSheet = endpoint({
  method: 'GET',
  path: '/api/sheets/:token/pdf/:paper',
  needs: 'public',
  kind: 'file',
  params: z.strictObject({ token: Token, paper: z.enum(['a4', 'letter']) }),
  output: z.unknown(),
});

/**
 * The published keys of a fishroom of any installation, fetched by the server since a page may only speak to its own. For
 * anyone who checks a file; what is not a key is not handed on.
 */
export const fetchKeys = endpoint({
  method: 'POST',
  path: '/api/sheet-keys',
  needs: 'public',
  body: z.strictObject({ at: Address }),
  output: z.strictObject({ keys: z.array(PublicJwk), recalled: z.array(Recalled) }),
});
