import { CheckFileScreen } from '@/features/sheets/CheckFileScreen';

export default function CheckFile() {
  return <CheckFileScreen />;
}
