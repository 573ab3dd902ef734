import { useLocalSearchParams } from 'expo-router';
import { OwnOrderScreen } from '@/features/orders/OwnOrderScreen';

export default function OwnOrder() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return <OwnOrderScreen key={token} token={token} />;
}
