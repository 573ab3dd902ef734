import { useField } from 'formik';
import { View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { FieldError } from '@/components/form/FieldFrame';
import { useFieldState } from '@/components/form/useFieldState';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { Text } from '@/components/ui/Text';
import { Part } from '@/features/entries/Part';
import { residentsWords } from '@/features/entries/tanks';
import type { TankRow } from '@/shared/tanks/contract';
import { ButtonWrap } from './ButtonWrap';

/** Which tanks it touched: all, a rack, or one by one. */
export function IncidentTanks({ tanks }: { tanks: readonly TankRow[] }) {
  const [{ value: chosen }, , { setValue }] = useField<string[]>('tankIds');
  const field = useFieldState('tankIds');
  // "Long wall, top left" and "Long wall, bottom" are one wall to a power cut.
  const wallOf = ({ place }: TankRow) => place?.split(',')[0]?.trim() ?? null;
  const places = [...new Set(tanks.flatMap((tank) => wallOf(tank) ?? []))];
  const choose = (some: readonly TankRow[]) => void setValue(some.map(({ id }) => id));
  return (
    <Part title="Which tanks?" aside={`${chosen.length} of ${tanks.length}`}>
      <ButtonWrap>
        <Button label="All" small onPress={() => choose(tanks)} />
        {places.map((place) => (
          <Button
            key={place}
            label={place}
            small
            onPress={() => choose(tanks.filter((tank) => wallOf(tank) === place))}
          />
        ))}
        {chosen.length > 0 ? <Button label="None" kind="text" small onPress={() => choose([])} /> : null}
      </ButtonWrap>
      <View>
        {tanks.map((tank) => {
          const on = chosen.includes(tank.id);
          return (
            <CheckRow
              key={tank.id}
              on={on}
              onChange={() => void setValue(on ? chosen.filter((id) => id !== tank.id) : [...chosen, tank.id])}
              label={tank.code}
            >
              <Code>{tank.code}</Code>
              <Text size="small" tone="soft" cut style={{ flexShrink: 1 }}>
                {residentsWords(tank)}
              </Text>
            </CheckRow>
          );
        })}
      </View>
      <FieldError id={field.errorId} words={field.error} />
    </Part>
  );
}
