import { useLocalSearchParams } from 'expo-router';
import { CorrectionForm } from '@/features/holds/CorrectionForm';

export default function HoldCorrection() {
  const { hold } = useLocalSearchParams<{ hold?: string }>();
  return <CorrectionForm holdId={hold} />;
}
