import { sql } from 'kysely';
import type * as z from 'zod/mini';
import type { addColony, ColonyRow, changeColony, readColony } from '../../shared/colonies/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { isUniqueViolation } from '../db/constraint';
import { newId } from '../db/newId';
import { addFounders, endStay, fishRows, freeCodes, joinColony, mustBeOurs, mustLiveHere, startStay } from '../fish';
import type { Scope } from '../scope';
import { speciesNames } from '../species';

export async function colonyRows(scope: Scope, colonyId?: string): Promise<ColonyRow[]> {
  const { db, roomId } = scope;
  let query = db
    .selectFrom('colony')
    .innerJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'colony.roomId').onRef('strain.id', '=', 'colony.strainId'),
    )
    .leftJoin('stay', (join) =>
      join
        .onRef('stay.roomId', '=', 'colony.roomId')
        .onRef('stay.colonyId', '=', 'colony.id')
        .on('stay.untilDay', 'is', null),
    )
    .leftJoin('tank', (join) => join.onRef('tank.roomId', '=', 'colony.roomId').onRef('tank.id', '=', 'stay.tankId'))
    .where('colony.roomId', '=', roomId)
    .select((eb) => [
      'colony.id',
      'colony.version',
      'colony.code',
      'colony.strainId',
      'colony.startedOn',
      'colony.endedOn',
      'colony.note',
      'strain.code as strainCode',
      'strain.speciesId',
      'strain.scientificName',
      'strain.locality',
      'tank.id as tankId',
      'tank.code as tankCode',
      eb
        .selectFrom('hold')
        .whereRef('hold.roomId', '=', 'colony.roomId')
        .whereRef('hold.colonyId', '=', 'colony.id')
        .where('hold.endedOn', 'is', null)
        .select(({ fn }) => fn.countAll<number>().as('n'))
        .as('openHolds'),
    ]);
  if (colonyId) query = query.where('colony.id', '=', colonyId);
  const rows = await query.orderBy('colony.code').execute();
  const sexes = await sexesOf(scope);
  const nameOf = await speciesNames(scope);
  return rows.map(({ tankId, tankCode, scientificName, openHolds, ...row }) => ({
    ...row,
    displayName: scientificName ?? nameOf(row.speciesId),
    tank: tankId && tankCode ? { id: tankId, code: tankCode } : null,
    openHolds: openHolds ?? 0,
    ...(sexes.get(row.id) ?? { males: 0, females: 0, unsexed: 0 }),
  }));
}

/** How many of each sex every colony has today. */
async function sexesOf({
  db,
  roomId,
}: Scope): Promise<Map<string, { males: number; females: number; unsexed: number }>> {
  const { rows } = await sql<{ colonyId: string; males: number; females: number; unsexed: number }>`
    select member.colonyId,
           sum(coalesce(sex, '') = 'male') as males,
           sum(coalesce(sex, '') = 'female') as females,
           sum(coalesce(sex, '') not in ('male', 'female')) as unsexed
      from (select colonyMember.colonyId,
                   (select finding.value from finding
                     where finding.roomId = colonyMember.roomId and finding.fishId = colonyMember.fishId and finding.kind = 'sex'
                     order by finding.onDay desc, finding.id desc limit 1) as sex
              from colonyMember
             where colonyMember.roomId = ${roomId} and colonyMember.untilDay is null) member
     group by member.colonyId
  `.execute(db);
  return new Map(rows.map(({ colonyId, ...counts }) => [colonyId, counts]));
}

export async function oneColony(scope: Scope, colonyId: string): Promise<ColonyRow> {
  const [colony] = await colonyRows(scope, colonyId);
  if (!colony) throw notFound('That colony');
  return colony;
}

export async function colonyPage(scope: Scope, colonyId: string): Promise<z.input<typeof readColony.output>> {
  const colony = await oneColony(scope, colonyId);
  const members = await fishRows(scope, { colonyId });
  const past = await scope.db
    .selectFrom('colonyMember')
    .where('roomId', '=', scope.roomId)
    .where('colonyId', '=', colonyId)
    .where('untilDay', 'is not', null)
    .select(['fishId', 'fromDay', 'untilDay'])
    .orderBy('untilDay', 'desc')
    .execute();
  const left = past.length > 0 ? await fishRows(scope, { ids: past.map(({ fishId }) => fishId) }) : [];
  const former = past.flatMap(({ fishId, fromDay, untilDay }) => {
    const fish = left.find(({ id }) => id === fishId);
    return fish && untilDay ? [{ fish, fromDay, untilDay }] : [];
  });
  return { colony, members, former };
}

/** Starts a colony in a tank with fish that are here already and with new founders. */
export async function startColony(scope: Scope, adding: z.output<typeof addColony.body>): Promise<ColonyRow> {
  const { db, roomId, now, today } = scope;
  const { id, tankId, fishIds, newFish, ...facts } = adding;
  await mustBeOurs(scope, 'strain', facts.strainId, 'strainId', 'Choose a strain');
  await mustBeOurs(scope, 'tank', tankId, 'tankId', 'Choose a tank');
  if (facts.startedOn > today)
    throw new Refusal('invalid', 'That day is still to come', { startedOn: 'Choose today or an earlier day' });
  await keepColonyCode(facts.code, () =>
    db
      .insertInto('colony')
      .values({ roomId, id, ...facts, endedOn: null, planId: null, entryId: null, createdAt: now })
      .execute(),
  );
  await startStay(scope, { column: 'colonyId', id, tankId, onDay: facts.startedOn, entryId: null });
  for (const fishId of fishIds) {
    await mustLiveHere(scope, { fishId, field: 'fishIds', sentence: 'Choose fish of this fishroom' });
    await joinColony(scope, { fishId, colonyId: id, onDay: facts.startedOn, entryId: null });
  }
  for (const [sex, heads] of [
    ['male', newFish.males],
    ['female', newFish.females],
    ['unknown', newFish.unsexed],
  ] as const) {
    if (heads === 0) continue;
    const ids = Array.from({ length: heads }, () => newId(now));
    const codes = newFish.coded ? await freeCodes(scope, facts.code, heads) : ids.map(() => null);
    await addFounders(scope, {
      ids,
      codes,
      strainId: facts.strainId,
      sex,
      keptAs: 'breeder',
      bornOn: null,
      arrivedOn: facts.startedOn,
      lotId: newFish.lotId,
      colonyId: id,
      tankId: null,
      mark: null,
      note: null,
    });
  }
  await audit(scope, { action: 'colony started', about: 'colony', aboutId: id });
  return oneColony(scope, id);
}

export async function changeOne(
  scope: Scope,
  colonyId: string,
  { version, ...facts }: z.output<typeof changeColony.body>,
): Promise<ColonyRow> {
  const before = await oneColony(scope, colonyId);
  if (before.version !== version)
    throw new Refusal('conflict', 'Someone changed this colony meanwhile', {}, { current: before });
  if (facts.endedOn && before.males + before.females + before.unsexed > 0) {
    throw new Refusal('conflict', 'Fish are in this colony. Move them out first.', {
      endedOn: 'Move its fish out first',
    });
  }
  await keepColonyCode(facts.code, () =>
    scope.db
      .updateTable('colony')
      .set({ ...facts, version: version + 1 })
      .where('roomId', '=', scope.roomId)
      .where('id', '=', colonyId)
      .execute(),
  );
  if (facts.endedOn) await endStay(scope, 'colonyId', colonyId, facts.endedOn, null);
  await audit(scope, {
    action: 'colony changed',
    about: 'colony',
    aboutId: colonyId,
    change: { code: [before.code, facts.code], endedOn: [before.endedOn, facts.endedOn] },
  });
  return oneColony(scope, colonyId);
}

async function keepColonyCode<T>(code: string, write: () => Promise<T>): Promise<T> {
  try {
    return await write();
  } catch (error) {
    if (isUniqueViolation(error, 'colony.code')) {
      throw new Refusal('conflict', `Another colony has the code ${code}`, { code: 'Taken: choose another code' });
    }
    throw error;
  }
}
