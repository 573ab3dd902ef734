import { StrainsScreen } from '@/features/strains/StrainScreen';

export default function Strains() {
  return <StrainsScreen />;
}
