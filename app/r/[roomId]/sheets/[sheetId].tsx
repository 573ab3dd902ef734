import { useLocalSearchParams } from 'expo-router';
import { SheetScreen } from '@/features/sheets/SheetScreen';

export default function Sheet() {
  const { sheetId } = useLocalSearchParams<{ sheetId: string }>();
  return <SheetScreen sheetId={sheetId} />;
}
