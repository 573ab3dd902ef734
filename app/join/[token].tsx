import { useLocalSearchParams } from 'expo-router';
import { JoinScreen } from '@/features/accounts/JoinScreen';

export default function JoinPage() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return <JoinScreen token={token} />;
}
