import type { FamilyTable } from './familyTable';
import { OUTSIDE } from './parentOptions';
import { cycle } from './pedigreeError';

/** Families in an order in which every possible parent comes first (Kahn 1962); names the ring if an animal is its own ancestor. */
export function familyOrder(table: FamilyTable, ids: string[]): number[] {
  const waiting = mentions(table);
  const order: number[] = [];
  waiting.open.forEach((parents, family) => {
    if (parents === 0) order.push(family);
  });
  for (let done = 0; done < order.length; done += 1) {
    const family = order[done] ?? 0;
    for (let at = waiting.start[family] ?? 0; at < (waiting.start[family + 1] ?? 0); at += 1) {
      const child = waiting.child[at] ?? 0;
      waiting.open[child] = (waiting.open[child] ?? 0) - 1;
      if (waiting.open[child] === 0) order.push(child);
    }
  }
  if (order.length < table.isDraw.length) throw cycle(ringOf(table, waiting.open, ids));
  return order;
}

/** For every family: how many mentions of parents are not placed yet, and which families mention it. */
function mentions(table: FamilyTable) {
  const families = table.isDraw.length;
  const open = new Int32Array(families);
  const start = new Int32Array(families + 1);
  const each = (visit: (parent: number, child: number) => void) => {
    for (let child = 0; child < families; child += 1) {
      for (let at = table.start[child] ?? 0; at < (table.start[child + 1] ?? 0); at += 1) {
        const sire = table.sire[at] ?? OUTSIDE;
        const dam = table.dam[at] ?? OUTSIDE;
        if (sire !== OUTSIDE) visit(table.familyOf[sire] ?? 0, child);
        if (dam !== OUTSIDE) visit(table.familyOf[dam] ?? 0, child);
      }
    }
  };
  each((parent, child) => {
    open[child] = (open[child] ?? 0) + 1;
    start[parent + 1] = (start[parent + 1] ?? 0) + 1;
  });
  for (let family = 1; family <= families; family += 1) start[family] = (start[family] ?? 0) + (start[family - 1] ?? 0);
  const next = start.slice();
  const child = new Int32Array(start[families] ?? 0);
  each((parent, of) => {
    const at = next[parent] ?? 0;
    child[at] = of;
    next[parent] = at + 1;
  });
  return { open, start, child };
}

/** Walks from one blocked family to a blocked parent of it, and on, until it meets its own trail. */
function ringOf(table: FamilyTable, open: Int32Array, ids: string[]): string[] {
  let family = open.findIndex((parents) => parents > 0);
  const trail: number[] = [];
  const metAt = new Map<number, number>();
  while (!metAt.has(family)) {
    metAt.set(family, trail.length);
    const parent = blockedParent(table, open, family);
    trail.push(parent);
    family = table.familyOf[parent] ?? 0;
  }
  const ring = trail.slice(metAt.get(family));
  return ring.flatMap((number) => ids[number] ?? []);
}

function blockedParent(table: FamilyTable, open: Int32Array, family: number): number {
  for (let at = table.start[family] ?? 0; at < (table.start[family + 1] ?? 0); at += 1) {
    for (const parent of [table.sire[at] ?? OUTSIDE, table.dam[at] ?? OUTSIDE]) {
      if (parent !== OUTSIDE && (open[table.familyOf[parent] ?? 0] ?? 0) > 0) return parent;
    }
  }
  return OUTSIDE;
}
