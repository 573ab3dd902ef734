import { BuyersTabs } from '@/features/buyers/BuyersTabs';
import { OrdersScreen } from '@/features/orders/OrdersScreen';

export default function Orders() {
  return <OrdersScreen tabs={<BuyersTabs value="orders" />} />;
}
