import { useLocalSearchParams } from 'expo-router';
import { NewSpeciesScreen } from '@/features/species/NewSpeciesScreen';

export default function NewSpecies() {
  const { name } = useLocalSearchParams<{ name?: string }>();
  return <NewSpeciesScreen name={name} />;
}
