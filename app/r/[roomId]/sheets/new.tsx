import { Redirect, useLocalSearchParams } from 'expo-router';
import { NewSheetScreen } from '@/features/sheets/NewSheetScreen';

export default function NewSheet() {
  const { roomId, fish, brood, replaces } = useLocalSearchParams<{
    roomId: string;
    fish?: string;
    brood?: string;
    replaces?: string;
  }>();
  const id = fish ?? brood;
  if (!id) return <Redirect href={`/r/${roomId}/lineage/sheets`} />;
  return <NewSheetScreen of={{ thing: fish ? 'fish' : 'brood', id }} replaces={replaces} />;
}
