import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { GRAPH_SIZES, type GraphEntry, layoutLineage } from '@/shared/lineage/graphLayout';
import { parentShares } from '@/shared/lineage/parentShares';
import type { PedigreeEntry } from '@/shared/lineage/pedigree';
import { relativesWithin } from '@/shared/lineage/relatives';
import { smallPedigrees } from './lineageArbitraries';
import { child, known, longPedigree, mixed, oneOf, unknown, wild } from './lineagePedigrees';

const labelled = (pedigree: PedigreeEntry[], kind: 'fish' | 'brood' = 'fish'): GraphEntry[] =>
  pedigree.map((entry) => ({ ...entry, label: `No ${entry.id}`, kind }));

const colony: PedigreeEntry[] = [
  ...wild('w1', 'w2', 'w3'),
  child('m1', 'w1', 'w2'),
  child('d', 'w3', 'w2'),
  { id: 'brood', sire: oneOf('k', ['m1', 3], ['w1', 1]), dam: known('d') },
  { id: 'late', sire: mixed(['m1', 1], [null, 1]), dam: known('brood') },
];

describe('The lineage graph', () => {
  const graph = layoutLineage(labelled(colony));
  const node = (id: string) => graph.nodes.find((one) => one.id === id);

  test('has founders on top and every fish below its possible parents, in rows', () => {
    expect(Object.fromEntries(graph.nodes.map(({ id, row }) => [id, row]))).toEqual({
      w1: 0,
      w2: 0,
      w3: 0,
      m1: 1,
      d: 1,
      brood: 2,
      late: 3,
    });
    const [m1, d] = [node('m1'), node('d')];
    expect(m1?.y).toBe(d?.y);
    expect(node('brood')?.label).toBe('No brood');
  });

  test('keeps a wild fish on top that came late, next to the other founders', () => {
    const late = layoutLineage(labelled([...wild('new'), ...colony, child('outcross', 'late', 'new')]));
    expect(late.nodes.find(({ id }) => id === 'new')?.row).toBe(0);
    expect(late.nodes.find(({ id }) => id === 'outcross')?.row).toBe(4);
  });

  test('draws one line for each possible parent with its share, and room for the share where it is not certain', () => {
    const lines = graph.edges.filter(({ child: of }) => of === 'brood');
    expect(lines.map(({ parent, side, share }) => [parent, side, share])).toEqual([
      ['m1', 'sire', 0.75],
      ['w1', 'sire', 0.25],
      ['d', 'dam', 1],
    ]);
    expect(lines.map(({ mark }) => mark !== null)).toEqual([true, true, false]);
    expect(node('late')?.undrawn.sire).toEqual({ unknown: 0.5, hidden: 0 });
    expect(node('w1')?.undrawn).toEqual({ sire: { unknown: 1, hidden: 0 }, dam: { unknown: 1, hidden: 0 } });
  });

  test('leads every line from below the parent down to above its young', () => {
    for (const { parent, child: of, points } of graph.edges) {
      const [start, end] = [points[0], points.at(-1)];
      const [above, below] = [node(parent), node(of)];
      expect(start).toEqual({ x: above?.x, y: (above?.y ?? 0) + GRAPH_SIZES.node.height / 2 });
      expect(end?.y).toBe((below?.y ?? 0) - GRAPH_SIZES.node.height / 2);
      expect(Math.abs((end?.x ?? 0) - (below?.x ?? 0))).toBeLessThan(GRAPH_SIZES.node.width / 2);
      expect(points.every(({ y }, place) => place === 0 || y >= (points[place - 1]?.y ?? 0))).toBe(true);
    }
  });

  test('lets the lines that arrive at one fish end in the order in which they come, so that none cross there', () => {
    const drawn = layoutLineage(labelled(longPedigree(40)));
    for (const { id } of drawn.nodes) {
      const arriving = drawn.edges.filter(({ child: of }) => of === id);
      const byEnd = arriving.toSorted((a, b) => (a.points.at(-1)?.x ?? 0) - (b.points.at(-1)?.x ?? 0));
      const before = byEnd.map(({ points }) => points.at(-2)?.x ?? 0);
      expect(before).toEqual(before.toSorted((a, b) => a - b));
    }
  });

  test('tells parents that are not shown from unknown ones, and sets such a fish just above its young', () => {
    const part = layoutLineage(labelled(colony.filter(({ id }) => ['w1', 'm1', 'd', 'brood'].includes(id))));
    const at = (id: string) => part.nodes.find((one) => one.id === id);
    expect(at('d')?.undrawn).toEqual({ sire: { unknown: 0, hidden: 1 }, dam: { unknown: 0, hidden: 1 } });
    expect(at('m1')?.undrawn).toEqual({ sire: { unknown: 0, hidden: 0 }, dam: { unknown: 0, hidden: 1 } });
    expect([at('w1')?.row, at('d')?.row, at('brood')?.row]).toEqual([0, 1, 2]);
  });

  test('draws a fish that may be sire or dam of the same young twice', () => {
    const twice = layoutLineage(
      labelled([...wild('a'), { id: 'b', sire: mixed(['a', 1], [null, 1]), dam: known('a') }]),
    );
    expect(twice.edges.map(({ side, share }) => [side, share])).toEqual([
      ['sire', 0.5],
      ['dam', 1],
    ]);
    expect(twice.edges[0]?.points.at(-1)).not.toEqual(twice.edges[1]?.points.at(-1));
  });

  test('of nothing is empty, of one fish one node', () => {
    expect(layoutLineage([])).toEqual({ width: 0, height: 0, nodes: [], edges: [] });
    const { width, height, nodes } = layoutLineage(labelled(wild('a'), 'brood'));
    expect([width, height, nodes[0]?.kind]).toEqual([GRAPH_SIZES.node.width, GRAPH_SIZES.node.height, 'brood']);
  });

  test('refuses a cycle by name, as every computation does', () => {
    const ring = labelled([child('a', 'b', null), child('b', 'a', null)]);
    expect(() => layoutLineage(ring)).toThrow(expect.objectContaining({ reason: 'cycle' }));
  });

  test('keeps fish apart and inside the drawing, and comes out the same again, whatever the pedigree', () => {
    fc.assert(
      fc.property(smallPedigrees(1_000_000), (pedigree) => {
        const drawn = layoutLineage(labelled(pedigree));
        expect(layoutLineage(labelled(pedigree))).toEqual(drawn);
        for (const a of drawn.nodes) {
          expect(a.x - a.width / 2 >= 0 && a.x + a.width / 2 <= drawn.width).toBe(true);
          expect(a.y - a.height / 2 >= 0 && a.y + a.height / 2 <= drawn.height).toBe(true);
          for (const b of drawn.nodes) {
            if (a.id < b.id && a.row === b.row) expect(Math.abs(a.x - b.x)).toBeGreaterThanOrEqual(a.width);
            if (a.row < b.row) expect(b.y - a.y).toBeGreaterThan(a.height);
          }
        }
        const shares = pedigree.flatMap(parentShares).filter(({ id }) => id !== null);
        expect(drawn.edges.map(({ share }) => share)).toEqual(shares.map(({ share }) => share));
      }),
      { numRuns: 60 },
    );
  });

  test('places five hundred fish', () => {
    const drawn = layoutLineage(labelled(longPedigree(500)));
    expect(drawn.nodes).toHaveLength(500);
    expect(drawn.edges.every(({ points }) => points.length >= 2)).toBe(true);
  });
});

describe('The fish around one', () => {
  const line = [
    ...wild('0', 'x'),
    ...Array.from({ length: 6 }, (_, t) => child(`${t + 1}`, `${t}`, t === 3 ? 'x' : null)),
  ];

  test('three generations back and one on, with what is left out on either side', () => {
    const { entries, moreParents, moreYoung } = relativesWithin(line, '4', { ancestors: 3, descendants: 1 });
    expect(entries.map(({ id }) => id)).toEqual(['x', '1', '2', '3', '4', '5']);
    expect([moreParents, moreYoung]).toEqual([['1'], ['5']]);
  });

  test('possible parents are among the ancestors; depth nought is the fish alone', () => {
    const all = relativesWithin(colony, 'late', { ancestors: 99, descendants: 0 });
    expect(all.entries).toEqual(colony);
    expect(relativesWithin(colony, 'brood', { ancestors: 0, descendants: 0 })).toEqual({
      entries: [colony[5]],
      moreParents: ['brood'],
      moreYoung: ['brood'],
    });
    const orphan = [{ id: 'o', sire: known('gone'), dam: unknown }];
    expect(relativesWithin(orphan, 'o', { ancestors: 2, descendants: 2 }).moreParents).toEqual(['o']);
  });

  test('refuses a fish that is not there and a depth that is none', () => {
    expect(() => relativesWithin(line, 'nobody', { ancestors: 1, descendants: 1 })).toThrow(
      'nobody is not in the pedigree',
    );
    expect(() => relativesWithin(line, '4', { ancestors: -1, descendants: 1 })).toThrow(BadValue);
  });
});
