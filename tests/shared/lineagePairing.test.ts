import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { kinship } from '@/shared/lineage/kinship';
import type { KinshipMatrix } from '@/shared/lineage/kinshipMatrix';
import { pairingChoice } from '@/shared/lineage/pairingChoice';
import { searchGroup } from '@/shared/lineage/pairingSearch';
import { startGroup } from '@/shared/lineage/pairingStart';
import { PedigreeError } from '@/shared/lineage/pedigreeError';
import { type PairingRequest, planPairing } from '@/shared/lineage/planPairing';
import { certainPedigrees } from './lineageArbitraries';
import { child, longPedigree, wild } from './lineagePedigrees';

/** Two broods of two, all of one dam, and a wild pair from elsewhere. */
const room = kinship([
  ...wild('w1', 'w2', 'w3', 'wildM', 'wildF'),
  child('m1', 'w1', 'w3'),
  child('f1', 'w1', 'w3'),
  child('m2', 'w2', 'w3'),
  child('f2', 'w2', 'w3'),
]);
const ask = (more: Partial<PairingRequest> = {}): PairingRequest => ({
  matrix: room,
  males: ['m1', 'm2', 'wildM'],
  females: ['f1', 'f2', 'wildF'],
  chooseMales: 1,
  chooseFemales: 1,
  ...more,
});

function refusal(more: Partial<PairingRequest>): PedigreeError {
  try {
    planPairing(ask(more));
  } catch (error) {
    if (error instanceof PedigreeError) return error;
    throw error;
  }
  throw new Error('The plan was made');
}

describe('A pairing plan', () => {
  test('takes the unrelated pair: mean kinship of the young 1/4, worked out by hand', () => {
    const plan = planPairing(ask({ males: ['m1', 'm2'], females: ['f1', 'wildF'] }));
    expect(plan).toEqual({
      males: ['m1'],
      females: ['wildF'],
      meanKinship: 0.25,
      geneDiversity: 0.75,
      pairs: [{ male: 'm1', female: 'wildF', fryInbreeding: 0 }],
      exact: true,
    });
  });

  test('each sex gives half, whatever its number: one male and two females', () => {
    const plan = planPairing(ask({ males: ['m1'], females: ['f2', 'wildF'], chooseFemales: 2 }));
    // 1/4 f(m1,m1) + 1/4 (1/2 + 1/2 + 2 x 0)/4 + 1/2 (1/8 + 0)/2
    expect(plan.meanKinship).toBeCloseTo(0.125 + 0.0625 + 0.03125, 15);
    expect(plan.pairs).toEqual([
      { male: 'm1', female: 'wildF', fryInbreeding: 0 },
      { male: 'm1', female: 'f2', fryInbreeding: 0.125 },
    ]);
  });

  test('the limit binds every male with every female, for one tank keeps no pairs apart', () => {
    const two = { chooseMales: 2, chooseFemales: 2, males: ['m1', 'm2'], females: ['f1', 'f2', 'wildF'] };
    expect(planPairing(ask(two)).pairs.at(-1)?.fryInbreeding).toBe(0.25);
    const error = refusal({ ...two, maxFryInbreeding: 0.125 });
    expect(error.reason).toBe('noGroupFits');
    expect(error.message).toContain('two tanks');
    const plan = planPairing(ask({ ...two, chooseMales: 1, maxFryInbreeding: 0.125 }));
    expect(plan.pairs.every(({ fryInbreeding }) => fryInbreeding <= 0.125)).toBe(true);
  });

  test('a fish that must be in the group is, whatever it costs', () => {
    expect(planPairing(ask()).males).toEqual(['m1']);
    const plan = planPairing(ask({ required: ['f1', 'm1'] }));
    expect([plan.males, plan.females]).toEqual([['m1'], ['f1']]);
    const error = refusal({ required: ['f1', 'm1'], maxFryInbreeding: 0.2 });
    expect([error.reason, error.ids]).toEqual(['noGroupFits', ['m1', 'f1']]);
  });

  test('of sibs that are alike takes the first listed', () => {
    const matrix = kinship([...wild('s', 'd', 'm'), ...['a', 'b', 'c', 'e'].map((id) => child(id, 's', 'd'))]);
    const plan = planPairing({ matrix, males: ['m'], females: ['c', 'e', 'a', 'b'], chooseMales: 1, chooseFemales: 2 });
    expect(plan.females).toEqual(['c', 'e']);
  });

  test.each<[string, Partial<PairingRequest>, string, string[]]>([
    ['too few fish to choose from', { chooseMales: 4 }, 'noGroupFits', []],
    ['more required than asked for', { required: ['f1', 'f2'] }, 'noGroupFits', ['f1', 'f2']],
    ['a fish on both sides', { males: ['m1', 'f1'] }, 'bothSexes', ['f1']],
    ['a fish that is not in the table', { males: ['ghost'] }, 'unknownId', ['ghost']],
    ['a required fish that is no candidate', { required: ['w1'] }, 'unknownId', ['w1']],
  ])('refuses %s', (_, more, reason, ids) => {
    const error = refusal(more);
    expect([error.reason, error.ids]).toEqual([reason, ids]);
  });

  test.each([{ chooseMales: 0 }, { chooseFemales: 1.5 }, { maxFryInbreeding: Number.NaN }, { maxFryInbreeding: -0.1 }])(
    'refuses %o',
    (more) => {
      expect(() => planPairing(ask(more))).toThrow(BadValue);
    },
  );

  test('is the best of all groups, or refuses when there is none: every group listed', () => {
    const cases = fc.record({
      pedigree: certainPedigrees(14),
      order: fc.infiniteStream(fc.nat()),
      chooseMales: fc.integer({ min: 1, max: 3 }),
      chooseFemales: fc.integer({ min: 1, max: 4 }),
      limit: fc.constantFrom(1, 0.25, 0.125, 0.0625, 0),
      required: fc.nat(2),
    });
    let refused = 0;
    fc.assert(
      fc.property(cases, ({ pedigree, order, chooseMales, chooseFemales, limit, required }) => {
        fc.pre(pedigree.length >= chooseMales + chooseFemales + 1);
        const matrix = kinship(pedigree);
        const ids = pedigree.map(({ id }) => ({ id, at: order.next().value ?? 0 })).sort((a, b) => a.at - b.at);
        const males = ids.slice(0, Math.max(chooseMales, Math.floor(ids.length / 2))).map(({ id }) => id);
        const females = ids.slice(males.length).map(({ id }) => id);
        fc.pre(females.length >= chooseFemales);
        const must = [males[0], females[0]].flatMap((id) => id ?? []).slice(0, required);
        const best = bestOfAll({
          matrix,
          males,
          females,
          chooseMales,
          chooseFemales,
          maxFryInbreeding: limit,
          required: must,
        });
        const request = { matrix, males, females, chooseMales, chooseFemales, maxFryInbreeding: limit, required: must };
        if (best === undefined) {
          refused += 1;
          expect(() => planPairing(request)).toThrow(expect.objectContaining({ reason: 'noGroupFits' }));
          return;
        }
        const plan = planPairing(request);
        expect(plan.exact).toBe(true);
        expect(plan.meanKinship).toBeCloseTo(best, 12);
        expect(plan.meanKinship).toBeCloseTo(meanOfYoung(matrix, plan.males, plan.females), 12);
        expect(plan.pairs).toHaveLength(chooseMales * chooseFemales);
        expect(plan.pairs.every(({ fryInbreeding }) => fryInbreeding <= limit)).toBe(true);
        for (const id of must) expect([...plan.males, ...plan.females]).toContain(id);
      }),
      { numRuns: 400 },
    );
    expect(refused).toBeGreaterThan(20);
  });

  test('a search that is ended early owns up to it, with the best group seen or none', () => {
    const ids = ['m1', 'm2', 'f1', 'f2'];
    const of = { maleCount: 2, males: 1, females: 1, limit: 1, required: new Set<string>() };
    const choice = pairingChoice(room, ids, of);
    expect(searchGroup(choice, undefined, 1)).toEqual({ group: undefined, exact: false });
    const start = startGroup(choice);
    expect(searchGroup(choice, start, 1)).toEqual({ group: start, exact: false });
    expect(searchGroup(choice, undefined, 1_000)).toEqual({
      group: expect.objectContaining({ cost: start?.cost }),
      exact: true,
    });
  });

  test('says that it is not sure when twenty are to be chosen from sixty unlike fish', () => {
    const pedigree = longPedigree(260);
    const ids = pedigree.slice(-60).map(({ id }) => id);
    const matrix = kinship(pedigree, ids);
    const [males, females] = [ids.slice(0, 30), ids.slice(30)];
    const plan = planPairing({ matrix, males, females, chooseMales: 10, chooseFemales: 10 });
    expect(plan.exact).toBe(false);
    expect(plan.meanKinship).toBeCloseTo(meanOfYoung(matrix, plan.males, plan.females), 12);
    for (const out of plan.males) {
      for (const other of males) {
        if (plan.males.includes(other)) continue;
        const swapped = plan.males.map((id) => (id === out ? other : id));
        expect(meanOfYoung(matrix, swapped, plan.females)).toBeGreaterThan(plan.meanKinship - 1e-12);
      }
    }
  });
});

/** Mean kinship of young by half from each sex, as plain sums. */
function meanOfYoung(matrix: KinshipMatrix, males: string[], females: string[]): number {
  const mean = (some: string[], others: string[]) =>
    some.reduce((sum, a) => sum + others.reduce((part, b) => part + matrix.between(a, b), 0), 0) /
    (some.length * others.length);
  return mean(males, males) / 4 + mean(females, females) / 4 + mean(males, females) / 2;
}

function bestOfAll(request: Required<PairingRequest>): number | undefined {
  const { matrix, males, females, maxFryInbreeding, required } = request;
  let best: number | undefined;
  for (const sires of groupsOf(males, request.chooseMales)) {
    for (const dams of groupsOf(females, request.chooseFemales)) {
      const fits = sires.every((a) => dams.every((b) => matrix.between(a, b) <= maxFryInbreeding));
      if (!fits || !required.every((id) => sires.includes(id) || dams.includes(id))) continue;
      best = Math.min(best ?? 1, meanOfYoung(matrix, sires, dams));
    }
  }
  return best;
}

function groupsOf(ids: string[], size: number): string[][] {
  if (size === 0) return [[]];
  return ids.flatMap((id, place) => groupsOf(ids.slice(place + 1), size - 1).map((rest) => [id, ...rest]));
}
