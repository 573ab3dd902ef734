import { TrailScreen } from '@/features/settings/TrailScreen';

export default function TrailPage() {
  return <TrailScreen />;
}
