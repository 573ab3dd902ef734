import { StyleSheet, View } from 'react-native';
import { bar, line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Icon } from './Icon';
import { Press } from './Press';
import { type Place, type PlaceName, placeIcons, placeWords } from './place';
import { Text } from './Text';

type Props = {
  places: Place[];
  current: PlaceName | null;
  /** Opens the Record sheet; left out for those who may not record. */
  onRecord?: () => void;
};

/** A phone's places, with Record as a bar of ink that stands above them. */
export function BottomBar({ places, current, onRecord }: Props) {
  const theme = useTheme();
  const half = Math.ceil(places.length / 2);
  return (
    <View
      role="navigation"
      aria-label="Places"
      dataSet={{ printHide: true }}
      style={[styles.bar, { backgroundColor: theme.ground }]}
    >
      <View style={[styles.edge, { backgroundColor: theme.control }]} />
      {places.slice(0, half).map((place) => (
        <PlaceCell key={place.name} place={place} isCurrent={place.name === current} />
      ))}
      {onRecord ? (
        <Press
          onPress={onRecord}
          aria-label="Record"
          aria-haspopup="dialog"
          style={({ pressed }) => [styles.record, { backgroundColor: theme.actFill, opacity: pressed ? 0.85 : 1 }]}
        >
          <Icon name="record" size={28} width={2} tone="inverse" />
          <Text size="label" strong tone="inverse">
            Record
          </Text>
        </Press>
      ) : null}
      {places.slice(half).map((place) => (
        <PlaceCell key={place.name} place={place} isCurrent={place.name === current} />
      ))}
    </View>
  );
}

function PlaceCell({ place, isCurrent }: { place: Place; isCurrent: boolean }) {
  const theme = useTheme();
  return (
    <Press
      href={place.href}
      aria-current={isCurrent ? 'page' : undefined}
      aria-label={placeWords[place.name]}
      style={styles.cell}
    >
      {isCurrent ? <View style={[styles.current, { backgroundColor: theme.ink }]} /> : null}
      <Icon name={placeIcons[place.name]} tone={isCurrent ? 'ink' : 'soft'} />
      <Text size="label" strong={isCurrent} semi={!isCurrent} tone={isCurrent ? 'ink' : 'soft'} cut>
        {placeWords[place.name]}
      </Text>
    </Press>
  );
}

const styles = StyleSheet.create({
  bar: { flexDirection: 'row', minHeight: bar.height, zIndex: 5 },
  edge: { position: 'absolute', left: 0, right: 0, top: 0, height: line.row },
  cell: { flex: 1, alignItems: 'center', paddingTop: 12, gap: 5, minWidth: 0 },
  current: { position: 'absolute', top: 0, left: 10, right: 10, height: line.place },
  record: { width: 84, alignItems: 'center', marginTop: -bar.rise, paddingTop: 19, gap: 5 },
});
