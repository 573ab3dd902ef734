import { StyleSheet, View } from 'react-native';
import { Code } from '@/components/ui/Code';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import type { HoldRow } from '@/shared/holds/contract';
import { shortName } from '@/shared/species/shortName';
import { modeWords } from './modeWords';
import { whoHolds } from './whoHolds';

/** The carer's shape and code, or that one can't tell which. */
export function HoldName({ hold }: { hold: HoldRow }) {
  return (
    <Text strong>
      <SexShape sex={modeWords(hold.mode).carer} />{' '}
      {hold.holder?.code ? <Code>{hold.holder.code}</Code> : whoHolds(hold)}
    </Text>
  );
}

/** "Tropheus duboisi Maswa · T07". */
export function HoldPlace({ hold }: { hold: HoldRow }) {
  return (
    <Text size="small" tone="soft">
      {hold.displayName ? <Text italic>{hold.displayName}</Text> : 'Species not known'}
      {hold.locality ? ` ${hold.locality}` : ''}
      {' · '}
      <Code>{hold.tank.code}</Code>
    </Text>
  );
}

/** In a row: "T. duboisi Maswa · T07". A long name gives way, the tank does not. */
export function HoldPlaceShort({ hold }: { hold: HoldRow }) {
  return (
    <View style={styles.place}>
      <Text size="small" tone="soft" cut style={styles.name}>
        {hold.displayName ? <Text italic>{shortName(hold.displayName)}</Text> : 'Species not known'}
        {hold.locality ? ` ${hold.locality}` : ''}
      </Text>
      <Text size="small" tone="soft" whole>
        {'\u00a0· '}
        <Code>{hold.tank.code}</Code>
      </Text>
    </View>
  );
}

const styles = StyleSheet.create({
  place: { flexDirection: 'row', minWidth: 0 },
  name: { flexShrink: 1 },
});
