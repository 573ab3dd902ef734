import { NewOrderScreen } from '@/features/orders/NewOrderScreen';

export default function NewOrder() {
  return <NewOrderScreen />;
}
