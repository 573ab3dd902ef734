import type * as z from 'zod/mini';
import type { BatchTold, BroodRow, changeBrood, readBrood } from '../../shared/broods/contract';
import { headCountOf } from '../../shared/broods/headCount';
import { byNumber, proposeBroodCode } from '../../shared/codes';
import { grouped } from '../../shared/grouped';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { parentagesOf } from '../lineage';
import type { RoomAsked, Scope } from '../scope';
import { speciesNames } from '../species';
import { keepBroodCode } from './begin';
import { type Line, linesOf } from './ledger';
import { type Source, sharesOf, sourcesOf } from './sources';

type Told = z.input<typeof BroodRow>;
type BatchOf = z.input<typeof BatchTold>;

/** Broods with what their ledgers and samples say; all of them, or those with heads or eggs here. */
export async function broodRows(scope: RoomAsked, which: { ids?: string[]; hereOnly?: boolean } = {}): Promise<Told[]> {
  const rows = await rowsOf(scope, which);
  const batches = await batchesOf(
    scope,
    rows.map(({ id }) => id),
  );
  const parentages = await parentagesOf(
    scope,
    rows.map(({ parentageId }) => parentageId),
  );
  const reserved = await reservedByBrood(scope);
  const samples = await lastSamples(
    scope,
    [...rows, ...batches].map(({ id }) => id),
  );
  const nameOf = await speciesNames(scope);
  const ofBrood = grouped(batches, ({ sources }) => sources.map(({ broodId }) => broodId));
  const told = rows.map((row) => {
    const own = ofBrood.get(row.id) ?? [];
    const parentage = parentages.get(row.parentageId);
    const dam = parentage?.dams.length === 1 ? parentage.dams[0] : undefined;
    const { heads, ...count } = countsOf(row.id, own);
    return {
      id: row.id,
      version: row.version,
      code: row.code,
      strainId: row.strainId,
      strainCode: row.strainCode,
      speciesId: row.speciesId,
      displayName: row.scientificName ?? (row.speciesId ? nameOf(row.speciesId) : null),
      locality: row.locality,
      possibleHybrid: row.possibleHybrid === 1,
      hold: row.holdId,
      dam: dam?.fishId ? { id: dam.fishId, code: dam.code } : null,
      spawnEarliest: row.spawnEarliest,
      spawnLatest: row.spawnLatest,
      startedOn: row.startedOn,
      start: row.start,
      heads,
      ...count,
      reserved: reserved.get(row.id) ?? 0,
      available: Math.floor(heads + 1e-9) - (reserved.get(row.id) ?? 0),
      tanks: own.filter(({ balance, lines }) => balance > 0 || lines.length === 0).flatMap(({ tank }) => tank ?? []),
      lastSample:
        samples.get(row.id) ?? own.map(({ id }) => samples.get(id)).find((sample) => sample !== undefined) ?? null,
    };
  });
  return which.hereOnly ? told.filter(({ heads, opened }) => heads > 0 || opened === null) : told;
}

function rowsOf({ db, roomId }: RoomAsked, { ids, hereOnly }: { ids?: string[]; hereOnly?: boolean }) {
  let query = db
    .selectFrom('brood')
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'brood.roomId').onRef('strain.id', '=', 'brood.strainId'),
    )
    .where('brood.roomId', '=', roomId)
    .select([
      'brood.id',
      'brood.version',
      'brood.code',
      'brood.holdId',
      'brood.strainId',
      'brood.parentageId',
      'brood.possibleHybrid',
      'brood.spawnEarliest',
      'brood.spawnLatest',
      'brood.startedOn',
      'brood.start',
      'brood.note',
      'strain.code as strainCode',
      'strain.speciesId',
      'strain.scientificName',
      'strain.locality',
    ]);
  if (ids) query = query.where('brood.id', 'in', ids);
  // Years of broods that are gone need not be reckoned to find out that they are: a batch that swims here has a tank.
  if (hereOnly)
    query = query.where(({ or, not, exists, eb }) => {
      const stays = eb
        .selectFrom('batchSource')
        .innerJoin('stay', (join) =>
          join.onRef('stay.roomId', '=', 'batchSource.roomId').onRef('stay.batchId', '=', 'batchSource.batchId'),
        )
        .whereRef('batchSource.roomId', '=', 'brood.roomId')
        .whereRef('batchSource.broodId', '=', 'brood.id')
        .select('stay.id');
      return or([exists(stays.where('stay.untilDay', 'is', null)), not(exists(stays))]);
    });
  return query.orderBy('brood.startedOn', 'desc').orderBy('brood.id', 'desc').execute();
}

/** A brood's figures over its batches; of a mixed batch its share. */
function countsOf(broodId: string, batches: BatchOf[]) {
  let [heads, lost, opened] = [0, 0, 0];
  const days: { opened: string[]; counted: string[] } = { opened: [], counted: [] };
  for (const { sources, lines } of batches) {
    const share = sources.find((source) => source.broodId === broodId)?.share ?? 0;
    const count = headCountOf(lines);
    heads += count.balance * share;
    lost += count.lost * share;
    opened += count.opened * share;
    if (count.openedOn) days.opened.push(count.openedOn);
    if (count.countedOn) days.counted.push(count.countedOn);
  }
  return {
    heads: Math.round(heads * 10) / 10,
    headsAreShare: batches.some(({ sources }) => sources.length > 1),
    opened: days.opened.length > 0 ? Math.round(opened) : null,
    openedOn: days.opened.sort()[0] ?? null,
    countedOn: days.counted.sort().at(-1) ?? null,
    lost: Math.round(lost),
  };
}

/** The batches that some broods swim or swam in, with their ledgers. */
export async function batchesOf(scope: RoomAsked, broodIds: string[]): Promise<BatchOf[]> {
  const { db, roomId } = scope;
  if (broodIds.length === 0) return [];
  const rows = await db
    .selectFrom('batch')
    .leftJoin('stay', (join) =>
      join
        .onRef('stay.roomId', '=', 'batch.roomId')
        .onRef('stay.batchId', '=', 'batch.id')
        .on('stay.untilDay', 'is', null),
    )
    .leftJoin('tank', (join) => join.onRef('tank.roomId', '=', 'batch.roomId').onRef('tank.id', '=', 'stay.tankId'))
    .where('batch.roomId', '=', roomId)
    .where('batch.id', 'in', (eb) =>
      eb
        .selectFrom('batchSource')
        .where('batchSource.roomId', '=', roomId)
        .where('batchSource.broodId', 'in', broodIds)
        .select('batchSource.batchId'),
    )
    .select(['batch.id', 'batch.startedOn', 'tank.id as tankId', 'tank.code as tankCode'])
    .orderBy('batch.startedOn')
    .orderBy('batch.id')
    .execute();
  const ids = rows.map(({ id }) => id);
  const lists = await sourcesOf(scope, ids);
  const lines = grouped(await linesOf(scope, ids), ({ batchId }) => batchId);
  return rows.map(({ id, startedOn, tankId, tankCode }) =>
    batchTold(
      { id, startedOn, tank: tankId && tankCode ? { id: tankId, code: tankCode } : null },
      lists.get(id) ?? [],
      lines.get(id) ?? [],
    ),
  );
}

function batchTold(batch: Pick<BatchOf, 'id' | 'startedOn' | 'tank'>, sources: Source[], lines: Line[]): BatchOf {
  const shares = sharesOf(sources);
  const own = lines.map(({ batchId: _batch, ...line }) => line);
  return {
    ...batch,
    sources: sources
      .map(({ broodId, code }, i) => ({ broodId, code, share: shares[i] ?? 0 }))
      .sort((a, b) => b.share - a.share || byNumber(a.code, b.code)),
    balance: headCountOf(own).balance,
    lines: own,
  };
}

export async function oneBatch(scope: Scope, batchId: string): Promise<BatchOf> {
  const sources = (await sourcesOf(scope, [batchId])).get(batchId) ?? [];
  const batch = (
    await batchesOf(
      scope,
      sources.map(({ broodId }) => broodId),
    )
  ).find(({ id }) => id === batchId);
  if (!batch) throw notFound('That batch');
  return batch;
}

async function reservedByBrood({ db, roomId, now }: RoomAsked): Promise<Map<string, number>> {
  const rows = await db
    .selectFrom('reservation')
    .where('roomId', '=', roomId)
    .where('freedAt', 'is', null)
    .where(({ eb, or }) => or([eb('until', 'is', null), eb('until', '>', now)]))
    .select(['broodId', ({ fn }) => fn.sum<number>('heads').as('heads')])
    .groupBy('broodId')
    .execute();
  return new Map(rows.map(({ broodId, heads }) => [broodId, Number(heads)]));
}

/** So many ids go into a query one by one; beyond, the whole room is read faster. */
const FEW = 600;

/** The last sample of broods and batches, by their ids. */
async function lastSamples(
  { db, roomId }: RoomAsked,
  ids: string[],
): Promise<Map<string, NonNullable<Told['lastSample']>>> {
  let query = db
    .selectFrom('lengthSample')
    .innerJoin('lengthReading', (join) =>
      join
        .onRef('lengthReading.roomId', '=', 'lengthSample.roomId')
        .onRef('lengthReading.sampleId', '=', 'lengthSample.id'),
    )
    .where('lengthSample.roomId', '=', roomId)
    .where('lengthSample.fishId', 'is', null)
    .select([
      'lengthSample.broodId',
      'lengthSample.batchId',
      'lengthSample.onDay',
      'lengthSample.measure',
      ({ fn }) => fn.countAll<number>().as('n'),
      ({ fn }) => fn.avg<number>('lengthReading.lengthTenthsMm').as('meanTenthsMm'),
    ])
    .groupBy('lengthSample.id')
    .orderBy('lengthSample.onDay');
  if (ids.length <= FEW)
    query = query.where(({ or, eb }) =>
      or([eb('lengthSample.broodId', 'in', ids), eb('lengthSample.batchId', 'in', ids)]),
    );
  const rows = await query.execute();
  return new Map(rows.map(({ broodId, batchId, ...sample }) => [broodId ?? batchId ?? '', sample]));
}

export async function oneBrood(scope: RoomAsked, broodId: string): Promise<Told> {
  const [brood] = await broodRows(scope, { ids: [broodId] });
  if (!brood) throw notFound('That brood');
  return brood;
}

export async function broodPage(scope: Scope, broodId: string): Promise<z.input<typeof readBrood.output>> {
  const { db, roomId, now } = scope;
  const brood = await oneBrood(scope, broodId);
  const { parentageId, note } = await db
    .selectFrom('brood')
    .where('roomId', '=', roomId)
    .where('id', '=', broodId)
    .select(['parentageId', 'note'])
    .executeTakeFirstOrThrow();
  const parentage = (await parentagesOf(scope, [parentageId])).get(parentageId);
  if (!parentage) throw notFound('Its parentage');
  const counts = await db
    .selectFrom('stageCount')
    .innerJoin('account', 'account.id', 'stageCount.actorId')
    .where('stageCount.roomId', '=', roomId)
    .where('stageCount.broodId', '=', broodId)
    .select([
      'stageCount.id',
      'onDay',
      'total',
      'eggs',
      'wrigglers',
      'freeSwimming',
      'dead',
      'deformed',
      'note',
      'account.name as by',
    ])
    .orderBy('onDay')
    .orderBy('stageCount.id')
    .execute();
  const batches = await batchesOf(scope, [broodId]);
  const reservations = await db
    .selectFrom('reservation')
    .where('roomId', '=', roomId)
    .where('broodId', '=', broodId)
    .where('freedAt', 'is', null)
    .where(({ eb, or }) => or([eb('until', 'is', null), eb('until', '>', now)]))
    .select(['id', 'kind', 'heads', 'until', 'note'])
    .orderBy('createdAt')
    .execute();
  const holdbacks = await db
    .selectFrom('fish')
    .where('roomId', '=', roomId)
    .where('broodId', '=', broodId)
    .select(['id', 'code', 'createdAt', 'entryId'])
    .orderBy('code')
    .execute();
  const heldOn = new Map(
    batches.flatMap(({ lines }) =>
      lines.flatMap(({ entryId, on, kind }) => (entryId && kind === 'heldBack' ? [[entryId, on] as const] : [])),
    ),
  );
  return {
    brood,
    note,
    parentage,
    batches,
    reservations,
    stageCounts: counts.map(({ id, onDay, note: said, by, ...numbers }) => ({ id, onDay, note: said, by, numbers })),
    holdbacks: holdbacks.map(({ id, code, entryId }) => ({
      id,
      code,
      onDay: heldOn.get(entryId ?? '') ?? brood.startedOn,
    })),
  };
}

export async function changeOne(
  scope: Scope,
  broodId: string,
  change: z.output<typeof changeBrood.body>,
): Promise<Told> {
  const before = await oneBrood(scope, broodId);
  const { version, possibleHybrid, ...facts } = change;
  if (before.version !== version)
    throw new Refusal('conflict', 'Someone changed this brood meanwhile', {}, { current: before });
  await keepBroodCode(facts.code, 'code', () =>
    scope.db
      .updateTable('brood')
      .set({ ...facts, possibleHybrid: possibleHybrid ? 1 : 0, version: version + 1 })
      .where('roomId', '=', scope.roomId)
      .where('id', '=', broodId)
      .execute(),
  );
  await audit(scope, {
    action: 'brood changed',
    about: 'brood',
    aboutId: broodId,
    change: {
      code: [before.code, facts.code],
      strainId: [before.strainId, facts.strainId],
      possibleHybrid: [before.possibleHybrid, possibleHybrid],
    },
  });
  return oneBrood(scope, broodId);
}

/** The next free code; `X` stands for a strain that is not claimed. */
export async function nextCode({ db, roomId }: Scope, strainId: string | undefined, onDay: string): Promise<string> {
  const strain = strainId
    ? await db
        .selectFrom('strain')
        .where('roomId', '=', roomId)
        .where('id', '=', strainId)
        .select('code')
        .executeTakeFirst()
    : undefined;
  const taken = await db.selectFrom('brood').where('roomId', '=', roomId).select('code').execute();
  return proposeBroodCode(strain?.code ?? 'X', onDay, new Set(taken.map(({ code }) => code)));
}
