import { RecordScreen } from '@/features/record/RecordScreen';

export default function Record() {
  return <RecordScreen />;
}
