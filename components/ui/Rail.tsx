import { ScrollView, StyleSheet, View } from 'react-native';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { line, space } from '@/components/theme/space';
import { useTheme, useThemeChoice } from '@/components/theme/ThemeProvider';
import { Icon } from './Icon';
import { Kbd } from './Kbd';
import { Mark, Wordmark } from './Mark';
import { Press } from './Press';
import { type Place, type PlaceName, placeIcons, placeWords } from './place';
import { RailFoot } from './RailFoot';
import type { SavedState } from './SavedLine';
import { Segmented } from './Segmented';
import { Text } from './Text';

export type RailProps = {
  places: Place[];
  current: PlaceName | null;
  currentSub?: string | null;
  onRecord?: () => void;
  saved: SavedState;
  onSaved?: () => void;
  /** Name and role of who is signed in. */
  person: string;
  onPerson: () => void;
};

/** The places of a wide screen; icons with small words below 1080 px. */
export function Rail(props: RailProps) {
  const theme = useTheme();
  const narrow = useBreakpoint() === 'narrow';
  const half = props.places.length / 2;
  return (
    <View
      role="navigation"
      aria-label="Places"
      dataSet={{ printHide: true }}
      style={[styles.rail, { width: narrow ? 88 : 208, borderRightColor: theme.rule }]}
    >
      <ScrollView contentContainerStyle={styles.inner}>
        <View style={narrow ? styles.markNarrow : styles.mark}>{narrow ? <Mark width={36} /> : <Wordmark />}</View>
        {props.places.map((place, i) => (
          <View key={place.name}>
            {i === half && props.onRecord ? <RecordCell onRecord={props.onRecord} narrow={narrow} /> : null}
            <RailPlace
              place={place}
              isCurrent={place.name === props.current}
              currentSub={props.currentSub}
              narrow={narrow}
            />
          </View>
        ))}
        <View style={styles.push} />
        {narrow ? null : <ThemeSwitch />}
        <RailFoot {...props} narrow={narrow} />
      </ScrollView>
    </View>
  );
}

function ThemeSwitch() {
  const { name, choose } = useThemeChoice();
  return (
    <View style={styles.themes}>
      <Segmented
        label="Theme"
        value={name}
        onChange={choose}
        choices={[
          { value: 'dark', word: 'Dim room' },
          { value: 'light', word: 'Daylight' },
        ]}
      />
    </View>
  );
}

type PlaceProps = { place: Place; isCurrent: boolean; currentSub?: string | null; narrow: boolean };

function RailPlace({ place, isCurrent, currentSub, narrow }: PlaceProps) {
  const theme = useTheme();
  const word = placeWords[place.name];
  const inSub = isCurrent && place.subPlaces?.some((sub) => sub.name === currentSub) === true;
  const bar = <View style={[styles.current, { backgroundColor: theme.ink }]} />;
  const subs = isCurrent && !narrow ? (place.subPlaces ?? []) : [];
  return (
    <>
      <Press
        href={place.href}
        aria-current={isCurrent && !inSub ? 'page' : undefined}
        aria-label={place.count ? `${word}, ${place.count}` : word}
        style={({ hovered }) => [
          narrow ? styles.placeNarrow : styles.place,
          hovered ? { backgroundColor: theme.well } : null,
        ]}
      >
        {isCurrent && (!inSub || narrow) ? bar : null}
        <Icon name={placeIcons[place.name]} tone={isCurrent ? 'ink' : 'soft'} />
        <Text
          size={narrow ? 'label' : 'large'}
          style={narrow ? undefined : styles.word}
          strong={isCurrent}
          semi={!isCurrent}
          tone={isCurrent ? 'ink' : 'soft'}
        >
          {word}
        </Text>
        {place.count && !narrow ? (
          <Text
            size="small"
            strong={isCurrent}
            semi={!isCurrent}
            tone={isCurrent ? 'ink' : 'soft'}
            style={styles.count}
          >
            {String(place.count)}
          </Text>
        ) : null}
      </Press>
      {subs.map((sub) => (
        <Press
          key={sub.name}
          href={sub.href}
          aria-current={sub.name === currentSub ? 'page' : undefined}
          style={({ hovered }) => [styles.sub, hovered ? { backgroundColor: theme.well } : null]}
        >
          {sub.name === currentSub ? bar : null}
          <Text strong={sub.name === currentSub} tone={sub.name === currentSub ? 'ink' : 'soft'}>
            {sub.word}
          </Text>
        </Press>
      ))}
    </>
  );
}

function RecordCell({ onRecord, narrow }: { onRecord: () => void; narrow: boolean }) {
  const theme = useTheme();
  return (
    <Press
      onPress={onRecord}
      aria-label="Record"
      aria-keyshortcuts="R"
      aria-haspopup="dialog"
      style={({ pressed }) => [
        narrow ? styles.recordNarrow : styles.record,
        { backgroundColor: theme.actFill, opacity: pressed ? 0.85 : 1 },
      ]}
    >
      <Icon name="record" tone="inverse" />
      <Text size={narrow ? 'label' : 'large'} style={narrow ? undefined : styles.word} strong tone="inverse">
        Record
      </Text>
      {narrow ? null : (
        <View style={styles.count}>
          <Kbd letter="R" tone="inverse" />
        </View>
      )}
    </Press>
  );
}

const styles = StyleSheet.create({
  rail: { borderRightWidth: line.row },
  inner: { flexGrow: 1, paddingTop: 20, paddingBottom: space[4] },
  mark: { paddingHorizontal: 20, paddingBottom: 20 },
  markNarrow: { alignItems: 'center', paddingBottom: 20 },
  place: { flexDirection: 'row', alignItems: 'center', gap: 14, minHeight: 48, paddingHorizontal: 20 },
  placeNarrow: { alignItems: 'center', justifyContent: 'center', gap: 4, minHeight: 64 },
  word: { fontSize: 16, lineHeight: 20 },
  count: { marginLeft: 'auto' },
  current: { position: 'absolute', left: 0, top: 6, bottom: 6, width: 6 },
  sub: { minHeight: 40, justifyContent: 'center', paddingLeft: 58, paddingRight: 12 },
  record: {
    flexDirection: 'row',
    alignItems: 'center',
    gap: 14,
    minHeight: 52,
    marginVertical: 12,
    marginRight: 16,
    paddingHorizontal: 20,
  },
  recordNarrow: { alignItems: 'center', justifyContent: 'center', gap: 4, minHeight: 72, marginVertical: 12 },
  push: { flexGrow: 1, minHeight: space[6] },
  themes: { paddingHorizontal: space[4] },
});
