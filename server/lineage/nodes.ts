import type * as z from 'zod/mini';
import type { LineageNode } from '../../shared/lineage/contract';
import { type Parentage, type PedigreeEntry, pairsOf } from '../../shared/lineage/pedigree';
import { notFound } from '../../shared/refusal';
import { fishRows } from '../fish';
import type { RoomAsked } from '../scope';
import { speciesNames } from '../species';
import { pedigreeOf } from './pedigree';
import { type ToldAnimal, toldAnimals } from './told';

type Node = z.input<typeof LineageNode>;
type About = Omit<Extract<Node, { sire: unknown }>, 'sire' | 'dam'>;

/** The pedigree with what screens and sheets say of each animal; of one animal only those it descends from and its descendants. */
export async function lineageNodes(scope: RoomAsked, around?: string): Promise<Node[]> {
  const { entries } = await pedigreeOf(scope);
  const kept = around ? relativesOf(entries, around) : entries;
  if (around && !kept.some(({ id }) => id === around)) throw notFound('That animal');
  const ids = around ? kept.map(({ id }) => id) : undefined;
  const about = new Map([...(await fishAbout(scope, ids)), ...(await broodsAbout(scope, ids))]);
  return kept.flatMap((entry): Node[] => {
    const told = about.get(entry.id);
    if (!told) return [];
    return [{ ...told, ...parentsOf(entry) }];
  });
}

const parentsOf = (entry: PedigreeEntry) =>
  'from' in entry ? { from: entry.from } : { sire: entry.sire, dam: entry.dam };

async function fishAbout(scope: RoomAsked, ids?: string[]): Promise<[string, About][]> {
  const { db, roomId } = scope;
  const rows = await fishRows(scope, { foreign: true, ...(ids ? { ids } : {}) });
  const told = await toldAnimals(scope);
  let query = db
    .selectFrom('fish')
    .leftJoin('lot', (join) => join.onRef('lot.roomId', '=', 'fish.roomId').onRef('lot.id', '=', 'fish.lotId'))
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'fish.roomId').onRef('strain.id', '=', 'fish.strainId'),
    )
    .leftJoin('brood', (join) => join.onRef('brood.roomId', '=', 'fish.roomId').onRef('brood.id', '=', 'fish.broodId'))
    .where('fish.roomId', '=', roomId)
    .select([
      'fish.id',
      'fish.parentageId',
      'brood.parentageId as broodParentageId',
      'lot.provenance as lotProvenance',
      'lot.generation',
      'strain.provenance as strainProvenance',
    ]);
  if (ids) query = query.where('fish.id', 'in', ids);
  const more = await query.execute();
  const byId = new Map(more.map((row) => [row.id, row]));
  return rows.map((fish) => {
    const row = byId.get(fish.id);
    const byItsSheet = told.get(fish.id);
    const {
      id,
      code,
      sex,
      sexCertain,
      strainId,
      strainCode,
      displayName,
      bornOn,
      keptAs,
      colony,
      tank,
      lastLengthTenthsMm,
    } = fish;
    return [
      id,
      {
        id,
        thing: 'fish',
        code: code ?? (byItsSheet?.here === false ? byItsSheet.entry.code : null),
        sex,
        sexCertain,
        strainId,
        strainCode: strainCode ?? byItsSheet?.entry.strain ?? null,
        displayName,
        bornOn,
        keptAs,
        colony,
        tank,
        lastLengthTenthsMm,
        living: fish.exit === null && fish.origin !== 'imported',
        broodId: fish.brood?.id ?? null,
        founderGeneration: byItsSheet
          ? toldGeneration(byItsSheet)
          : fish.origin === 'founder'
            ? founderGeneration(row?.lotProvenance ?? row?.strainProvenance, row?.generation ?? null)
            : null,
        issuer: byItsSheet?.room ?? null,
        sheet: byItsSheet
          ? { id: byItsSheet.importId, number: byItsSheet.number, signature: byItsSheet.signature }
          : null,
        parentageId: row?.parentageId ?? row?.broodParentageId ?? null,
      },
    ];
  });
}

/** Wild is 0; what a supplier said counts; anything else is not known. */
function founderGeneration(provenance: string | null | undefined, said: number | null): number | null {
  if (provenance === 'wildCaught') return 0;
  return provenance === 'bredElsewhere' ? said : null;
}

/** Of an animal that a sheet tells of: wild is 0; where it gives no parents, the number that it gives. */
function toldGeneration({ entry }: ToldAnimal): number | null {
  if (entry.origin === 'wild') return 0;
  const known = pairsOf(entry).some(({ sire, dam }) => idsOf(sire).length + idsOf(dam).length > 0);
  const { generation } = entry;
  return !known && generation && generation.low === generation.high ? generation.low : null;
}

async function broodsAbout(scope: RoomAsked, ids?: string[]): Promise<[string, About][]> {
  const { db, roomId } = scope;
  let query = db
    .selectFrom('brood')
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'brood.roomId').onRef('strain.id', '=', 'brood.strainId'),
    )
    .where('brood.roomId', '=', roomId)
    .select([
      'brood.id',
      'brood.code',
      'brood.strainId',
      'brood.spawnLatest',
      'brood.parentageId',
      'strain.code as strainCode',
      'strain.scientificName',
      'strain.speciesId',
    ]);
  if (ids) query = query.where('brood.id', 'in', ids);
  const rows = await query.execute();
  const nameOf = await speciesNames(scope);
  return rows.map(({ id, code, strainId, strainCode, scientificName, speciesId, spawnLatest, parentageId }) => [
    id,
    {
      id,
      thing: 'brood',
      code,
      sex: 'unknown',
      sexCertain: false,
      strainId,
      strainCode,
      displayName: scientificName ?? (speciesId ? nameOf(speciesId) : null),
      bornOn: spawnLatest,
      living: true,
      keptAs: null,
      colony: null,
      tank: null,
      lastLengthTenthsMm: null,
      broodId: null,
      founderGeneration: null,
      issuer: null,
      sheet: null,
      parentageId,
    },
  ]);
}

const idsOf = (parent: Parentage): string[] =>
  parent.kind === 'known'
    ? [parent.id]
    : parent.kind === 'unknown'
      ? []
      : parent.candidates.flatMap(({ id }) => id ?? []);

/** An animal, all its possible ancestors, its descendants, and the other parents of those. */
function relativesOf(entries: PedigreeEntry[], around: string): PedigreeEntry[] {
  const byId = new Map(entries.map((entry) => [entry.id, entry]));
  const parents = new Map(
    entries.map((entry) => [entry.id, pairsOf(entry).flatMap(({ sire, dam }) => [...idsOf(sire), ...idsOf(dam)])]),
  );
  const young = new Map<string, string[]>();
  for (const [id, list] of parents) for (const parent of list) young.set(parent, [...(young.get(parent) ?? []), id]);
  const down = reach([around], (id) => young.get(id) ?? []);
  const all = reach([...down], (id) => parents.get(id) ?? []);
  return [...all].flatMap((id) => byId.get(id) ?? []);
}

function reach(from: string[], next: (id: string) => string[]): Set<string> {
  const found = new Set(from);
  for (const id of found) for (const other of next(id)) found.add(other);
  return found;
}
