import { OUTSIDE } from './parentOptions';
import type { SortedPedigree } from './sortedPedigree';
import type { Places } from './sweep';

/**
 * Places for the breeding nodes that later families still need, as families pass in order. A place is given up after the
 * last family that names its node and taken by a younger one, so a long pedigree needs no more room than its widest moment.
 */
export function frontierOf(sorted: SortedPedigree): Places {
  const retiring = retiringAfter(sorted);
  const placeOf = new Int32Array(sorted.nodes).fill(OUTSIDE);
  const free: number[] = [];
  let size = 0;
  for (let family = 0; family < sorted.families; family += 1) {
    for (let node = sorted.firstNode[family] ?? 0; node < (sorted.firstNode[family + 1] ?? 0); node += 1) {
      if (sorted.isLeaf[node] === 1) continue;
      placeOf[node] = free.pop() ?? size;
      size = Math.max(size, (placeOf[node] ?? 0) + 1);
    }
    for (const node of retiring(family)) free.push(placeOf[node] ?? 0);
  }
  return { size, placeOf };
}

/** Nodes by the last family that names them as a parent. */
function retiringAfter(sorted: SortedPedigree): (family: number) => Int32Array {
  const { parents } = sorted;
  const last = new Int32Array(sorted.nodes).fill(OUTSIDE);
  for (let family = 0; family < sorted.families; family += 1) {
    for (let at = parents.start[family] ?? 0; at < (parents.start[family + 1] ?? 0); at += 1) {
      last[parents.node[at] ?? 0] = family;
    }
  }
  const start = new Int32Array(sorted.families + 1);
  for (const family of last) if (family !== OUTSIDE) start[family + 1] = (start[family + 1] ?? 0) + 1;
  for (let family = 1; family < start.length; family += 1)
    start[family] = (start[family] ?? 0) + (start[family - 1] ?? 0);
  const next = start.slice();
  const listed = new Int32Array(start[sorted.families] ?? 0);
  last.forEach((family, node) => {
    if (family === OUTSIDE) return;
    listed[next[family] ?? 0] = node;
    next[family] = (next[family] ?? 0) + 1;
  });
  return (family) => listed.subarray(start[family], start[family + 1]);
}
