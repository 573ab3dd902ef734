import * as z from 'zod/mini';
import { DayText } from '../days';
import { Done, endpoint, inRoom } from '../endpoint';
import { ParentageTold } from '../holds/contract';
import { Id } from '../ids';
import { Instant, Note } from '../shapes';
import { ParentageDraft } from './parentageDraft';

const Candidates = z.array(z.strictObject({ id: z.nullable(Id), weight: z.number() }));
const Parent = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('known'), id: Id }),
  z.strictObject({ kind: z.literal('unknown') }),
  z.strictObject({ kind: z.literal('oneOf'), key: z.string(), candidates: Candidates }),
  z.strictObject({ kind: z.literal('mixed'), candidates: Candidates }),
]);

const about = {
  id: Id,
  thing: z.enum(['fish', 'brood']),
  code: z.nullable(z.string()),
  sex: z.enum(['male', 'female', 'unknown']),
  sexCertain: z.boolean(),
  strainId: z.nullable(Id),
  strainCode: z.nullable(z.string()),
  displayName: z.nullable(z.string()),
  bornOn: z.nullable(DayText),
  /** Alive and here; a brood: heads or eggs here. */
  living: z.boolean(),
  keptAs: z.nullable(z.enum(['breeder', 'holdback', 'other'])),
  colony: z.nullable(z.strictObject({ id: Id, code: z.string() })),
  tank: z.nullable(z.strictObject({ id: Id, code: z.string() })),
  lastLengthTenthsMm: z.nullable(z.number()),
  /** The brood that a fish was taken out of. */
  broodId: z.nullable(Id),
  /** Of an animal without parents here: F0 for wild, what its supplier gave, null for unknown origin. */
  founderGeneration: z.nullable(z.number()),
  /** The fishroom of an animal that came in by a sheet. */
  issuer: z.nullable(z.string()),
  /** That sheet, and whether its signature was checked. */
  sheet: z.nullable(z.strictObject({ id: Id, number: z.string(), signature: z.enum(['valid', 'keyUnknown']) })),
  /** The root of the parentage that can be changed here: its own, or its brood's. */
  parentageId: z.nullable(Id),
};

/** One animal with its parents, as `shared/lineage` takes it: cut the rest off and it is a `PedigreeEntry`. */
export const LineageNode = z.union([
  z.strictObject({ ...about, sire: Parent, dam: Parent }),
  z.strictObject({ ...about, from: z.array(z.strictObject({ sire: Parent, dam: Parent, weight: z.number() })) }),
]);
export type LineageNode = z.output<typeof LineageNode>;

/**
 * The fishroom's pedigree: all of it, or one animal with all its possible ancestors and its descendants. The computations run
 * where it is read.
 */
export const readPedigree = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/pedigree',
  needs: 'lineage:see',
  params: inRoom({}),
  query: z.strictObject({ around: z.optional(Id) }),
  output: z.strictObject({ nodes: z.array(LineageNode) }),
});

const inAnimal = inRoom({ animalId: Id });

/** The parentage that can be changed at a fish, a brood or a hold. A fish without one of its own has that of its brood. */
export const readParentage = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/animals/:animalId/parentage',
  needs: 'lineage:see',
  params: inAnimal,
  output: z.strictObject({
    thing: z.enum(['fish', 'brood', 'hold']),
    name: z.nullable(z.string()),
    /** How often it was set; 0 for a fish that has none of its own. A change carries the one it saw. */
    turn: z.number(),
    parentage: ParentageTold,
    /** Where and when the mouthful was spawned, to ask who was there; null where no hold is on record. */
    spawn: z.nullable(
      z.strictObject({ tank: z.strictObject({ id: Id, code: z.string() }), from: DayText, until: DayText }),
    ),
    /** Every turn of it, newest first: nothing that was said before is lost. */
    turns: z.array(z.strictObject({ turn: z.number(), basis: z.nullable(z.string()), by: z.string(), at: Instant })),
  }),
});

const Figures = z.strictObject({
  f: z.number(),
  generation: z.nullable(z.strictObject({ low: z.number(), high: z.number() })),
  /** Complete generation equivalents. */
  known: z.number(),
});
const Change = z.strictObject({
  id: Id,
  thing: z.enum(['fish', 'brood']),
  code: z.nullable(z.string()),
  before: Figures,
  after: Figures,
});
export type LineageChange = z.output<typeof Change>;

const change = z.strictObject({
  turn: z.number('Send the turn').check(z.int('A whole number'), z.minimum(0, 'From zero')),
  parentage: ParentageDraft,
});

/** What a change would do to everything downstream. Nothing is written. */
export const previewParentage = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/animals/:animalId/parentage/preview',
  needs: 'parentage:write',
  params: inAnimal,
  body: change,
  output: z.strictObject({
    changes: z.array(Change),
    /** Sheets in force that say otherwise. */
    sheets: z.array(z.strictObject({ id: Id, number: z.string() })),
    doubts: z.array(z.string()),
  }),
});

/** A new turn of a parentage; the turns before it stay. */
export const changeParentage = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/animals/:animalId/parentage',
  needs: 'parentage:write',
  params: inAnimal,
  body: change,
  output: Done,
});

export const CONTRADICTIONS = ['younger', 'sex', 'dead', 'away', 'loop'] as const;
const Contradiction = z.strictObject({
  kind: z.enum(CONTRADICTIONS),
  thing: z.enum(['fish', 'brood', 'hold']),
  id: Id,
  name: z.string(),
  parent: z.nullable(z.strictObject({ id: Id, name: z.string() })),
  says: z.string(),
});
export type Contradiction = z.output<typeof Contradiction>;

/** What cannot all be true of parents and young as they are recorded. */
export const listContradictions = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/contradictions',
  needs: 'lineage:see',
  params: inRoom({}),
  output: z.strictObject({ contradictions: z.array(Contradiction) }),
});

const TableText = z
  .string('Choose a file')
  .check(z.minLength(1, 'The file is empty'), z.maxLength(2_000_000, 'At most 2 MB'));

/** The pedigree as a table: id, sire, dam, sex, born, strain, clutch, fathers. See `pedigreeTable.ts` in the server. */
export const exportTable = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/pedigree-table',
  needs: 'lineage:see',
  params: inRoom({}),
  output: z.strictObject({ text: z.string() }),
});

const BadCell = z.strictObject({ line: z.number(), column: z.string(), value: z.string(), says: z.string() });
export type BadCell = z.output<typeof BadCell>;

/** Names every bad row of a table. Nothing is written. */
export const previewTable = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/pedigree-table/preview',
  needs: 'data:import',
  params: inRoom({}),
  body: z.strictObject({ text: TableText }),
  output: z.strictObject({ rows: z.number(), bad: z.array(BadCell) }),
});

/** Writes the whole table, or nothing where a row is bad. */
export const importTable = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/pedigree-table',
  needs: 'data:import',
  params: inRoom({}),
  body: z.strictObject({ text: TableText }),
  output: z.strictObject({ rows: z.number() }),
});

/** Two records that are one fish: this one ends, what it did and was counts for the other. */
export const mergeFish = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/fish/:fishId/merge',
  needs: 'parentage:write',
  params: inRoom({ fishId: Id }),
  body: z.strictObject({ intoId: Id, note: Note }),
  output: z.strictObject({ fishId: Id, code: z.nullable(z.string()) }),
});
