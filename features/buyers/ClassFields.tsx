import { useFormikContext } from 'formik';
import { StyleSheet, View } from 'react-native';
import { FieldError } from '@/components/form/FieldFrame';
import { NumberField } from '@/components/form/NumberField';
import { useFieldState } from '@/components/form/useFieldState';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { IconButton } from '@/components/ui/IconButton';
import { Text } from '@/components/ui/Text';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import type { Offer } from '@/shared/buyers/offers';
import { promiseOf } from '@/shared/buyers/promise';
import { chosenLength, reachedWords } from '@/shared/buyers/words';
import { spelledLength } from '@/shared/spelled';

type Class = { key: string; fromTenthsMm: string; cents: string };

const MOST = 6;

/** Prices by length, each with how many of the fish have reached it. */
export function ClassFields({ offer }: { offer: Offer }) {
  const { values, setFieldValue } = useFormikContext<{ classes: Class[] }>();
  const list = useFieldState('classes');
  const { classes } = values;
  const set = (next: Class[]) => void setFieldValue('classes', next);
  return (
    <View style={{ gap: space[3] }}>
      <Text strong>By length, each fish</Text>
      {classes.map(({ key, fromTenthsMm }, i) => (
        <View key={key} style={{ gap: space[1] }}>
          <ClassLine index={i} onRemove={() => set(classes.filter((one) => one.key !== key))} />
          <Reached offer={offer} typed={fromTenthsMm} />
        </View>
      ))}
      {typeof list.error === 'string' ? <FieldError id={list.errorId} words={list.error} /> : null}
      {classes.length < MOST ? (
        <Button
          small
          icon="plus"
          label={classes.length === 0 ? 'Add a price' : 'Another length class'}
          onPress={() => set([...classes, { key: newId(), fromTenthsMm: '', cents: '' }])}
        />
      ) : null}
    </View>
  );
}

function ClassLine({ index, onRemove }: { index: number; onRemove: () => void }) {
  const room = useRoom();
  return (
    <View style={styles.line}>
      <View style={styles.field}>
        <NumberField name={`classes.${index}.fromTenthsMm`} label="From" unit={room.units.length} />
      </View>
      <View style={styles.field}>
        <NumberField name={`classes.${index}.cents`} label="Price each" unit={room.currency} />
      </View>
      <View style={styles.remove}>
        <IconButton icon="close" label={`Leave length class ${index + 1} out`} onPress={onRemove} />
      </View>
    </View>
  );
}

/** "About 9 of 17 have reached 5 cm (5 to 13)." */
function Reached({ offer: { size, available }, typed }: { offer: Offer; typed: string }) {
  const { units } = useRoom();
  const length = spelledLength(units).safeParse(typed);
  if (!size || !length.success) return null;
  const promised = promiseOf(size, available, { heads: 1, lengthTenthsMm: length.data });
  return (
    <Text size="small" tone="soft">
      {reachedWords(promised, available, chosenLength(length.data, units))}
    </Text>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', gap: space[3], alignItems: 'flex-start' },
  field: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
  remove: { paddingTop: space[6] },
});
