import { LineageTabs } from '@/features/lineage/LineageFrame';
import { SheetsScreen } from '@/features/sheets/SheetsScreen';

export default function Sheets() {
  return <SheetsScreen tabs={<LineageTabs tab="sheets" />} />;
}
