import { useRef, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { Sheet } from '@/components/ui/Sheet';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import type { TankRow } from '@/shared/tanks/contract';
import { TankList } from './TankChoice';
import { residentsWords, useTanks } from './tanks';

type Props = { tank: TankRow | null; onChange?: (tankId: string) => void; suits?: (tank: TankRow) => boolean };

/** "In T07 DUMA-A, 8 fish", and the way to another tank. */
export function TankLine({ tank, onChange, suits = () => true }: Props) {
  const { data: tanks = [] } = useTanks();
  const [open, setOpen] = useState(false);
  const anchor = useRef<View>(null);
  return (
    <View style={styles.line}>
      <Text style={styles.words}>
        {tank ? (
          <>
            <Text tone="soft">In </Text>
            <Code>{tank.code}</Code>
            {`${tank.residents.length === 0 ? ',' : ''} ${residentsWords(tank)}`}
          </>
        ) : (
          <Text tone="soft">No tank chosen yet</Text>
        )}
      </Text>
      {onChange ? (
        <View ref={anchor}>
          <TextLink label={tank ? 'Change tank' : 'Choose tank'} onPress={() => setOpen(true)} />
          <Sheet open={open} onClose={() => setOpen(false)} title="Which tank?" anchor={anchor} width={380}>
            <TankList
              tanks={tanks.filter(suits)}
              onPick={(tankId) => {
                setOpen(false);
                onChange(tankId);
              }}
            />
          </Sheet>
        </View>
      ) : null}
    </View>
  );
}

/** Under a form's title, where the tank is not to be changed any more. */
export function TankWords({ tank }: { tank: TankRow | null }) {
  if (!tank) return null;
  return (
    <Text size="small" tone="soft">
      {'In '}
      <Code>{tank.code}</Code>
      {`${tank.residents.length === 0 ? ',' : ''} ${residentsWords(tank)}`}
    </Text>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', alignItems: 'center', justifyContent: 'space-between', gap: space[3], minHeight: 48 },
  words: { flexShrink: 1 },
});
