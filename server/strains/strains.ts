import type * as z from 'zod/mini';
import { notFound, Refusal } from '../../shared/refusal';
import { librarySpecies } from '../../shared/species/library';
import type { addLot, addStrain, changeStrain, readStrain, StrainRow } from '../../shared/strains/contract';
import { audit } from '../db/audit';
import { isUniqueViolation } from '../db/constraint';
import type { Scope } from '../scope';
import { speciesNames } from '../species';

export async function strainRows(scope: Scope, strainId?: string): Promise<StrainRow[]> {
  const { db, roomId } = scope;
  let query = db
    .selectFrom('strain')
    .where('strain.roomId', '=', roomId)
    .select((eb) => [
      'id',
      'version',
      'code',
      'speciesId',
      'naming',
      'scientificName',
      'tradeName',
      'synonyms',
      'locality',
      'localityKnown',
      'provenance',
      'fromWhom',
      'acquiredOn',
      'papers',
      'citesSource',
      'note',
      'retiredOn',
      eb
        .selectFrom('colony')
        .whereRef('colony.roomId', '=', 'strain.roomId')
        .whereRef('colony.strainId', '=', 'strain.id')
        .where('colony.endedOn', 'is', null)
        .select(({ fn }) => fn.countAll<number>().as('n'))
        .as('colonies'),
      eb
        .selectFrom('fish')
        .leftJoin('fishExit', (join) =>
          join.onRef('fishExit.roomId', '=', 'fish.roomId').onRef('fishExit.fishId', '=', 'fish.id'),
        )
        .whereRef('fish.roomId', '=', 'strain.roomId')
        .whereRef('fish.strainId', '=', 'strain.id')
        .where('fishExit.id', 'is', null)
        .select(({ fn }) => fn.countAll<number>().as('n'))
        .as('livingFish'),
      eb
        .selectFrom('brood')
        .whereRef('brood.roomId', '=', 'strain.roomId')
        .whereRef('brood.strainId', '=', 'strain.id')
        .select(({ fn }) => fn.countAll<number>().as('n'))
        .as('broods'),
    ]);
  if (strainId) query = query.where('strain.id', '=', strainId);
  const rows = await query.orderBy('code').execute();
  const nameOf = await speciesNames(scope);
  return rows.map((row) => ({
    ...row,
    displayName: row.scientificName ?? nameOf(row.speciesId),
    colonies: row.colonies ?? 0,
    livingFish: row.livingFish ?? 0,
    broods: row.broods ?? 0,
  }));
}

export async function oneStrain(scope: Scope, strainId: string): Promise<StrainRow> {
  const [strain] = await strainRows(scope, strainId);
  if (!strain) throw notFound('That strain');
  return strain;
}

export async function strainPage(scope: Scope, strainId: string): Promise<z.input<typeof readStrain.output>> {
  const strain = await oneStrain(scope, strainId);
  const lots = await scope.db
    .selectFrom('lot')
    .where('roomId', '=', scope.roomId)
    .where('strainId', '=', strainId)
    .select([
      'id',
      'version',
      'receivedOn',
      'fromWhom',
      'provenance',
      'generation',
      'heads',
      'deadOnArrival',
      'quarantineUntil',
      'papers',
      'mayBeSibs',
      'note',
    ])
    .orderBy('receivedOn', 'desc')
    .execute();
  return { strain, lots: lots.map((lot) => ({ ...lot, mayBeSibs: lot.mayBeSibs === 1 })) };
}

export async function addOne(scope: Scope, { id, ...facts }: z.output<typeof addStrain.body>): Promise<StrainRow> {
  await mustKnowSpecies(scope, facts.speciesId);
  await keepStrainCode(facts.code, () =>
    scope.db
      .insertInto('strain')
      .values({ roomId: scope.roomId, id, ...facts, retiredOn: null, createdAt: scope.now })
      .execute(),
  );
  await audit(scope, { action: 'strain added', about: 'strain', aboutId: id });
  return oneStrain(scope, id);
}

export async function changeOne(
  scope: Scope,
  strainId: string,
  { version, ...facts }: z.output<typeof changeStrain.body>,
): Promise<StrainRow> {
  const before = await oneStrain(scope, strainId);
  if (before.version !== version)
    throw new Refusal('conflict', 'Someone changed this strain meanwhile', {}, { current: before });
  await mustKnowSpecies(scope, facts.speciesId);
  await keepStrainCode(facts.code, () =>
    scope.db
      .updateTable('strain')
      .set({ ...facts, version: version + 1 })
      .where('roomId', '=', scope.roomId)
      .where('id', '=', strainId)
      .execute(),
  );
  await audit(scope, {
    action: 'strain changed',
    about: 'strain',
    aboutId: strainId,
    change: {
      code: [before.code, facts.code],
      locality: [before.locality, facts.locality],
      provenance: [before.provenance, facts.provenance],
    },
  });
  return oneStrain(scope, strainId);
}

export async function addLotTo(
  scope: Scope,
  strainId: string,
  lot: z.output<typeof addLot.body>,
): Promise<z.input<typeof addLot.output>> {
  await oneStrain(scope, strainId);
  if (lot.heads !== null && lot.deadOnArrival > lot.heads) {
    throw new Refusal('invalid', 'More dead than came', { deadOnArrival: 'No more than the fish that came' });
  }
  await scope.db
    .insertInto('lot')
    .values({ roomId: scope.roomId, strainId, ...lot, mayBeSibs: lot.mayBeSibs ? 1 : 0 })
    .execute();
  await audit(scope, { action: 'lot added', about: 'strain', aboutId: strainId });
  return { ...lot, version: 1 };
}

async function mustKnowSpecies({ db, roomId }: Scope, speciesId: string): Promise<void> {
  if (librarySpecies(speciesId)) return;
  const own = await db
    .selectFrom('speciesOverride')
    .where('roomId', '=', roomId)
    .where('id', '=', speciesId)
    .select('id')
    .executeTakeFirst();
  if (!own)
    throw new Refusal('invalid', 'Choose a species', { speciesId: 'Choose a species of the library, or add your own' });
}

async function keepStrainCode<T>(code: string, write: () => Promise<T>): Promise<T> {
  try {
    return await write();
  } catch (error) {
    if (isUniqueViolation(error, 'strain.code')) {
      throw new Refusal('conflict', `Another strain has the code ${code}`, { code: 'Taken: choose another code' });
    }
    throw error;
  }
}
