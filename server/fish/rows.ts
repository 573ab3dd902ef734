import { type ExpressionBuilder, sql } from 'kysely';
import type { FishRow } from '../../shared/fish/contract';
import type { Database } from '../db/schema';
import type { RoomAsked } from '../scope';
import { speciesNames } from '../species';

/** `foreign`: ancestors too that are known from sheets of other fishrooms and have no life here. */
type Which = { ids?: string[]; colonyId?: string; living?: boolean; foreign?: boolean };

type Row = ExpressionBuilder<Database, 'fish'>;

/** The last thing found of a kind about a fish. */
const lastFinding = (eb: Row, kind: 'sex' | 'mark' | 'dominance') =>
  eb
    .selectFrom('finding')
    .whereRef('finding.roomId', '=', 'fish.roomId')
    .whereRef('finding.fishId', '=', 'fish.id')
    .where('finding.kind', '=', kind)
    .orderBy('finding.onDay', 'desc')
    .orderBy('finding.id', 'desc')
    .limit(1);

/** Fish as lists show them, by code; anonymous ones last. */
export async function fishRows(scope: RoomAsked, which: Which = {}): Promise<FishRow[]> {
  const { db, roomId } = scope;
  let query = db
    .selectFrom('fish')
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'fish.roomId').onRef('strain.id', '=', 'fish.strainId'),
    )
    .leftJoin('brood', (join) => join.onRef('brood.roomId', '=', 'fish.roomId').onRef('brood.id', '=', 'fish.broodId'))
    .leftJoin('fishExit', (join) =>
      join.onRef('fishExit.roomId', '=', 'fish.roomId').onRef('fishExit.fishId', '=', 'fish.id'),
    )
    .leftJoin('colonyMember', (join) =>
      join
        .onRef('colonyMember.roomId', '=', 'fish.roomId')
        .onRef('colonyMember.fishId', '=', 'fish.id')
        .on('colonyMember.untilDay', 'is', null),
    )
    .leftJoin('colony', (join) =>
      join.onRef('colony.roomId', '=', 'fish.roomId').onRef('colony.id', '=', 'colonyMember.colonyId'),
    )
    .leftJoin('stay as ownStay', (join) =>
      join
        .onRef('ownStay.roomId', '=', 'fish.roomId')
        .onRef('ownStay.fishId', '=', 'fish.id')
        .on('ownStay.untilDay', 'is', null),
    )
    .leftJoin('stay as colonyStay', (join) =>
      join
        .onRef('colonyStay.roomId', '=', 'fish.roomId')
        .onRef('colonyStay.colonyId', '=', 'colony.id')
        .on('colonyStay.untilDay', 'is', null),
    )
    .leftJoin('tank', (join) =>
      join
        .onRef('tank.roomId', '=', 'fish.roomId')
        .on(sql<boolean>`tank.id = coalesce(ownStay.tankId, colonyStay.tankId)`),
    )
    .where('fish.roomId', '=', roomId)
    .select((eb) => [
      'fish.id',
      'fish.version',
      'fish.code',
      'fish.strainId',
      'fish.keptAs',
      'fish.origin',
      'fish.bornOn',
      'fish.arrivedOn',
      'strain.code as strainCode',
      'strain.speciesId',
      'strain.scientificName as strainName',
      'brood.id as broodId',
      'brood.code as broodCode',
      'colony.id as colonyId',
      'colony.code as colonyCode',
      'tank.id as tankId',
      'tank.code as tankCode',
      'fishExit.kind as exitKind',
      'fishExit.onDay as exitOn',
      'fishExit.cause as exitCause',
      lastFinding(eb, 'sex').select('finding.value').as('sex'),
      lastFinding(eb, 'sex').select('finding.certain').as('sexCertain'),
      lastFinding(eb, 'mark').select('finding.value').as('mark'),
      lastFinding(eb, 'dominance').select('finding.value').as('dominance'),
      // Sample first, then its reading: joined, SQLite may walk every reading of the room for each fish.
      eb
        .selectFrom('lengthReading')
        .whereRef('lengthReading.roomId', '=', 'fish.roomId')
        .where('lengthReading.sampleId', '=', (inner) =>
          inner
            .selectFrom('lengthSample')
            .whereRef('lengthSample.roomId', '=', 'fish.roomId')
            .whereRef('lengthSample.fishId', '=', 'fish.id')
            .orderBy('lengthSample.onDay', 'desc')
            .orderBy('lengthSample.id', 'desc')
            .limit(1)
            .select('lengthSample.id'),
        )
        .orderBy('lengthReading.position')
        .limit(1)
        .select('lengthReading.lengthTenthsMm')
        .as('lastLengthTenthsMm'),
    ]);
  if (which.ids) query = query.where('fish.id', 'in', which.ids);
  if (which.colonyId) query = query.where('colonyMember.colonyId', '=', which.colonyId);
  if (which.living) query = query.where('fishExit.id', 'is', null);
  if (!which.ids && !which.foreign) query = query.where('fish.origin', '<>', 'imported');
  const rows = await query.orderBy(sql`fish.code is null`).orderBy('fish.code').orderBy('fish.id').execute();
  const nameOf = await speciesNames(scope);
  const place = (id: string | null, code: string | null) => (id && code ? { id, code } : null);
  return rows.map((row) => ({
    id: row.id,
    version: row.version,
    code: row.code,
    strainId: row.strainId,
    strainCode: row.strainCode,
    speciesId: row.speciesId,
    displayName: row.strainName ?? (row.speciesId ? nameOf(row.speciesId) : null),
    sex: sexOf(row.sex),
    sexCertain: row.sexCertain === 1,
    dominant: row.dominance === 'dominant' && !row.exitKind,
    mark: row.mark || null,
    keptAs: row.keptAs,
    origin: row.origin,
    bornOn: row.bornOn,
    arrivedOn: row.arrivedOn,
    brood: place(row.broodId, row.broodCode),
    colony: place(row.colonyId, row.colonyCode),
    tank: row.exitKind ? null : place(row.tankId, row.tankCode),
    exit: row.exitKind && row.exitOn ? { kind: row.exitKind, onDay: row.exitOn, cause: row.exitCause } : null,
    lastLengthTenthsMm: row.lastLengthTenthsMm,
  }));
}

const sexOf = (value: string | null): FishRow['sex'] => (value === 'male' || value === 'female' ? value : 'unknown');
