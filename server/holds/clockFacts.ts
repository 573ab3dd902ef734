import { addDays, daysBetween } from '../../shared/days';
import type { ClockFacts } from '../../shared/holds/contract';
import { type TemperatureReading, temperatureOn } from '../../shared/holds/waterTemperature';
import type { Scope } from '../scope';
import { valuesOf } from '../species';

type Held = {
  tankId: string;
  speciesId: string | null;
  spawnEarliest: string;
  spawnLatest: string;
  endedOn: string | null;
};

/** How far back readings still speak for the water of a hold that has just begun. */
const DAYS_BEFORE = 14;

/** What the clocks of some holds run on. Read once for all of them: Today shows every open hold. */
export async function clockFactsFor(scope: Scope, holds: Held[]): Promise<(hold: Held) => ClockFacts> {
  const overrides = await overridesOf(scope);
  const finished = await finishedHolds(scope);
  const readings = await temperaturesOf(scope, [...new Set(holds.map(({ tankId }) => tankId))]);
  return ({ tankId, speciesId, spawnEarliest, endedOn }) => {
    const from = addDays(spawnEarliest, -DAYS_BEFORE);
    const until = endedOn ?? scope.today;
    const own = speciesId ? overrides.get(speciesId) : undefined;
    return {
      speciesId,
      overrides: own?.figures ?? {},
      about: own?.about ?? null,
      finished: finished.filter((one) => one.speciesId === speciesId).map(({ days, meanC }) => ({ days, meanC })),
      temperatures: (readings.get(tankId) ?? []).filter(({ on }) => on >= from && on <= until),
    };
  };
}

async function overridesOf({ db, roomId }: Scope) {
  const rows = await db
    .selectFrom('speciesOverride')
    .where('roomId', '=', roomId)
    .select(['id', 'figures', 'about'])
    .execute();
  return new Map(
    rows.map(({ id, figures, about }): [string, Pick<ClockFacts, 'about'> & { figures: ClockFacts['overrides'] }] => [
      id,
      { figures: valuesOf(figures), about: about ? JSON.parse(about) : null },
    ]),
  );
}

/** Released holds whose spawn was known to within a few days: what the fishroom's own holding time is learned from. */
async function finishedHolds(scope: Scope): Promise<{ speciesId: string; days: number; meanC: number }[]> {
  const rows = await scope.db
    .selectFrom('hold')
    .innerJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'hold.roomId').onRef('strain.id', '=', 'hold.strainId'),
    )
    .where('hold.roomId', '=', scope.roomId)
    .where('hold.outcome', '=', 'released')
    .select(['hold.tankId', 'hold.spawnEarliest', 'hold.spawnLatest', 'hold.endedOn', 'strain.speciesId'])
    .execute();
  const sharp = rows.filter((row) => daysBetween(row.spawnEarliest, row.spawnLatest) <= 4);
  const readings = await temperaturesOf(scope, [...new Set(sharp.map(({ tankId }) => tankId))]);
  return sharp.flatMap(({ tankId, spawnEarliest, spawnLatest, endedOn, speciesId }) => {
    const celsius = temperatureOn(readings.get(tankId) ?? []);
    if (!celsius || !endedOn) return [];
    const days = daysBetween(spawnEarliest, endedOn) - daysBetween(spawnEarliest, spawnLatest) / 2;
    if (days <= 0) return [];
    const span = daysBetween(spawnEarliest, endedOn);
    let sum = 0;
    for (let i = 0; i <= span; i += 1) sum += celsius(addDays(spawnEarliest, i));
    return [{ speciesId, days, meanC: sum / (span + 1) }];
  });
}

/** A tank's temperatures, several a day as they come; where none were read, the heater's set point stands in for today. */
async function temperaturesOf(
  { db, roomId, today }: Scope,
  tankIds: string[],
): Promise<Map<string, TemperatureReading[]>> {
  const readings = new Map<string, TemperatureReading[]>();
  if (tankIds.length === 0) return readings;
  const rows = await db
    .selectFrom('waterReading')
    .where('roomId', '=', roomId)
    .where('tankId', 'in', tankIds)
    .where('celsius', 'is not', null)
    .select(['tankId', 'onDay as on', ({ fn }) => fn.avg<number>('celsius').as('celsius')])
    .groupBy(['tankId', 'onDay'])
    .orderBy('onDay')
    .execute();
  for (const { tankId, on, celsius } of rows) readings.set(tankId, [...(readings.get(tankId) ?? []), { on, celsius }]);
  const tanks = await db
    .selectFrom('tank')
    .where('roomId', '=', roomId)
    .where('id', 'in', tankIds)
    .select(['id', 'heaterC'])
    .execute();
  for (const { id, heaterC } of tanks)
    if (heaterC !== null && !readings.has(id)) readings.set(id, [{ on: today, celsius: heaterC }]);
  return readings;
}
