import { useLocalSearchParams } from 'expo-router';
import { NewStrainScreen } from '@/features/strains/StrainForm';

export default function NewStrain() {
  const { species } = useLocalSearchParams<{ species?: string }>();
  return <NewStrainScreen key={species ?? ''} species={species} />;
}
