import type { Parentage, PedigreeEntry } from '../../shared/lineage/pedigree';
import { type AncestryEntry, type AnimalId, animalId, splitAnimalId } from '../../shared/sheets/ancestry';
import { outranks, type Rank, rankOf, renamed } from '../../shared/sheets/mergeAncestry';
import type { Scope } from '../scope';

/** An animal as a sheet from elsewhere tells of it, and which sheet that is. */
export type ToldAnimal = {
  fishId: string;
  /** Its name beyond the fishroom, given by its first issuer; null for a head of a brood, which we name first. */
  name: AnimalId | null;
  here: boolean;
  /** The fishroom that it was bred or kept in. */
  room: string;
  entry: AncestryEntry;
  rank: Rank;
  issuedOn: string;
  importId: string;
  number: string;
  signature: 'valid' | 'keyUnknown';
};

type InRoom = Pick<Scope, 'db' | 'roomId'>;

/** Everything that sheets from elsewhere tell of the fish here and their ancestors, by fish. */
export async function toldAnimals(scope: InRoom): Promise<Map<string, ToldAnimal>> {
  const { db, roomId } = scope;
  const rows = await db
    .selectFrom('toldFish')
    .where('roomId', '=', roomId)
    .select(['fishId', 'here', 'entry', 'importedSheetId'])
    .execute();
  if (rows.length === 0) return new Map();
  const sheets = await sheetsTold(scope);
  const nameOf = new Map([...(await foreignNames(scope))].map(([name, fishId]) => [fishId, name]));
  return new Map(
    rows.flatMap(({ fishId, here, entry: text, importedSheetId }): [string, ToldAnimal][] => {
      const sheet = sheets.get(importedSheetId);
      if (!sheet) return [];
      const entry: AncestryEntry = JSON.parse(text);
      const checked = sheet.signature === 'valid';
      const bredBy = splitAnimalId(entry.id)?.roomId;
      const animal: ToldAnimal = {
        fishId,
        name: nameOf.get(fishId) ?? null,
        here: here === 1,
        room: entry.room ?? (bredBy === sheet.issuer ? sheet.room : `by ${sheet.room}’s sheet`),
        entry,
        rank: rankOf(entry.id, { issuer: sheet.issuer, checked }),
        issuedOn: sheet.issuedOn,
        importId: importedSheetId,
        number: sheet.number,
        signature: checked ? 'valid' : 'keyUnknown',
      };
      return [[fishId, animal]];
    }),
  );
}

/** The sheets themselves, apart from their animals: a content of megabytes is read once, not for each of its ancestors. */
async function sheetsTold({ db, roomId }: InRoom) {
  const rows = await db
    .selectFrom('importedSheet')
    .where('roomId', '=', roomId)
    .select(({ eb, fn }) => [
      'id',
      'issuer',
      'number',
      'signature',
      fn<string>('json_extract', ['content', eb.val('$.fishroom.name')]).as('room'),
      fn<string>('json_extract', ['content', eb.val('$.issue.on')]).as('issuedOn'),
    ])
    .execute();
  return new Map(rows.map((row) => [row.id, row]));
}

/** What the fishroom makes of names that others gave. */
export type Here = {
  /** The fish that a name stands for here; null when it is not known here. */
  fishOf: (name: AnimalId) => string | null;
  /** Our own parentage behind a key of ours that comes back on somebody's sheet: it is in force, whatever the sheet says. */
  ownParent: (key: string) => Parentage | null;
};

/**
 * The parents that sheets tell, with the fishroom's own ids in place of names. One animal that is "one of several" is told alike
 * everywhere: where two sheets differ, the one that counts more goes for all.
 */
export function toldParents(told: Iterable<ToldAnimal>, { fishOf, ownParent }: Here): Map<string, PedigreeEntry> {
  const draws = new Map<string, Parentage>();
  const parentOf = (parent: Parentage): Parentage => {
    if (parent.kind !== 'oneOf') return renamed(parent, fishOf, (key) => key);
    const known = draws.get(parent.key) ?? ownParent(parent.key) ?? renamed(parent, fishOf, (key) => key);
    draws.set(parent.key, known);
    return known;
  };
  const inOrder = [...told].sort((a, b) => (outranks(a, b) ? -1 : outranks(b, a) ? 1 : 0));
  return new Map(
    inOrder.map(({ fishId: id, entry }): [string, PedigreeEntry] => {
      if ('from' in entry)
        return [
          id,
          {
            id,
            from: entry.from.map(({ sire, dam, weight }) => ({ sire: parentOf(sire), dam: parentOf(dam), weight })),
          },
        ];
      return [id, { id, sire: parentOf(entry.sire), dam: parentOf(entry.dam) }];
    }),
  );
}

/** Every name that the fishroom has for fish of others, and which fish each is. */
export async function foreignNames({ db, roomId }: InRoom): Promise<Map<AnimalId, string>> {
  const rows = await db
    .selectFrom('foreignFish')
    .where('roomId', '=', roomId)
    .select(['issuer', 'foreignId', 'fishId'])
    .execute();
  return new Map(rows.map(({ issuer, foreignId, fishId }) => [animalId(issuer, foreignId), fishId]));
}

/**
 * The key under which all the young of a parentage share its one sire or its one dam, beyond the fishroom: the parentage's id, for
 * the dam with its last digit turned.
 */
export function drawKey(roomId: string, key: string): string {
  if (key.includes('/')) return key;
  const [root = '', side] = key.split(':');
  return animalId(roomId, side === 'dam' ? turned(root) : root);
}

const turned = (id: string): string => `${id.slice(0, -1)}${(Number.parseInt(id.slice(-1), 16) ^ 8).toString(16)}`;

/** The parentage of ours that a key names, and which of its sides; null for keys of others. */
export function ownDraw(
  roomId: string,
  key: string,
  isOurs: (rootId: string) => boolean,
): { rootId: string; side: 'sire' | 'dam' } | null {
  const name = splitAnimalId(key);
  if (name?.roomId !== roomId) return null;
  if (isOurs(name.localId)) return { rootId: name.localId, side: 'sire' };
  return isOurs(turned(name.localId)) ? { rootId: turned(name.localId), side: 'dam' } : null;
}
