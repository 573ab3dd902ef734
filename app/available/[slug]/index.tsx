import { useLocalSearchParams } from 'expo-router';
import { AvailableScreen } from '@/features/buyers/AvailableScreen';

export default function Available() {
  const { slug } = useLocalSearchParams<{ slug: string }>();
  return <AvailableScreen slug={slug} />;
}
