import { NotFound } from '@/features/accounts/NotFound';

export default function Unmatched() {
  return <NotFound />;
}
