import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { KeyValues } from '@/components/ui/KeyValues';
import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { IntegrityReport } from '@/shared/transfer/contract';
import { useCheck } from './queries';

/** Compares every photo with what was stored, and the head counts with themselves. */
export function CheckPart() {
  const room = useRoom();
  const check = useCheck(room.id);
  return (
    <View style={{ gap: space[4], paddingTop: space[3] }}>
      <Text tone="soft">
        Reads the database and every photo of this fishroom, and compares them with what was stored. With many photos it
        takes a while.
      </Text>
      {check.error ? <Notice tone="act" alert words={check.error.message} /> : null}
      {check.data ? <Found report={check.data} /> : null}
      <Button
        small
        label={check.data ? 'Check again' : 'Check now'}
        busy={check.isPending}
        busyLabel="Checking"
        onPress={() => check.mutate()}
      />
    </View>
  );
}

const counted = (list: string[]): string => (list.length === 0 ? 'none' : String(list.length));

function Found({ report }: { report: IntegrityReport }) {
  const { database, references, pictures, missing, damaged, unclaimed, belowZero } = report;
  const broken = references.reduce((sum, { count }) => sum + count, 0);
  const whole = database === 'ok' && broken + missing.length + damaged.length + belowZero.length === 0;
  return (
    <View style={{ gap: space[3] }}>
      <Notice
        alert
        tone={whole ? 'tell' : 'act'}
        title={whole ? 'Everything is there' : 'Something is missing or damaged'}
        words={
          whole
            ? 'Nothing is missing and nothing was changed.'
            : 'Tell whoever runs this Kinwater; a backup may have it.'
        }
      />
      <KeyValues
        right
        pairs={[
          { key: 'Database', value: database === 'ok' ? 'whole' : database },
          { key: 'Rows that refer to nothing', value: broken === 0 ? 'none' : String(broken) },
          { key: 'Photos compared', value: String(pictures) },
          { key: 'Photos without their files', value: counted(missing) },
          { key: 'Photos that were changed', value: counted(damaged) },
          { key: 'Files without a photo', value: counted(unclaimed) },
          { key: 'Batches below zero', value: counted(belowZero) },
        ]}
      />
    </View>
  );
}
