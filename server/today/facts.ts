import type * as z from 'zod/mini';
import { headCountOf } from '../../shared/broods/headCount';
import { addDays } from '../../shared/days';
import { grouped } from '../../shared/grouped';
import type { TankToday, TodayFacts } from '../../shared/today/facts';
import { batchesOf, broodRows } from '../broods';
import { requestsToday } from '../buyers';
import { holdRows } from '../holds';
import { ordersToday } from '../orders';
import type { Scope } from '../scope';
import { speciesSeen } from '../species';
import { allTanks } from '../tanks';
import { careRows, readingRows } from '../water';
import { intervalsOf } from './intervals';
import { taskRows } from './tasks';

type Told = z.input<typeof TodayFacts>;

/** How far back a reading still says something about a tank. */
const READINGS_SINCE_DAYS = 120;

/** Everything that Today is worked out from. */
export async function todayFacts(scope: Scope): Promise<Told> {
  const { today } = scope;
  const holds = await holdRows(scope, { open: true });
  const broods = await broodRows(scope, { hereOnly: true });
  const tanks = await allTanks(scope);
  const care = await careRows(scope, { since: addDays(today, -READINGS_SINCE_DAYS) });
  const speciesOfStrain = await strainSpecies(scope);
  const tanksToday = await tanksNow(scope, tanks, care, speciesOfStrain);
  const speciesIds = new Set([
    ...tanksToday.flatMap((tank) => tank.speciesIds),
    ...broods.flatMap(({ speciesId }) => speciesId ?? []),
    ...holds.flatMap(({ clock }) => clock.speciesId ?? []),
  ]);
  return {
    today,
    intervals: await intervalsOf(scope),
    holds,
    broods,
    batches: await batchesNow(scope, broods),
    tanks: tanksToday,
    care: care.filter(({ kind }) => kind === 'treatment' || kind === 'quarantine'),
    species: await speciesSeen(scope, [...speciesIds]),
    orders: await ordersToday(scope),
    requests: await requestsToday(scope),
    tasks: await taskRows(scope),
    failedLetters: scope.role === 'owner' ? await failedLetters(scope) : 0,
    females: await femaleCount(scope),
  };
}

async function strainSpecies({ db, roomId }: Scope): Promise<Map<string, string>> {
  const rows = await db.selectFrom('strain').where('roomId', '=', roomId).select(['id', 'speciesId']).execute();
  return new Map(rows.map(({ id, speciesId }) => [id, speciesId]));
}

async function tanksNow(
  scope: Scope,
  tanks: Awaited<ReturnType<typeof allTanks>>,
  care: Awaited<ReturnType<typeof careRows>>,
  speciesOfStrain: Map<string, string>,
): Promise<z.input<typeof TankToday>[]> {
  const readings = grouped(
    await readingRows(scope, { since: addDays(scope.today, -READINGS_SINCE_DAYS) }),
    ({ tankId }) => tankId,
  );
  const changed = grouped(
    care.filter(({ kind }) => kind === 'waterChange'),
    ({ tankId }) => tankId,
  );
  return tanks
    .filter(({ retiredOn }) => retiredOn === null)
    .map(({ id, code, place, litres, residents }) => {
      const own = readings.get(id) ?? [];
      const changes = changed.get(id) ?? [];
      const since = residents.map((resident) => resident.since).sort();
      return {
        id,
        code,
        place,
        litres,
        stockedSince: since[0] ?? null,
        speciesIds: [
          ...new Set(residents.flatMap(({ strainId }) => (strainId ? (speciesOfStrain.get(strainId) ?? []) : []))),
        ],
        latest: own[0] ?? null,
        testedOn: own.find(({ source }) => source === 'test')?.onDay ?? null,
        changedOn: changes[0]?.onDay ?? null,
        changedPercent: changes[0]?.percent ?? null,
      };
    });
}

async function batchesNow(scope: Scope, broods: Awaited<ReturnType<typeof broodRows>>): Promise<Told['batches']> {
  const { db, roomId } = scope;
  const batches = await batchesOf(
    scope,
    broods.map(({ id }) => id),
  );
  const byId = new Map(broods.map((brood) => [brood.id, brood]));
  const counts = await db
    .selectFrom('stageCount')
    .where('roomId', '=', roomId)
    .select(['broodId', ({ fn }) => fn.max('onDay').as('onDay')])
    .groupBy('broodId')
    .execute();
  const stageCounted = new Map(counts.map(({ broodId, onDay }) => [broodId, onDay]));
  return batches.flatMap(({ id, sources, tank, balance, startedOn, lines }) => {
    const own = sources.flatMap(({ broodId }) => byId.get(broodId) ?? []);
    const [first] = own;
    if (!first) return [];
    const { openedOn, countedOn } = headCountOf(lines);
    if (openedOn !== null && balance === 0) return [];
    return [
      {
        id,
        tank,
        balance,
        startedOn,
        openedOn,
        countedOn,
        codes: sources.map(({ code }) => code),
        broodIds: sources.map(({ broodId }) => broodId),
        spawnLatest: first.spawnLatest,
        speciesId: first.speciesId,
        stageCountedOn: stageCounted.get(first.id) ?? null,
        sampledOn: first.lastSample?.onDay ?? null,
        meanTenthsMm: first.lastSample?.meanTenthsMm ?? null,
      },
    ];
  });
}

async function failedLetters({ db, roomId }: Scope): Promise<number> {
  const row = await db
    .selectFrom('letter')
    .where('roomId', '=', roomId)
    .where('state', '=', 'failed')
    .select(({ fn }) => fn.countAll<number>().as('n'))
    .executeTakeFirst();
  return row?.n ?? 0;
}

/** Living females of the colonies: "5 of 31 females hold". */
async function femaleCount({ db, roomId }: Scope): Promise<number> {
  const row = await db
    .selectFrom('colonyMember')
    .where('roomId', '=', roomId)
    .where('untilDay', 'is', null)
    .where(({ eb, selectFrom }) =>
      eb(
        selectFrom('finding')
          .whereRef('finding.roomId', '=', 'colonyMember.roomId')
          .whereRef('finding.fishId', '=', 'colonyMember.fishId')
          .where('finding.kind', '=', 'sex')
          .orderBy('finding.onDay', 'desc')
          .orderBy('finding.id', 'desc')
          .limit(1)
          .select('finding.value'),
        '=',
        'female',
      ),
    )
    .select(({ fn }) => fn.countAll<number>().as('n'))
    .executeTakeFirst();
  return row?.n ?? 0;
}
