import { SearchScreen } from '@/features/search/SearchScreen';
import { StockFound } from '@/features/stock/StockFound';

export default function Search() {
  return <SearchScreen unsignalled={(search) => <StockFound search={search} />} />;
}
