import type * as z from 'zod/mini';
import { type addPlan, type carryOutPlan, PlanContent, type PlanRow } from '../../shared/plans/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { startColony } from '../colonies';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { fishRows, mustBeOurs } from '../fish';
import type { Scope } from '../scope';
import { addTaskFor } from '../today';

type Told = z.input<typeof PlanRow>;

/** Plans, the newest first, with the fish of each that are gone meanwhile. */
export async function planRows({ db, roomId, ...scope }: Scope, planId?: string): Promise<Told[]> {
  let query = db
    .selectFrom('pairingPlan')
    .innerJoin('account', 'account.id', 'pairingPlan.madeBy')
    .leftJoin('colony', (join) =>
      join.onRef('colony.roomId', '=', 'pairingPlan.roomId').onRef('colony.id', '=', 'pairingPlan.colonyId'),
    )
    .where('pairingPlan.roomId', '=', roomId)
    .select([
      'pairingPlan.id',
      'pairingPlan.version',
      'pairingPlan.name',
      'pairingPlan.content',
      'pairingPlan.state',
      'pairingPlan.createdAt',
      'colony.id as colonyId',
      'colony.code as colonyCode',
      'account.name as by',
    ]);
  if (planId) query = query.where('pairingPlan.id', '=', planId);
  const rows = await query.orderBy('pairingPlan.createdAt', 'desc').orderBy('pairingPlan.id', 'desc').execute();
  const plans = rows.map((row) => ({ row, content: PlanContent.parse(JSON.parse(row.content)) }));
  const ids = [...new Set(plans.flatMap(({ content }) => fishOf(content)))];
  const known = ids.length > 0 ? await fishRows({ db, roomId, ...scope }, { ids }) : [];
  const left = new Map(known.filter(({ exit }) => exit !== null).map(({ id, code }) => [id, code]));
  return plans.map(({ row: { colonyId, colonyCode, content: _content, ...row }, content }) => ({
    ...row,
    content,
    colony: colonyId && colonyCode ? { id: colonyId, code: colonyCode } : null,
    gone: fishOf(content).flatMap((id) => (left.has(id) ? [{ id, code: left.get(id) ?? null }] : [])),
  }));
}

const fishOf = ({ groups }: PlanContent): string[] => groups.flatMap(({ males, females }) => [...males, ...females]);

export async function onePlan(scope: Scope, planId: string): Promise<Told> {
  const [plan] = await planRows(scope, planId);
  if (!plan) throw notFound('That plan');
  return plan;
}

export async function addOne(scope: Scope, { id, name, content }: z.output<typeof addPlan.body>): Promise<Told> {
  const { db, roomId, actorId, now } = scope;
  await mustBeOurs(scope, 'strain', content.strainId, 'content.strainId', 'Choose a strain');
  for (const [i, { tankId, ...sexes }] of content.groups.entries()) {
    if (tankId) await mustBeOurs(scope, 'tank', tankId, `content.groups.${i}.tankId`, 'Choose a tank');
    for (const side of ['males', 'females'] as const)
      for (const fishId of sexes[side])
        await mustBeOurs(scope, 'fish', fishId, `content.groups.${i}.${side}`, 'Choose fish of this fishroom');
  }
  await mustHaveSexes(scope, content);
  await db
    .insertInto('pairingPlan')
    .values({ roomId, id, name, content: JSON.stringify(content), colonyId: null, madeBy: actorId, createdAt: now })
    .execute();
  await audit(scope, { action: 'pairing plan made', about: 'plan', aboutId: id });
  return onePlan(scope, id);
}

/** A female among the males would count wrong in every figure of the plan. */
async function mustHaveSexes(scope: Scope, { groups }: PlanContent): Promise<void> {
  const rows = await fishRows(scope, { ids: groups.flatMap(({ males, females }) => [...males, ...females]) });
  const byId = new Map(rows.map((fish) => [fish.id, fish]));
  for (const [i, group] of groups.entries())
    for (const [side, wrong] of [
      ['males', 'female'],
      ['females', 'male'],
    ] as const)
      for (const id of group[side]) {
        const fish = byId.get(id);
        if (fish?.sex !== wrong) continue;
        const said = `${fish.code ?? 'A fish'} is recorded as ${wrong}`;
        throw new Refusal('invalid', said, { [`content.groups.${i}.${side}`]: said });
      }
}

async function draftOf(scope: Scope, planId: string, version: number): Promise<Told> {
  const plan = await onePlan(scope, planId);
  if (plan.version !== version)
    throw new Refusal('conflict', 'Someone changed this plan meanwhile', {}, { current: plan });
  if (plan.state === 'draft') return plan;
  const said = plan.state === 'dropped' ? 'This plan was dropped' : 'This plan was carried out already';
  throw new Refusal('conflict', said, {}, { current: plan });
}

export async function drop(scope: Scope, planId: string, version: number): Promise<Told> {
  await draftOf(scope, planId, version);
  await settle(scope, planId, { state: 'dropped', version: version + 1 });
  await audit(scope, { action: 'pairing plan dropped', about: 'plan', aboutId: planId });
  return onePlan(scope, planId);
}

async function settle(
  { db, roomId }: Scope,
  planId: string,
  to: { state: 'dropped' | 'carriedOut'; version: number; colonyId?: string },
): Promise<void> {
  await db.updateTable('pairingPlan').set(to).where('roomId', '=', roomId).where('id', '=', planId).execute();
}

/** All of it or nothing: the colonies, their members, and what is to be netted where. */
export async function carryOut(
  scope: Scope,
  planId: string,
  { version, onDay, colonies }: z.output<typeof carryOutPlan.body>,
): Promise<Told> {
  const plan = await draftOf(scope, planId, version);
  const { groups, strainId } = plan.content;
  if (plan.gone.length > 0) {
    const codes = plan.gone.map(({ code }) => code ?? 'one without a code').join(', ');
    throw new Refusal('conflict', `Not here any more: ${codes}. Make a new plan without them.`, {}, { current: plan });
  }
  if (colonies.length !== groups.length)
    throw new Refusal('invalid', 'Name a colony for each tank', { colonies: `Name ${groups.length}` });
  for (const [i, group] of groups.entries()) {
    const colony = colonies[i];
    if (!colony) continue;
    await mustBeOurs(scope, 'tank', colony.tankId, `colonies.${i}.tankId`, 'Choose a tank');
    await nettingTasks(scope, { fishIds: [...group.males, ...group.females], toTankId: colony.tankId, onDay });
    const { id, code, tankId } = colony;
    const newFish = { males: 0, females: 0, unsexed: 0, lotId: null, coded: false };
    const fishIds = [...group.males, ...group.females];
    await startColony(scope, { id, code, strainId, tankId, startedOn: onDay, note: null, fishIds, newFish });
  }
  await settle(scope, planId, { state: 'carriedOut', version: version + 1, colonyId: colonies[0]?.id ?? '' });
  await audit(scope, { action: 'pairing plan carried out', about: 'plan', aboutId: planId });
  return onePlan(scope, planId);
}

/** A task for each tank that fish come out of: which to net, and where they go. */
async function nettingTasks(
  scope: Scope,
  { fishIds, toTankId, onDay }: { fishIds: string[]; toTankId: string; onDay: string },
): Promise<void> {
  const { db, roomId, now } = scope;
  const to = await db
    .selectFrom('tank')
    .where('roomId', '=', roomId)
    .where('id', '=', toTankId)
    .select('code')
    .executeTakeFirstOrThrow();
  const from = new Map<string, { code: string; fish: string[] }>();
  for (const { code, tank } of await fishRows(scope, { ids: fishIds })) {
    if (!tank || tank.id === toTankId) continue;
    const known = from.get(tank.id) ?? { code: tank.code, fish: [] };
    known.fish.push(code ?? 'one without a code');
    from.set(tank.id, known);
  }
  for (const [tankId, { code, fish }] of from) {
    const title = `Move from ${code} to ${to.code}: ${fish.join(', ')}`;
    await addTaskFor(scope, {
      id: newId(now),
      title: title.length > 120 ? `Move ${fish.length} fish from ${code} to ${to.code}` : title,
      dueOn: onDay,
      everyDays: null,
      onWeekday: null,
      assignedTo: null,
      about: { thing: 'tank', id: tankId },
    });
  }
}
