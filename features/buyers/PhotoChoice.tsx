import { useQuery } from '@tanstack/react-query';
import { StyleSheet, View } from 'react-native';
import { useFieldState } from '@/components/form/useFieldState';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { PhotoTile } from '@/components/ui/PhotoTile';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatShortDay } from '@/shared/days';
import { photosToShowQuery, smallPhoto } from './queries';

const SHOWN = 12;

/** Which photo goes with it; none chosen: the newest. */
export function PhotoChoice({ name, broodId = null }: { name: string; broodId?: string | null }) {
  const room = useRoom();
  const theme = useTheme();
  const field = useFieldState(name);
  const { data = [] } = useQuery(photosToShowQuery(room.id, broodId));
  if (data.length === 0) return null;
  return (
    <View style={{ gap: space[2] }}>
      <Text strong>Photo</Text>
      <View style={styles.tiles}>
        {data.slice(0, SHOWN).map(({ id, takenOn, caption, of }) => {
          const on = field.value === id;
          const alt = [caption ?? of.code ?? 'Photo', formatShortDay(takenOn)].join(', ');
          return (
            <View key={id} style={[styles.tile, { borderColor: on ? theme.ink : 'transparent' }]}>
              <PhotoTile
                uri={smallPhoto(room.id, id)}
                alt={on ? `${alt}, chosen` : alt}
                onPress={() => field.change(on ? null : id)}
              />
            </View>
          );
        })}
      </View>
      <Text size="small" tone="soft">
        {field.value ? 'The one with the frame is shown.' : 'None chosen: the newest of the brood is shown.'}
      </Text>
    </View>
  );
}

const styles = StyleSheet.create({
  tiles: { flexDirection: 'row', flexWrap: 'wrap', gap: space[2] },
  tile: { width: 84, borderWidth: 3 },
});
