import { useLocalSearchParams } from 'expo-router';
import { CheckScreen } from '@/features/sheets/CheckScreen';

export default function CheckedSheet() {
  const { token } = useLocalSearchParams<{ token: string }>();
  return <CheckScreen token={token} />;
}
