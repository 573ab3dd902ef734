import { useLocalSearchParams } from 'expo-router';
import { ToldApartForm } from '@/features/fishEntries/ToldApartForm';

export default function ToldApart() {
  const { tank, fish } = useLocalSearchParams<{ tank?: string; fish?: string }>();
  return <ToldApartForm tankId={tank} fishId={fish} />;
}
