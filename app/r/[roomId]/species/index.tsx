import { SpeciesLibraryScreen } from '@/features/species/SpeciesScreen';

export default function Species() {
  return <SpeciesLibraryScreen />;
}
