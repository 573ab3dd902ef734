import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { SearchField } from '@/components/ui/SearchField';
import { Segmented } from '@/components/ui/Segmented';
import { Filters, Toolbar } from '@/components/ui/Toolbar';
import type { LineageNode } from '@/shared/lineage/contract';
import { KEPT, KEPT_WORDS, keptOf, type Order, type View as Sides } from './group';

type Props = {
  search: string;
  setSearch: (word: string) => void;
  kept: string;
  setKept: (word: string) => void;
  order: Order;
  setOrder: (order: Order) => void;
  view: Sides;
  setView: (view: Sides) => void;
  fish: readonly LineageNode[];
  /** A set chosen fish by fish is not narrowed by what they are kept as. */
  choosable: boolean;
};

const VIEWS = [
  { value: 'pairs', word: 'Pairs' },
  { value: 'all', word: 'All' },
] as const;
const ORDERS = [
  { value: 'mean', word: 'By mean' },
  { value: 'code', word: 'By code' },
] as const;

/** What is compared, and in which order. All of it is kept in the address. */
export function KinshipControls(props: Props) {
  const { search, setSearch, kept, setKept, order, setOrder, view, setView, fish, choosable } = props;
  const filters = KEPT.map((value) => ({
    value,
    word: KEPT_WORDS[value],
    count: fish.filter((node) => keptOf(node) === value).length,
  })).filter(({ count }) => count > 0);
  return (
    <Toolbar>
      <SearchField value={search} onChange={setSearch} placeholder="Fish, tank, colony" />
      {choosable && filters.length > 1 ? (
        <Filters
          label="Compared"
          filters={filters}
          on={KEPT.filter((word) => kept.split(',').includes(word))}
          onChange={(next) => setKept(next.join(','))}
        />
      ) : null}
      <View style={styles.line}>
        <View style={styles.choice}>
          <Segmented label="Who with whom" as="tabs" choices={VIEWS} value={view} onChange={setView} />
        </View>
        <View style={styles.choice}>
          <Segmented label="Order" as="tabs" choices={ORDERS} value={order} onChange={setOrder} />
        </View>
      </View>
    </Toolbar>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', flexWrap: 'wrap', gap: space[2] },
  choice: { flexGrow: 1, flexBasis: 160, maxWidth: 320 },
});
