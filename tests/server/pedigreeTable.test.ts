import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { exportTable, importTable, previewTable, readPedigree } from '@/shared/lineage/contract';
import { kinship } from '@/shared/lineage/kinship';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { strainIn } from '../support/stock';
import { type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;

beforeAll(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  await strainIn(owner, roomId);
});
afterAll(() => app.close());

const HEAD = 'id,sire,dam,sex,born,strain,clutch,fathers';
const take = (text: string, who: Pick<Known, 'ask'> = owner, room = roomId) =>
  who.ask(importTable, { params: { roomId: room }, body: { text } });
const preview = (lines: string[]) =>
  owner.get(previewTable, { params: { roomId }, body: { text: [HEAD, ...lines].join('\n') } });
const nodesIn = async (who: Known, room: string) =>
  (await who.get(readPedigree, { params: { roomId: room }, query: {} })).nodes;

/** Kinship of every two coded fish, by their codes. */
async function kinships(who: Known, room: string): Promise<Map<string, number>> {
  const nodes = await nodesIn(who, room);
  const found = kinship(
    nodes.map((node) =>
      'from' in node ? { id: node.id, from: node.from } : { id: node.id, sire: node.sire, dam: node.dam },
    ),
  );
  return new Map(
    nodes.flatMap((a) => nodes.map((b): [string, number] => [`${a.code} ${b.code}`, found.between(a.id, b.id)])),
  );
}

describe('a pedigree table', () => {
  test('with bad rows names each line, column and value, and writes nothing', async () => {
    const { rows, bad } = await preview([
      'B1,NOBODY,,,,',
      '=1+1,,,,,',
      'B3,,,neither,,',
      'B4,,,,2026-02-30,',
      'B5,B4:0,,,,',
      'B6,B7,,,,',
      'B7,B6,,,,',
      'B8,,,,,NONE',
      'B8,,,,,MOKA',
    ]);
    expect(rows).toBe(9);
    expect(bad.map(({ line, column, value }) => [line, column, value])).toEqual([
      [2, 'sire', 'NOBODY'],
      [3, 'id', '=1+1'],
      [4, 'sex', 'neither'],
      [5, 'born', '2026-02-30'],
      [6, 'sire', 'B4:0'],
      [8, 'id', 'B7'],
      [9, 'strain', 'NONE'],
      [10, 'id', 'B8'],
    ]);
    const refused = await take([HEAD, 'GOOD,,,,,', 'B1,NOBODY,,,,'].join('\n'));
    expect(refused.status).toBe(422);
    expect(refused.body.error?.fields?.['text']).toContain('Line 3');
    expect(await nodesIn(owner, roomId)).toEqual([]);
  });

  test('is for the owner to take in', async () => {
    expect((await take(`${HEAD}\nC1,,,,,`, await memberOf(app, roomId, 'keeper'))).status).toBe(403);
  });

  test('comes out as it went in: every kinship is the same in a fresh fishroom', async () => {
    const fish = fc.record({
      a: fc.nat(),
      b: fc.nat(),
      shape: fc.constantFrom('known', 'one', 'several', 'half', 'none'),
    });
    await fc.assert(
      fc.asyncProperty(fc.array(fish, { minLength: 3, maxLength: 12 }), async (made) => {
        const lines = made.flatMap(({ a, b, shape }, i) => {
          const [one, two] = [`F${a % (i + 1)}`, `F${b % (i + 1)}`];
          const sires = one === two ? one : `${one}:1 ${two}:3`;
          const [sire, clutch, fathers] = {
            known: [one, '', ''],
            one: [sires, `k${i}`, ''],
            several: [sires, '', 'several'],
            half: [`${one};?`, `k${i}`, ''],
            none: ['', '', ''],
          }[shape] as [string, string, string];
          // Two of each clutch, so that what they share is seen.
          return [`F${i + 1},${sire},,,,MOKA,${clutch},${fathers}`, `T${i + 1},${sire},,,,MOKA,${clutch},${fathers}`];
        });
        const [first, second] = [await ownerWithRoom(app), await ownerWithRoom(app)];
        for (const { owner: who, roomId: room } of [first, second]) await strainIn(who, room);
        expect((await take([HEAD, 'F0,,,,,MOKA', ...lines].join('\n'), first.owner, first.roomId)).status).toBe(200);
        const { text } = await first.owner.get(exportTable, { params: { roomId: first.roomId } });
        expect((await take(text, second.owner, second.roomId)).status).toBe(200);
        const [was, now] = [await kinships(first.owner, first.roomId), await kinships(second.owner, second.roomId)];
        expect(now.size).toBe(was.size);
        for (const [pair, value] of was) expect(now.get(pair), pair).toBeCloseTo(value, 9);
      }),
      { numRuns: 6 },
    );
  }, 60_000);

  test('of a thousand fish is taken in within ten seconds', async () => {
    const { owner: who, roomId: room } = await ownerWithRoom(app);
    const lines = Array.from({ length: 1000 }, (_none, i) =>
      i < 10 ? `N${i},,,,,` : `N${i},N${i - 10}:2 N${i - 9}:1,N${i - 8},,,`,
    );
    const from = performance.now();
    expect((await take([HEAD, ...lines].join('\n'), who, room)).body).toEqual({ rows: 1000 });
    expect(performance.now() - from).toBeLessThan(10_000);
  }, 30_000);
});
