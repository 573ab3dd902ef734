import { useRouter } from 'expo-router';
import { useRef, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { line } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Sheet } from '@/components/ui/Sheet';
import { TankLine } from '@/features/entries/TankLine';
import { useTanks } from '@/features/entries/tanks';
import { useRoom } from '@/hooks/useRoom';
import { RecordActions } from './RecordActions';
import { type Here, useHere } from './useHere';

/** Over the page from below on a phone, beside the rail on a wide screen; it knows where it was opened. */
export function RecordSheet({ open, onClose }: { open: boolean; onClose: () => void }) {
  const { id: roomId } = useRoom();
  const router = useRouter();
  const anchor = useRef<View>(null);
  return (
    <>
      {/* Where the sheet stands on a wide screen: at the rail, level with its Record cell. */}
      <View ref={anchor} style={styles.anchor} />
      <Sheet
        open={open}
        onClose={onClose}
        title="Record"
        anchor={anchor}
        width={480}
        dock={
          <Button
            kind="primary"
            icon="scan"
            grow
            label="Scan a tank label"
            onPress={() => {
              onClose();
              router.push(`/r/${roomId}/record/scan`);
            }}
          />
        }
      >
        <SheetBody onClose={onClose} />
      </Sheet>
    </>
  );
}

function SheetBody({ onClose }: { onClose: () => void }) {
  const theme = useTheme();
  const opened = useHere();
  const { data: tanks = [] } = useTanks();
  const [other, setOther] = useState<string | null>(null);
  const elsewhere = tanks.find(({ id }) => id === other);
  // Another tank than the page's: what the page is about does not go along.
  const here: Here = elsewhere ? { tank: elsewhere, ids: { tank: elsewhere.id } } : opened;
  return (
    <View>
      <TankLine tank={here.tank} onChange={setOther} />
      <View style={[styles.rule, { backgroundColor: theme.ruleStrong }]} />
      <RecordActions here={here} onGone={onClose} />
    </View>
  );
}

const styles = StyleSheet.create({
  anchor: { position: 'absolute', left: 8, top: 12, width: 1, height: 1 },
  rule: { height: line.section },
});
