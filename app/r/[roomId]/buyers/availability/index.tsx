import { AvailabilityScreen } from '@/features/buyers/AvailabilityScreen';

export default function Availability() {
  return <AvailabilityScreen />;
}
