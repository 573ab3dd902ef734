import { sql } from 'kysely';
import { headCount } from '../../shared/broods/headCount';
import type { Resident } from '../../shared/tanks/contract';
import type { Scope } from '../scope';
import { speciesNames } from '../species';

export type Stayed = { tankId: string; resident: Resident; fromDay: string; untilDay: string | null };

/** Everyone who stays or stayed in the fishroom's tanks; open stays only, or all of one tank. */
export async function staysOf(scope: Scope, which: { tankId?: string; openOnly: boolean }): Promise<Stayed[]> {
  const { db, roomId } = scope;
  let query = db
    .selectFrom('stay')
    .leftJoin('colony', (join) =>
      join.onRef('colony.roomId', '=', 'stay.roomId').onRef('colony.id', '=', 'stay.colonyId'),
    )
    .leftJoin('fish', (join) => join.onRef('fish.roomId', '=', 'stay.roomId').onRef('fish.id', '=', 'stay.fishId'))
    .leftJoin('strain', (join) =>
      join
        .onRef('strain.roomId', '=', 'stay.roomId')
        .on(sql<boolean>`strain.id = coalesce(colony.strainId, fish.strainId)`),
    )
    .where('stay.roomId', '=', roomId)
    .select((eb) => [
      'stay.tankId',
      'stay.colonyId',
      'stay.fishId',
      'stay.batchId',
      'stay.fromDay',
      'stay.untilDay',
      'colony.code as colonyCode',
      'fish.code as fishCode',
      'strain.id as strainId',
      'strain.code as strainCode',
      'strain.speciesId',
      'strain.scientificName',
      eb
        .selectFrom('colonyMember')
        .whereRef('colonyMember.roomId', '=', 'stay.roomId')
        .whereRef('colonyMember.colonyId', '=', 'stay.colonyId')
        .where('colonyMember.untilDay', 'is', null)
        .select(({ fn }) => fn.countAll<number>().as('heads'))
        .as('members'),
    ]);
  if (which.tankId) query = query.where('stay.tankId', '=', which.tankId);
  if (which.openOnly) query = query.where('stay.untilDay', 'is', null);
  const rows = await query.orderBy('stay.fromDay', 'desc').orderBy('stay.id', 'desc').execute();
  const batches = await batchesOf(
    scope,
    rows.flatMap(({ batchId }) => batchId ?? []),
  );
  const nameOf = await speciesNames(scope);
  // A batch that everyone has left lives nowhere; eggs and wrigglers do, though no head is counted yet.
  const here = which.openOnly ? rows.filter(({ batchId }) => !batchId || !batches.get(batchId)?.isEmpty) : rows;
  return here.map((row) => {
    const batch = row.batchId ? batches.get(row.batchId) : undefined;
    const speciesId = row.speciesId ?? batch?.speciesId ?? null;
    return {
      tankId: row.tankId,
      fromDay: row.fromDay,
      untilDay: row.untilDay,
      resident: {
        thing: row.colonyId ? 'colony' : row.batchId ? 'batch' : 'fish',
        id: row.colonyId ?? row.batchId ?? row.fishId ?? '',
        code: row.colonyCode ?? batch?.code ?? row.fishCode ?? 'not told apart',
        strainId: row.strainId ?? batch?.strainId ?? null,
        strainCode: row.strainCode ?? batch?.strainCode ?? null,
        displayName: row.scientificName ?? batch?.scientificName ?? (speciesId ? nameOf(speciesId) : null),
        heads: row.colonyId ? (row.members ?? 0) : (batch?.heads ?? 1),
        since: row.fromDay,
      },
    };
  });
}

type Batch = {
  code: string;
  heads: number;
  /** Counted once, and nobody left. */
  isEmpty: boolean;
  strainId: string | null;
  strainCode: string | null;
  speciesId: string | null;
  scientificName: string | null;
};

async function batchesOf({ db, roomId }: Scope, ids: string[]): Promise<Map<string, Batch>> {
  if (ids.length === 0) return new Map();
  const sources = await db
    .selectFrom('batchSource')
    .innerJoin('brood', (join) =>
      join.onRef('brood.roomId', '=', 'batchSource.roomId').onRef('brood.id', '=', 'batchSource.broodId'),
    )
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'brood.roomId').onRef('strain.id', '=', 'brood.strainId'),
    )
    .where('batchSource.roomId', '=', roomId)
    .where('batchSource.batchId', 'in', ids)
    .select([
      'batchSource.batchId',
      'brood.code',
      'strain.id as strainId',
      'strain.code as strainCode',
      'strain.speciesId',
      'strain.scientificName',
    ])
    .orderBy('brood.code')
    .execute();
  const lines = await db
    .selectFrom('headEntry')
    .where('roomId', '=', roomId)
    .where('batchId', 'in', ids)
    .select(['id', 'batchId', 'onDay as on', 'at', 'kind', 'heads', 'cause', 'reverses'])
    .execute();
  return new Map(
    ids.map((id) => {
      const own = sources.filter(({ batchId }) => batchId === id);
      const first = own[0];
      const count = headCount(lines.filter(({ batchId }) => batchId === id));
      return [
        id,
        {
          code: [...new Set(own.map(({ code }) => code))].join(' + '),
          heads: count.balance,
          isEmpty: count.series.length > 0 && count.balance === 0,
          strainId: first?.strainId ?? null,
          strainCode: first?.strainCode ?? null,
          speciesId: first?.speciesId ?? null,
          scientificName: first?.scientificName ?? null,
        },
      ];
    }),
  );
}
