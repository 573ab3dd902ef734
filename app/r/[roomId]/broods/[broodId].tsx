import { useLocalSearchParams } from 'expo-router';
import { BroodScreen } from '@/features/broods/BroodScreen';
import { GrowthPart } from '@/features/growth/GrowthPart';
import { InbreedingPart } from '@/features/lineage/InbreedingPart';
import { PhotoStrip } from '@/features/photos/PhotoStrip';
import { History } from '@/features/record/History';

export default function Brood() {
  const { broodId } = useLocalSearchParams<{ broodId: string }>();
  return (
    <BroodScreen
      broodId={broodId}
      growth={<GrowthPart broodId={broodId} />}
      photos={<PhotoStrip of={{ thing: 'brood', thingId: broodId }} />}
      inbreeding={<InbreedingPart id={broodId} />}
      history={<History thing="brood" id={broodId} />}
    />
  );
}
