import { useLocalSearchParams } from 'expo-router';
import { TakeInScreen } from '@/features/sheets/TakeInScreen';

export default function TakeIn() {
  const { from } = useLocalSearchParams<{ from?: string }>();
  return <TakeInScreen from={from} />;
}
