import { OwnOrdersScreen } from '@/features/orders/OwnOrdersScreen';

export default function OwnOrders() {
  return <OwnOrdersScreen />;
}
