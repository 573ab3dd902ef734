import { VerifyScreen } from '@/features/accounts/VerifyScreen';

export default function VerifyPage() {
  return <VerifyScreen />;
}
