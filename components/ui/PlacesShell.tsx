import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { useHotkey } from '@/hooks/useHotkey';
import { BottomBar } from './BottomBar';
import { Rail, type RailProps } from './Rail';
import { SavedLine } from './SavedLine';

type Props = RailProps & {
  children: ReactNode;
  /** The fishroom and the time of what is shown, on the phone's strip. */
  place: string;
  savedOpen?: boolean;
  /** Between the strip and the page on a phone, above the page on a wide screen: what waits, an undo. */
  under?: ReactNode;
  /** Over the bottom of the page, within the thumb's reach: the undo strip. */
  over?: ReactNode;
  /** A form that fills the phone: no strip, no bottom bar. Wide screens keep the rail. */
  bare?: boolean;
};

/** The frame of a fishroom: strip and bottom bar on a phone, rail on a wide screen. R opens Record. */
export function PlacesShell({ children, place, savedOpen, under, over, bare = false, ...rail }: Props) {
  const theme = useTheme();
  const wide = useIsWide();
  useHotkey('r', rail.onRecord);
  return (
    <View
      style={[wide ? styles.wide : styles.phone, bare && !wide ? styles.bare : null, { backgroundColor: theme.ground }]}
    >
      {wide ? <Rail {...rail} /> : null}
      {!wide && !bare ? (
        <View dataSet={{ printHide: true }}>
          <SavedLine state={rail.saved} place={place} onPress={rail.onSaved} open={savedOpen} onPlace={rail.onPerson} />
        </View>
      ) : null}
      <View style={styles.fill}>
        {under}
        <View style={styles.fill}>{children}</View>
        {over}
      </View>
      {!wide && !bare ? <BottomBar places={rail.places} current={rail.current} onRecord={rail.onRecord} /> : null}
    </View>
  );
}

const styles = StyleSheet.create({
  phone: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minHeight: 0 },
  // No strip above: the head keeps its distance from the edge.
  bare: { paddingTop: space[2] },
  wide: { flexGrow: 1, flexShrink: 1, flexBasis: 0, flexDirection: 'row', minHeight: 0 },
  fill: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minHeight: 0, minWidth: 0 },
});
