import { BooksScreen } from '@/features/orders/BooksScreen';

export default function Books() {
  return <BooksScreen />;
}
