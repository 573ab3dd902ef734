import * as z from 'zod/mini';
import { DayText } from '../days';
import { Id } from '../ids';
import { type Parentage, pairsOf } from '../lineage/pedigree';
import { words } from './wording';

/**
 * An animal named beyond its own fishroom: the fishroom's id, a slash, its own id there. A fish that came in by a sheet
 * keeps the name its first issuer gave, so that the same ancestor on two sheets is one animal.
 */
export const AnimalId = z
  .string('An animal is needed')
  .check(z.refine((text) => splitAnimalId(text) !== null, 'That is not the id of an animal'));
export type AnimalId = z.output<typeof AnimalId>;

export const animalId = (roomId: string, localId: string): AnimalId => `${roomId}/${localId}`;

/** The two halves of an animal's id; null for anything else. */
export function splitAnimalId(text: string): { roomId: string; localId: string } | null {
  const [roomId = '', localId = '', ...more] = text.split('/');
  const whole = more.length === 0 && Id.safeParse(roomId).success && Id.safeParse(localId).success;
  return whole ? { roomId, localId } : null;
}

const Weight = z.number().check(z.gt(0, 'A weight is above zero'), z.maximum(1e9));
/** Which draw is shared: the parentage's id in its own fishroom, so that full sibs on two sheets share it too. */
const DrawKey = AnimalId;

const Candidate = z.strictObject({ id: z.nullable(AnimalId), weight: Weight });
const Candidates = z.array(Candidate).check(z.minLength(1), z.maxLength(200));

/** As in `shared/lineage`: one known animal, none known, one of several, or each young its own draw. */
const SheetParentage = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('known'), id: AnimalId }),
  z.strictObject({ kind: z.literal('unknown') }),
  z.strictObject({ kind: z.literal('oneOf'), key: DrawKey, candidates: Candidates }),
  z.strictObject({ kind: z.literal('mixed'), candidates: Candidates }),
]);

/** Filial generation from wild founders: F0 is wild, a range where parents are uncertain, null when it can't be told. */
export const Generation = z.nullable(
  z
    .strictObject({
      low: z.number().check(z.int(), z.minimum(0), z.maximum(1000)),
      high: z.number().check(z.int(), z.minimum(0), z.maximum(1000)),
      oneParentWild: z.boolean(),
    })
    .check(z.refine((g) => g.low <= g.high, 'The range runs from low to high')),
);
export type Generation = z.output<typeof Generation>;

const Animal = {
  id: AnimalId,
  kind: z.enum(['fish', 'brood']),
  code: words(60),
  sex: z.enum(['male', 'female', 'unsexed']),
  born: z.nullable(DayText),
  origin: z.enum(['wild', 'bred', 'unknown']),
  generation: Generation,
  /** Strain and place in short, "Kapampa"; null for a possible hybrid. */
  strain: z.nullable(words(120)),
  /** The fishroom it was bred or kept in, when that is not the issuer and may be shown. */
  room: z.nullable(words(120)),
};

const Pair = z.strictObject({ sire: SheetParentage, dam: SheetParentage, weight: Weight });

/** One known ancestor, or the subject itself; with its parents it is an entry that `kinship` reads as it stands. */
export const AncestryEntry = z.union([
  z.strictObject({ ...Animal, sire: SheetParentage, dam: SheetParentage }),
  z.strictObject({ ...Animal, from: z.array(Pair).check(z.minLength(1), z.maxLength(400)) }),
]);
export type AncestryEntry = z.output<typeof AncestryEntry>;

/** The subject and every ancestor that is known, in any order. */
export const Ancestry = z.array(AncestryEntry).check(
  z.minLength(1, 'The fish itself is needed'),
  z.maxLength(20_000, 'At most 20 000 ancestors'),
  z.refine((entries) => ancestryFault(entries) === null, {
    error: (issue) => ancestryFault(issue.input as AncestryEntry[]) ?? '',
  }),
);

const idsOf = (parentage: Parentage): AnimalId[] => {
  if (parentage.kind === 'known') return [parentage.id];
  if (parentage.kind === 'unknown') return [];
  return parentage.candidates.flatMap((candidate) => candidate.id ?? []);
};

/** Every animal that may be a parent of the entry. */
function possibleParents(entry: AncestryEntry): AnimalId[] {
  return pairsOf(entry).flatMap((pair) => [...idsOf(pair.sire), ...idsOf(pair.dam)]);
}

/** What is wrong with an ancestry as a whole, in words: an animal twice, a parent left out, a loop. Null when it is sound. */
export function ancestryFault(entries: AncestryEntry[]): string | null {
  const byId = new Map(entries.map((entry) => [entry.id, entry]));
  if (byId.size < entries.length) return 'An animal is listed twice';
  const waiting = new Map<string, number>();
  const young = new Map<string, AncestryEntry[]>();
  for (const entry of entries) {
    const parents = new Set(possibleParents(entry));
    waiting.set(entry.id, parents.size);
    for (const id of parents) {
      if (!byId.has(id)) return `A parent of ${entry.code} is not listed`;
      const known = young.get(id);
      if (known) known.push(entry);
      else young.set(id, [entry]);
    }
  }
  const ready = entries.filter((entry) => waiting.get(entry.id) === 0);
  for (const entry of ready) {
    for (const child of young.get(entry.id) ?? []) {
      const left = (waiting.get(child.id) ?? 0) - 1;
      waiting.set(child.id, left);
      if (left === 0) ready.push(child);
    }
  }
  const stuck = entries.find((entry) => (waiting.get(entry.id) ?? 0) > 0);
  return stuck ? `${stuck.code} is among its own ancestors` : null;
}
