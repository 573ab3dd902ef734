import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { roomsToTakeInQuery } from './importQueries';

type Props = {
  /** Null where the reader has its file, which is chosen once more there. */
  checkUrl: string | null;
  issuer: string;
};

/** On a sheet's public page, for whoever is signed in and has a fishroom: carry the lineage on there. */
export function TakeInOffer({ checkUrl, issuer }: Props) {
  const { data = [] } = useQuery(roomsToTakeInQuery);
  const rooms = data.filter(({ id }) => id !== issuer);
  if (rooms.length === 0) return null;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
      {rooms.map(({ id, name }) => (
        <Button
          key={id}
          small
          label={`Take it into ${name}`}
          href={`/r/${id}/sheets/import${checkUrl ? `?from=${encodeURIComponent(checkUrl)}` : ''}`}
        />
      ))}
    </View>
  );
}
