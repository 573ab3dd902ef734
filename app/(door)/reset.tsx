import { ResetScreen } from '@/features/accounts/ResetScreen';

export default function ResetPage() {
  return <ResetScreen />;
}
