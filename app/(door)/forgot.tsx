import { ForgotScreen } from '@/features/accounts/ForgotScreen';

export default function ForgotPage() {
  return <ForgotScreen />;
}
