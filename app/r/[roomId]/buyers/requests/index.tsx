import { RequestsScreen } from '@/features/buyers/RequestsScreen';

export default function Requests() {
  return <RequestsScreen kind="fish" />;
}
