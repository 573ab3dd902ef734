import { LinkScreen } from '@/features/accounts/LinkScreen';

export default function LinkPage() {
  return <LinkScreen />;
}
