import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { DateBars } from '@/components/chart/DateBars';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { PhotoTile } from '@/components/ui/PhotoTile';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import type { Photo } from '@/shared/photos/contract';
import { may } from '@/shared/roles';
import { type PhotosOf, photoAddress, photosQuery, useRemovePhoto } from './queries';

/** All photos of a thing by date; two of them one above the other. */
export function PhotosScreen({ of }: { of: PhotosOf }) {
  const room = useRoom();
  const router = useRouter();
  const { data, error, refetch } = useQuery(photosQuery(room.id, of));
  const code = data?.[0]?.of.code;
  const back = () => (router.canGoBack() ? router.back() : router.replace(`/r/${room.id}`));
  return (
    <Screen title={code ? `Photos of ${code}` : 'Photos'} close={{ label: 'Close Photos', onPress: back }}>
      {!data ? (
        error ? (
          <ErrorState title="The photos could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading photos" />
        )
      ) : data.length === 0 ? (
        <EmptyState title="No photos yet" words="A photo over a ruler, once a month, shows more than a note.">
          {may(room.role, 'entry:record') ? (
            <Button label="Photo" icon="photo" href={`/r/${room.id}/record/photo?${of.thing}=${of.thingId}`} />
          ) : null}
        </EmptyState>
      ) : (
        <Compare photos={[...data].reverse()} />
      )}
    </Screen>
  );
}

/** Oldest first: A begins as the first, B as the last. */
function Compare({ photos }: { photos: Photo[] }) {
  const room = useRoom();
  const remove = useRemovePhoto();
  const [slots, setSlots] = useState({ a: photos[0]?.id ?? '', b: photos.at(-1)?.id ?? '', next: 'a' as 'a' | 'b' });
  const pick = (id: string) => setSlots((now) => ({ ...now, [now.next]: id, next: now.next === 'a' ? 'b' : 'a' }));
  const shown = [...new Set([slots.a, slots.b])].flatMap((id) => photos.find((photo) => photo.id === id) ?? []);
  return (
    <View style={{ gap: space[4] }}>
      {shown.map(({ id, takenOn, caption, width, height, by }, i) => (
        <View key={id} style={{ gap: space[1] }}>
          <PhotoTile
            uri={photoAddress(room.id, id, 'large')}
            alt={caption ?? `Photo of ${formatDate(takenOn)}`}
            aspect={Math.max(0.6, width / height)}
          />
          <Text size="small">
            <Text strong>{shown.length > 1 ? `${i === 0 ? 'A' : 'B'} · ` : ''}</Text>
            {[formatDate(takenOn), caption, by].filter(Boolean).join(' · ')}
          </Text>
          {may(room.role, 'photo:remove') ? (
            <Button
              small
              kind="text"
              label={`Remove the photo of ${formatDate(takenOn)}`}
              onPress={() => remove.mutate(id)}
            />
          ) : null}
        </View>
      ))}
      {photos.length > 1 ? (
        <DateBars
          label="Photos by date"
          bars={photos.map(({ id, takenOn, caption }) => ({
            id,
            day: takenOn,
            value: lengthIn(caption),
            stage: 'juvenile',
          }))}
          a={slots.a}
          b={slots.b}
          onPick={pick}
        />
      ) : null}
    </View>
  );
}

/** A caption such as "29 mm" says how long the fish was. */
const lengthIn = (caption: string | null): number | null => {
  const [, mm] = /^(\d{1,4}(?:\.\d)?) mm$/.exec(caption ?? '') ?? [];
  return mm ? Number(mm) : null;
};
