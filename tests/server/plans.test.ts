import { afterEach, beforeEach, expect, test } from 'vitest';
import { readColony } from '@/shared/colonies/contract';
import { addPlan, carryOutPlan, dropPlan, listPlans, readPlan } from '@/shared/plans/contract';
import { readToday } from '@/shared/today/contract';
import { memberOf, ownerWithRoom } from '../support/accounts';
import { record, TODAY } from '../support/stock';
import { makeId, type Person, type TestApp, testApp } from '../support/testApp';
import { type ThreeBroods, threeBroods } from '../support/threeBroods';

let app: TestApp;
let owner: Person;
let roomId: string;
let room: ThreeBroods;

beforeEach(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  room = await threeBroods(owner, roomId);
});
afterEach(() => app.close());

const idOf = (code: string): string => room.fish[code] ?? '';

const content = () => ({
  strainId: room.colony.strainId,
  groups: [{ tankId: room.empty, males: [idOf('MOKA-K1')], females: [idOf('MOKA-K3'), idOf('MOKA-K4')] }],
  limit: 0.125,
  note: null,
});

async function saved(id = makeId()) {
  return owner.get(addPlan, { params: { roomId }, body: { id, name: 'Next spring', content: content() } });
}

const carrying = (version = 1, code = 'MOKA-B') => ({
  version,
  onDay: TODAY,
  colonies: [{ id: makeId(), code, tankId: room.empty }],
});

test('a plan is carried out at once: the colony, its members, and whom to net from where', async () => {
  const plan = await saved();
  const body = carrying();
  const done = await owner.get(carryOutPlan, { params: { roomId, planId: plan.id }, body });
  expect(done.state).toBe('carriedOut');
  expect(done.colony?.code).toBe('MOKA-B');
  const colonyId = body.colonies[0]?.id ?? '';
  const { colony, members } = await owner.get(readColony, { params: { roomId, colonyId } });
  expect(members.map(({ code }) => code).sort()).toEqual(['MOKA-K1', 'MOKA-K3', 'MOKA-K4']);
  expect(colony.tank?.code).toBe('R9');
  const { tasks } = await owner.get(readToday, { params: { roomId } });
  expect(tasks.map(({ title, dueOn }) => [title, dueOn])).toEqual([
    ['Move from G1 to R9: MOKA-K1, MOKA-K3, MOKA-K4', TODAY],
  ]);
});

test('it is carried out once, whoever is faster', async () => {
  const plan = await saved();
  const params = { roomId, planId: plan.id };
  const answers = await Promise.all([
    owner.ask(carryOutPlan, { params, body: carrying(1, 'MOKA-B') }),
    owner.ask(carryOutPlan, { params, body: carrying(1, 'MOKA-C') }),
  ]);
  expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
});

test('fish that died meanwhile are named, and nothing is begun', async () => {
  const plan = await saved();
  await record(owner, roomId, {
    kind: 'fishLeft',
    fishId: idOf('MOKA-K4'),
    onDay: TODAY,
    how: 'died',
    cause: null,
    note: null,
  });
  const body = carrying();
  const answer = await owner.ask(carryOutPlan, { params: { roomId, planId: plan.id }, body });
  expect(answer.status).toBe(409);
  expect(answer.body.error?.message).toContain('MOKA-K4');
  const colonyId = body.colonies[0]?.id ?? '';
  expect((await owner.ask(readColony, { params: { roomId, colonyId } })).status).toBe(404);
  const { plans } = await owner.get(listPlans, { params: { roomId } });
  expect(plans[0]).toMatchObject({ state: 'draft', gone: [{ code: 'MOKA-K4' }] });
});

test('a colony code that is taken is told beside its field, and the plan stays a draft', async () => {
  const plan = await saved();
  const params = { roomId, planId: plan.id };
  const answer = await owner.ask(carryOutPlan, { params, body: carrying(1, 'MOKA-A') });
  expect(answer.status).toBe(409);
  expect((await owner.get(readPlan, { params })).state).toBe('draft');
});

test.each([
  ['a female among the males', { males: ['MOKA-K2'], females: ['MOKA-K3'] }, 'content.groups.0.males'],
  ['a male among the females', { males: ['MOKA-K1'], females: ['MOKA-K1'] }, 'content.groups'],
])('refuses %s beside its field', async (_what, { males, females }, field) => {
  const groups = [{ tankId: null, males: males.map(idOf), females: females.map(idOf) }];
  const body = { id: makeId(), name: 'Wrong', content: { ...content(), groups } };
  const answer = await owner.ask(addPlan, { params: { roomId }, body });
  expect(answer.status).toBe(422);
  expect(Object.keys(answer.body.error?.fields ?? {})).toContain(field);
});

test('a fish of another fishroom is no fish here', async () => {
  const other = await ownerWithRoom(app);
  const theirs = await threeBroods(other.owner, other.roomId);
  const groups = [{ tankId: null, males: [theirs.fish['MOKA-K1'] ?? ''], females: [idOf('MOKA-K3')] }];
  const body = { id: makeId(), name: 'Theirs', content: { ...content(), groups } };
  expect((await owner.ask(addPlan, { params: { roomId }, body })).status).toBe(422);
});

test('helpers read plans and make none; a dropped plan stays as dropped', async () => {
  const plan = await saved();
  const helper = await memberOf(app, roomId, 'helper');
  const params = { roomId, planId: plan.id };
  expect((await helper.get(readPlan, { params })).name).toBe('Next spring');
  expect((await helper.ask(dropPlan, { params, body: { version: 1 } })).status).toBe(403);
  expect((await owner.get(dropPlan, { params, body: { version: 1 } })).state).toBe('dropped');
  const answer = await owner.ask(carryOutPlan, { params, body: carrying(2) });
  expect(answer.status).toBe(409);
  expect(answer.body.error?.message).toBe('This plan was dropped');
});
