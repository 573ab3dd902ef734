import { ImportScreen } from '@/features/transfer/ImportScreen';

export default function ImportPage() {
  return <ImportScreen />;
}
