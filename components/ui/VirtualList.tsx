import { useVirtualizer } from '@tanstack/react-virtual';
import { type ReactNode, use, useRef, useState } from 'react';
import { View } from 'react-native';
import { elementOf } from './elementOf';
import { ScrollContext } from './paneContext';
import { Unlisted } from './Rows';

type Props<Item> = {
  items: readonly Item[];
  keyOf: (item: Item) => string;
  /** A `Row`, usually. */
  children: (item: Item, index: number) => ReactNode;
  /** Height of a row before it is measured. */
  estimate?: number;
  /** Below this many all are drawn: shorter lists need no machinery and can be searched by the browser. */
  allUnder?: number;
};

/** A list of thousands inside a `Screen`: draws what is seen and a little more. */
export function VirtualList<Item>(props: Props<Item>) {
  const { items, keyOf, children, allUnder = 60 } = props;
  if (items.length <= allUnder)
    return items.map((item, index) => <View key={keyOf(item)}>{children(item, index)}</View>);
  return <Windowed {...props} />;
}

function Windowed<Item>({ items, keyOf, children, estimate = 68 }: Props<Item>) {
  const scroll = use(ScrollContext);
  const box = useRef<View>(null);
  const [offset, setOffset] = useState(0);
  const scroller = () => {
    const node: unknown = scroll?.current?.getScrollableNode();
    return typeof HTMLElement !== 'undefined' && node instanceof HTMLElement ? node : null;
  };
  const list = useVirtualizer<HTMLElement, HTMLElement>({
    count: items.length,
    getScrollElement: scroller,
    estimateSize: () => estimate,
    getItemKey: (index) => keyOf(at(items, index)),
    overscan: 8,
    scrollMargin: offset,
  });
  const settle = () => {
    const from = elementOf(box.current);
    const to = scroller();
    if (from && to) setOffset(from.getBoundingClientRect().top - to.getBoundingClientRect().top + to.scrollTop);
  };
  return (
    <View ref={box} onLayout={settle} style={{ height: list.getTotalSize() }}>
      {list.getVirtualItems().map((line) => (
        <View
          key={line.key}
          ref={(view) => list.measureElement(elementOf(view))}
          dataSet={{ index: line.index }}
          role="listitem"
          aria-posinset={line.index + 1}
          aria-setsize={items.length}
          style={{ position: 'absolute', top: 0, left: 0, right: 0, transform: [{ translateY: line.start - offset }] }}
        >
          <Unlisted>{children(at(items, line.index), line.index)}</Unlisted>
        </View>
      ))}
    </View>
  );
}

function at<Item>(items: readonly Item[], index: number): Item {
  const item = items[index];
  if (item === undefined) throw new Error('A row beyond the end of its list');
  return item;
}
