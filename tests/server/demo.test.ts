import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { DEMO_PASSWORD, loadDemo } from '@/server/demo/load';
import { demoScenario } from '@/server/demo/scenario';
import { listBroods } from '@/shared/broods/contract';
import { headCountOf } from '@/shared/broods/headCount';
import { listColonies } from '@/shared/colonies/contract';
import { listHolds } from '@/shared/holds/contract';
import { readPedigree } from '@/shared/lineage/contract';
import { inbreeding } from '@/shared/lineage/inbreeding';
import { listStrains } from '@/shared/strains/contract';
import { listTanks } from '@/shared/tanks/contract';
import { readToday } from '@/shared/today/contract';
import { replay } from '../support/scenarioReplay';
import { type Person, START, type TestApp, testApp } from '../support/testApp';

/*
 * The demo fishroom as the product answers for it after it was loaded through the product's own rules: the figures are
 * those that the story itself tells, replayed or worked out here.
 */

let app: TestApp;
let owner: Person;
let roomId: string;
let idOf: (key: string) => string;
const scenario = demoScenario(START.slice(0, 10));

beforeAll(async () => {
  app = await testApp();
  ({ roomId, idOf } = await loadDemo(app.house, scenario));
  owner = app.person();
  expect((await signIn(owner, 'owner')).status).toBe(200);
}, 60_000);
afterAll(() => app.close());

function signIn(person: Person, role: string): Promise<Response> {
  const email = scenario.members.find((member) => member.role === role)?.email;
  return person.raw('POST', '/api/sessions', {
    body: JSON.stringify({ email, password: DEMO_PASSWORD }),
    headers: { 'content-type': 'application/json' },
  });
}

describe('the demo fishroom', () => {
  test('is as large as a breeder’s room: tanks, strains, colonies, broods', async () => {
    const params = { roomId };
    expect((await owner.get(listTanks, { params })).tanks).toHaveLength(30);
    expect((await owner.get(listStrains, { params })).strains).toHaveLength(6);
    expect((await owner.get(listColonies, { params })).colonies).toHaveLength(8);
    const { broods } = await owner.get(listBroods, { params, query: { which: 'all' } });
    expect(broods).toHaveLength(25);
    expect(broods.filter(({ possibleHybrid }) => possibleHybrid)).toHaveLength(1);
  });

  test.each(['owner', 'keeper', 'helper', 'viewer'])('lets the %s in', async (role) => {
    const person = app.person();
    expect((await signIn(person, role)).status).toBe(200);
    expect((await person.ask(readToday, { params: { roomId } })).status).toBe(200);
  });

  test('has the heads that its ledgers tell', async () => {
    const { broods } = await owner.get(listBroods, { params: { roomId }, query: { which: 'all' } });
    const told = broods.reduce((sum, { heads }) => sum + heads, 0);
    const replayed = [...replay(scenario).ledgers.values()].reduce((sum, lines) => sum + headCountOf(lines).balance, 0);
    expect(told).toBe(replayed);
  });

  test('knows how related two fish are that may share a father', async () => {
    const { nodes } = await owner.get(readPedigree, { params: { roomId } });
    // ESMI-B01 is of A04 and of A01 (2 shares) or A02 (1); ESMI-B10 of A08 and A01: half sibs at two in three, F = 1/8 × 2/3.
    expect(inbreeding(nodes).get(idOf('brood:s4'))).toBeCloseTo(1 / 12, 12);
  });

  test('has a Today that is alive', async () => {
    const today = await owner.get(readToday, { params: { roomId } });
    const { holds } = await owner.get(listHolds, { params: { roomId }, query: { which: 'open' } });
    expect(today.today).toBe(START.slice(0, 10));
    expect(today.holds.map(({ id }) => id).sort()).toEqual(holds.map(({ id }) => id).sort());
    expect(holds.length).toBeGreaterThanOrEqual(5);
    expect(today.batches.filter(({ balance }) => balance > 0).length).toBe(11);
  });
});
