import { YouScreen } from '@/features/accounts/YouScreen';

export default function YouPage() {
  return <YouScreen />;
}
