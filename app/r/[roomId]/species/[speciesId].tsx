import { useLocalSearchParams } from 'expo-router';
import { SpeciesScreen } from '@/features/species/SpeciesScreen';

export default function OneSpecies() {
  const { speciesId } = useLocalSearchParams<{ speciesId: string }>();
  return <SpeciesScreen speciesId={speciesId} />;
}
