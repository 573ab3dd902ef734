import { useLocalSearchParams } from 'expo-router';
import { PhotosScreen } from '@/features/photos/PhotosScreen';
import { isPhotoThing } from '@/features/photos/things';

export default function Photos() {
  const { thing, thingId } = useLocalSearchParams<{ thing: string; thingId: string }>();
  return <PhotosScreen of={{ thing: isPhotoThing(thing) ? thing : 'tank', thingId }} />;
}
