import { OrdersScreen } from '@/features/orders/OrdersScreen';

export default function Orders() {
  return <OrdersScreen />;
}
