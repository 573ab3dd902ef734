import { useLocalSearchParams } from 'expo-router';
import { ScanScreen } from '@/features/record/ScanScreen';

export default function Scan() {
  const { next } = useLocalSearchParams<{ next?: string }>();
  return <ScanScreen next={next} />;
}
