/** Items under each of their keys, in the order they come in: one walk over them instead of one for each key. */
export function grouped<Item>(
  items: readonly Item[],
  keysOf: (item: Item) => string | readonly string[],
): Map<string, Item[]> {
  const groups = new Map<string, Item[]>();
  for (const item of items) {
    const keys = keysOf(item);
    for (const key of typeof keys === 'string' ? [keys] : keys) {
      const group = groups.get(key);
      if (group) group.push(item);
      else groups.set(key, [item]);
    }
  }
  return groups;
}
