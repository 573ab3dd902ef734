import type * as z from 'zod/mini';
import type { HoldRow, readHold } from '../../shared/holds/contract';
import { notFound } from '../../shared/refusal';
import { librarySpecies } from '../../shared/species/library';
import { BREEDING_MODES } from '../../shared/species/species';
import { broodRows } from '../broods';
import { parentagesOf } from '../lineage';
import type { Scope } from '../scope';
import { speciesNames } from '../species';
import { clockFactsFor } from './clockFacts';

type Which = { ids?: string[]; open?: boolean; colonyId?: string | undefined; holderId?: string | undefined };

export async function holdRows(scope: Scope, which: Which = {}): Promise<HoldRow[]> {
  const rows = await rowsOf(scope, which);
  const facts = await clockFactsFor(scope, rows);
  const nameOf = await speciesNames(scope);
  const checks = await checkDays(
    scope,
    rows.map(({ id }) => id),
  );
  return rows.map((row) => {
    const clock = facts(row);
    return {
      id: row.id,
      version: row.version,
      holder: row.holderId ? { id: row.holderId, code: row.holderCode } : null,
      colony: row.colonyId && row.colonyCode ? { id: row.colonyId, code: row.colonyCode } : null,
      tank: { id: row.tankId, code: row.tankCode },
      strainId: row.strainId,
      strainCode: row.strainCode,
      displayName: row.scientificName ?? (row.speciesId ? nameOf(row.speciesId) : null),
      locality: row.locality,
      mode: modeOf(row.speciesId, clock.about),
      spawnSeen: row.spawnSeen === 1,
      spawnEarliest: row.spawnEarliest,
      spawnLatest: row.spawnLatest,
      firstSeenOn: row.firstSeenOn,
      plan: row.plan,
      outcome: row.outcome,
      endedOn: row.endedOn,
      checkedOn: checks.get(row.id) ?? [],
      brood: row.broodId && row.broodCode ? { id: row.broodId, code: row.broodCode } : null,
      femalesInColony: row.females ?? 0,
      clock,
    };
  });
}

function rowsOf({ db, roomId }: Scope, { ids, open, colonyId, holderId }: Which) {
  let query = db
    .selectFrom('hold')
    .innerJoin('tank', (join) => join.onRef('tank.roomId', '=', 'hold.roomId').onRef('tank.id', '=', 'hold.tankId'))
    .leftJoin('colony', (join) =>
      join.onRef('colony.roomId', '=', 'hold.roomId').onRef('colony.id', '=', 'hold.colonyId'),
    )
    .leftJoin('fish as holder', (join) =>
      join.onRef('holder.roomId', '=', 'hold.roomId').onRef('holder.id', '=', 'hold.holderId'),
    )
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'hold.roomId').onRef('strain.id', '=', 'hold.strainId'),
    )
    .leftJoin('brood', (join) => join.onRef('brood.roomId', '=', 'hold.roomId').onRef('brood.holdId', '=', 'hold.id'))
    .where('hold.roomId', '=', roomId)
    .select((eb) => [
      'hold.id',
      'hold.version',
      'hold.holderId',
      'hold.colonyId',
      'hold.tankId',
      'hold.parentageId',
      'hold.strainId',
      'hold.spawnSeen',
      'hold.spawnEarliest',
      'hold.spawnLatest',
      'hold.firstSeenOn',
      'hold.plan',
      'hold.outcome',
      'hold.endedOn',
      'hold.note',
      'holder.code as holderCode',
      'colony.code as colonyCode',
      'tank.code as tankCode',
      'strain.code as strainCode',
      'strain.speciesId',
      'strain.scientificName',
      'strain.locality',
      'brood.id as broodId',
      'brood.code as broodCode',
      eb
        .selectFrom('colonyMember')
        .whereRef('colonyMember.roomId', '=', 'hold.roomId')
        .whereRef('colonyMember.colonyId', '=', 'hold.colonyId')
        .where('colonyMember.untilDay', 'is', null)
        .where(({ selectFrom, eb: inner }) =>
          inner(
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
        .as('females'),
    ]);
  if (ids) query = query.where('hold.id', 'in', ids);
  if (open) query = query.where('hold.endedOn', 'is', null);
  if (colonyId) query = query.where('hold.colonyId', '=', colonyId);
  if (holderId) query = query.where('hold.holderId', '=', holderId);
  return query.orderBy('hold.spawnLatest', 'desc').orderBy('hold.id', 'desc').execute();
}

async function checkDays({ db, roomId }: Scope, holdIds: string[]): Promise<Map<string, string[]>> {
  const days = new Map<string, string[]>();
  if (holdIds.length === 0) return days;
  const rows = await db
    .selectFrom('holdCheck')
    .where('roomId', '=', roomId)
    .where('holdId', 'in', holdIds)
    .select(['holdId', 'onDay'])
    .orderBy('onDay')
    .execute();
  for (const { holdId, onDay } of rows) days.set(holdId, [...(days.get(holdId) ?? []), onDay]);
  return days;
}

function modeOf(speciesId: string | null, about: Record<string, unknown> | null): HoldRow['mode'] {
  const known = speciesId ? librarySpecies(speciesId)?.mode : undefined;
  return known ?? BREEDING_MODES.find((mode) => mode === about?.['mode']) ?? null;
}

export async function oneHold(scope: Scope, holdId: string): Promise<HoldRow> {
  const [hold] = await holdRows(scope, { ids: [holdId] });
  if (!hold) throw notFound('That hold');
  return hold;
}

export async function holdPage(scope: Scope, holdId: string): Promise<z.input<typeof readHold.output>> {
  const { db, roomId } = scope;
  const hold = await oneHold(scope, holdId);
  const { parentageId, strainId, note } = await db
    .selectFrom('hold')
    .where('roomId', '=', roomId)
    .where('id', '=', holdId)
    .select(['parentageId', 'strainId', 'note'])
    .executeTakeFirstOrThrow();
  const parentage = (await parentagesOf(scope, [parentageId])).get(parentageId);
  if (!parentage) throw notFound('Its parentage');
  const checks = await db
    .selectFrom('holdCheck')
    .innerJoin('account', 'account.id', 'holdCheck.actorId')
    .where('holdCheck.roomId', '=', roomId)
    .where('holdCheck.holdId', '=', holdId)
    .select(['holdCheck.id', 'holdCheck.onDay', 'holdCheck.seen', 'holdCheck.note', 'account.name as by'])
    .orderBy('holdCheck.onDay', 'desc')
    .execute();
  const all = hold.holder ? await holdRows(scope, { holderId: hold.holder.id }) : [];
  const others = all.filter(({ id }) => id !== holdId);
  const fry = await fryOf(
    scope,
    others.flatMap(({ brood }) => brood?.id ?? []),
  );
  const earlier = others.map(({ id, outcome, spawnLatest, endedOn, brood }) => ({
    id,
    outcome,
    spawnLatest,
    endedOn,
    brood,
    fry: fry.get(brood?.id ?? '') ?? null,
  }));
  return { hold, note, parentage, possibleHybrid: await mayBeHybrid(scope, strainId, parentage), checks, earlier };
}

/** Heads with which broods opened; before that, what was counted at the strip. */
async function fryOf(scope: Scope, broodIds: string[]): Promise<Map<string, number>> {
  const fry = new Map<string, number>();
  if (broodIds.length === 0) return fry;
  const counts = await scope.db
    .selectFrom('stageCount')
    .where('roomId', '=', scope.roomId)
    .where('broodId', 'in', broodIds)
    .where('total', 'is not', null)
    .select(['broodId', 'total'])
    .orderBy('onDay', 'desc')
    .execute();
  for (const { broodId, total } of counts) if (total !== null) fry.set(broodId, total);
  for (const { id, opened } of await broodRows(scope, { ids: broodIds })) if (opened !== null) fry.set(id, opened);
  return fry;
}

/** Whether a possible sire is of another strain than the hold's. */
export async function mayBeHybrid(
  { db, roomId }: Scope,
  strainId: string | null,
  { sires }: { sires: { fishId: string | null }[] },
): Promise<boolean> {
  const ids = sires.flatMap(({ fishId }) => fishId ?? []);
  if (ids.length === 0 || !strainId) return false;
  const strains = await db
    .selectFrom('fish')
    .where('roomId', '=', roomId)
    .where('id', 'in', ids)
    .select('strainId')
    .execute();
  return strains.some((fish) => fish.strainId !== strainId);
}
