import { SecurityScreen } from '@/features/accounts/SecurityScreen';

export default function SecurityPage() {
  return <SecurityScreen />;
}
