import { useRouter } from 'expo-router';
import { View } from 'react-native';
import { chooseFile } from '@/components/form/chooseFile';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { CsvPart } from './CsvPart';
import { ImportsPart } from './ImportsPart';
import { useBringIn } from './queries';

/** What comes in: lines of a spreadsheet, or a whole fishroom from an archive. */
export function ImportScreen() {
  const room = useRoom();
  return (
    <Screen title="Import" back={`/r/${room.id}/settings`} measure>
      <Section title="A spreadsheet" aside="CSV">
        <CsvPart />
      </Section>
      <ImportsPart />
      <Section title="An archive" aside="becomes a fishroom of its own">
        <ArchivePart />
      </Section>
    </Screen>
  );
}

function ArchivePart() {
  const router = useRouter();
  const bringIn = useBringIn();
  const take = (file: File) => bringIn.mutate(file, { onSuccess: ({ id }) => router.push(`/r/${id}`) });
  return (
    <View style={{ gap: space[4], paddingTop: space[3] }}>
      <Text tone="soft">
        An archive that any Kinwater saved comes in whole, with every entry and photo, or not at all. You own the new
        fishroom; members are invited anew, and its lineage sheets are signed with a new key.
      </Text>
      {bringIn.error ? <Notice tone="act" alert title="Not brought in" words={bringIn.error.message} /> : null}
      <Button
        small
        label="Choose an archive"
        busy={bringIn.isPending}
        busyLabel="Bringing it in"
        onPress={() => chooseFile('.zip,application/zip', take)}
      />
    </View>
  );
}
