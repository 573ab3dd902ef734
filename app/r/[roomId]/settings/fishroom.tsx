import { FishroomScreen } from '@/features/settings/FishroomScreen';

export default function FishroomPage() {
  return <FishroomScreen />;
}
