import { type Parentage, pairsOf } from '../lineage/pedigree';
import type { AncestryEntry, AnimalId } from './ancestry';
import { generationWords, shareWords } from './sayings';

type Role = 'sire' | 'dam';
type Possible = { id: AnimalId | null; share: number };

/** One place in the drawing: an animal, or the animals one of which it is, or nobody known. */
export type KinSlot = {
  role: Role;
  /** Codes that may stand here, likeliest first; empty when nobody is known. */
  codes: string[];
  /** What to say where there is no code. */
  otherwise: string;
  notes: string[];
  share: number;
  sure: boolean;
  /** Its own parents, when any are known. */
  parents: KinSlot[];
};

const SHOWN_CANDIDATES = 12;
const CERTAIN = 1 - 1e-9;

function possibleOf(parentage: Parentage): Possible[] {
  if (parentage.kind === 'known') return [{ id: parentage.id, share: 1 }];
  if (parentage.kind === 'unknown') return [{ id: null, share: 1 }];
  const all = parentage.candidates.reduce((sum, { weight }) => sum + weight, 0);
  return parentage.candidates.map(({ id, weight }) => ({ id, share: weight / all }));
}

/** Who may be the sire, or the dam, with the shares of all pairs added up; likeliest first, nobody known last. */
function possibleParentsOf(entry: AncestryEntry, role: Role): Possible[] {
  const pairs = pairsOf(entry);
  const all = pairs.reduce((sum, { weight }) => sum + weight, 0);
  const shares = new Map<AnimalId | null, number>();
  for (const pair of pairs) {
    for (const { id, share } of possibleOf(pair[role])) {
      shares.set(id, (shares.get(id) ?? 0) + (share * pair.weight) / all);
    }
  }
  const list = [...shares].map(([id, share]) => ({ id, share }));
  return list.sort((a, b) => Number(a.id === null) - Number(b.id === null) || b.share - a.share);
}

type Family = Map<AnimalId, AncestryEntry>;

const unknownWords = (role: Role, share: number): string =>
  share >= CERTAIN ? `${role} not known` : `a ${role === 'sire' ? 'male' : 'female'} not known`;

/** Where an ancestor comes from, in one or two short notes. */
function originNotes(entry: AncestryEntry): string[] {
  const from = entry.room ? [`from ${entry.room}`] : [];
  if (entry.origin === 'wild') return [entry.strain ? `wild, ${entry.strain}` : 'wild', ...from];
  if (entry.origin === 'unknown') return ['origin not known', ...from];
  return [generationWords(entry.generation), ...from];
}

/** One slot for each animal that may be the sire or the dam; the last one sums up those there is no room for. */
function parentSlots(entry: AncestryEntry, role: Role, family: Family): KinSlot[] {
  const possible = possibleParentsOf(entry, role);
  const shown = possible.length > SHOWN_CANDIDATES ? possible.slice(0, SHOWN_CANDIDATES - 1) : possible;
  const slots = shown.map(({ id, share }): KinSlot => {
    const animal = id === null ? undefined : family.get(id);
    const sure = share >= CERTAIN && animal !== undefined;
    const said = share >= CERTAIN ? role : `${role}, ${shareWords(share)}`;
    return {
      role,
      codes: animal ? [animal.code] : [],
      otherwise: unknownWords(role, share),
      notes: animal ? [...originNotes(animal), said] : share >= CERTAIN ? [] : [said],
      share,
      sure,
      parents: animal ? grandparents(animal, family) : [],
    };
  });
  const rest = possible.slice(shown.length);
  if (rest.length > 0) slots.push(restSlot(role, rest));
  return slots;
}

function restSlot(role: Role, rest: Possible[]): KinSlot {
  const share = rest.reduce((sum, each) => sum + each.share, 0);
  const otherwise = `${rest.length} more ${role === 'sire' ? 'males' : 'females'}`;
  return {
    role,
    codes: [],
    otherwise,
    notes: [`${role}, ${shareWords(share)} together`],
    share,
    sure: false,
    parents: [],
  };
}

/** A sire's and a dam's place, each one slot; none at all for an animal without known parents. */
function grandparents(parent: AncestryEntry, family: Family): KinSlot[] {
  const slots = (['sire', 'dam'] as const).map((role) => jointSlot(possibleParentsOf(parent, role), role, family));
  return slots.every((slot) => slot.codes.length === 0 && slot.share >= CERTAIN) ? [] : slots;
}

/** Two candidates are both named; of more, the likeliest. */
function jointSlot(possible: Possible[], role: Role, family: Family): KinSlot {
  const animals = possible.flatMap(({ id, share }) => {
    const animal = id === null ? undefined : family.get(id);
    return animal ? [{ animal, share }] : [];
  });
  const [first] = animals;
  const both = animals.length === 2 && possible.length === 2;
  const sure = possible.length === 1 && animals.length === 1;
  const named = both ? animals : animals.slice(0, 1);
  const others = possible.length - named.length;
  const shares = named.map(({ share }) => shareWords(share)).join(' or ');
  const more = others > 0 ? [`${shares}, or ${others === 1 ? 'another' : `one of ${others} others`}`] : [shares];
  return {
    role,
    codes: named.map(({ animal }) => animal.code),
    otherwise: unknownWords(role, 1),
    notes: !first ? [] : sure ? originNotes(first.animal) : more,
    share: first ? first.share : 1,
    sure,
    parents: [],
  };
}

export type Kin = {
  parents: KinSlot[];
  /** Known ancestors beyond the grandparents. */
  furtherBack: number;
};

/** Parents and grandparents of the subject, ready to be drawn. */
export function kinOf(ancestry: AncestryEntry[], subjectId: AnimalId): Kin {
  const family: Family = new Map(ancestry.map((entry) => [entry.id, entry]));
  const subject = family.get(subjectId);
  if (!subject) return { parents: [], furtherBack: 0 };
  const parents = (['sire', 'dam'] as const).flatMap((role) => parentSlots(subject, role, family));
  const near = new Set<AnimalId>([subjectId]);
  let ring = [subject];
  for (const _ of ['parents', 'grandparents']) {
    ring = ring.flatMap((entry) => namesOf(entry)).flatMap((id) => family.get(id) ?? []);
    for (const entry of ring) near.add(entry.id);
  }
  const known = parents.some((slot) => slot.codes.length > 0 || !(slot.share >= CERTAIN));
  return { parents: known ? parents : [], furtherBack: ancestry.length - near.size };
}

const namesOf = (entry: AncestryEntry): AnimalId[] =>
  (['sire', 'dam'] as const).flatMap((role) => possibleParentsOf(entry, role).flatMap(({ id }) => id ?? []));

/** The pairs behind a mixed batch, when there are several: shares of parents alone would lose who goes with whom. */
export function pairsBehind(
  ancestry: AncestryEntry[],
  subjectId: AnimalId,
): { sires: string[]; dams: string[]; share: number }[] {
  const codes = new Map(ancestry.map((entry) => [entry.id, entry.code]));
  const subject = ancestry.find((entry) => entry.id === subjectId);
  if (!subject || !('from' in subject) || subject.from.length < 2) return [];
  const all = subject.from.reduce((sum, { weight }) => sum + weight, 0);
  const names = (parentage: Parentage) => possibleOf(parentage).map(({ id }) => (id && codes.get(id)) || 'not known');
  return subject.from.map(({ sire, dam, weight }) => ({ sires: names(sire), dams: names(dam), share: weight / all }));
}
