import { ExportScreen } from '@/features/transfer/ExportScreen';

export default function ExportPage() {
  return <ExportScreen />;
}
