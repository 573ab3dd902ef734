import { folded } from '@/shared/folded';

type Named = { word: string; code?: string; note?: string };

/** What has every typed word at the start of one of its own; those whose name begins with it come first. */
export function found<Item extends Named>(items: readonly Item[], search: string): Item[] {
  const wanted = folded(search).split(/\s+/).filter(Boolean);
  if (wanted.length === 0) return [...items];
  const text = (item: Item) => folded([item.code, item.word, item.note].filter(Boolean).join(' '));
  const starts = (item: Item) => (text(item).startsWith(wanted.join(' ')) ? 0 : 1);
  return items
    .filter((item) => {
      const words = text(item).split(/[\s,.·()-]+/);
      return wanted.every((part) => words.some((word) => word.startsWith(part)) || text(item).startsWith(part));
    })
    .sort((a, b) => starts(a) - starts(b));
}
