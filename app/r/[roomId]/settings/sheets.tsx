import { SheetSettingsScreen } from '@/features/sheets/SheetSettingsScreen';

export default function SheetSettings() {
  return <SheetSettingsScreen />;
}
