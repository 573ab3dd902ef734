import { SignInsScreen } from '@/features/accounts/SignInsScreen';

export default function SignInsPage() {
  return <SignInsScreen />;
}
