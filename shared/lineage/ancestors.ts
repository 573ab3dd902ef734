import { OUTSIDE } from './parentOptions';
import type { SortedPedigree } from './sortedPedigree';

/** The given nodes and every node that may be an ancestor of them, in pedigree order. */
export function withAncestors(sorted: SortedPedigree, of: Iterable<number>): Int32Array {
  const { parents, familyOf } = sorted;
  const marked = new Uint8Array(sorted.nodes);
  for (const node of of) marked[node] = 1;
  let count = 0;
  for (let node = sorted.nodes - 1; node >= 0; node -= 1) {
    if (marked[node] !== 1) continue;
    count += 1;
    const family = familyOf[node] ?? 0;
    for (let at = parents.start[family] ?? 0; at < (parents.start[family + 1] ?? 0); at += 1) {
      marked[parents.node[at] ?? OUTSIDE] = 1;
    }
  }
  const found = new Int32Array(count);
  for (let node = 0, place = 0; node < sorted.nodes; node += 1) {
    if (marked[node] === 1) {
      found[place] = node;
      place += 1;
    }
  }
  return found;
}
