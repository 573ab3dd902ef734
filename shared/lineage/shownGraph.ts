import { parentShares, type Side } from './parentShares';
import type { Parentage, PedigreeEntry } from './pedigree';
import { sortPedigree } from './sortedPedigree';

/** Shares of one side's parents that no line stands for: `unknown` to anyone, or `hidden` because not among the entries. */
export type Undrawn = { unknown: number; hidden: number };

type ShownLine = { parent: string; child: string; side: Side; share: number };

/** What there is to draw: lines between entries, rows with the oldest as 0, and what no line stands for. */
export type ShownGraph = {
  lines: ShownLine[];
  rows: Map<string, number>;
  undrawn: Map<string, Record<Side, Undrawn>>;
};

/** Parents that are not among the entries are told apart from unknown ones; faults among the rest are refused. */
export function shownGraph(entries: PedigreeEntry[]): ShownGraph {
  const shown = new Set(entries.map(({ id }) => id));
  const ids = parentsFirst(entries, shown);
  const lines: ShownLine[] = [];
  const undrawn: ShownGraph['undrawn'] = new Map();
  for (const entry of entries) {
    const missing = { sire: { unknown: 0, hidden: 0 }, dam: { unknown: 0, hidden: 0 } };
    for (const { side, id, share } of parentShares(entry)) {
      if (id === null) missing[side].unknown += share;
      else if (shown.has(id)) lines.push({ parent: id, child: entry.id, side, share });
      else missing[side].hidden += share;
    }
    undrawn.set(entry.id, missing);
  }
  const isCut = (id: string) => (undrawn.get(id)?.sire.hidden ?? 0) + (undrawn.get(id)?.dam.hidden ?? 0) > 0;
  return { lines, rows: rowsOf(ids, lines, isCut), undrawn };
}

/**
 * Every entry one row below the lowest of its parents; founders stay on top. An entry whose parents are all left out is no
 * founder: it comes down to just above the highest of its young.
 */
function rowsOf(ids: string[], lines: ShownLine[], isCut: (id: string) => boolean): Map<string, number> {
  const parentsOf = new Map<string, string[]>(ids.map((id) => [id, []]));
  const youngOf = new Map<string, string[]>(ids.map((id) => [id, []]));
  for (const { parent, child } of lines) {
    parentsOf.get(child)?.push(parent);
    youngOf.get(parent)?.push(child);
  }
  const rows = new Map<string, number>();
  const rowOf = (id: string) => rows.get(id) ?? 0;
  for (const id of ids) {
    const above = (parentsOf.get(id) ?? []).map(rowOf);
    rows.set(id, Math.max(-1, ...above) + 1);
  }
  for (const id of ids) {
    const young = (youngOf.get(id) ?? []).map(rowOf);
    if (isCut(id) && parentsOf.get(id)?.length === 0 && young.length > 0) rows.set(id, Math.min(...young) - 1);
  }
  return rows;
}

/** Ids with parents first. Sorting the drawn part as a pedigree of its own finds cycles, doubles and bad shares. */
function parentsFirst(entries: PedigreeEntry[], shown: Set<string>): string[] {
  const { ids, nodeOf } = sortPedigree(entries.map((entry) => drawnPart(entry, shown)));
  const rows = Array.from(ids.keys()).sort((a, b) => (nodeOf[a] ?? 0) - (nodeOf[b] ?? 0));
  return rows.flatMap((row) => ids[row] ?? []);
}

/** The entry with every parent outside the drawing taken for an unknown one. */
function drawnPart(entry: PedigreeEntry, shown: Set<string>): PedigreeEntry {
  const drawn = (parentage: Parentage): Parentage => {
    switch (parentage.kind) {
      case 'unknown':
        return parentage;
      case 'known':
        return shown.has(parentage.id) ? parentage : { kind: 'unknown' };
      default: {
        const candidates = parentage.candidates.map(({ id, weight }) => ({
          id: id !== null && shown.has(id) ? id : null,
          weight,
        }));
        return { ...parentage, candidates };
      }
    }
  };
  const pair = <P extends { sire: Parentage; dam: Parentage }>(of: P): P => ({
    ...of,
    sire: drawn(of.sire),
    dam: drawn(of.dam),
  });
  return 'from' in entry ? { id: entry.id, from: entry.from.map(pair) } : pair(entry);
}
