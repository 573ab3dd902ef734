import { TanksScreen } from '@/features/tanks/TankScreen';

export default function Tanks() {
  return <TanksScreen />;
}
