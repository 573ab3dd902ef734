import { RequestsScreen } from '@/features/buyers/RequestsScreen';

export default function Waiting() {
  return <RequestsScreen kind="notice" />;
}
