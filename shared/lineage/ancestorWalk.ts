import type { SortedPedigree } from './sortedPedigree';

/**
 * Visits nodes and all their ancestors, youngest first. One bit a node keeps the order, so that a walk costs little more
 * than the ancestors it meets, however large the pedigree.
 */
export type AncestorWalk = {
  /** Asks for a node to be visited. */
  ask(node: number): void;
  /** Visits what was asked for and its ancestors; the list holds until the next walk. */
  visit(each?: (node: number) => void): Int32Array;
};

export function ancestorWalk({ nodes, familyOf, parents }: SortedPedigree): AncestorWalk {
  const bits = new Int32Array((nodes >> 5) + 1);
  const visited = new Int32Array(nodes);
  let top = -1;
  const ask = (node: number) => {
    const word = node >> 5;
    bits[word] = (bits[word] ?? 0) | (1 << (node & 31));
    if (word > top) top = word;
  };
  return {
    ask,
    visit(each) {
      let count = 0;
      for (let word = top; word >= 0; word -= 1) {
        for (let left = bits[word] ?? 0; left !== 0; left = bits[word] ?? 0) {
          const bit = 31 - Math.clz32(left);
          bits[word] = left ^ (1 << bit);
          const node = (word << 5) + bit;
          visited[count] = node;
          count += 1;
          each?.(node);
          const family = familyOf[node] ?? 0;
          for (let at = parents.start[family] ?? 0; at < (parents.start[family + 1] ?? 0); at += 1) {
            const parent = parents.node[at] ?? 0;
            bits[parent >> 5] = (bits[parent >> 5] ?? 0) | (1 << (parent & 31));
          }
        }
      }
      top = -1;
      return visited.subarray(0, count);
    },
  };
}
