import { useLocalSearchParams } from 'expo-router';
import { AskScreen } from '@/features/buyers/AskScreen';

export default function Ask() {
  const { slug, brood, strain } = useLocalSearchParams<{ slug: string; brood?: string; strain?: string }>();
  return <AskScreen slug={slug} broodId={brood} strainId={strain} />;
}
