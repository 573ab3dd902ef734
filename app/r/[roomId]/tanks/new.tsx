import { NewTankScreen } from '@/features/tanks/TankForm';

export default function NewTank() {
  return <NewTankScreen />;
}
