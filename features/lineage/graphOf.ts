import type { PedigreeEdgeData, PedigreeNodeData, PedigreeRow } from '@/components/chart/PedigreeGraph';
import type { Stage } from '@/shared/broods/stage';
import type { LineageNode } from '@/shared/lineage/contract';
import { type GraphNode, layoutLineage } from '@/shared/lineage/graphLayout';
import { entryOf, generationsOf, type Nodes, nameOf, saidOf } from './entries';

export type LineageDrawing = {
  width: number;
  height: number;
  nodes: PedigreeNodeData[];
  edges: PedigreeEdgeData[];
  rows: PedigreeRow[];
};

/** Places a part of the pedigree; names and generations come from all of it. */
export function graphOf(shown: Nodes, all: Nodes, stageOf: (id: string) => Stage | undefined): LineageDrawing {
  const byId = new Map<string, LineageNode>(all.map((node) => [node.id, node]));
  const generations = generationsOf(all);
  const graph = layoutLineage(shown.map((node) => ({ ...entryOf(node), label: node.code ?? '–', kind: node.thing })));
  const nodes = graph.nodes.flatMap((placed): PedigreeNodeData[] => {
    const node = byId.get(placed.id);
    if (!node) return [];
    const stage = node.thing === 'brood' ? stageOf(node.id) : undefined;
    const note = noteOf(node, placed);
    return [
      {
        id: placed.id,
        x: placed.x,
        y: placed.y,
        width: placed.width,
        height: placed.height,
        label: node.code ?? '–',
        sex: node.thing === 'brood' ? 'unknown' : node.sex,
        ...(node.thing === 'fish' && node.sex !== 'unknown' && !node.sexCertain ? { possible: true } : {}),
        ...(stage ? { stage } : {}),
        ...(note ? { note } : {}),
        said: saidOf(node, byId),
      },
    ];
  });
  return { ...graph, nodes, rows: rowsOf(graph.nodes, generations) };
}

function noteOf(node: LineageNode, { undrawn }: GraphNode): string | null {
  const hidden = (['sire', 'dam'] as const).filter((side) => undrawn[side].hidden > 0);
  if (hidden.length > 0) return hidden.length === 2 ? 'parents not drawn' : `${hidden[0]} not drawn`;
  if (node.sheet) return node.sheet.signature === 'valid' ? 'by sheet' : 'by sheet, unchecked';
  if (node.founderGeneration === 0) return 'wild';
  return node.code === null ? nameOf(node) : null;
}

/** A row has a word where all of it is of one generation. */
function rowsOf(placed: readonly GraphNode[], generations: ReadonlyMap<string, string | null>): PedigreeRow[] {
  const rows = new Map<number, { y: number; words: Set<string | null> }>();
  for (const { id, row, y } of placed) {
    const found = rows.get(row) ?? { y, words: new Set() };
    found.words.add(generations.get(id) ?? null);
    rows.set(row, found);
  }
  return [...rows.values()].flatMap(({ y, words }) => {
    const [word] = words;
    return words.size === 1 && word ? [{ word, y }] : [];
  });
}

/** Names in the foot of the graph: what the shapes and lines mean. */
export const GRAPH_LEGEND =
  'Square male, circle female, diamond not sexed or a brood. Dashed: possible, with its share.';
