import { useLocalSearchParams } from 'expo-router';
import { OrderScreen } from '@/features/orders/OrdersScreen';

export default function Order() {
  const { orderId } = useLocalSearchParams<{ orderId: string }>();
  return <OrderScreen orderId={orderId} />;
}
