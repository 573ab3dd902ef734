import { useLocalSearchParams } from 'expo-router';
import { FishScreen } from '@/features/fish/FishScreen';
import { InbreedingPart } from '@/features/lineage/InbreedingPart';
import { PhotoStrip } from '@/features/photos/PhotoStrip';
import { History } from '@/features/record/History';
import { CameBySheet } from '@/features/sheets/CameBySheet';

export default function Fish() {
  const { fishId } = useLocalSearchParams<{ fishId: string }>();
  return (
    <FishScreen
      fishId={fishId}
      photos={<PhotoStrip of={{ thing: 'fish', thingId: fishId }} />}
      inbreeding={
        <>
          <InbreedingPart id={fishId} />
          <CameBySheet fishId={fishId} />
        </>
      }
      history={<History thing="fish" id={fishId} />}
    />
  );
}
