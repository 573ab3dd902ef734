import { View } from 'react-native';
import { saveFrom } from '@/components/form/chooseFile';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { addressOf } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { exportArchive, exportTables } from '@/shared/transfer/contract';
import { CheckPart } from './CheckPart';
import { DeleteRoomPart } from './DeleteRoomPart';

/** The data is the breeder's own: all of it to take along, a look at whether it is whole, and the way out. */
export function ExportScreen() {
  const room = useRoom();
  const params = { roomId: room.id };
  return (
    <Screen title="Export and checks" back={`/r/${room.id}/settings`} measure>
      <Section title="Archive" aside="JSON and photos, in a zip">
        <Part
          words="The whole fishroom in one file. Any Kinwater makes an equal fishroom of it: Import. It holds no passwords and no keys that sign; it does hold your buyers’ addresses, so keep it as you keep those."
          label="Save the archive"
          onPress={() => saveFrom(addressOf(exportArchive, { params }))}
          primary
        />
      </Section>
      <Section title="Tables" aside="CSV, in a zip">
        <Part
          words="Every table for a spreadsheet, with a list of what each column means. Cells that a spreadsheet would run as a formula begin with an apostrophe."
          label="Save the tables"
          onPress={() => saveFrom(addressOf(exportTables, { params }))}
        />
      </Section>
      <Section title="Is everything there?">
        <CheckPart />
      </Section>
      <Section title="Delete the fishroom">
        <DeleteRoomPart />
      </Section>
    </Screen>
  );
}

type PartProps = { words: string; label: string; onPress: () => void; primary?: boolean };

function Part({ words, label, onPress, primary = false }: PartProps) {
  return (
    <View style={{ gap: space[4], paddingTop: space[3] }}>
      <Text tone="soft">{words}</Text>
      <Button kind={primary ? 'primary' : 'plain'} small label={label} onPress={onPress} />
    </View>
  );
}
