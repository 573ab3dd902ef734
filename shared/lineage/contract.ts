import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';

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
