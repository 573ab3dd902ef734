import type * as z from 'zod/mini';
import type { listSamples, listStrainSamples, Sample } from '../../shared/growth/contract';
import { notFound } from '../../shared/refusal';
import { sourcesOf } from '../broods';
import type { RoomAsked, Scope } from '../scope';
import { figuresOf } from '../species';

/** A chart that compares more broods than these says nothing; the latest were kept as these are. */
const COMPARED = 40;

type Thing = 'brood' | 'batch' | 'fish';
type Wanted = { broodIds?: string[]; batchIds?: string[]; fishIds?: string[] };

/** Samples with their readings, oldest first. */
export async function samplesOf(
  scope: RoomAsked,
  { broodIds = [], batchIds = [], fishIds = [] }: Wanted,
): Promise<Sample[]> {
  const { db, roomId } = scope;
  if (broodIds.length + batchIds.length + fishIds.length === 0) return [];
  const rows = await db
    .selectFrom('lengthSample')
    .innerJoin('account', 'account.id', 'lengthSample.actorId')
    .leftJoin('brood', (join) =>
      join.onRef('brood.roomId', '=', 'lengthSample.roomId').onRef('brood.id', '=', 'lengthSample.broodId'),
    )
    .leftJoin('fish', (join) =>
      join.onRef('fish.roomId', '=', 'lengthSample.roomId').onRef('fish.id', '=', 'lengthSample.fishId'),
    )
    .where('lengthSample.roomId', '=', roomId)
    .where(({ or, eb }) =>
      or([
        ...(broodIds.length > 0 ? [eb('lengthSample.broodId', 'in', broodIds)] : []),
        ...(batchIds.length > 0 ? [eb('lengthSample.batchId', 'in', batchIds)] : []),
        ...(fishIds.length > 0 ? [eb('lengthSample.fishId', 'in', fishIds)] : []),
      ]),
    )
    .select([
      'lengthSample.id',
      'lengthSample.broodId',
      'lengthSample.batchId',
      'lengthSample.fishId',
      'lengthSample.onDay',
      'lengthSample.measure',
      'lengthSample.method',
      'lengthSample.note',
      'lengthSample.entryId',
      'account.name as by',
      'brood.code as broodCode',
      'fish.code as fishCode',
    ])
    .orderBy('lengthSample.onDay')
    .orderBy('lengthSample.id')
    .execute();
  const readings = await readingsOf(
    scope,
    rows.map(({ id }) => id),
  );
  const sources = await sourcesOf(
    scope,
    rows.flatMap(({ batchId }) => batchId ?? []),
  );
  return rows.map(({ broodId, batchId, fishId, broodCode, fishCode, ...row }) => {
    const batch = sources.get(batchId ?? '') ?? [];
    const thing: Thing = broodId ? 'brood' : batchId ? 'batch' : 'fish';
    const code = broodCode ?? fishCode ?? (batch.map((source) => source.code).join(' + ') || null);
    return {
      ...row,
      of: { thing, id: broodId ?? batchId ?? fishId ?? '', code },
      readings: readings.get(row.id) ?? [],
      mixed: batch.length > 1,
    };
  });
}

async function readingsOf({ db, roomId }: RoomAsked, sampleIds: string[]): Promise<Map<string, Sample['readings']>> {
  const readings = new Map<string, Sample['readings']>();
  if (sampleIds.length === 0) return readings;
  const rows = await db
    .selectFrom('lengthReading')
    .where('roomId', '=', roomId)
    .where('sampleId', 'in', sampleIds)
    .select(['sampleId', 'lengthTenthsMm', 'weightG'])
    .orderBy('sampleId')
    .orderBy('position')
    .execute();
  for (const { sampleId, ...reading } of rows) {
    const list = readings.get(sampleId);
    if (list) list.push(reading);
    else readings.set(sampleId, [reading]);
  }
  return readings;
}

/** A brood's own samples and those of the batches that it swims or swam in. */
export async function samplesOfBrood(scope: RoomAsked, broodId: string): Promise<Sample[]> {
  const { db, roomId } = scope;
  const batches = await db
    .selectFrom('batchSource')
    .where('roomId', '=', roomId)
    .where('broodId', '=', broodId)
    .select('batchId')
    .distinct()
    .execute();
  return samplesOf(scope, { broodIds: [broodId], batchIds: batches.map(({ batchId }) => batchId) });
}

export async function samplesPage(
  scope: Scope,
  thing: Thing,
  thingId: string,
): Promise<z.input<typeof listSamples.output>> {
  const about = await subjectOf(scope, thing, thingId);
  const samples =
    thing === 'brood'
      ? await samplesOfBrood(scope, thingId)
      : await samplesOf(scope, thing === 'batch' ? { batchIds: [thingId] } : { fishIds: [thingId] });
  const { speciesId, ...spawn } = about;
  return { samples, ...spawn, speciesId, overrides: speciesId ? await figuresOf(scope, speciesId) : {} };
}

type Subject = { spawnEarliest: string | null; spawnLatest: string | null; speciesId: string | null };

async function subjectOf(scope: Scope, thing: Thing, id: string): Promise<Subject> {
  const { db, roomId } = scope;
  if (thing === 'fish') {
    const fish = await db
      .selectFrom('fish')
      .leftJoin('strain', (join) =>
        join.onRef('strain.roomId', '=', 'fish.roomId').onRef('strain.id', '=', 'fish.strainId'),
      )
      .leftJoin('brood', (join) =>
        join.onRef('brood.roomId', '=', 'fish.roomId').onRef('brood.id', '=', 'fish.broodId'),
      )
      .where('fish.roomId', '=', roomId)
      .where('fish.id', '=', id)
      .select(['fish.bornOn', 'brood.spawnEarliest', 'brood.spawnLatest', 'strain.speciesId'])
      .executeTakeFirst();
    if (!fish) throw notFound('That fish');
    const { bornOn, spawnEarliest, spawnLatest, speciesId } = fish;
    return { spawnEarliest: spawnEarliest ?? bornOn, spawnLatest: spawnLatest ?? bornOn, speciesId };
  }
  const broodId = thing === 'brood' ? id : (await sourcesOf(scope, [id])).get(id)?.[0]?.broodId;
  const brood = await db
    .selectFrom('brood')
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'brood.roomId').onRef('strain.id', '=', 'brood.strainId'),
    )
    .where('brood.roomId', '=', roomId)
    .where('brood.id', '=', broodId ?? '')
    .select(['brood.spawnEarliest', 'brood.spawnLatest', 'strain.speciesId'])
    .executeTakeFirst();
  if (!brood) throw notFound(thing === 'brood' ? 'That brood' : 'That batch');
  return brood;
}

export async function strainSamples(scope: Scope, strainId: string): Promise<z.input<typeof listStrainSamples.output>> {
  const { db, roomId } = scope;
  const strain = await db
    .selectFrom('strain')
    .where('roomId', '=', roomId)
    .where('id', '=', strainId)
    .select('id')
    .executeTakeFirst();
  if (!strain) throw notFound('That strain');
  const broods = await db
    .selectFrom('brood')
    .where('roomId', '=', roomId)
    .where('strainId', '=', strainId)
    .select(['id', 'code', 'spawnEarliest', 'spawnLatest'])
    .orderBy('spawnLatest', 'desc')
    .orderBy('id', 'desc')
    .limit(COMPARED)
    .execute();
  const told: z.input<typeof listStrainSamples.output>['broods'] = [];
  for (const brood of broods.reverse()) told.push({ ...brood, samples: await samplesOfBrood(scope, brood.id) });
  return { broods: told };
}
