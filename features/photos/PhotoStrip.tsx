import { useQuery } from '@tanstack/react-query';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { PhotoTile } from '@/components/ui/PhotoTile';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { formatShortDay } from '@/shared/days';
import { may } from '@/shared/roles';
import { type PhotosOf, photoAddress, photosQuery } from './queries';

const SHOWN = 2;

/** The last two photos of a thing, and the way to all of them. */
export function PhotoStrip({ of }: { of: PhotosOf }) {
  const room = useRoom();
  const { data } = useQuery(photosQuery(room.id, of));
  const home = `/r/${room.id}` as const;
  if (!data) return null;
  const [last] = data;
  const all = `${home}/photos/${of.thing}/${of.thingId}` as const;
  const aside = last ? (
    <TextLink label={data.length > SHOWN ? `All ${data.length}` : 'Compare'} href={all} />
  ) : undefined;
  return (
    <Section title="Photos" aside={aside}>
      {last ? (
        <View style={styles.line}>
          {data.slice(0, SHOWN).map(({ id, takenOn, caption }) => (
            <View key={id} style={styles.tile}>
              <PhotoTile
                uri={photoAddress(room.id, id, 'small')}
                alt={caption ?? `Photo of ${formatShortDay(takenOn)}`}
                caption={[formatShortDay(takenOn), caption].filter(Boolean).join(', ')}
                href={all}
                aspect={1.2}
              />
            </View>
          ))}
        </View>
      ) : (
        <View style={{ gap: space[3], alignItems: 'flex-start' }}>
          <Text tone="soft">No photos yet.</Text>
          {may(room.role, 'entry:record') ? (
            <Button small icon="photo" label="Photo" href={`${home}/record/photo?${of.thing}=${of.thingId}`} />
          ) : null}
        </View>
      )}
    </Section>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', gap: space[2] },
  tile: { flexGrow: 1, flexShrink: 1, flexBasis: 0 },
});
