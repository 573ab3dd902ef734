import { useLocalSearchParams } from 'expo-router';
import { IncidentForm } from '@/features/water/IncidentForm';

export default function Incident() {
  const { tank } = useLocalSearchParams<{ tank?: string }>();
  return <IncidentForm tankId={tank} />;
}
