import { type EdgeLabel, Graph, type GraphLabel, layout, type NodeLabel, type RankerFunction } from '@dagrejs/dagre';
import { withPorts } from './graphPorts';
import type { Side } from './parentShares';
import type { PedigreeEntry } from './pedigree';
import { type ShownGraph, shownGraph, type Undrawn } from './shownGraph';

/** A fish or a brood of the pedigree as it is to be drawn. */
export type GraphEntry = PedigreeEntry & { label: string; kind: 'fish' | 'brood' };

/** In the units of the drawing. `mark` is the room that the share of an uncertain parent takes on its line. */
export type GraphSizes = {
  node: { width: number; height: number };
  mark: { width: number; height: number };
  columnGap: number;
  rowGap: number;
};

export type GraphPoint = { x: number; y: number };

/** `x` and `y` are the middle; `row` counts from 0, the oldest. */
export type GraphNode = GraphPoint & {
  id: string;
  label: string;
  kind: 'fish' | 'brood';
  row: number;
  width: number;
  height: number;
  undrawn: Record<Side, Undrawn>;
};

/** A line from a parent down to its young; `share` is below 1 for a possible parent, and `mark` the place for that share. */
export type GraphEdge = {
  parent: string;
  child: string;
  side: Side;
  share: number;
  points: GraphPoint[];
  mark: GraphPoint | null;
};

export type LineageGraph = { width: number; height: number; nodes: GraphNode[]; edges: GraphEdge[] };

export const GRAPH_SIZES: GraphSizes = {
  node: { width: 104, height: 72 },
  mark: { width: 48, height: 20 },
  columnGap: 24,
  rowGap: 72,
};

/**
 * Places a pedigree for drawing, layer by layer with few crossings (Sugiyama's method, by @dagrejs/dagre): founders on top,
 * every fish below all its possible parents. Parents that are not among the entries are left out and their share told, so
 * any part of a pedigree can be drawn. The same entries give the same drawing. Throws what `kinship` throws.
 */
export function layoutLineage(entries: GraphEntry[], sizes: GraphSizes = GRAPH_SIZES): LineageGraph {
  const shown = shownGraph(entries);
  if (entries.length === 0) return { width: 0, height: 0, nodes: [], edges: [] };
  const names = new Map(entries.map(({ id }, index) => [id, `n${index}`]));
  const nameOf = (id: string) => names.get(id) ?? '';
  const graph = placed(shown, nameOf, sizes);
  const { width = 0, height = 0 } = graph.graph();
  const nodes = entries.map((entry) => drawnNode(entry, shown, graph.node(nameOf(entry.id))));
  const edges = shown.lines.map((line) => {
    const { points = [], x = 0, y = 0 } = graph.edge(nameOf(line.parent), nameOf(line.child), line.side);
    return { ...line, points: points.map(pointOf), mark: line.share < CERTAIN ? { x, y } : null };
  });
  return { width, height, nodes, edges: withPorts(nodes, edges) };
}

/** A share that misses 1 by rounding only is certain. */
const CERTAIN = 1 - 1e-9;

/** The ranker may be a function, which its types leave out. */
type RankedLabel = Pick<GraphLabel, 'width' | 'height' | 'rankdir' | 'nodesep' | 'edgesep' | 'ranksep'> & {
  ranker: RankerFunction;
};

function placed({ rows, lines }: ShownGraph, nameOf: (id: string) => string, sizes: GraphSizes) {
  const graph = new Graph<RankedLabel, NodeLabel, EdgeLabel>({ multigraph: true });
  const rowOf = new Map(Array.from(rows, ([id, row]) => [nameOf(id), row]));
  graph.setGraph({
    rankdir: 'TB',
    nodesep: sizes.columnGap,
    edgesep: sizes.columnGap / 3,
    ranksep: sizes.rowGap,
    // Lines carry marks, so the layout doubles every step from row to row.
    ranker: (ranked) => {
      for (const name of ranked.nodes()) ranked.node(name).rank = 2 * (rowOf.get(name) ?? 0);
    },
  });
  for (const id of rows.keys()) graph.setNode(nameOf(id), { ...sizes.node });
  for (const { parent, child, side, share } of lines) {
    const mark = share < CERTAIN ? sizes.mark : { width: 0, height: 0 };
    graph.setEdge(nameOf(parent), nameOf(child), { ...mark, labelpos: 'c' }, side);
  }
  layout(graph);
  return graph;
}

function drawnNode({ id, label, kind }: GraphEntry, { rows, undrawn }: ShownGraph, at: NodeLabel): GraphNode {
  const missing = undrawn.get(id) ?? { sire: NOTHING, dam: NOTHING };
  return {
    id,
    label,
    kind,
    row: rows.get(id) ?? 0,
    ...pointOf(at),
    width: at.width,
    height: at.height,
    undrawn: missing,
  };
}

const NOTHING: Undrawn = { unknown: 0, hidden: 0 };

const pointOf = ({ x = 0, y = 0 }: { x?: number; y?: number }): GraphPoint => ({ x, y });
