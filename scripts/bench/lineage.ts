import { execFileSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { Graph, layout } from '@dagrejs/dagre';
import { layoutLineage } from '../../shared/lineage/graphLayout';
import { inbreeding } from '../../shared/lineage/inbreeding';
import { kinship } from '../../shared/lineage/kinship';
import { kinshipColumns } from '../../shared/lineage/kinshipColumns';
import type { PedigreeEntry } from '../../shared/lineage/pedigree';
import { planPairing } from '../../shared/lineage/planPairing';
import type { Figure } from './figure';
import { columnByMaps, everyGroup, fByAncestors, invented, type Parents, tableOfRows } from './lineageTextbook';

const LARGE = 100_000;

/** Kinship, F, pairing and the graph, each beside the way that a textbook gives it, on the same invented pedigrees. */
export async function bench(): Promise<Figure[]> {
  return [...inbreedingFigures(), memoryFigure(), columnFigure(), ...tableFigures(), pairingFigure(), graphFigure()];
}

/** The textbook is timed on as many animals as it manages in two seconds, the rest reckoned at the same pace: it slows, in fact. */
function inbreedingFigures(): Figure[] {
  const shapes = [
    { name: 'in broods of 20', size: 20, window: 2_000 },
    { name: 'each of its own pair', size: 1, window: 2_000 },
  ];
  return shapes.map(({ name, size, window }) => {
    const parents = invented(LARGE, size, window);
    const pedigree = entries(parents);
    return {
      figure: `F of 100,000 fish ${name}`,
      ours: span(() => inbreeding(pedigree)),
      anchor: fByAncestors(parents, 2_000),
      anchorName: 'Meuwissen & Luo, fish by fish (at its pace in the first 2 s)',
      unit: 'ms',
      goal: 'about 1 s in broods, 3 s at most',
    };
  });
}

/** The highest memory of a process that works out F, less that of one which only makes the pedigree. */
function memoryFigure(): Figure {
  const peak = (what: string) => {
    const script = fileURLToPath(import.meta.url);
    const text = execFileSync(process.execPath, ['--import', 'tsx', script, what], { encoding: 'utf8' });
    return Number(text) / 1_024;
  };
  return {
    figure: 'Memory for F of 100,000 fish in broods',
    ours: Math.max(0, peak('with F') - peak('without F')),
    anchor: (LARGE * LARGE * 8) / 1_024 ** 2,
    anchorName: 'a square table (reckoned)',
    unit: 'MB',
    goal: '50 MB at most',
  };
}

function columnFigure(): Figure {
  const parents = invented(LARGE, 20, 2_000);
  const columns = kinshipColumns(entries(parents));
  const ids = columns.ids.slice(-12);
  const f = inbreeding(entries(parents));
  const textbook = columnByMaps(parents, (id) => f.get(id) ?? 0);
  return {
    figure: 'One fish against 100,000',
    ours: fastest(ids.map((id) => () => columns.of(id))),
    anchor: fastest(ids.slice(0, 3).map((id) => () => textbook(id))),
    anchorName: "T D T' by maps of objects",
    unit: 'ms',
    goal: '10 ms at most',
  };
}

function tableFigures(): Figure[] {
  const shapes = [
    { name: 'in broods of 20', size: 20 },
    { name: 'each of its own pair', size: 1 },
  ];
  return shapes.map(({ name, size }) => {
    const parents = invented(5_000, size, 1_000);
    const pedigree = entries(parents);
    const turns = [1, 2, 3];
    return {
      figure: `Kinship table of 5,000 fish ${name}`,
      ours: fastest(turns.map(() => () => kinship(pedigree))),
      anchor: fastest(turns.map(() => () => tableOfRows(parents))),
      anchorName: 'tabular method, a row of numbers each',
      unit: 'ms',
      goal: 'about 1 s',
    };
  });
}

/** Two of 20 males and three of 40 females: few enough groups for the textbook, which looks at every one. */
function pairingFigure(): Figure {
  const pedigree = entries(invented(300, 5, 200));
  const ids = pedigree.slice(-60).map(({ id }) => id);
  const matrix = kinship(pedigree, ids);
  const [males, females] = [ids.slice(0, 20), ids.slice(20)];
  const request = { matrix, males, females, chooseMales: 2, chooseFemales: 3 };
  return {
    figure: 'Pairing plan, 2 and 3 of 60 fish',
    ours: fastest([1, 2, 3].map(() => () => planPairing(request))),
    anchor: span(() => everyGroup(request)),
    anchorName: 'every group',
    unit: 'ms',
    goal: 'under 500 ms',
  };
}

function graphFigure(): Figure {
  const parents = invented(500, 5, 150);
  const drawn = entries(parents).map((entry) => ({ ...entry, label: entry.id, kind: 'fish' as const }));
  const plain = () => {
    const graph = new Graph({ multigraph: true });
    graph.setGraph({});
    for (const { id } of parents) graph.setNode(id, { width: 104, height: 72 });
    for (const { id, sire, dam } of parents) {
      if (sire) graph.setEdge(sire, id, {}, 'sire');
      if (dam) graph.setEdge(dam, id, {}, 'dam');
    }
    layout(graph);
  };
  return {
    figure: 'Lineage graph of 500 fish',
    ours: fastest([1, 2].map(() => () => layoutLineage(drawn))),
    anchor: fastest([1, 2].map(() => plain)),
    anchorName: 'the layout library as it comes',
    unit: 'ms',
    goal: 'no slower',
  };
}

function entries(parents: Parents[]): PedigreeEntry[] {
  const parentage = (id: string | null) =>
    id === null ? { kind: 'unknown' as const } : { kind: 'known' as const, id };
  return parents.map(({ id, sire, dam }) => ({ id, sire: parentage(sire), dam: parentage(dam) }));
}

function span(work: () => unknown): number {
  const from = performance.now();
  work();
  return performance.now() - from;
}

const fastest = (works: (() => unknown)[]): number => Math.min(...works.map(span));

const asked = process.argv[2];
if (asked === 'with F' || asked === 'without F') {
  const pedigree = entries(invented(LARGE, 20, 2_000));
  if (asked === 'with F') inbreeding(pedigree);
  process.stdout.write(String(process.resourceUsage().maxRSS));
}
