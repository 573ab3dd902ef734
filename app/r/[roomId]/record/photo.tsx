import { useLocalSearchParams, useRouter } from 'expo-router';
import { TankChoice } from '@/features/entries/TankChoice';
import { PhotoForm } from '@/features/photos/PhotoForm';
import { photoSubject } from '@/features/photos/things';

export default function PhotoOf() {
  const router = useRouter();
  const of = photoSubject(
    useLocalSearchParams<{
      fish?: string;
      hold?: string;
      batch?: string;
      brood?: string;
      colony?: string;
      tank?: string;
    }>(),
  );
  if (!of) return <TankChoice title="Photo" form="photo" onPick={(tank) => router.setParams({ tank })} />;
  return <PhotoForm of={of} subtitle={`Of this ${of.thing}`} />;
}
