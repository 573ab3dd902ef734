import { TermsScreen } from '@/features/orders/TermsScreen';

export default function OrderTerms() {
  return <TermsScreen />;
}
