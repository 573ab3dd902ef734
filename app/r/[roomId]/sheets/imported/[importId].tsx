import { useLocalSearchParams } from 'expo-router';
import { ImportedScreen } from '@/features/sheets/ImportedScreen';

export default function Imported() {
  const { importId } = useLocalSearchParams<{ importId: string }>();
  return <ImportedScreen importId={importId} />;
}
