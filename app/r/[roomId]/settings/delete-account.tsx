import { DeleteAccountScreen } from '@/features/transfer/DeleteAccountScreen';

export default function DeleteAccountPage() {
  return <DeleteAccountScreen />;
}
